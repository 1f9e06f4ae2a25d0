import type { EntityManager } from 'typeorm'
import type { OpponentStill } from '@shared/stills/schemas'
import { Still } from '../../database/entities/Still'
import { presentStill } from '../possessions/possessions.presenter'

export interface OpponentStillsFilter {
  teamId: string
  opponentId: string
  /** Only those chosen for the report. */
  reportOnly: boolean
  limit: number
  offset: number
}

/** The stills of an opponent, newest game first, then as they were played; nothing of what was deleted. */
export async function listOpponentStills(
  manager: EntityManager,
  { teamId, opponentId, reportOnly, limit, offset }: OpponentStillsFilter,
): Promise<{ rows: OpponentStill[]; total: number }> {
  const query = manager
    .createQueryBuilder(Still, 'still')
    .innerJoinAndSelect('still.possession', 'possession', 'possession.deletedAt IS NULL')
    .leftJoin('scouted_games', 'scouted', 'scouted.id = possession.scoutedGameId')
    .leftJoin('games', 'game', 'game.id = possession.gameId')
    .where('still.teamId = :teamId', { teamId })
    .andWhere('COALESCE(scouted.opponentId, game.opponentId) = :opponentId', { opponentId })
  if (reportOnly) query.andWhere('still.inReport = 1 AND still.facesLeft = 0')
  const total = await query.getCount()
  const found = await query
    .orderBy('COALESCE(scouted.playedOn, game.tipOff)', 'DESC')
    .addOrderBy('possession.number', 'ASC')
    .addOrderBy('still.position', 'ASC')
    .addOrderBy('still.id', 'ASC')
    .limit(limit)
    .offset(offset)
    .getMany()
  const rows = found.flatMap((still) => {
    const { possession } = still
    if (!possession) return []
    const { id: possessionId, scoutedGameId, gameId, number } = possession
    return [{ ...presentStill(still), possessionId, scoutedGameId, gameId, number }]
  })
  return { rows, total }
}

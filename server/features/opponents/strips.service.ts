import { IsNull, type EntityManager } from 'typeorm'
import { onStrip, stripOf, type OpponentStrip } from '@shared/opponents/strips'
import { HABITS } from '@shared/tendencies/habits'
import { Opponent } from '../../database/entities/Opponent'
import { readOpponent } from '../tendencies/readOpponent'

const ON_STRIP = HABITS.filter(({ key }) => onStrip(key))

/** The press of every opponent of a team, flattened for a list; counted as the read counts it. */
export async function listStrips(manager: EntityManager, teamId: string): Promise<OpponentStrip[]> {
  const opponents = await manager
    .getRepository(Opponent)
    .find({ where: { teamId, deletedAt: IsNull() }, select: { id: true } })
  const strips: OpponentStrip[] = []
  for (const { id } of opponents)
    strips.push({ opponentId: id, ...stripOf(await readOpponent(manager, id, {}, undefined, ON_STRIP)) })
  return strips
}

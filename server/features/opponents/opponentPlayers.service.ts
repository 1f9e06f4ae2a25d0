import { IsNull, Not, type DataSource, type EntityManager } from 'typeorm'
import type { OpponentPlayerBody, OpponentPlayerRow } from '@shared/opponents/players'
import { countJerseys } from '../../database/counting/jerseys'
import { Opponent } from '../../database/entities/Opponent'
import { OpponentPlayer } from '../../database/entities/OpponentPlayer'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { Conflict } from '../../http/problem'
import { metaOf } from '../../http/present'

const bodyOf = ({ opponentId, jersey, does, note }: OpponentPlayer): OpponentPlayerBody => ({
  opponentId,
  jersey,
  does,
  note,
})

const NEVER_SEEN: OpponentPlayerRow['counts'] = { onFloor: 0, traps: 0, steals: 0 }

/** Players of one opponent with what was counted of each. */
export async function presentOpponentPlayers(
  manager: EntityManager,
  rows: readonly OpponentPlayer[],
): Promise<OpponentPlayerRow[]> {
  const [first] = rows
  const counts = first ? await countJerseys(manager, first.opponentId) : new Map<number, never>()
  return rows.map((row) => ({
    ...metaOf(row),
    ...bodyOf(row),
    counts: counts.get(row.jersey) ?? NEVER_SEEN,
  }))
}

/** Players of an opponent by number. @throws NotFound */
export async function listOpponentPlayers(
  manager: EntityManager,
  teamId: string,
  opponentId: string,
): Promise<OpponentPlayerRow[]> {
  await findInTeam(manager, Opponent, teamId, opponentId, 'opponent')
  const rows = await manager.find(OpponentPlayer, {
    where: { teamId, opponentId, deletedAt: IsNull() },
    order: { jersey: 'ASC' },
  })
  return presentOpponentPlayers(manager, rows)
}

/** One number, one player of an opponent. @throws Conflict */
export async function checkJersey(
  manager: EntityManager,
  { id, opponentId, jersey }: Pick<OpponentPlayer, 'id' | 'opponentId' | 'jersey'>,
): Promise<void> {
  const taken = await manager.existsBy(OpponentPlayer, {
    opponentId,
    jersey,
    id: Not(id),
    deletedAt: IsNull(),
  })
  if (taken)
    throw new Conflict(`Number ${jersey} of theirs is there already. Open that one, or use another number.`)
}

/** @throws NotFound, Conflict (also for a number that is there), StaleVersion */
export function putOpponentPlayer(
  db: DataSource,
  options: {
    id: string
    teamId: string
    body: OpponentPlayerBody
    ifMatch: number | null
    now: Date
    by: string
  },
): Promise<{ put: Put<OpponentPlayer>; row: OpponentPlayerRow | undefined }> {
  return db.transaction(async (manager) => {
    const { id, teamId, body } = options
    await findInTeam(manager, Opponent, teamId, body.opponentId, 'opponent')
    await checkJersey(manager, { id, ...body })
    const put = await putRow<OpponentPlayer, OpponentPlayerBody>({
      ...options,
      manager,
      entity: OpponentPlayer,
      what: 'player of theirs',
      bodyOf,
      columnsOf: (columns) => columns,
      present: async (row) => (await presentOpponentPlayers(manager, [row]))[0],
    })
    const [row] = await presentOpponentPlayers(manager, [put.row])
    return { put, row }
  })
}

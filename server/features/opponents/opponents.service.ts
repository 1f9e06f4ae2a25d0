import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { OpponentBody } from '@shared/opponents/schemas'
import { Opponent } from '../../database/entities/Opponent'
import { putRow, type Put } from '../../database/putRow'
import { countOpponents, type OpponentCounts } from '../../database/counting/opponentCounts'
import { presentOpponent } from './opponents.presenter'

/** Opponents of a team with what is counted of each; next meeting first, then by name. */
export async function listOpponents(db: DataSource, teamId: string, now: Date) {
  const rows = await db
    .getRepository(Opponent)
    .find({ where: { teamId, deletedAt: IsNull() }, order: { name: 'ASC' } })
  const counts = await countOpponents(db.manager, teamId, now)
  return rows
    .map((row) => presentOpponent(row, counts.get(row.id)))
    .sort(
      (a, b) =>
        (a.nextGame?.tipOff ?? '9').localeCompare(b.nextGame?.tipOff ?? '9') || a.name.localeCompare(b.name),
    )
}

/** What is counted of one opponent. */
export async function countsOf(
  manager: EntityManager,
  opponent: Opponent,
  now: Date,
): Promise<OpponentCounts | undefined> {
  const counts = await countOpponents(manager, opponent.teamId, now, opponent.id)
  return counts.get(opponent.id)
}

/** @throws NotFound, Conflict, StaleVersion */
export function putOpponent(
  db: DataSource,
  options: { id: string; teamId: string; body: OpponentBody; ifMatch: number | null; now: Date; by: string },
): Promise<Put<Opponent>> {
  return db.transaction((manager) =>
    putRow<Opponent, OpponentBody>({
      ...options,
      manager,
      entity: Opponent,
      what: 'opponent',
      bodyOf: ({ name, shortName, notes }) => ({ name, shortName, notes }),
      columnsOf: (body) => body,
      present: async (row) => presentOpponent(row, await countsOf(manager, row, options.now)),
    }),
  )
}

import { IsNull, type EntityManager } from 'typeorm'
import type { CounterRow } from '@shared/counters/schemas'
import { countLoggedReps } from '../../database/counting/liveReps'
import { countRecords } from '../../database/counting/records'
import { Counter } from '../../database/entities/Counter'
import { NotFound } from '../../http/problem'
import { bodyOfCounter, presentCounter } from './counters.presenter'

/** The team's library by name, with our own record of each; one that can no longer be read is left out. */
export async function listCounters(manager: EntityManager, teamId: string): Promise<CounterRow[]> {
  const rows = await manager
    .getRepository(Counter)
    .find({ where: { teamId, deletedAt: IsNull() }, order: { name: 'ASC' } })
  const cells = await countRecords(manager, teamId)
  const logged = new Map((await countLoggedReps(manager, teamId)).map((reps) => [reps.counterId, reps]))
  return rows.flatMap((row) => {
    const body = bodyOfCounter(row)
    const record = cells
      .filter((cell) => cell.counterId === row.id)
      .map(({ shape, k, n }) => ({ shape, k, n }))
    return body ? [presentCounter(row, body, record, logged.get(row.id))] : []
  })
}

/** @throws NotFound */
export async function getCounter(manager: EntityManager, teamId: string, id: string): Promise<CounterRow> {
  const counter = (await listCounters(manager, teamId)).find((row) => row.id === id)
  if (!counter) throw new NotFound('counter')
  return counter
}

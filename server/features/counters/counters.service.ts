import { IsNull, type EntityManager } from 'typeorm'
import type { CounterRow, CounterShow } from '@shared/counters/schemas'
import { countLoggedReps } from '../../database/counting/liveReps'
import { countRecords } from '../../database/counting/records'
import { Counter } from '../../database/entities/Counter'
import { NotFound } from '../../http/problem'
import { bodyOfCounter, presentCounter } from './counters.presenter'

/** Whether a counter belongs to what is asked for. Only the book is ever offered for a game. */
const SHOWN: Record<CounterShow, (row: Counter) => boolean> = {
  book: (row) => !row.draft && row.archivedAt === null,
  drafts: (row) => row.draft && row.archivedAt === null,
  archived: (row) => row.archivedAt !== null,
  all: () => true,
}

/**
 * The team's counters by name, with our own record of each: the book unless something else is asked for. One that
 * can no longer be read is left out.
 */
export async function listCounters(
  manager: EntityManager,
  teamId: string,
  show: CounterShow = 'book',
): Promise<CounterRow[]> {
  const rows = await manager
    .getRepository(Counter)
    .find({ where: { teamId, deletedAt: IsNull() }, order: { name: 'ASC' } })
  const cells = await countRecords(manager, teamId)
  const logged = new Map((await countLoggedReps(manager, teamId)).map((reps) => [reps.counterId, reps]))
  return rows.filter(SHOWN[show]).flatMap((row) => {
    const body = bodyOfCounter(row)
    const record = cells
      .filter((cell) => cell.counterId === row.id)
      .map(({ shape, k, n }) => ({ shape, k, n }))
    return body ? [presentCounter(row, body, record, logged.get(row.id))] : []
  })
}

/** One counter, also while it is a draft or archived. @throws NotFound */
export async function getCounter(manager: EntityManager, teamId: string, id: string): Promise<CounterRow> {
  const counter = (await listCounters(manager, teamId, 'all')).find((row) => row.id === id)
  if (!counter) throw new NotFound('counter')
  return counter
}

import type { DataSource, EntityManager } from 'typeorm'
import { counterFaults, faultSentence } from '@shared/counters/faults'
import { CounterBody, type CounterInput, type CounterRow } from '@shared/counters/schemas'
import { Counter } from '../../database/entities/Counter'
import { findInTeam } from '../../database/findInTeam'
import { recordChange } from '../../database/history'
import { putRow, type Put } from '../../database/putRow'
import { faultsOf } from '../../http/faults'
import { BadInput, Conflict, StaleVersion } from '../../http/problem'
import { bodyOfCounter } from './counters.presenter'
import { getCounter } from './counters.service'

interface Which {
  id: string
  teamId: string
  now: Date
  by: string
}

/**
 * What keeps a counter out of the book: fields that a draft may leave open, and every fault of its drawing on every
 * rule set it names, each with its step, its move and what to do.
 * @throws BadInput
 */
function checkForBook(body: CounterInput): void {
  const parsed = CounterBody.safeParse(body, { reportInput: true })
  const drawing = counterFaults(body.diagram, body.rulePacks).map((fault) => ({
    field: ['diagram.steps', fault.step, ...(fault.move === null ? [] : ['moves', fault.move])].join('.'),
    message: faultSentence(fault, body.diagram),
  }))
  const faults = [...(parsed.success ? [] : faultsOf(parsed.error, '')), ...drawing]
  if (faults.length > 0)
    throw new BadInput(faults, 'It cannot go in the book yet. Each line says what to change.')
}

/**
 * Draws a counter or changes it. A draft is kept with its faults; what is in the book has none.
 * @throws BadInput, NotFound, Conflict, StaleVersion
 */
export async function putCounter(
  db: DataSource,
  options: Which & { body: CounterInput; ifMatch: number | null },
): Promise<{ put: Put<Counter>; row: CounterRow }> {
  return db.transaction(async (manager) => {
    const present = (row: Counter) => getCounter(manager, row.teamId, row.id)
    if (!options.body.draft) checkForBook(options.body)
    const put = await putRow<Counter, CounterInput>({
      ...options,
      manager,
      entity: Counter,
      what: 'counter',
      bodyOf: (row) => ({ ...(bodyOfCounter(row) ?? options.body), draft: row.draft }),
      columnsOf: ({ draft, ...body }) => ({ name: body.name, family: body.family, draft, body }),
      present,
      after: (_row, before) =>
        before && !before.draft && options.body.draft
          ? Promise.reject(
              new Conflict(
                'This counter is in the book. Draw a copy of it, or take it out of the book first.',
              ),
            )
          : Promise.resolve(),
    })
    return { put, row: await present(put.row) }
  })
}

/**
 * Takes a counter out of the book, or puts it back; its record stays with it. A repeat changes nothing.
 * @throws NotFound, StaleVersion
 */
export function archiveCounter(
  db: DataSource,
  options: Which & { archive: boolean; ifMatch: number | null },
): Promise<CounterRow> {
  const { id, teamId, now, by, archive, ifMatch } = options
  return db.transaction(async (manager) => {
    const row = await findInTeam(manager, Counter, teamId, id, 'counter')
    if (ifMatch !== null && ifMatch !== row.version)
      throw new StaleVersion(await getCounter(manager, teamId, id), row.version)
    if ((row.archivedAt !== null) === archive) return getCounter(manager, teamId, id)
    const archivedAt = archive ? now.toISOString() : null
    const fields = [{ field: 'archivedAt', from: row.archivedAt, to: archivedAt }]
    const version = row.version + 1
    await manager.update(Counter, { id }, { archivedAt, version, updatedAt: now.toISOString() })
    await recordChange(manager, Counter, { teamId, rowId: id, action: 'changed', by, now, fields })
    return getCounter(manager, teamId, id)
  })
}

/** Notes that a counter was walked on a screen; nobody's edit is in its way, so its version stays. @throws NotFound */
export async function walkedCounter(manager: EntityManager, { id, teamId, now }: Which): Promise<CounterRow> {
  await findInTeam(manager, Counter, teamId, id, 'counter')
  await manager.update(Counter, { id }, { walkedAt: now.toISOString() })
  return getCounter(manager, teamId, id)
}

import { isDeepStrictEqual } from 'node:util'
import { In, type DataSource, type EntityManager } from 'typeorm'
import { z } from 'zod'
import { FieldChange } from '@shared/history/schemas'
import { PossessionBody, PossessionPatch } from '@shared/possessions/schemas'
import type { BatchBody, BatchField, BatchResult } from '@shared/possessions/table'
import { Change } from '../../database/entities/Change'
import { Possession } from '../../database/entities/Possession'
import { faultsOf } from '../../http/faults'
import { BadInput, Conflict, NotFound, type FieldFault } from '../../http/problem'
import { withParts } from './loadPossessions'
import { writePossession } from './possessions.service'
import { bodyOfPossession, type WholePossession } from './possessions.presenter'

interface Asking {
  teamId: string
  by: string
  now: Date
}

const DAY_MS = 86_400_000

/** A value of a field as a row would hold it. */
function valueOf(field: BatchField, name: 'from' | 'to', value: unknown, faults: FieldFault[]): unknown {
  if (value === undefined) {
    faults.push({ field: name, message: 'This is missing. Fill it in; null is “not logged”.' })
    return undefined
  }
  const parsed = PossessionPatch.shape[field].safeParse(value, { reportInput: true })
  if (parsed.success) return parsed.data
  faults.push(...faultsOf(parsed.error, name))
  return undefined
}

/** Rows of the team, also deleted ones, by id. @throws NotFound when one is not the team's */
async function rowsOf(
  manager: EntityManager,
  teamId: string,
  ids: readonly string[],
): Promise<Map<string, WholePossession>> {
  const rows = await manager.findBy(Possession, { teamId, id: In([...ids]) })
  if (rows.length < ids.length) throw new NotFound('possession')
  return new Map((await withParts(manager, rows)).map((whole) => [whole.row.id, whole]))
}

const entriesOf = (manager: EntityManager, teamId: string, batchId: string): Promise<Change[]> =>
  manager.findBy(Change, { teamId, batchId, kind: 'possessions', action: 'changed' })

/**
 * Changes one field from one value to another in many rows. Rows that hold another value or were changed since
 * they were read are left out and told. One entry in each row's history; the same batch again changes nothing.
 * @throws NotFound, BadInput naming row and field: then nothing is changed
 */
export function changeMany(db: DataSource, asking: Asking, body: BatchBody): Promise<BatchResult> {
  const { batchId, field } = body
  const faults: FieldFault[] = []
  const from = valueOf(field, 'from', body.from, faults)
  const to = valueOf(field, 'to', body.to, faults)
  if (faults.length === 0 && isDeepStrictEqual(from, to))
    faults.push({ field: 'to', message: 'This is what they hold already. Choose another value.' })
  if (faults.length > 0) throw new BadInput(faults)
  return db.transaction(async (manager) => {
    const result: BatchResult = { batchId, changed: [], already: [], leftOut: [] }
    const there = await rowsOf(
      manager,
      asking.teamId,
      body.rows.map(({ id }) => id),
    )
    const before = await entriesOf(manager, asking.teamId, batchId)
    if (before.length > 0) return { ...result, already: before.map(({ rowId }) => rowId) }
    for (const [index, { id, version }] of body.rows.entries()) {
      const whole = there.get(id)
      if (!whole) continue
      const { row, traps } = whole
      const present = bodyOfPossession(row, traps)
      const leave = (why: BatchResult['leftOut'][number]['why']) =>
        result.leftOut.push({ id, number: row.number, why })
      if (row.deletedAt !== null) leave('deleted')
      else if (!isDeepStrictEqual(present[field], from)) leave('other-value')
      else if (row.version !== version) leave('changed-since')
      else {
        const parsed = PossessionBody.safeParse({ ...present, [field]: to }, { reportInput: true })
        if (!parsed.success)
          faults.push(
            ...faultsOf(parsed.error, `rows.${index}`).map((fault) => ({
              ...fault,
              message: `No. ${row.number}: ${fault.message}`,
            })),
          )
        else {
          const put = await writePossession(
            manager,
            { ...asking, id, ifMatch: version, batchId },
            parsed.data,
          )
          result.changed.push({ id, version: put.row.version })
        }
      }
    }
    if (faults.length > 0) throw new BadInput(faults)
    return result
  })
}

const Fields = z.array(FieldChange).catch([])

/**
 * Puts every row of a batch back to what it held, within a day. Rows whose field was changed since, that were
 * deleted, or that would no longer be sound are left out and told; rows that are back already stay.
 * @throws NotFound, Conflict after a day
 */
export function undoMany(
  db: DataSource,
  asking: Asking,
  batchId: string,
  undoId: string,
): Promise<BatchResult> {
  return db.transaction(async (manager) => {
    const entries = await entriesOf(manager, asking.teamId, batchId)
    const [first] = entries
    if (!first) throw new NotFound('change of many rows')
    if (asking.now.getTime() - Date.parse(first.at) > DAY_MS)
      throw new Conflict('This is more than a day ago. Put each row back from its own history.')
    const result: BatchResult = { batchId, changed: [], already: [], leftOut: [] }
    const there = await rowsOf(
      manager,
      asking.teamId,
      entries.map(({ rowId }) => rowId),
    )
    for (const { rowId: id, fields } of entries) {
      const whole = there.get(id)
      const [change] = Fields.parse(fields)
      if (!whole || !change) continue
      const { row, traps } = whole
      const present: Record<string, unknown> = { ...bodyOfPossession(row, traps) }
      const leave = (why: BatchResult['leftOut'][number]['why']) =>
        result.leftOut.push({ id, number: row.number, why })
      const parsed = PossessionBody.safeParse({ ...present, [change.field]: change.from })
      if (row.deletedAt !== null) leave('deleted')
      else if (isDeepStrictEqual(present[change.field], change.from)) result.already.push(id)
      else if (!isDeepStrictEqual(present[change.field], change.to)) leave('changed-since')
      else if (!parsed.success) leave('does-not-fit')
      else {
        const write = { ...asking, id, ifMatch: row.version, batchId: undoId }
        const put = await writePossession(manager, write, parsed.data)
        result.changed.push({ id, version: put.row.version })
      }
    }
    return result
  })
}

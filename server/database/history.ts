import { randomUUID } from 'node:crypto'
import { isDeepStrictEqual } from 'node:util'
import type { EntityManager, EntityTarget, ObjectLiteral } from 'typeorm'
import type { FieldChange } from '@shared/history/schemas'
import { Change } from './entities/Change'

/** JSON characters past which a value is told by its length only: a whole drawing, a long note. */
const LONG = 8000

export interface NewChange {
  teamId: string
  rowId: string
  action: Change['action']
  /** Who did it; null where the product did. */
  by: string | null
  now: Date
  /** What became of each field, for `changed`. */
  fields?: FieldChange[]
  /** Rows changed together share it. */
  batchId?: string | null
}

const told = (value: unknown): unknown => {
  const length = JSON.stringify(value ?? null).length
  return length > LONG ? { long: length } : (value ?? null)
}

/** The fields in which two bodies of a row differ, in the order of the newer one. */
export function fieldsChanged(from: object, to: object): FieldChange[] {
  const before = new Map(Object.entries(from))
  return Object.entries(to)
    .filter(([field, value]) => !isDeepStrictEqual(before.get(field), value))
    .map(([field, value]) => ({ field, from: told(before.get(field)), to: told(value) }))
}

/** Writes one entry into a row's history; call it in the transaction of the change itself. */
export async function recordChange<E extends ObjectLiteral>(
  manager: EntityManager,
  entity: EntityTarget<E>,
  { teamId, rowId, action, by, now, fields = [], batchId = null }: NewChange,
): Promise<void> {
  await manager.getRepository(Change).insert({
    id: randomUUID(),
    teamId,
    kind: manager.connection.getMetadata(entity).tableName,
    rowId,
    action,
    personId: by,
    at: now.toISOString(),
    batchId,
    fields,
  })
}

/** A row that is gone for good takes its history with it. */
export async function forgetHistory(manager: EntityManager, rowIds: readonly string[]): Promise<void> {
  for (const rowId of rowIds) await manager.getRepository(Change).delete({ rowId })
}

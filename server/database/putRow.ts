import { isDeepStrictEqual } from 'node:util'
import type { EntityManager, EntityTarget } from 'typeorm'
import type { FieldChange } from '@shared/history/schemas'
import { Conflict, NotFound, StaleVersion } from '../http/problem'
import type { TeamRow } from './columns'
import { fieldsChanged, recordChange } from './history'

/** What a PUT did: 201, or 200 with or without a change. */
export type Put<E> = { row: E; outcome: 'created' | 'changed' | 'unchanged' }

export interface PutOptions<E extends TeamRow, B> {
  manager: EntityManager
  entity: EntityTarget<E>
  /** "opponent", for the words of an error. */
  what: string
  id: string
  teamId: string
  body: B
  ifMatch: number | null
  now: Date
  /** Whoever does it, for the row's history; null where the product itself does. */
  by: string | null
  /** Rows changed together share it in their history. */
  batchId?: string | null
  /** The stored row as the body that would have made it. */
  bodyOf: (row: E) => B | Promise<B>
  /** The body's fields as columns. */
  columnsOf: (body: B) => Partial<E>
  /** The row as a caller sees it, for 409 and 412. */
  present: (row: E) => unknown
  /** Rows and checks that go with it, in the same transaction; `before` is null for a new row. */
  after?: (row: E, before: E | null) => Promise<void>
}

/**
 * Identity of RECORD.md section 6: PUT of a new id creates; the identical body again changes nothing;
 * another body for an existing id without `If-Match` is a conflict; a stale `If-Match` carries the
 * present row; an id of another team does not exist. Call it inside a transaction.
 * @throws NotFound, Conflict, StaleVersion
 */
export async function putRow<E extends TeamRow, B>(options: PutOptions<E, B>): Promise<Put<E>> {
  const { manager, entity, id, teamId, body, ifMatch, now } = options
  const repository = manager.getRepository(entity)
  const found = await repository.createQueryBuilder('row').where('row.id = :id', { id }).getOne()
  if (found && found.teamId !== teamId) throw new NotFound(options.what)
  if (found && found.deletedAt !== null)
    throw new Conflict(`This ${options.what} was deleted. Put it back first, or use a new id.`)
  const record = (action: 'made' | 'changed', fields: FieldChange[] = []) =>
    recordChange(manager, entity, {
      teamId,
      rowId: id,
      action,
      fields,
      by: options.by,
      now,
      batchId: options.batchId ?? null,
    })
  if (!found) {
    if (ifMatch !== null) throw new NotFound(options.what)
    const stamp = now.toISOString()
    const row = repository.create()
    Object.assign(row, options.columnsOf(body), {
      id,
      teamId,
      version: 1,
      createdAt: stamp,
      updatedAt: stamp,
      deletedAt: null,
    })
    await repository.insert(row as never)
    await options.after?.(row, null)
    await record('made')
    return { row, outcome: 'created' }
  }
  if (ifMatch !== null && ifMatch !== found.version)
    throw new StaleVersion(await options.present(found), found.version)
  const present = await options.bodyOf(found)
  if (isDeepStrictEqual(present, body)) return { row: found, outcome: 'unchanged' }
  if (ifMatch === null)
    throw new Conflict(
      `This ${options.what} is already there and says something else. Open it and change it there.`,
      await options.present(found),
    )
  const before = Object.assign(repository.create(), found)
  Object.assign(found, options.columnsOf(body), { version: found.version + 1, updatedAt: now.toISOString() })
  const { id: _id, ...columns } = found
  await repository.update({ id } as never, columns as never)
  await options.after?.(found, before)
  await record('changed', fieldsChanged(present as object, body as object))
  return { row: found, outcome: 'changed' }
}

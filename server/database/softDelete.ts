import type { EntityManager, EntityTarget } from 'typeorm'
import { Conflict, NotFound, StaleVersion } from '../http/problem'
import type { TeamRow } from './columns'
import { findAlsoDeleted } from './findInTeam'
import { hangingOn, parentsOf, undoUntil } from './hanging'
import { recordChange } from './history'

interface Which<E extends TeamRow> {
  /** Of the transaction that the deletion is part of. */
  manager: EntityManager
  entity: EntityTarget<E>
  /** "opponent", for the words of an error. */
  what: string
  teamId: string
  id: string
  now: Date
  by: string
}

export interface Deletion<E extends TeamRow> extends Which<E> {
  ifMatch: number | null
  /** The row as a caller sees it, for 412. */
  present: (row: E) => unknown
  /** Throws where the row must stay. */
  check?: (row: E) => Promise<void>
}

/** Runs over every level below a row: `sql` is a condition over `table` that holds for what hangs on the row. */
async function below(
  table: string,
  condition: string,
  visit: (table: string, condition: string) => Promise<void>,
): Promise<void> {
  for (const child of hangingOn(table)) {
    const hangs = `"${child.column}" IN (SELECT "id" FROM "${table}" WHERE ${condition})`
    await below(child.table, hangs, visit)
    await visit(child.table, hangs)
  }
}

/**
 * The instant of a deletion, which its children are marked with too. Later than any earlier deletion below the
 * row, so that what was deleted before does not come back with it.
 */
async function stampFor(manager: EntityManager, table: string, id: string, now: Date): Promise<string> {
  let newest = ''
  await below(table, '"id" = ?', async (child, condition) => {
    const [row]: { at: string | null }[] = await manager.query(
      `SELECT max("deletedAt") AS at FROM "${child}" WHERE ${condition}`,
      [id],
    )
    if (row?.at && row.at > newest) newest = row.at
  })
  const stamp = now.toISOString()
  return newest >= stamp ? new Date(Date.parse(newest) + 1).toISOString() : stamp
}

async function mark<E extends TeamRow>(
  { manager, entity, id, now }: Which<E>,
  row: E,
  deletedAt: string | null,
) {
  Object.assign(row, { deletedAt, updatedAt: now.toISOString(), version: row.version + 1 })
  const { updatedAt, version } = row
  await manager.update(entity, { id } as never, { deletedAt, updatedAt, version } as never)
}

/**
 * Takes a row, and what hangs on it, out of every list and count; it can be put back for ten minutes. A repeat
 * changes nothing. Call it inside a transaction.
 * @throws NotFound, StaleVersion
 */
export async function softDelete<E extends TeamRow>(options: Deletion<E>): Promise<void> {
  const { manager, entity, what, teamId, id, ifMatch, now, by } = options
  const row = await findAlsoDeleted(manager, entity, teamId, id, what)
  if (row.deletedAt !== null) return
  if (ifMatch !== null && ifMatch !== row.version)
    throw new StaleVersion(await options.present(row), row.version)
  await options.check?.(row)
  const { tableName } = manager.connection.getMetadata(entity)
  const stamp = await stampFor(manager, tableName, id, now)
  await below(tableName, '"id" = ?', async (child, condition) => {
    const sql = `UPDATE "${child}" SET "deletedAt" = ? WHERE "deletedAt" IS NULL AND ${condition}`
    await manager.query(sql, [stamp, id])
  })
  await mark(options, row, stamp)
  await recordChange(manager, entity, { teamId, rowId: id, action: 'deleted', by, now })
}

/** What a row hangs on must be there. @throws Conflict */
async function checkParents(manager: EntityManager, table: string, id: string, what: string): Promise<void> {
  for (const parent of parentsOf(table)) {
    const gone: unknown[] = await manager.query(
      `SELECT 1 FROM "${table}" r JOIN "${parent.table}" p ON p."id" = r."${parent.column}"
        WHERE r."id" = ? AND p."deletedAt" IS NOT NULL`,
      [id],
    )
    const named = parent.table.replaceAll('_', ' ').replace(/s$/, '')
    if (gone.length > 0)
      throw new Conflict(`The ${named} of this ${what} was deleted too. Put the ${named} back first.`)
  }
}

/**
 * Puts a deleted row back while that is possible, with whatever went with it and nothing else. A row that is
 * there is handed back as it is. Call it inside a transaction.
 * @throws NotFound once the ten minutes are over, Conflict where what it hangs on is deleted
 */
export async function restoreDeleted<E extends TeamRow>(
  options: Which<E> & { check?: (row: E) => Promise<void> },
): Promise<E> {
  const { manager, entity, what, teamId, id, now, by } = options
  const row = await findAlsoDeleted(manager, entity, teamId, id, what)
  const { deletedAt } = row
  if (deletedAt === null) return row
  if (deletedAt <= undoUntil(now)) throw new NotFound(what)
  const { tableName } = manager.connection.getMetadata(entity)
  await checkParents(manager, tableName, id, what)
  await options.check?.(row)
  await below(tableName, '"id" = ?', async (child, condition) => {
    const sql = `UPDATE "${child}" SET "deletedAt" = NULL WHERE "deletedAt" = ? AND ${condition}`
    await manager.query(sql, [deletedAt, id])
  })
  await mark(options, row, null)
  await recordChange(manager, entity, { teamId, rowId: id, action: 'restored', by, now })
  return row
}

import Database from 'better-sqlite3'
import { PURGE_STATEMENTS, undoUntil } from '../database/hanging'

/** Told of a letter that had not left when the backup was made. */
const WORDS_LOST =
  'It had not left when the backup was made, and its words are not in backups. Write it again.'

type Connection = Database.Database

/** One step for the whole file: pages are copied under one read lock, so no writer can make it start again. */
const ALL_PAGES = 0x7fff_ffff

/**
 * Copies the database at `from`, which a server may have open and be writing to, as of one instant, with
 * what stands only in its log. Writers are not held up.
 */
export async function copyDatabase(from: string, to: string): Promise<void> {
  const source = new Database(from, { fileMustExist: true })
  try {
    await source.backup(to, { progress: () => ALL_PAGES })
  } finally {
    source.close()
  }
}

/**
 * Takes out of a copy what a backup does not keep: who is signed in, links to new passwords, the words of
 * letters (they may hold a link too), and rows whose time to be put back is over, with all that hangs on them and
 * their history. A copy of an older database has not every table. What was taken out is gone from the file's
 * bytes too, and the file needs no log beside it.
 */
export function clearCopy(file: string, now: Date): void {
  withConnection(file, (connection) => {
    connection.pragma('journal_mode = DELETE')
    connection.pragma('foreign_keys = ON')
    connection.pragma('secure_delete = ON')
    connection.exec('DELETE FROM "sessions"')
    const has = columnsIn(connection)
    if (has('password_resets', 'id')) connection.exec('DELETE FROM "password_resets"')
    // A link that still opens a team is not carried about; used ones open nothing.
    if (has('invitations', 'usedAt')) connection.exec('DELETE FROM "invitations" WHERE "usedAt" IS NULL')
    // A restored letter has no words to leave with: what had not left yet is a failed one, for somebody to look at.
    if (has('mails', 'state'))
      connection.exec(`UPDATE "mails" SET "text" = '', "html" = '',
        "trouble" = CASE WHEN "state" IN ('waiting', 'sending', 'kept', 'failed') THEN '${WORDS_LOST}' ELSE "trouble" END,
        "nextTryAt" = NULL,
        "state" = CASE WHEN "state" IN ('waiting', 'sending', 'kept') THEN 'failed' ELSE "state" END`)
    const until = undoUntil(now)
    for (const { sql, needs } of PURGE_STATEMENTS)
      if (needs.every(([table, column]) => has(table, column)))
        connection.prepare(sql).run(...(sql.includes('?') ? [until] : []))
    connection.exec('VACUUM')
  })
}

/** Whether a database has a column. */
function columnsIn(connection: Connection): (table: string, column: string) => boolean {
  const find = connection.prepare('SELECT 1 FROM pragma_table_info(?) WHERE name = ?')
  return (table, column) => find.get(table, column) !== undefined
}

/** What is wrong with a database file, in words; empty when nothing is. */
export function databaseFaults(file: string): string[] {
  try {
    return withConnection(file, (connection) => {
      const integrity = connection.pragma('integrity_check', { simple: true })
      const orphans = connection.pragma('foreign_key_check') as unknown[]
      return [
        ...(integrity === 'ok' ? [] : ['the database file is damaged']),
        ...(orphans.length === 0 ? [] : [`${orphans.length} rows are without the row they belong to`]),
      ]
    })
  } catch (error) {
    if (error instanceof Database.SqliteError) return ['the database file is damaged']
    throw error
  }
}

/** Rows of every table, by its name. */
export function countRows(file: string): Record<string, number> {
  return withConnection(file, (connection) => {
    const tables = connection
      .prepare(
        `SELECT name FROM sqlite_schema WHERE type = 'table' AND name NOT LIKE 'sqlite~_%' ESCAPE '~' ORDER BY name`,
      )
      .pluck()
      .all() as string[]
    return Object.fromEntries(
      tables.map((table) => [
        table,
        connection.prepare(`SELECT count(*) FROM "${table}"`).pluck().get() as number,
      ]),
    )
  })
}

/** The name of the newest migration that a database has had; empty for one that has had none. */
export function newestMigration(file: string): string {
  return withConnection(
    file,
    (connection) =>
      (connection
        .prepare('SELECT "name" FROM "migrations" ORDER BY "timestamp" DESC LIMIT 1')
        .pluck()
        .get() as string | undefined) ?? '',
  )
}

/** Ids of every still and its team. */
export function stillsOf(file: string): { id: string; teamId: string }[] {
  return withConnection(
    file,
    (connection) =>
      connection.prepare('SELECT "id", "teamId" FROM "stills" ORDER BY "id"').all() as {
        id: string
        teamId: string
      }[],
  )
}

/** Whether a still's row is there. */
export function hasStill(file: string, id: string): boolean {
  return withConnection(
    file,
    (connection) => connection.prepare('SELECT 1 FROM "stills" WHERE "id" = ?').get(id) !== undefined,
  )
}

/** Takes stills out of a copy that were deleted after it was made. */
export function forgetStills(file: string, ids: readonly string[]): void {
  withConnection(file, (connection) => {
    connection.pragma('secure_delete = ON')
    const forget = connection.prepare('DELETE FROM "stills" WHERE "id" = ?')
    for (const id of ids) forget.run(id)
    connection.exec('VACUUM')
  })
}

function withConnection<T>(file: string, use: (connection: Connection) => T): T {
  const connection = new Database(file, { fileMustExist: true })
  try {
    return use(connection)
  } finally {
    connection.close()
  }
}

import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'

/** The lock's file in a data folder; it holds no data. */
export const LOCK_FILE = 'in-use.lock'

/** Thrown when another process, or another part of this one, has the folder. */
export class FolderInUse extends Error {
  constructor(
    readonly folder: string,
    /** Who has it, as far as that can be told. */
    readonly pid: number | null,
  ) {
    super(`${folder} is in use by ${pid === null ? 'another process' : `process ${pid}`}.`)
  }
}

/** A server that is just stopping, or somebody asking who holds the folder, is waited for. */
const WAIT_MS = 1000

const isBusy = (error: unknown): boolean =>
  error instanceof Database.SqliteError && error.code.startsWith('SQLITE_BUSY')

/**
 * Takes a data folder for one process. What locks is an open write transaction on a file of its own: the
 * system lets go of it when the process ends, however it ends, so no lock is ever left behind and no process
 * id of a dead server can be mistaken for a living one. The id is kept in the file only to name the holder.
 * Returns the function that lets go.
 * @throws FolderInUse
 */
export function lockFolder(folder: string, pid = process.pid): () => void {
  mkdirSync(folder, { recursive: true })
  const file = new Database(join(folder, LOCK_FILE), { timeout: WAIT_MS })
  try {
    // A reader still gets in beside a write transaction in this mode: that is how the holder is named.
    file.pragma('journal_mode = DELETE')
    file.exec('BEGIN IMMEDIATE')
    file.pragma(`user_version = ${pid}`)
    file.exec('COMMIT; BEGIN IMMEDIATE')
  } catch (error) {
    const holder = isBusy(error) ? holderOf(file) : null
    file.close()
    if (isBusy(error)) throw new FolderInUse(folder, holder)
    throw error
  }
  return () => file.close()
}

function holderOf(file: Database.Database): number | null {
  try {
    const pid = file.pragma('user_version', { simple: true })
    return typeof pid === 'number' && pid > 0 ? pid : null
  } catch {
    return null
  }
}

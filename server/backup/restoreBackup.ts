import { mkdir, rename, rm, rmdir } from 'node:fs/promises'
import { join } from 'node:path'
import { FolderInUse, lockFolder } from '../adapters/folderLock'
import { CommandError } from '../commands/commandError'
import { openDatabase } from '../database/dataSource'
import { countRows, databaseFaults } from './databaseCopy'
import { doneErasures, eraseAgain } from './erasedSince'
import { copyWhole, exists, namesIn } from './files'
import { DATABASE_FILE, differingRows, STILLS_FOLDER, type Manifest } from './manifest'
import { BEFORE_RESTORE, RESTORING } from './retention'
import { stampOf } from './stamp'
import { stillsWithoutFiles } from './stillCopies'
import { verifyBackup } from './verifyBackup'

export interface Restored {
  manifest: Manifest
  /** Where the data that was there before lies now; null when there was none. */
  aside: string | null
  /** Names of migrations that the restored database has had since it was backed up. */
  migrated: string[]
  /**
   * How many people the backup held who were erased since and were erased again; null where there was no data to
   * learn of erasures from.
   */
  erasedAgain: number | null
}

/** What a data folder's own data is; its backups, its secret and its lock stay where they are. */
const DATA = [DATABASE_FILE, `${DATABASE_FILE}-wal`, `${DATABASE_FILE}-shm`, STILLS_FOLDER]

/**
 * Puts a backup in place of a data folder's database and stills. All of it is verified, copied, brought to
 * the newest migration and checked before anything of what is there is touched; what is there is then kept
 * aside, never deleted.
 * @throws CommandError when the backup is damaged or newer than we are, when a server has the folder, or when
 * there is data in it and `replace` is off; nothing is changed then.
 */
export async function restoreBackup(options: {
  backup: string
  dataDir: string
  replace: boolean
  now: Date
}): Promise<Restored> {
  const { backup, dataDir, replace, now } = options
  const manifest = await verifyBackup(backup)
  const letGo = takeFolder(dataDir)
  try {
    if (!replace && (await holdsData(dataDir)))
      throw new CommandError(
        `${dataDir} has data in it. Add --replace to put the backup in its place; what is there is kept aside. Nothing was changed.`,
      )
    const part = join(dataDir, RESTORING + stampOf(now))
    try {
      const { migrated, erasedAgain } = await prepare(backup, part, manifest, await doneErasures(dataDir))
      const aside = join(dataDir, BEFORE_RESTORE + stampOf(now))
      return { manifest, migrated, erasedAgain, aside: (await swap(dataDir, part, aside)) ? aside : null }
    } finally {
      await rm(part, { recursive: true, force: true })
    }
  } finally {
    letGo()
  }
}

function takeFolder(dataDir: string): () => void {
  try {
    return lockFolder(dataDir)
  } catch (error) {
    if (!(error instanceof FolderInUse)) throw error
    throw new CommandError(`${error.message} Stop the server, then restore. Nothing was changed.`)
  }
}

async function holdsData(dataDir: string): Promise<boolean> {
  if (await exists(join(dataDir, DATABASE_FILE))) return true
  return (await namesIn(join(dataDir, STILLS_FOLDER))).length > 0
}

/** A backup's files in a folder of their own, migrated and checked, without whoever was erased since. */
async function prepare(
  backup: string,
  part: string,
  manifest: Manifest,
  erasures: Awaited<ReturnType<typeof doneErasures>>,
): Promise<Pick<Restored, 'migrated' | 'erasedAgain'>> {
  await mkdir(part, { mode: 0o700 })
  await mkdir(join(part, STILLS_FOLDER), { mode: 0o700 })
  for (const { path } of manifest.files) await copyWhole(join(backup, path), join(part, path))
  const file = join(part, DATABASE_FILE)
  const refuse = (faults: string[]) => {
    if (faults.length > 0)
      throw new CommandError(`${backup}: ${faults.join('; ')}. Take another backup. Nothing was changed.`)
  }
  refuse(databaseFaults(file))
  refuse(differingRows(manifest.rows, countRows(file)))
  const done = await migrate(file, erasures)
  refuse(databaseFaults(file))
  refuse((await stillsWithoutFiles(part)).map((id) => `still ${id} has no picture`))
  return done
}

async function migrate(
  file: string,
  erasures: Awaited<ReturnType<typeof doneErasures>>,
): Promise<Pick<Restored, 'migrated' | 'erasedAgain'>> {
  const namesHad = (rows: { name: string }[]) => rows.map(({ name }) => name)
  const before = countRows(file)['migrations'] ?? 0
  const db = await openDatabase(file)
  try {
    const had = namesHad(await db.query('SELECT "name" FROM "migrations" ORDER BY "timestamp"'))
    const known = new Set(db.migrations.map(({ name }) => name))
    const unknown = had.find((name) => !known.has(name))
    if (unknown !== undefined)
      throw new CommandError(
        `The backup was made by a newer Overtop (${unknown}). Update this one, then restore. Nothing was changed.`,
      )
    const erasedAgain = erasures && (await eraseAgain(db, erasures))
    return { migrated: had.slice(before), erasedAgain }
  } finally {
    await db.destroy()
  }
}

/** By renames inside one folder; what was moved is moved back when one fails. Says whether anything was there. */
async function swap(dataDir: string, part: string, aside: string): Promise<boolean> {
  const there: string[] = []
  for (const name of DATA) if (await exists(join(dataDir, name))) there.push(name)
  const moved: [from: string, to: string][] = []
  const move = async (name: string, from: string, to: string) => {
    await rename(join(from, name), join(to, name))
    moved.push([join(from, name), join(to, name)])
  }
  if (there.length > 0) await mkdir(aside, { mode: 0o700 })
  try {
    for (const name of there) await move(name, dataDir, aside)
    for (const name of [DATABASE_FILE, STILLS_FOLDER]) await move(name, part, dataDir)
  } catch (error) {
    for (const [from, to] of moved.reverse()) await rename(to, from)
    if (there.length > 0) await rmdir(aside)
    throw error
  }
  return there.length > 0
}

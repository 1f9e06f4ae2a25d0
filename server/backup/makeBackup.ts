import { mkdir, rename, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { CommandError } from '../commands/commandError'
import { clearCopy, copyDatabase, countRows, databaseFaults, newestMigration } from './databaseCopy'
import { describeFile, exists, namesIn, settle } from './files'
import { DATABASE_FILE, FORMAT, MANIFEST_FILE, STILLS_FOLDER, type Manifest } from './manifest'
import { PART } from './retention'
import { stampOf } from './stamp'
import { copyStills } from './stillCopies'

export interface Backup {
  /** The finished backup's folder. */
  folder: string
  manifest: Manifest
}

/**
 * Copies a data folder, which a running server may be writing to, into `into`/<stamp>: the database as of one
 * instant, the pictures of its stills, and a manifest. The folder has its name only once it is whole and
 * checked. Sessions and the secret that signs them are not copied.
 * @throws CommandError when there is nothing to copy or a check fails; nothing is left behind then.
 */
export async function makeBackup(dataDir: string, into: string, now: Date): Promise<Backup> {
  const source = join(dataDir, DATABASE_FILE)
  if (!(await exists(source)))
    throw new CommandError(
      `There is no ${DATABASE_FILE} in ${dataDir}. Set DATA_DIR to the folder that the server uses.`,
    )
  const folder = join(into, stampOf(now))
  const part = folder + PART
  await mkdir(into, { recursive: true, mode: 0o700 })
  if ((await exists(folder)) || (await exists(part)))
    throw new CommandError(`${folder} is being made or there already. Run it again in a second.`)
  await mkdir(part, { mode: 0o700 })
  try {
    await fill(part, dataDir, now)
    const manifest = await describe(part, now)
    const file = join(part, MANIFEST_FILE)
    await writeFile(file, `${JSON.stringify(manifest, null, 2)}\n`)
    await settle(file)
    await rename(part, folder)
    return { folder, manifest }
  } catch (error) {
    await rm(part, { recursive: true, force: true })
    throw error
  }
}

async function fill(part: string, dataDir: string, now: Date): Promise<void> {
  const copy = join(part, DATABASE_FILE)
  await copyDatabase(join(dataDir, DATABASE_FILE), copy)
  const damage = databaseFaults(copy)
  if (damage.length > 0)
    throw new CommandError(
      `Nothing was backed up: ${damage.join('; ')}. Restore the newest backup that is whole.`,
    )
  clearCopy(copy, now)
  await copyStills(dataDir, part)
  const faults = databaseFaults(copy)
  if (faults.length > 0)
    throw new CommandError(`Nothing was backed up: in the copy ${faults.join('; ')}. Run it again.`)
  await settle(copy)
}

async function describe(part: string, now: Date): Promise<Manifest> {
  const copy = join(part, DATABASE_FILE)
  const paths = [DATABASE_FILE]
  for (const team of await namesIn(join(part, STILLS_FOLDER)))
    for (const name of await namesIn(join(part, STILLS_FOLDER, team)))
      paths.push(`${STILLS_FOLDER}/${team}/${name}`)
  const files: Manifest['files'] = []
  for (const path of paths) files.push(await describeFile(part, path))
  return {
    format: FORMAT,
    madeAt: now.toISOString(),
    newestMigration: newestMigration(copy),
    rows: countRows(copy),
    files,
  }
}

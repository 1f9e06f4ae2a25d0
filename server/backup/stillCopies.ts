import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { diskStillFiles } from '../adapters/stillFiles'
import { CommandError } from '../commands/commandError'
import { forgetStills, hasStill, stillsOf } from './databaseCopy'
import { copyWhole, exists, isMissing, namesIn } from './files'
import { DATABASE_FILE, STILLS_FOLDER } from './manifest'

/** How long a still's row and files may be gone one without the other: the server takes one after the other. */
const WAIT_MS = 5000
const LOOK_EVERY_MS = 100

/** Every still of a data folder's database whose picture or thumbnail is missing beside it. */
export async function stillsWithoutFiles(folder: string): Promise<string[]> {
  const files = diskStillFiles(folder)
  const missing: string[] = []
  for (const { id, teamId } of stillsOf(join(folder, DATABASE_FILE)))
    for (const size of ['full', 'thumbnail'] as const)
      if (!missing.includes(id) && !(await exists(files.pathOf(teamId, id, size)))) missing.push(id)
  return missing
}

/**
 * Copies the pictures of every still that the copied database in `to` lists. One that was deleted while we
 * copied is taken out of the copy too; a picture without a row is left behind.
 * @throws CommandError when a still has lost its picture.
 */
export async function copyStills(from: string, to: string): Promise<void> {
  const listed = stillsOf(join(to, DATABASE_FILE))
  const ids = new Set(listed.map(({ id }) => id))
  for (const teamId of new Set(listed.map((still) => still.teamId)))
    for (const name of await namesIn(join(from, STILLS_FOLDER, teamId))) {
      const [id = ''] = name.split('.')
      if (!ids.has(id) || name.endsWith('.part')) continue
      try {
        const path = join(STILLS_FOLDER, teamId, name)
        await copyWhole(join(from, path), join(to, path))
      } catch (error) {
        if (!isMissing(error)) throw error
      }
    }
  const missing = await stillsWithoutFiles(to)
  for (const id of missing)
    if (!(await goesSoon(join(from, DATABASE_FILE), id)))
      throw new CommandError(
        `Nothing was backed up: still ${id} has lost its picture. Delete that still in Overtop, or put its files back, and run it again.`,
      )
  if (missing.length > 0) forgetStills(join(to, DATABASE_FILE), missing)
}

async function goesSoon(database: string, id: string): Promise<boolean> {
  for (let waited = 0; waited < WAIT_MS; waited += LOOK_EVERY_MS) {
    if (!hasStill(database, id)) return true
    await pause(LOOK_EVERY_MS)
  }
  return false
}

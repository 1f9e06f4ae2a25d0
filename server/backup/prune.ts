import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import { exists, namesIn } from './files'
import { MANIFEST_FILE } from './manifest'
import { BEFORE_RESTORE, namesOver } from './retention'

/** Where backups go unless another folder is named. */
export const BACKUPS_FOLDER = 'backups'

/** Deletes what is over in one folder; only folders that hold what ours hold. Returns the paths that went. */
async function pruneIn(folder: string, days: number, now: Date): Promise<string[]> {
  const { kept, unfinished } = namesOver(await namesIn(folder), days, now)
  const gone: string[] = []
  for (const name of [...kept, ...unfinished]) {
    const path = join(folder, name)
    const ours =
      unfinished.includes(name) ||
      name.startsWith(BEFORE_RESTORE) ||
      (await exists(join(path, MANIFEST_FILE)))
    if (!ours) continue
    await rm(path, { recursive: true, force: true })
    gone.push(path)
  }
  return gone
}

/**
 * Keeps the stated retention: backups of `folder` and, in the data folder, backups and what a restore set
 * aside go once `days` are over, and half-written folders after a day. Returns the paths that went.
 */
export async function pruneBackups(
  { dataDir, backupDays }: { dataDir: string; backupDays: number },
  now: Date,
  folder: string | null = null,
): Promise<string[]> {
  const folders = new Set([join(dataDir, BACKUPS_FOLDER), dataDir, ...(folder === null ? [] : [folder])])
  const gone: string[] = []
  for (const each of folders) gone.push(...(await pruneIn(each, backupDays, now)))
  return gone
}

import { join, resolve } from 'node:path'
import { parseArgs } from 'node:util'
import type { Clock } from '../adapters/clock'
import { sizeInWords } from '../backup/files'
import { makeBackup } from '../backup/makeBackup'
import { BACKUPS_FOLDER, pruneBackups } from '../backup/prune'
import type { Config } from '../config'
import { CommandError } from './commandError'
import type { Terminal } from './terminal'

const count = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`

/** `npm run backup [-- folder]`: makes one, then deletes those whose days are over. @throws CommandError */
export async function backupCommand(
  args: readonly string[],
  { config, terminal, clock }: { config: Config; terminal: Terminal; clock: Clock },
): Promise<void> {
  const into = folderIn(args) ?? join(config.dataDir, BACKUPS_FOLDER)
  const now = clock()
  const { folder, manifest } = await makeBackup(config.dataDir, into, now)
  const bytes = manifest.files.reduce((sum, file) => sum + file.bytes, 0)
  const rows = (table: string) => manifest.rows[table] ?? 0
  terminal.say(
    `Backed up ${config.dataDir}: ${count(rows('teams'), 'team')}, ${count(rows('possessions'), 'possession')}, ${count(rows('stills'), 'still')}, ${sizeInWords(bytes)}. Checked: nothing is missing.`,
  )
  terminal.say(`It is in ${folder}. To put it back: npm run restore -- ${folder}`)
  for (const path of await pruneBackups(config, now, into))
    terminal.say(`Deleted ${path}: older than ${count(config.backupDays, 'day')}, or left half-written.`)
}

function folderIn(args: readonly string[]): string | null {
  try {
    const { positionals } = parseArgs({ args: [...args], options: {}, allowPositionals: true })
    if (positionals.length <= 1) return positionals[0] ? resolve(positionals[0]) : null
  } catch {
    // An option that is none of ours: told the same way as a second folder.
  }
  throw new CommandError('Name one folder at most, e.g. npm run backup -- /mnt/safe/overtop')
}

import { join, resolve } from 'node:path'
import { parseArgs } from 'node:util'
import type { Clock } from '../adapters/clock'
import { namesIn } from '../backup/files'
import { BACKUPS_FOLDER } from '../backup/prune'
import { restoreBackup } from '../backup/restoreBackup'
import { instantOf } from '../backup/stamp'
import type { Config } from '../config'
import { CommandError } from './commandError'
import type { Terminal } from './terminal'

/** `npm run restore -- folder [--replace]`. @throws CommandError */
export async function restoreCommand(
  args: readonly string[],
  { config, terminal, clock }: { config: Config; terminal: Terminal; clock: Clock },
): Promise<void> {
  const { backup, replace } = await readArgs(args, config)
  const { manifest, migrated, erasedAgain, aside } = await restoreBackup({
    backup,
    replace,
    dataDir: config.dataDir,
    now: clock(),
  })
  terminal.say(
    `Restored ${config.dataDir} to what it was at ${manifest.madeAt}: ${manifest.files.length} files, each as it was backed up.`,
  )
  if (migrated.length > 0)
    terminal.say(`The backup was older than this Overtop; brought up to date: ${migrated.join(', ')}.`)
  if (erasedAgain === null)
    terminal.say(
      `There was no data to learn from who was erased since ${manifest.madeAt}. Whoever was is back: erase them again on the page People.`,
    )
  else if (erasedAgain > 0)
    terminal.say(
      `Erased again, as they were since the backup was made: ${erasedAgain} ${erasedAgain === 1 ? 'person' : 'people'}.`,
    )
  if (aside !== null)
    terminal.say(
      `What was there before is in ${aside}. Delete it when you no longer need it; npm run backup does after ${config.backupDays} days.`,
    )
  terminal.say('Everybody has to sign in again. Start the server: npm start')
}

async function readArgs(
  args: readonly string[],
  config: Config,
): Promise<{ backup: string; replace: boolean }> {
  try {
    const { values, positionals } = parseArgs({
      args: [...args],
      options: { replace: { type: 'boolean', default: false } },
      allowPositionals: true,
    })
    const [named, ...more] = positionals
    if (named && more.length === 0) return { backup: resolve(named), replace: values.replace }
  } catch {
    // An option that is none of ours: told the same way as no folder.
  }
  const folder = join(config.dataDir, BACKUPS_FOLDER)
  const newest = (await namesIn(folder)).filter((name) => instantOf(name) !== null).at(-1)
  throw new CommandError(
    newest
      ? `Name the backup. The newest is: npm run restore -- ${join(folder, newest)}`
      : `Name the backup, e.g. npm run restore -- /mnt/safe/overtop/2026-03-17T094200Z. There is none in ${folder}.`,
  )
}

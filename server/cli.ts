import { systemClock } from './adapters/clock'
import { backupCommand } from './commands/backup'
import { CommandError } from './commands/commandError'
import { firstCoachCommand } from './commands/firstCoach'
import { restoreCommand } from './commands/restore'
import { wordsForSystemError } from './commands/systemErrors'
import { processTerminal } from './commands/terminal'
import { ConfigError, readConfig } from './config'

/** What npm's scripts run besides the server: each command's name and the function behind it. */
const COMMANDS = new Map([
  ['backup', backupCommand],
  ['restore', restoreCommand],
  ['first-coach', firstCoachCommand],
])

/** What to print for an error; null for one that we have no words for. */
function linesOf(error: unknown): readonly string[] | null {
  if (error instanceof CommandError) return error.lines
  if (error instanceof ConfigError) return error.faults
  const words = wordsForSystemError(error)
  return words === null ? null : [words]
}

const [name = '', ...args] = process.argv.slice(2)
try {
  const command = COMMANDS.get(name)
  if (!command) throw new CommandError(`Name a command: ${[...COMMANDS.keys()].join(', ')}.`)
  await command(args, { config: readConfig(process.env), terminal: processTerminal(), clock: systemClock })
} catch (error) {
  const lines = linesOf(error)
  if (lines === null) throw error
  for (const line of lines) process.stderr.write(`${line}\n`)
  process.exitCode = 1
}

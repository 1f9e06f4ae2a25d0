import { spawn } from 'node:child_process'

/** What a command printed and how it ended. */
export interface Ran {
  code: number | null
  printed: string
}

/** One command of the built product, as npm's scripts run it; `input` is piped in. */
export function runCommand(args: string[], env: Record<string, string>, input = ''): Promise<Ran> {
  const command = spawn(process.execPath, ['dist/server/cli.js', ...args], {
    env: { PATH: process.env['PATH'], ...env },
    stdio: 'pipe',
  })
  let printed = ''
  for (const stream of [command.stdout, command.stderr])
    stream.on('data', (chunk: Buffer) => {
      printed += chunk.toString()
    })
  // A command that reads nothing may be gone before all is written.
  command.stdin.on('error', () => undefined)
  command.stdin.end(input)
  return new Promise((resolve, reject) => {
    command.on('error', reject)
    command.on('close', (code) => resolve({ code, printed }))
  })
}

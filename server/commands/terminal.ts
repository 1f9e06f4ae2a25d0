import { createInterface } from 'node:readline'
import { Writable } from 'node:stream'
import { CommandError } from './commandError'

/** What a command may ask and say; tests answer in a person's place. */
export interface Terminal {
  /** Whether somebody sits at it who can be asked. */
  interactive: boolean
  say: (line: string) => void
  /** One line, as typed. */
  ask: (question: string) => Promise<string>
  /** One line that is not shown while it is typed. */
  askHidden: (question: string) => Promise<string>
  /** The first line of what was piped in. */
  readLine: () => Promise<string>
}

const STOPPED = 'Stopped. Nothing was changed.'

function askOn(question: string, hidden: boolean): Promise<string> {
  const silent = new Writable({ write: (_chunk, _encoding, done) => done() })
  // From here on the terminal itself shows nothing of what is typed; only then is the question put.
  const lines = createInterface({
    input: process.stdin,
    output: hidden ? silent : process.stdout,
    terminal: true,
  })
  if (hidden) process.stdout.write(question)
  return new Promise((resolve, reject) => {
    lines.question(hidden ? '' : question, (line) => {
      resolve(line)
      lines.close()
    })
    lines.on('SIGINT', () => lines.close())
    lines.on('close', () => {
      if (hidden) process.stdout.write('\n')
      // After a line this changes nothing: the promise is kept.
      reject(new CommandError(STOPPED))
    })
  })
}

/** The first line of a stream, without its end; empty when there is none. */
export async function firstLine(input: AsyncIterable<Buffer | string>): Promise<string> {
  let text = ''
  for await (const chunk of input) {
    text += chunk.toString()
    if (text.includes('\n')) break
  }
  return text.split(/\r?\n/, 1)[0] ?? ''
}

/** The terminal that the command was started from. */
export const processTerminal = (): Terminal => ({
  interactive: process.stdin.isTTY && process.stdout.isTTY,
  say: (line) => void process.stdout.write(`${line}\n`),
  ask: (question) => askOn(question, false),
  askHidden: (question) => askOn(question, true),
  readLine: () => firstLine(process.stdin),
})

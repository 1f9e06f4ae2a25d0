import { spawn, type ChildProcess } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

export interface Product {
  url: string
  /** Everything that the server has printed. */
  printed: () => string
  stop: () => Promise<void>
}

const START_MS = 90_000

/** The built product as `npm start` runs it: one process, a port of its own, an empty folder filled with the demo. */
export async function startProduct(env: Record<string, string> = {}, dataDir?: string): Promise<Product> {
  const folder = dataDir ?? (await mkdtemp(join(tmpdir(), 'overtop-e2e-')))
  const server: ChildProcess = spawn(process.execPath, ['dist/server/main.js'], {
    env: { PATH: process.env['PATH'], DATA_DIR: folder, PORT: '0', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let output = ''
  let stopping = false
  const url = await new Promise<string>((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error(`the server did not start: ${output}`)), START_MS)
    const read = (chunk: Buffer) => {
      output += chunk.toString()
      const [address] = /http:\/\/127\.0\.0\.1:\d+/.exec(output) ?? []
      if (!address) return
      clearTimeout(timer)
      resolve(address)
    }
    server.stdout?.on('data', read)
    server.stderr?.on('data', read)
    server.on('exit', (code, signal) => {
      // A test then only sees that nobody answers; why stands in what the server printed.
      if (!stopping) process.stderr.write(`the server stopped with ${code ?? signal}: ${output}\n`)
    })
    server.on('exit', (code) => reject(new Error(`the server stopped with ${code}: ${output}`)))
  })
  return {
    url,
    printed: () => output,
    stop: async () => {
      const ended = new Promise((resolve) => server.once('exit', resolve))
      stopping = true
      server.kill('SIGTERM')
      await ended
      if (dataDir === undefined) await rm(folder, { recursive: true, force: true })
    },
  }
}

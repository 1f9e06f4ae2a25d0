import { Agent, request as httpRequest } from 'node:http'
import type { Express } from 'express'

export interface Served {
  /** One request on a kept connection; resolves with the status once the answer is whole. */
  send: (method: string, path: string, cookie: string, body?: string) => Promise<number>
  close: () => Promise<void>
}

/** An app on a free port of this machine, with a client of its own. */
export async function serve(app: Express): Promise<Served> {
  const server = app.listen(0, '127.0.0.1')
  await new Promise((ready) => server.once('listening', ready))
  // Filling tables takes longer than an idle connection is kept by default.
  server.keepAliveTimeout = 600_000
  const address = server.address()
  const port = typeof address === 'object' && address ? address.port : 0
  const agent = new Agent({ keepAlive: true, maxSockets: 1 })
  return {
    send: (method, path, cookie, body = '') =>
      new Promise((resolve, reject) => {
        const headers = {
          cookie,
          'content-type': 'application/json',
          'content-length': Buffer.byteLength(body),
        }
        const sent = httpRequest({ port, host: '127.0.0.1', path, method, agent, headers }, (answer) => {
          answer.resume()
          answer.on('end', () => resolve(answer.statusCode ?? 0))
        })
        sent.on('error', reject)
        sent.end(body)
      }),
    close: () => {
      agent.destroy()
      return new Promise((done) => server.close(() => done()))
    },
  }
}

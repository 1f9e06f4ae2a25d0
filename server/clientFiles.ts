import { existsSync } from 'node:fs'
import { join } from 'node:path'
import express, { type ErrorRequestHandler, type Express } from 'express'
import type { Logger } from 'pino'

const YEAR_MS = 31_536_000_000

const NOTHING_HERE = 'There is nothing here.'

/** Express would print a stack; a browser gets one plain line. An address that cannot be read is nowhere. */
const plainFault =
  (log: Logger): ErrorRequestHandler =>
  (error, req, res, next) => {
    if (res.headersSent) return next(error)
    const status = (error as { status?: number }).status ?? 500
    const missing = status >= 400 && status < 500
    if (!missing) log.error({ err: error, path: req.path }, 'a file could not be served')
    res
      .status(missing ? 404 : 500)
      .type('text/plain')
      .send(missing ? NOTHING_HERE : 'This did not load. Try again.')
  }

/** Serves the built client; every address that is not a file is the client's own route. */
export function serveClient(app: Express, folder: string, log: Logger): void {
  if (!existsSync(join(folder, 'index.html'))) return
  app.use(
    '/assets',
    // Names carry a digest of the content, so a file never changes under its name.
    express.static(join(folder, 'assets'), { immutable: true, maxAge: YEAR_MS, fallthrough: false }),
  )
  app.use(express.static(folder, { index: false, maxAge: 0 }))
  app.get('/{*path}', (_req, res) => {
    res.set('Cache-Control', 'no-cache').sendFile('index.html', { root: folder })
  })
  app.use((_req, res) => {
    res.status(404).type('text/plain').send(NOTHING_HERE)
  })
  app.use(plainFault(log))
}

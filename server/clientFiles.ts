import { existsSync } from 'node:fs'
import { join } from 'node:path'
import express, { type Express } from 'express'

const YEAR_S = 31_536_000

/** Serves the built client; every address that is not a file is the client's own route. */
export function serveClient(app: Express, folder: string): void {
  if (!existsSync(join(folder, 'index.html'))) return
  app.use(
    '/assets',
    // Names carry a digest of the content, so a file never changes under its name.
    express.static(join(folder, 'assets'), { immutable: true, maxAge: YEAR_S * 1000, fallthrough: false }),
  )
  app.use(express.static(folder, { index: false, maxAge: 0 }))
  app.get('/{*path}', (_req, res) => {
    res.set('Cache-Control', 'no-cache').sendFile(join(folder, 'index.html'))
  })
}

import type { IncomingMessage, ServerResponse } from 'node:http'
import type { Plugin } from 'vite'

type Handler = (req: IncomingMessage, res: ServerResponse) => void

/**
 * Serves /api and /healthz from the server's own source inside Vite's dev server: one process, one port,
 * live reload on both sides. The module keeps the open database across reloads.
 */
export function apiInDev(): Plugin {
  return {
    name: 'overtop-api-in-dev',
    configureServer(vite) {
      vite.middlewares.use((req, res, next) => {
        if (!/^\/(api|healthz)(\/|\?|$)/.test(req.url ?? '')) return next()
        vite
          .ssrLoadModule('/server/dev.ts')
          .then(async (module) => {
            const app = (await module['app']) as Handler
            app(req, res)
          })
          .catch(next)
      })
    },
  }
}

import type { RequestHandler } from 'express'
import { HttpError } from './problem'

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses writes that another site's page makes a browser send. A program without either header is not
 * a browser and carries no cookie by itself.
 */
export function ownOriginOnly(publicUrl: string | null): RequestHandler {
  const ownOrigin = publicUrl === null ? null : new URL(publicUrl).origin
  return (req, _res, next) => {
    if (SAFE.has(req.method)) return next()
    const site = req.get('Sec-Fetch-Site')
    const origin = req.get('Origin')
    const own = ownOrigin ?? `${req.protocol}://${req.get('Host') ?? ''}`
    const foreignSite = site !== undefined && site !== 'same-origin' && site !== 'none'
    const foreignOrigin = origin !== undefined && origin !== own
    if (foreignSite || foreignOrigin)
      throw new HttpError(
        403,
        'other-site',
        'Not from here',
        'This was sent from another site’s page. Open Overtop itself and try there.',
      )
    next()
  }
}

import helmet from 'helmet'
import type { RequestHandler } from 'express'
import type { Config } from '../config'

/**
 * Headers for every answer, the client's files among them. Element Plus sets style attributes, so those
 * are allowed; style elements and scripts come from our own origin only.
 */
export function securityHeaders({ publicUrl }: Config): RequestHandler {
  const https = publicUrl?.startsWith('https:') ?? false
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'"],
        styleSrcAttr: ["'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(https ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'same-origin' },
  }) as RequestHandler
}

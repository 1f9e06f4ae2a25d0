import type { RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { TooMany } from '../../http/problem'

const WINDOW_MS = 15 * 60 * 1000
/** Links and tokens that open nothing, from one address in a window; one that works does not count. */
const PER_ADDRESS = 30

/** Slows guessing of links. */
export const tryLimit = (): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_MS,
    limit: PER_ADDRESS,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    keyGenerator: (req) => ipKeyGenerator(req.ip ?? 'unknown'),
    handler: () => {
      throw new TooMany('Too many tries with links that open nothing. Wait a quarter of an hour.')
    },
  })

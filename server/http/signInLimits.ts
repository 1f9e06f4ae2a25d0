import type { RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { TooMany } from './problem'

const WINDOW_MS = 15 * 60 * 1000
/** Wrong passwords in a window; a right one does not count. */
const PER_ACCOUNT = 10
const PER_ADDRESS = 40

const refuse: RequestHandler = () => {
  throw new TooMany('Too many tries with a wrong password. Wait a quarter of an hour, then try again.')
}

const limit = (max: number, keyGenerator: (req: Parameters<RequestHandler>[0]) => string) =>
  rateLimit({
    windowMs: WINDOW_MS,
    limit: max,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    keyGenerator,
    handler: refuse,
  })

/** Slows guessing: one account from many addresses, and many accounts from one address. */
export function signInLimits(): RequestHandler[] {
  return [
    limit(PER_ADDRESS, (req) => ipKeyGenerator(req.ip ?? 'unknown')),
    limit(PER_ACCOUNT, (req) => {
      const email: unknown = (req.body as { email?: unknown } | undefined)?.email
      return typeof email === 'string'
        ? `account:${email.trim().toLowerCase().slice(0, 254)}`
        : 'account:none'
    }),
  ]
}

import type { RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { TooMany } from './problem'

const WINDOW_MS = 15 * 60 * 1000
/** Wrong passwords in a window; a right one does not count. */
const PER_ACCOUNT = 10
const PER_ADDRESS = 40
/** Links that open nothing in a window. */
const LINKS_PER_ADDRESS = 30

/** Links asked for in a window, by one typed address: enough for a letter that is slow, too few to flood a mailbox. */
const ASKED_PER_ACCOUNT = 5

type Key = (req: Parameters<RequestHandler>[0]) => string

const WRONG_PASSWORD = 'Too many tries with a wrong password. Wait a quarter of an hour, then try again.'
const ASKED_OFTEN = 'Too many links were asked for. Look into the mailbox, or wait a quarter of an hour.'
const WRONG_LINK = 'Too many tries with a link that does not work. Wait a quarter of an hour, then try again.'

const limit = (max: number, words: string, keyGenerator: Key, options: { all?: boolean } = {}) =>
  rateLimit({
    windowMs: WINDOW_MS,
    limit: max,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: options.all !== true,
    keyGenerator,
    handler: () => {
      throw new TooMany(words)
    },
  })

const address: Key = (req) => ipKeyGenerator(req.ip ?? 'unknown')
const account: Key = (req) => {
  const email: unknown = (req.body as { email?: unknown } | undefined)?.email
  return typeof email === 'string' ? `account:${email.trim().toLowerCase().slice(0, 254)}` : 'account:none'
}

/** Slows guessing: one account from many addresses, and many accounts from one address. */
export function signInLimits(): RequestHandler[] {
  return [limit(PER_ADDRESS, WRONG_PASSWORD, address), limit(PER_ACCOUNT, WRONG_PASSWORD, account)]
}

/** Slows asking for links, counted by what was typed, whether or not it has an account. */
export function askLimits(): RequestHandler[] {
  return [
    limit(PER_ADDRESS, ASKED_OFTEN, address, { all: true }),
    limit(ASKED_PER_ACCOUNT, ASKED_OFTEN, account, { all: true }),
  ]
}

/** Slows trying links and tokens that were not given; one that works does not count. */
export const linkLimits = (): RequestHandler[] => [limit(LINKS_PER_ADDRESS, WRONG_LINK, address)]

/** Slows guessing the old password in a session that somebody left open. */
export const passwordLimits = (): RequestHandler[] => [
  limit(PER_ACCOUNT, WRONG_PASSWORD, (req) => `person:${req.user?.id ?? 'none'}`),
]

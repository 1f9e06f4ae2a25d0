import { pruneBackups } from './backup/prune'
import type { Context } from './context'
import { purgeDeleted } from './features/deletion/purge.service'
import { carryMail } from './features/mail/carrier'
import { forgetOldMail } from './features/mail/oldMail'
import { eraseDue } from './features/people/erasures.service'
import { forgetOldInvitations } from './features/people/oldInvitations'
import { forgetOldLinks } from './features/session/passwordReset.service'
import { expireStills } from './features/stills/expiry.service'
import { SESSION_MS } from './http/passport'
import { SessionStore } from './http/sessionStore'

const EVERY_MS = 60_000

type Part = [name: string, run: (context: Context) => Promise<unknown>]

/** What has to go goes: deletions past their undo, what is past its time, letters that wait. Letters last: a slow
 * mail server holds up nothing else. */
const PARTS: readonly Part[] = [
  ['deletions', ({ db, stillFiles, clock }) => purgeDeleted(db, stillFiles, clock())],
  ['erasures', ({ db, clock }) => eraseDue(db, clock())],
  ['stills', ({ db, stillFiles, clock }) => expireStills(db, stillFiles, clock())],
  ['sessions', ({ db, clock }) => new SessionStore(db, clock, SESSION_MS).sweep()],
  ['backups', ({ config, clock }) => pruneBackups(config, clock())],
  ['password links', (context) => forgetOldLinks(context)],
  ['old invitations', ({ db, clock }) => forgetOldInvitations(db, clock())],
  ['old letters', ({ db, clock }) => forgetOldMail(db, clock())],
  ['letters', (context) => carryMail(context)],
]

/** Runs every part once. One that fails is logged by its name and stops none of the others. */
export async function sweepOnce(context: Context, busy = new Set<string>()): Promise<void> {
  for (const [part, run] of PARTS) {
    // Still at it from the last minute: letters may take long.
    if (busy.has(part)) continue
    busy.add(part)
    try {
      await run(context)
    } catch (error) {
      context.log.error({ err: error, part }, 'housekeeping failed')
    } finally {
      busy.delete(part)
    }
  }
}

/** Housekeeping now and every minute; the returned function ends it. */
export function startHousekeeping(context: Context): () => void {
  const busy = new Set<string>()
  void sweepOnce(context, busy)
  const timer = setInterval(() => void sweepOnce(context, busy), EVERY_MS)
  return () => clearInterval(timer)
}

import { randomUUID } from 'node:crypto'
import { IsNull, type EntityManager } from 'typeorm'
import { LIMITS } from '@shared/limits'
import { hashPassword } from '../../adapters/passwords'
import type { Context } from '../../context'
import { PasswordReset } from '../../database/entities/PasswordReset'
import { Person } from '../../database/entities/Person'
import { HttpError } from '../../http/problem'
import { linkTo } from '../mail/linkTo'
import { queueMail, withdrawMailAbout } from '../mail/queueMail'
import { digestOf, SECRET_PLACE, secretOf } from '../mail/secretLink'
import { endSessions } from './endSessions'
import { passwordLetter } from './passwordLetter'

const KIND = 'new-password'

/** The same words for a link that never was, was used, is over or has a newer one: nothing is told of any. */
const linkIsOver = () =>
  new HttpError(410, 'link-over', 'Link is over', 'This link no longer works. Ask for a new one.')

/** Ends every link that a person has, with the letters that would still bring one. */
export async function endLinks(manager: EntityManager, personId: string, now: Date): Promise<void> {
  const resets = manager.getRepository(PasswordReset)
  const open = await resets.findBy({ personId, usedAt: IsNull() })
  for (const { id } of open) {
    await withdrawMailAbout(manager, id, KIND)
    await resets.update({ id }, { usedAt: now.toISOString() })
  }
}

/** A new link for a person; earlier ones end with it. Its secret is stored nowhere (secretLink.ts). */
async function openLink(
  manager: EntityManager,
  { personId, sessionSecret, now }: { personId: string; sessionSecret: string; now: Date },
): Promise<{ id: string; secret: string; expiresAt: string }> {
  await endLinks(manager, personId, now)
  const id = randomUUID()
  const secret = secretOf(sessionSecret, KIND, id)
  const expiresAt = new Date(now.getTime() + LIMITS.resetMinutes * 60_000).toISOString()
  await manager.getRepository(PasswordReset).insert({
    id,
    personId,
    tokenHash: digestOf(secret),
    createdAt: now.toISOString(),
    expiresAt,
    usedAt: null,
  })
  return { id, secret, expiresAt }
}

/** Mails a link to the account of an address, when there is one and a mail server to send it by. */
export async function mailPasswordLink(context: Context, email: string): Promise<void> {
  const { db, clock, config, mail, sessionSecret } = context
  if (mail === null) return
  const now = clock()
  await db.transaction(async (manager) => {
    const person = await manager.getRepository(Person).findOneBy({ email })
    if (!person) return
    const { id } = await openLink(manager, { personId: person.id, sessionSecret, now })
    await queueMail(manager, {
      teamId: null,
      kind: KIND,
      onceKey: `${KIND}:${id}`,
      aboutId: id,
      recipient: person.email,
      ...passwordLetter(person.name, linkTo(config, `/new-password#${SECRET_PLACE}`)),
      now,
    })
  })
}

/** A link for somebody to hand on by other ways; told this once. */
export async function makePasswordLink(
  { sessionSecret, config, clock }: Pick<Context, 'sessionSecret' | 'config' | 'clock'>,
  manager: EntityManager,
  personId: string,
): Promise<{ url: string; expiresAt: string }> {
  const { secret, expiresAt } = await openLink(manager, { personId, sessionSecret, now: clock() })
  return { url: linkTo(config, `/new-password#${secret}`), expiresAt }
}

/**
 * Sets a new password by a link, once, and signs the person out everywhere; nobody is signed in by it.
 * @throws HttpError 410 when the link is not one, was used, is over or has a newer one
 */
export async function usePasswordLink(
  { db, clock }: Pick<Context, 'db' | 'clock'>,
  { token, password }: { token: string; password: string },
): Promise<void> {
  const tokenHash = digestOf(token)
  const works = (reset: PasswordReset | null): reset is PasswordReset =>
    reset !== null && reset.usedAt === null && reset.expiresAt > clock().toISOString()
  // Looked at before the slow hash, so that made-up links cost nothing; and again after it, inside the transaction.
  if (!works(await db.getRepository(PasswordReset).findOneBy({ tokenHash }))) throw linkIsOver()
  const passwordHash = await hashPassword(password)
  await db.transaction(async (manager) => {
    const reset = await manager.getRepository(PasswordReset).findOneBy({ tokenHash })
    if (!works(reset)) throw linkIsOver()
    await setPassword(manager, { personId: reset.personId, passwordHash, now: clock() })
  })
}

/** Changes the password, ends every link to another one, and every session but one that may stay. */
export async function setPassword(
  manager: EntityManager,
  options: { personId: string; passwordHash: string; now: Date; butSession?: string },
): Promise<void> {
  const { personId, passwordHash, now } = options
  await manager.getRepository(Person).update({ id: personId }, { passwordHash })
  await endLinks(manager, personId, now)
  await endSessions(manager, personId, options.butSession ?? null)
}

/** Deletes links that are over. */
export async function forgetOldLinks({ db, clock }: Pick<Context, 'db' | 'clock'>): Promise<void> {
  await db
    .getRepository(PasswordReset)
    .createQueryBuilder()
    .delete()
    .where('expiresAt <= :now', { now: clock().toISOString() })
    .execute()
}

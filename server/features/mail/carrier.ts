import { In } from 'typeorm'
import { LIMITS } from '@shared/limits'
import { MailTrouble, type LetterFile, type MailTransport } from '../../adapters/mail/transport'
import type { Context } from '../../context'
import { Mail } from '../../database/entities/Mail'
import { HttpError } from '../../http/problem'
import { drawAttachment } from './attachments'
import { withSecret } from './secretLink'

const MINUTE_MS = 60_000
/** Minutes until the next try, after the first, the second and so on; the last holds for all after. */
const WAITS = [1, 5, 15, 60, 180]
/** A letter that has been leaving for longer was left in the middle, and is taken up again. */
const LEAVING_MINUTES = 10

const inMinutes = (now: Date, minutes: number): string =>
  new Date(now.getTime() + minutes * MINUTE_MS).toISOString()

/**
 * Takes every letter whose time has come to the mail server, one after another. Several at once are fine: a
 * letter is claimed by one UPDATE that only one of them can win. Without a mail server what waits, and what
 * did not arrive while there was one, is kept for the staff, who can send its words themselves.
 */
export async function carryMail(context: Context): Promise<void> {
  await endOldPasswordLetters(context)
  if (context.mail === null) return keepAll(context)
  for (;;) {
    const mail = await claimNext(context)
    if (mail === null) return
    if ((await carryOne(context, context.mail, mail)) === 'no letter leaves') return
  }
}

/** Lets what was just committed leave at once; the caller does not wait, and hears of no fault. */
export function pokeMail(context: Context): void {
  void carryMail(context).catch((error: unknown) => {
    context.log.error({ err: error }, 'letters could not be carried')
  })
}

/** Claims the letter that has waited longest: marked as leaving until a time, so that a crash frees it again. */
async function claimNext({ db, clock }: Context): Promise<Mail | null> {
  const mails = db.getRepository(Mail)
  for (;;) {
    const now = clock()
    const next = await mails
      .createQueryBuilder('mail')
      .where("mail.state IN ('waiting', 'sending') AND mail.nextTryAt <= :now", { now: now.toISOString() })
      .orderBy('mail.nextTryAt')
      .addOrderBy('mail.createdAt')
      .getOne()
    if (!next) return null
    const until = inMinutes(now, LEAVING_MINUTES)
    const claim = await mails
      .createQueryBuilder()
      .update()
      .set({ state: 'sending', tries: next.tries + 1, nextTryAt: until })
      .where('id = :id AND state = :state AND nextTryAt = :nextTryAt AND tries = :tries', { ...next })
      .execute()
    if (claim.affected === 1) return { ...next, state: 'sending', tries: next.tries + 1, nextTryAt: until }
  }
}

async function carryOne(
  context: Context,
  transport: MailTransport,
  mail: Mail,
): Promise<'carried' | 'no letter leaves'> {
  const { id, recipient, subject, text, html } = mail
  try {
    const fill = (words: string) => withSecret(words, context.sessionSecret, mail)
    const files = await filesOf(context, mail)
    await transport.send({ id, recipient, subject, text: fill(text), html: fill(html), files })
  } catch (error) {
    return notCarried(context, mail, troubleOf(context, error))
  }
  await settle(context, mail, {
    state: 'sent',
    sentAt: context.clock().toISOString(),
    text: '',
    html: '',
    trouble: null,
    nextTryAt: null,
  })
  return 'carried'
}

async function filesOf(context: Context, { attachment, teamId }: Mail): Promise<LetterFile[]> {
  if (attachment === null || teamId === null) return []
  try {
    return [await drawAttachment(context, teamId, attachment)]
  } catch (error) {
    if (error instanceof HttpError && error.status === 404)
      throw new MailTrouble('The sheet that goes with it is gone.', 'refused', { cause: error })
    throw new MailTrouble('The sheet that goes with it could not be drawn. It is tried again.', 'letter', {
      cause: error,
    })
  }
}

function troubleOf({ log }: Context, error: unknown): MailTrouble {
  const trouble =
    error instanceof MailTrouble
      ? error
      : new MailTrouble('The letter did not leave. It is tried again.', 'letter', { cause: error })
  log.warn({ err: trouble.cause ?? trouble }, 'a letter did not leave')
  return trouble
}

async function notCarried(
  context: Context,
  mail: Mail,
  { message, reach }: MailTrouble,
): Promise<'carried' | 'no letter leaves'> {
  const over = reach === 'refused' || mail.tries >= LIMITS.mailTries
  const wait = WAITS[Math.min(mail.tries, WAITS.length) - 1] ?? 1
  await settle(context, mail, {
    state: over ? 'failed' : 'waiting',
    trouble: over ? message.replace(/ It is tried again\.$/, '') : message,
    nextTryAt: over ? null : inMinutes(context.clock(), wait),
  })
  return reach === 'server' ? 'no letter leaves' : 'carried'
}

/** Writes how a try ended, unless the letter was taken up by another meanwhile. */
async function settle(
  { db }: Context,
  mail: Mail,
  end: Partial<Omit<Mail, 'team' | 'attachment'>>,
): Promise<void> {
  await db
    .getRepository(Mail)
    .createQueryBuilder()
    .update()
    .set(end)
    .where("id = :id AND state = 'sending' AND tries = :tries", { id: mail.id, tries: mail.tries })
    .execute()
}

/** A link to a new password lives an hour: a letter that is later would only bring a dead one. */
async function endOldPasswordLetters({ db, clock, mail }: Context): Promise<void> {
  const until = mail === null ? clock().toISOString() : inMinutes(clock(), -LIMITS.resetMinutes)
  await db
    .getRepository(Mail)
    .createQueryBuilder()
    .update()
    .set({ state: 'withdrawn', text: '', html: '', nextTryAt: null })
    .where("kind = 'new-password' AND state IN ('waiting', 'failed', 'kept') AND createdAt <= :until", {
      until,
    })
    .execute()
}

async function keepAll({ db }: Context): Promise<void> {
  await db
    .getRepository(Mail)
    .update({ state: In(['waiting', 'sending', 'failed']) }, { state: 'kept', nextTryAt: null })
}

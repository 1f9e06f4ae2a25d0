import type { z } from 'zod'
import { In, type DataSource } from 'typeorm'
import type { MailQuery } from '@shared/mail/schemas'
import { Mail } from '../../database/entities/Mail'
import { Conflict, NotFound } from '../../http/problem'

/** Letters of a team, newest first. Those between a person and the product have no team and are never among them. */
export async function listMail(
  db: DataSource,
  teamId: string,
  { state, limit, offset }: z.output<typeof MailQuery>,
): Promise<{ mails: Mail[]; total: number }> {
  const [mails, total] = await db.getRepository(Mail).findAndCount({
    where: { teamId, ...(state === undefined ? {} : { state }) },
    order: { createdAt: 'DESC', id: 'ASC' },
    take: limit,
    skip: offset,
  })
  return { mails, total }
}

async function findMail(db: DataSource, teamId: string, id: string): Promise<Mail> {
  const mail = await db.getRepository(Mail).findOneBy({ id, teamId })
  if (!mail) throw new NotFound('letter')
  return mail
}

/**
 * Has a letter tried again now, as if for the first time.
 * @throws NotFound; Conflict when it has left, is leaving, was withdrawn, or no mail server is set
 */
export async function sendAgain(
  db: DataSource,
  options: { teamId: string; id: string; now: Date; server: boolean },
): Promise<Mail> {
  const mail = await findMail(db, options.teamId, options.id)
  if (!options.server)
    throw new Conflict('No mail server is set. Copy the words and send them yourself, or set MAIL_URL.')
  if (mail.text === '') throw new Conflict(`${reasonAgainst(mail.state)} Write it again where it comes from.`)
  const taken = await db
    .getRepository(Mail)
    .update(
      { id: mail.id, state: In(['waiting', 'failed', 'kept']) },
      { state: 'waiting', tries: 0, nextTryAt: options.now.toISOString(), trouble: null },
    )
  const after = await findMail(db, options.teamId, options.id)
  if (taken.affected !== 1) throw new Conflict(reasonAgainst(after.state))
  return after
}

/**
 * Stops a letter for good and empties its words; withdrawn again, it stays as it is.
 * @throws NotFound; Conflict when it has left or is leaving
 */
export async function withdrawMail(db: DataSource, teamId: string, id: string): Promise<Mail> {
  const mail = await findMail(db, teamId, id)
  await db
    .getRepository(Mail)
    .update(
      { id: mail.id, state: In(['waiting', 'failed', 'kept']) },
      { state: 'withdrawn', text: '', html: '', nextTryAt: null },
    )
  const after = await findMail(db, teamId, id)
  if (after.state !== 'withdrawn') throw new Conflict(reasonAgainst(after.state))
  return after
}

function reasonAgainst(state: Mail['state']): string {
  if (state === 'sent') return 'This letter has left already.'
  if (state === 'sending') return 'This letter is leaving at this moment. Look again in a minute.'
  if (state === 'withdrawn') return 'This letter was withdrawn, and its words are gone.'
  return 'The words of this letter are gone.'
}

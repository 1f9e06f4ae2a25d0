import { randomUUID } from 'node:crypto'
import { In, type EntityManager } from 'typeorm'
import type { MailAttachment, MailKind } from '@shared/mail/schemas'
import { renderLetter, type LetterBody } from '../../adapters/mail/letter'
import { Mail } from '../../database/entities/Mail'

export interface NewMail {
  /** Null for letters between a person and the product, which no staff sees. */
  teamId: string | null
  kind: MailKind
  /** Names this very letter, e.g. `invitation:<id>` or `sheet:<sheet id>:<membership id>`. */
  onceKey: string
  /** The row that it is about. */
  aboutId: string | null
  recipient: string
  subject: string
  body: LetterBody
  attachment?: MailAttachment | null
  now: Date
}

/**
 * Puts a letter among those that wait, in the caller's transaction: it leaves only when that commits. The same
 * `onceKey` again is the same letter; nothing is changed and the first one is handed back, but for one that was
 * stopped: it never left, and is written anew. Call `pokeMail` (carrier.ts) after the commit so that it leaves at once.
 */
export async function queueMail(manager: EntityManager, mail: NewMail): Promise<Mail> {
  const mails = manager.getRepository(Mail)
  const before = await mails.findOneBy({ onceKey: mail.onceKey })
  if (before && before.state !== 'withdrawn') return before
  const subject = mail.subject.replace(/\s+/g, ' ').trim()
  const stamp = mail.now.toISOString()
  const row: Omit<Mail, 'team'> = {
    id: before?.id ?? randomUUID(),
    teamId: mail.teamId,
    kind: mail.kind,
    onceKey: mail.onceKey,
    aboutId: mail.aboutId,
    recipient: mail.recipient,
    subject,
    ...renderLetter(subject, mail.body),
    attachment: mail.attachment ?? null,
    state: 'waiting',
    tries: 0,
    nextTryAt: stamp,
    trouble: null,
    sentAt: null,
    createdAt: stamp,
  }
  await mails.save(row)
  return row
}

/**
 * Stops every letter about a row that has not left yet (a revoked invitation, a recalled sheet), and empties its
 * words, for they may hold a link that is dead now. What is leaving this very moment cannot be stopped. Returns how
 * many were stopped.
 */
export async function withdrawMailAbout(
  manager: EntityManager,
  aboutId: string,
  kind: MailKind,
): Promise<number> {
  const { affected } = await manager
    .getRepository(Mail)
    .update(
      { aboutId, kind, state: In(['waiting', 'failed', 'kept']) },
      { state: 'withdrawn', text: '', html: '', nextTryAt: null, trouble: null },
    )
  return affected ?? 0
}

import type { MailRow } from '@shared/mail/schemas'
import type { Mail } from '../../database/entities/Mail'
import { withSecret } from './secretLink'

/** A letter as staff see it; its words only while it is kept here, with the link that they are asked to hand on. */
export const presentMail = (mail: Mail, serverSecret: string): MailRow => ({
  id: mail.id,
  kind: mail.kind,
  recipient: mail.recipient,
  subject: mail.subject,
  state: mail.state,
  tries: mail.tries,
  trouble: mail.trouble,
  createdAt: mail.createdAt,
  nextTryAt: mail.state === 'waiting' ? mail.nextTryAt : null,
  sentAt: mail.sentAt,
  text: mail.state === 'kept' ? withSecret(mail.text, serverSecret, mail) : null,
  attached: mail.attachment !== null,
})

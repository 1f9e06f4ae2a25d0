import type { MailRow } from '@shared/mail/schemas'
import type { TeamRole } from '@shared/vocabulary'
import type { Mail } from '../../database/entities/Mail'
import { may } from '../../http/policy'
import { withSecret } from './secretLink'

/** Whose letters may be read by whom: the link of an invitation opens the team with whatever role it gives. */
const mayRead = (mail: Mail, role: TeamRole): boolean => mail.kind !== 'invitation' || may(role, 'team:write')

/**
 * A letter as staff see it; its words only while it is kept here, with the link that they are asked to hand on. The
 * words of an invitation are for whoever may ask somebody in.
 */
export const presentMail = (mail: Mail, serverSecret: string, role: TeamRole): MailRow => ({
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
  text: mail.state === 'kept' && mayRead(mail, role) ? withSecret(mail.text, serverSecret, mail) : null,
  attached: mail.attachment !== null,
})

import { z } from 'zod'
import { LIMITS } from '../limits'
import { Paper } from '../sheets/schemas'

export const MAIL_KINDS = ['invitation', 'new-password', 'sheet', 'sheet-recalled'] as const
export const MailKind = z.enum(MAIL_KINDS)
export type MailKind = z.infer<typeof MailKind>

/** What goes with a letter, drawn when it leaves. */
export const MailAttachment = z.object({
  kind: z.literal('sheet'),
  sheetId: z.uuid(),
  squadPlayerId: z.uuid().nullable(),
  paper: Paper,
})
export type MailAttachment = z.infer<typeof MailAttachment>

export const MAIL_STATES = ['waiting', 'sending', 'sent', 'failed', 'kept', 'withdrawn'] as const

/** A letter as staff see it. Its words are shown only while it is kept here for want of a mail server. */
export const MailRow = z.object({
  id: z.uuid(),
  kind: MailKind,
  recipient: z.string(),
  subject: z.string(),
  state: z.enum(MAIL_STATES),
  tries: z.number().int(),
  trouble: z.string().nullable(),
  createdAt: z.iso.datetime(),
  nextTryAt: z.iso.datetime().nullable(),
  sentAt: z.iso.datetime().nullable(),
  text: z.string().nullable(),
  attached: z.boolean(),
})
export type MailRow = z.infer<typeof MailRow>
export const MailList = z.object({
  rows: z.array(MailRow),
  total: z.number().int(),
  /** Whether a mail server is set; without one letters are kept here. */
  server: z.boolean(),
})
export type MailList = z.infer<typeof MailList>

/** Letters on the staff's page: one state or all, newest first. */
export const MailQuery = z.object({
  state: z.enum(MAIL_STATES).optional(),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageRows).default(50),
  offset: z.coerce.number().int().min(0).default(0),
})

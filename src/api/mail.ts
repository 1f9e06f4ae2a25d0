import type { z } from 'zod'
import { MailList, MailRow, type MailQuery } from '@shared/mail/schemas'
import { request, teamPath } from './http'

/** Letters of a team, newest first. */
export function listMail(
  team: string,
  query: z.input<typeof MailQuery>,
  signal?: AbortSignal,
): Promise<MailList> {
  const { state, limit, offset } = query
  return request('GET', teamPath(team, 'mails'), MailList, {
    query: { state, limit: Number(limit ?? 50), offset: Number(offset ?? 0) },
    signal,
  })
}

/** Tries a letter again now. 409 when it has left, or no mail server is set. */
export function sendMailAgain(team: string, id: string): Promise<MailRow> {
  return request('POST', teamPath(team, 'mails', id, 'again'), MailRow)
}

/** Stops a letter for good. 409 when it has left. */
export function withdrawMail(team: string, id: string): Promise<MailRow> {
  return request('POST', teamPath(team, 'mails', id, 'withdraw'), MailRow)
}

import { MailList, MailQuery, MailRow } from '@shared/mail/schemas'
import type { Context } from '../../context'
import { endpoint, ok, type Endpoint } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { pokeMail } from './carrier'
import { presentMail } from './mail.presenter'
import { listMail, sendAgain, withdrawMail } from './mail.service'

const STANDS = { 409: 'The letter has left, or no mail server is set' }

/** The letters of a team: what has left, what waits, and what stands in the way. */
export const mailRoutes = (context: Context): Endpoint[] => [
  endpoint({
    method: 'get',
    path: '/teams/:team/mails',
    summary: 'Letters of the team, newest first',
    action: 'mail:read',
    params: InTeam,
    query: MailQuery,
    response: MailList,
    handle: async ({ caller, query }) => {
      const { mails, total } = await listMail(context.db, caller.teamId, query)
      return ok({
        rows: mails.map((mail) => presentMail(mail, context.sessionSecret, caller.role)),
        total,
        server: context.mail !== null,
      })
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/mails/:id/again',
    summary: 'Try a letter again now',
    action: 'mail:read',
    params: OneRow,
    response: MailRow,
    problems: STANDS,
    handle: async ({ caller, params }) => {
      const mail = await sendAgain(context.db, {
        teamId: caller.teamId,
        id: params.id,
        now: context.clock(),
        server: context.mail !== null,
      })
      pokeMail(context)
      return ok(presentMail(mail, context.sessionSecret, caller.role))
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/mails/:id/withdraw',
    summary: 'Stop a letter that has not left',
    action: 'mail:read',
    params: OneRow,
    response: MailRow,
    problems: { 409: 'The letter has left' },
    handle: async ({ caller, params }) =>
      ok(
        presentMail(
          await withdrawMail(context.db, caller.teamId, params.id),
          context.sessionSecret,
          caller.role,
        ),
      ),
  }),
]

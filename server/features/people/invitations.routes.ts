import { InvitationBody, InvitationMade, ResendBody } from '@shared/people/schemas'
import type { Context } from '../../context'
import { endpoint } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { pokeMail } from '../mail/carrier'
import { putInvitation, resendInvitation, revokeInvitation } from './invitations.service'

export const invitationRoutes = (context: Context) => {
  const { db, clock } = context
  return [
    endpoint({
      method: 'put',
      path: '/teams/:team/invitations/:id',
      summary: 'Ask somebody into the team, by letter or by a link',
      action: 'team:write',
      params: OneRow,
      body: InvitationBody,
      response: InvitationMade,
      handle: async ({ caller, params, body, ifMatch }) => {
        const { teamId, personId: by } = caller
        const made = await putInvitation(context, {
          teamId,
          id: params.id,
          by,
          body,
          ifMatch,
          now: clock(),
        })
        pokeMail(context)
        return { status: made.created ? 201 : 200, body: made.body, version: made.row.version }
      },
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/invitations/:id/resend',
      summary: 'Send an invitation again, or tell its link again, with new days to run',
      action: 'team:write',
      params: OneRow,
      body: ResendBody,
      response: InvitationMade,
      problems: { 409: 'It was used or taken back' },
      handle: async ({ caller, params, body }) => {
        const { teamId, personId: by } = caller
        const again = await resendInvitation(context, {
          teamId,
          id: params.id,
          by,
          days: body.days,
          now: clock(),
        })
        pokeMail(context)
        return { status: 200, body: again.body, version: again.row.version }
      },
    }),
    endpoint({
      method: 'delete',
      path: '/teams/:team/invitations/:id',
      summary: 'Take an invitation back',
      action: 'team:write',
      params: OneRow,
      handle: async ({ caller, params, ifMatch }) => {
        const { teamId, personId: by } = caller
        await revokeInvitation(db, { teamId, id: params.id, by, ifMatch, now: clock() })
        return { status: 204 }
      },
    }),
  ]
}

import { PasswordLink } from '@shared/session/account'
import type { Context } from '../../context'
import { endpoint, ok, type Endpoint } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { linkForMember } from './passwordLink.service'

/** A link to a new password that a head coach hands on, where no mail goes. */
export const passwordLinkRoutes = (context: Context): Endpoint[] => [
  endpoint({
    method: 'post',
    path: '/teams/:team/members/:id/password-link',
    summary: 'Make a link to a new password for a member',
    action: 'team:write',
    params: OneRow,
    response: PasswordLink,
    problems: { 409: 'The person is on a team where the caller is not head coach' },
    handle: async ({ caller, params }) => ok(await linkForMember(context, caller, params.id)),
  }),
]

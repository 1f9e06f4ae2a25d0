import { TeamBody, TeamRow } from '@shared/team/settings'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam } from '../../http/params'
import { presentTeam } from './team.presenter'
import { getTeam, putTeam } from './team.service'

export const teamRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/settings',
    summary: 'The team and what its head coach has set',
    action: 'team:read',
    params: InTeam,
    response: TeamRow,
    handle: async ({ caller }) => {
      const row = await getTeam(db.manager, caller.teamId)
      return ok(presentTeam(row), row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/settings',
    summary: 'Change the team and what is set',
    action: 'team:write',
    params: InTeam,
    body: TeamBody,
    response: TeamRow,
    problems: { 428: 'If-Match is missing' },
    handle: async ({ caller, body, ifMatch }) => {
      const row = await putTeam(db, {
        teamId: caller.teamId,
        body,
        ifMatch,
        by: caller.personId,
        now: clock(),
      })
      return ok(presentTeam(row), row.version)
    },
  }),
]

import { RuleBody, RuleList, RuleRow } from '@shared/rules/schemas'
import type { Context } from '../../context'
import { endpoint } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { presentRule } from './rules.presenter'
import { listRules, putRule } from './rules.service'

export const ruleRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/rules',
    summary: 'The team’s rules: if a habit, then what a counter must have',
    action: 'rule:read',
    params: InTeam,
    response: RuleList,
    handle: async ({ caller }) => listReply(await listRules(db.manager, caller.teamId)),
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/rules/:id',
    summary: 'Add or change a rule, or switch it',
    action: 'rule:write',
    params: OneRow,
    body: RuleBody,
    response: RuleRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const put = await putRule(db, {
        id: params.id,
        teamId: caller.teamId,
        body,
        ifMatch,
        now: clock(),
        by: caller.personId,
      })
      return putReply(put, presentRule(put.row, body))
    },
  }),
]

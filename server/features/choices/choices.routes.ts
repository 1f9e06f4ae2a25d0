import { Choices, RulePreview, Turns } from '@shared/choices/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listReply } from '../../http/present'
import { chooseFor, previewRule, turnsFor } from './choices.service'

export const choiceRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/choices',
    summary: 'Our counters in order against this opponent, with the reasons for and against',
    action: 'plan:read',
    params: OneRow,
    response: Choices,
    handle: async ({ caller, params }) => ok(await chooseFor(db.manager, caller.teamId, params.id)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/turns',
    summary: 'What their next rows would have to show for another counter to lead',
    action: 'plan:read',
    params: OneRow,
    response: Turns,
    handle: async ({ caller, params }) => listReply(await turnsFor(db.manager, caller.teamId, params.id)),
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/games/:id/choices/preview',
    summary: 'The order as it would be were a rule written like this; nothing is kept',
    action: 'rule:write',
    params: OneRow,
    body: RulePreview,
    response: Choices,
    handle: async ({ caller, params, body }) =>
      ok(await previewRule(db.manager, caller.teamId, params.id, { id: body.id, ...body.rule })),
  }),
]

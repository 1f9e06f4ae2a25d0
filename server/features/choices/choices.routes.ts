import { Choices } from '@shared/choices/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { chooseFor } from './choices.service'

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
]

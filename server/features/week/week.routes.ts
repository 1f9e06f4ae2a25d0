import { Week, WeekQuery } from '@shared/week/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam } from '../../http/params'
import { weekFor } from './week.service'

export const weekRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/week',
    summary: 'This week: what is due, who has the ball, what happened, and how the last game went',
    action: 'game:read',
    params: InTeam,
    query: WeekQuery,
    response: Week,
    handle: async ({ caller, query }) => ok(await weekFor(db, { caller, on: query.on, now: clock() })),
  }),
]

import { CounterList, CounterRow } from '@shared/counters/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply } from '../../http/present'
import { getCounter, listCounters } from './counters.service'

export const counterRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/counters',
    summary: 'The team’s library of counters, with our own record of each',
    action: 'counter:read',
    params: InTeam,
    response: CounterList,
    handle: async ({ caller }) => listReply(await listCounters(db.manager, caller.teamId)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/counters/:id',
    summary: 'One counter',
    action: 'counter:read',
    params: OneRow,
    response: CounterRow,
    handle: async ({ caller, params }) => {
      const row = await getCounter(db.manager, caller.teamId, params.id)
      return ok(row, row.version)
    },
  }),
]

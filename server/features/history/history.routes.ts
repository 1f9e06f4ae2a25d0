import { History, HistoryQuery, News, NewsQuery } from '@shared/history/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam } from '../../http/params'
import { listReply } from '../../http/present'
import { presentChange } from './history.presenter'
import { historyOf } from './history.service'
import { newsOf } from './news.service'

export const historyRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/history',
    summary: 'What happened to one row, oldest first',
    action: 'history:read',
    params: InTeam,
    query: HistoryQuery,
    response: History,
    handle: async ({ caller, query }) => {
      const changes = await historyOf(db.manager, caller.teamId, query.row, clock())
      return listReply(changes.map(presentChange))
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/changes',
    summary: 'What happened in the team, newest first',
    action: 'history:read',
    params: InTeam,
    query: NewsQuery,
    response: News,
    handle: async ({ caller, query }) => ok(await newsOf(db.manager, caller.teamId, query, clock())),
  }),
]

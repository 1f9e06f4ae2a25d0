import { OpponentBody, OpponentList, OpponentRow, OpponentsQuery } from '@shared/opponents/schemas'
import type { Context } from '../../context'
import { findInTeam } from '../../database/findInTeam'
import { Opponent } from '../../database/entities/Opponent'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listPage } from '../../http/listing'
import { putReply } from '../../http/present'
import { OPPONENT_LISTING, presentOpponent } from './opponents.presenter'
import { countsOf, listOpponents, putOpponent } from './opponents.service'

export const opponentRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents',
    summary: 'Opponents of the team, next meeting first',
    action: 'opponent:read',
    params: InTeam,
    query: OpponentsQuery,
    response: OpponentList,
    handle: async ({ caller, query }) =>
      ok(listPage(await listOpponents(db, caller.teamId, clock()), query, OPPONENT_LISTING)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id',
    summary: 'One opponent',
    action: 'opponent:read',
    params: OneRow,
    response: OpponentRow,
    handle: async ({ caller, params }) => {
      const row = await findInTeam(db.manager, Opponent, caller.teamId, params.id, 'opponent')
      return ok(presentOpponent(row, await countsOf(db.manager, row, clock())), row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/opponents/:id',
    summary: 'Add or change an opponent',
    action: 'opponent:write',
    params: OneRow,
    body: OpponentBody,
    response: OpponentRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const put = await putOpponent(db, {
        id: params.id,
        teamId: caller.teamId,
        body,
        ifMatch,
        now: clock(),
        by: caller.personId,
      })
      return putReply(put, presentOpponent(put.row, await countsOf(db.manager, put.row, clock())))
    },
  }),
]

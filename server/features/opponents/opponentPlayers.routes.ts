import { OpponentPlayerBody, OpponentPlayerList, OpponentPlayerRow } from '@shared/opponents/players'
import type { Context } from '../../context'
import { endpoint } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { listOpponentPlayers, putOpponentPlayer } from './opponentPlayers.service'

export const opponentPlayerRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id/players',
    summary: 'Players of an opponent by number, with what was counted of each',
    action: 'opponent:read',
    params: OneRow,
    response: OpponentPlayerList,
    handle: async ({ caller, params }) =>
      listReply(await listOpponentPlayers(db.manager, caller.teamId, params.id)),
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/opponent-players/:id',
    summary: 'Add a player of an opponent by number, or change one',
    action: 'opponent:write',
    params: OneRow,
    body: OpponentPlayerBody,
    response: OpponentPlayerRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const { put, row } = await putOpponentPlayer(db, {
        id: params.id,
        teamId: caller.teamId,
        body,
        ifMatch,
        now: clock(),
        by: caller.personId,
      })
      return putReply(put, row)
    },
  }),
]

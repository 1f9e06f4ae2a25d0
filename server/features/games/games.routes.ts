import { GameBody, GameList, GameRow } from '@shared/games/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { getGame, listGames, putGame } from './games.service'

export const gameRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/games',
    summary: 'Our games in the order they are played, with where the work stands',
    action: 'game:read',
    params: InTeam,
    response: GameList,
    handle: async ({ caller }) => listReply(await listGames(db, caller.teamId, clock())),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id',
    summary: 'One of our games',
    action: 'game:read',
    params: OneRow,
    response: GameRow,
    handle: async ({ caller, params }) => {
      const row = await getGame(db, caller.teamId, params.id, clock())
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/games/:id',
    summary: 'Add or change one of our games',
    action: 'game:write',
    params: OneRow,
    body: GameBody,
    response: GameRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const put = await putGame(db, {
        id: params.id,
        teamId: caller.teamId,
        body,
        ifMatch,
        now: clock(),
        by: caller.personId,
      })
      return putReply(put, await getGame(db, caller.teamId, params.id, clock()))
    },
  }),
]

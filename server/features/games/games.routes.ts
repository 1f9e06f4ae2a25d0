import { GameBody, GameList, GameRow, GamesQuery, HandOnBody } from '@shared/games/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listPage } from '../../http/listing'
import { putReply } from '../../http/present'
import { getGame, listGames, putGame } from './games.service'
import { GAME_LISTING } from './games.presenter'
import { handOn, signRead } from './handOn.service'

export const gameRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/games',
    summary: 'Our games in the order they are played, with where the work stands',
    action: 'game:read',
    params: InTeam,
    query: GamesQuery,
    response: GameList,
    handle: async ({ caller, query }) =>
      ok(listPage(await listGames(db, caller.teamId, clock(), caller), query, GAME_LISTING)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id',
    summary: 'One of our games',
    action: 'game:read',
    params: OneRow,
    response: GameRow,
    handle: async ({ caller, params }) => {
      const row = await getGame(db, caller.teamId, params.id, clock(), caller)
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
        caller,
      })
      return putReply(put, await getGame(db, caller.teamId, params.id, clock(), caller))
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/games/:id/hand-on',
    summary: 'Give the work on a game to somebody of the staff',
    action: 'game:hand-on',
    params: OneRow,
    body: HandOnBody,
    response: GameRow,
    handle: async ({ caller, params, body }) => {
      await handOn(db, { gameId: params.id, caller, body, now: clock() })
      const row = await getGame(db, caller.teamId, params.id, clock(), caller)
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/games/:id/read-sign-off',
    summary: 'Sign the read of a game off: what is habit is decided',
    action: 'game:hand-on',
    params: OneRow,
    response: GameRow,
    handle: async ({ caller, params }) => {
      await signRead(db, { gameId: params.id, caller, signed: true, now: clock() })
      const row = await getGame(db, caller.teamId, params.id, clock(), caller)
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/games/:id/read-sign-off',
    summary: 'Take the sign-off of a read back',
    action: 'game:hand-on',
    params: OneRow,
    response: GameRow,
    handle: async ({ caller, params }) => {
      await signRead(db, { gameId: params.id, caller, signed: false, now: clock() })
      const row = await getGame(db, caller.teamId, params.id, clock(), caller)
      return ok(row, row.version)
    },
  }),
]

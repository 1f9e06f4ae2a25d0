import {
  ScoutedGameBody,
  ScoutedGameList,
  ScoutedGameRow,
  ScoutedGamesQuery,
} from '@shared/scoutedGames/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listPage } from '../../http/listing'
import { putReply } from '../../http/present'
import { SCOUTED_GAME_LISTING } from './scoutedGames.presenter'
import { getScoutedGame, listScoutedGames, putScoutedGame } from './scoutedGames.service'

export const scoutedGameRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id/scouted-games',
    summary: 'Games of an opponent that a scout watched, newest first',
    action: 'scouting:read',
    params: OneRow,
    query: ScoutedGamesQuery,
    response: ScoutedGameList,
    handle: async ({ caller, params, query }) =>
      ok(listPage(await listScoutedGames(db, caller.teamId, params.id), query, SCOUTED_GAME_LISTING)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/scouted-games/:id',
    summary: 'One scouted game',
    action: 'scouting:read',
    params: OneRow,
    response: ScoutedGameRow,
    handle: async ({ caller, params }) => {
      const row = await getScoutedGame(db.manager, caller.teamId, params.id)
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/scouted-games/:id',
    summary: 'Add a scouted game or change its header',
    action: 'scouting:write',
    params: OneRow,
    body: ScoutedGameBody,
    response: ScoutedGameRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const put = await putScoutedGame(db, {
        id: params.id,
        teamId: caller.teamId,
        scoutId: caller.personId,
        body,
        ifMatch,
        now: clock(),
      })
      return putReply(put, await getScoutedGame(db.manager, caller.teamId, params.id))
    },
  }),
]

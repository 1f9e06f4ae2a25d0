import { SquadList, SquadPlayerBody, SquadPlayerRow } from '@shared/squad/schemas'
import type { Context } from '../../context'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { findInTeam } from '../../database/findInTeam'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { presentSquadPlayer } from './squad.presenter'
import { listSquad, putSquadPlayer, teamDay } from './squad.service'

export const squadRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/squad',
    summary: 'Squad players by shirt number',
    action: 'squad:read',
    params: InTeam,
    response: SquadList,
    handle: async ({ caller }) => listReply(await listSquad(db, caller.teamId, clock())),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/squad/:id',
    summary: 'One squad player',
    action: 'squad:read',
    params: OneRow,
    response: SquadPlayerRow,
    handle: async ({ caller, params }) => {
      const row = await findInTeam(db.manager, SquadPlayer, caller.teamId, params.id, 'player')
      return ok(presentSquadPlayer(row, await teamDay(db.manager, caller.teamId, clock())), row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/squad/:id',
    summary: 'Add or change a squad player',
    action: 'squad:write',
    params: OneRow,
    body: SquadPlayerBody,
    response: SquadPlayerRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const put = await putSquadPlayer(db, {
        id: params.id,
        teamId: caller.teamId,
        body,
        ifMatch,
        now: clock(),
        by: caller.personId,
      })
      return putReply(put, presentSquadPlayer(put.row, await teamDay(db.manager, caller.teamId, clock())))
    },
  }),
]

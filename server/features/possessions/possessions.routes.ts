import { PossessionBody, PossessionList, PossessionPatch, PossessionRow } from '@shared/possessions/schemas'
import type { Context } from '../../context'
import { Game } from '../../database/entities/Game'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { findInTeam } from '../../database/findInTeam'
import { endpoint, gone, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { deletePossession, restorePossession } from './deletion.service'
import { getPossession, listPossessions, patchPossession, putPossession } from './possessions.service'
import { presentPossession } from './possessions.presenter'

export const possessionRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/scouted-games/:id/possessions',
    summary: 'Possessions of a scouted game, in the order they were played',
    action: 'scouting:read',
    params: OneRow,
    response: PossessionList,
    handle: async ({ caller, params }) => {
      await findInTeam(db.manager, ScoutedGame, caller.teamId, params.id, 'scouted game')
      const rows = await listPossessions(db, { teamId: caller.teamId, scoutedGameId: params.id })
      return listReply(rows.map(presentPossession))
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/possessions',
    summary: 'Possessions of one of our games, in the order they were played',
    action: 'scouting:read',
    params: OneRow,
    response: PossessionList,
    handle: async ({ caller, params }) => {
      await findInTeam(db.manager, Game, caller.teamId, params.id, 'game')
      const rows = await listPossessions(db, { teamId: caller.teamId, gameId: params.id })
      return listReply(rows.map(presentPossession))
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/possessions/:id',
    summary: 'One possession',
    action: 'scouting:read',
    params: OneRow,
    response: PossessionRow,
    handle: async ({ caller, params }) => {
      const whole = await getPossession(db.manager, caller.teamId, params.id)
      return ok(presentPossession(whole), whole.row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/possessions/:id',
    summary: 'Log a possession, or replace it',
    action: 'scouting:write',
    params: OneRow,
    body: PossessionBody,
    response: PossessionRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const write = { id: params.id, teamId: caller.teamId, ifMatch, now: clock(), by: caller.personId }
      const { put, whole } = await putPossession(db, write, body)
      return putReply(put, presentPossession(whole))
    },
  }),
  endpoint({
    method: 'patch',
    path: '/teams/:team/possessions/:id',
    summary: 'Change some fields of a possession',
    action: 'scouting:write',
    params: OneRow,
    body: PossessionPatch,
    response: PossessionRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const write = { id: params.id, teamId: caller.teamId, ifMatch, now: clock(), by: caller.personId }
      const { put, whole } = await patchPossession(db, write, body)
      return putReply(put, presentPossession(whole))
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/possessions/:id',
    summary: 'Delete a possession; it can be put back for ten minutes',
    action: 'scouting:write',
    params: OneRow,
    handle: async ({ caller, params, ifMatch }) => {
      await deletePossession(db, {
        teamId: caller.teamId,
        id: params.id,
        by: caller.personId,
        now: clock(),
        ifMatch,
      })
      return gone()
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/possessions/:id/restore',
    summary: 'Put a deleted possession back',
    action: 'scouting:write',
    params: OneRow,
    response: PossessionRow,
    handle: async ({ caller, params }) => {
      const which = { teamId: caller.teamId, id: params.id, by: caller.personId, now: clock() }
      const whole = await restorePossession(db, which)
      return ok(presentPossession(whole), whole.row.version)
    },
  }),
]

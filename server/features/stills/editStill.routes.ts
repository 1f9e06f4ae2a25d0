import { StillRow } from '@shared/possessions/schemas'
import { BlurBody, OpponentStills, OpponentStillsQuery, StillPatch } from '@shared/stills/schemas'
import type { Context } from '../../context'
import { Opponent } from '../../database/entities/Opponent'
import type { Still } from '../../database/entities/Still'
import { findInTeam } from '../../database/findInTeam'
import { endpoint, ok, type Caller } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { presentStill } from '../possessions/possessions.presenter'
import { blurStill, patchStill, type StillEdit } from './editStill.service'
import { listOpponentStills } from './opponentStills.service'
import { findStill } from './stills.service'

const reply = (still: Still) => ok(presentStill(still), still.version)

export const editStillRoutes = ({ db, clock, stillFiles }: Context) => {
  const editOf = (caller: Caller, id: string, ifMatch: number | null): StillEdit => ({
    teamId: caller.teamId,
    role: caller.role,
    by: caller.personId,
    id,
    ifMatch,
    now: clock(),
  })
  return [
    endpoint({
      method: 'get',
      path: '/teams/:team/stills/:id/row',
      summary: 'What is kept about a still: marks, words, faces, its last day',
      action: 'scouting:read',
      params: OneRow,
      response: StillRow,
      handle: async ({ caller, params }) => reply(await findStill(db.manager, caller.teamId, params.id)),
    }),
    endpoint({
      method: 'patch',
      path: '/teams/:team/stills/:id',
      summary: 'Change marks, words, time, place, faces, report or last day of a still',
      action: 'scouting:write',
      params: OneRow,
      body: StillPatch,
      response: StillRow,
      handle: async ({ caller, params, body, ifMatch }) =>
        reply(await patchStill(db, editOf(caller, params.id, ifMatch), body)),
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/stills/:id/blur',
      summary: 'Burn parts of a still away, for good',
      action: 'scouting:write',
      params: OneRow,
      body: BlurBody,
      response: StillRow,
      problems: { 412: 'Changed meanwhile; carries the present row', 428: 'If-Match is missing' },
      handle: async ({ caller, params, body, ifMatch }) =>
        reply(await blurStill(db, stillFiles, editOf(caller, params.id, ifMatch), body)),
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/opponents/:id/stills',
      summary: 'Stills of an opponent; with report=1 those chosen for the report',
      action: 'scouting:read',
      params: OneRow,
      query: OpponentStillsQuery,
      response: OpponentStills,
      handle: async ({ caller, params, query }) => {
        await findInTeam(db.manager, Opponent, caller.teamId, params.id, 'opponent')
        return ok(
          await listOpponentStills(db.manager, {
            teamId: caller.teamId,
            opponentId: params.id,
            reportOnly: query.report === '1',
            limit: query.limit,
            offset: query.offset,
          }),
        )
      },
    }),
  ]
}

import { Evidence, EvidenceQuery, TendencyFilter, TendencyRead } from '@shared/tendencies/schemas'
import type { Context } from '../../context'
import { ballAgainst } from '../../database/counting/ballTracks'
import { findInTeam } from '../../database/findInTeam'
import { Opponent } from '../../database/entities/Opponent'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { readEvidence } from './evidence.service'
import { engineSettings } from '../team/team.service'
import { readOpponent } from './readOpponent'
import { presentRead } from './tendencies.presenter'

export const tendencyRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id/tendencies',
    summary: 'What an opponent does, k of n, in a situation',
    action: 'scouting:read',
    params: OneRow,
    query: TendencyFilter,
    response: TendencyRead,
    handle: async ({ caller, params, query }) => {
      await findInTeam(db.manager, Opponent, caller.teamId, params.id, 'opponent')
      return ok(
        presentRead(
          params.id,
          await readOpponent(db.manager, params.id, query, await engineSettings(db.manager, caller.teamId)),
          await ballAgainst(db.manager, params.id, query),
        ),
      )
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id/evidence',
    summary: 'The possessions behind one habit',
    action: 'scouting:read',
    params: OneRow,
    query: EvidenceQuery,
    response: Evidence,
    handle: async ({ caller, params, query }) => {
      await findInTeam(db.manager, Opponent, caller.teamId, params.id, 'opponent')
      return ok(await readEvidence(db, params.id, query))
    },
  }),
]

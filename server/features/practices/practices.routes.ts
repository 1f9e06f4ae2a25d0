import {
  PracticeBody,
  PracticeList,
  PracticeRow,
  ScriptProposal,
  ScriptQuery,
} from '@shared/practices/schemas'
import type { Context } from '../../context'
import { endpoint, gone, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { presentPractice } from './practices.presenter'
import { deletePractice, getPractice, listPractices, putPractice, restorePractice } from './practices.service'
import { scriptFor } from './script.service'

export const practiceRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/practices',
    summary: 'Practices of the team, the latest first',
    action: 'practice:read',
    params: InTeam,
    response: PracticeList,
    handle: async ({ caller }) => listReply(await listPractices(db, caller.teamId)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/practices',
    summary: 'Practices before one game, the latest first',
    action: 'practice:read',
    params: OneRow,
    response: PracticeList,
    handle: async ({ caller, params }) => listReply(await listPractices(db, caller.teamId, params.id)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/script',
    summary: 'A practice script shared out by how often each look came',
    action: 'practice:read',
    params: OneRow,
    query: ScriptQuery,
    response: ScriptProposal,
    handle: async ({ caller, params, query }) =>
      ok(await scriptFor(db.manager, caller.teamId, params.id, query)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/practices/:id',
    summary: 'One practice',
    action: 'practice:read',
    params: OneRow,
    response: PracticeRow,
    handle: async ({ caller, params }) => {
      const row = await getPractice(db, caller.teamId, params.id)
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/practices/:id',
    summary: 'Write a practice: its script, and afterwards what was run',
    action: 'practice:write',
    params: OneRow,
    body: PracticeBody,
    response: PracticeRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const { teamId, personId: by } = caller
      const put = await putPractice(db, { id: params.id, teamId, body, ifMatch, now: clock(), by })
      return putReply(put, presentPractice(put.row, body))
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/practices/:id',
    summary: 'Throw a practice away; for ten minutes it can be put back',
    action: 'practice:write',
    params: OneRow,
    handle: async ({ caller, params, ifMatch }) => {
      const { teamId, personId: by } = caller
      await deletePractice(db, { id: params.id, teamId, ifMatch, now: clock(), by })
      return gone()
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/practices/:id/restore',
    summary: 'Put back a practice that was thrown away',
    action: 'practice:write',
    params: OneRow,
    response: PracticeRow,
    handle: async ({ caller, params }) => {
      const { teamId, personId: by } = caller
      const row = await restorePractice(db, { id: params.id, teamId, now: clock(), by })
      return ok(row, row.version)
    },
  }),
]

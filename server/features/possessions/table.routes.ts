import { randomUUID } from 'node:crypto'
import { z } from 'zod'
import { Id } from '@shared/http/common'
import { PossessionRow } from '@shared/possessions/schemas'
import { BatchBody, BatchResult, PossessionTable, PutBackBody, TableQuery } from '@shared/possessions/table'
import type { Context } from '../../context'
import { Opponent } from '../../database/entities/Opponent'
import { findInTeam } from '../../database/findInTeam'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { putReply } from '../../http/present'
import { changeMany, undoMany } from './batch.service'
import { presentPossession } from './possessions.presenter'
import { putBack } from './putBack.service'
import { readTable } from './table.service'

export const possessionTableRoutes = ({ db, clock }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/opponents/:id/possessions',
    summary: 'Possessions against an opponent as a table: filtered, in any order, page by page',
    action: 'scouting:read',
    params: OneRow,
    query: TableQuery,
    response: PossessionTable,
    handle: async ({ caller, params, query }) => {
      await findInTeam(db.manager, Opponent, caller.teamId, params.id, 'opponent')
      return ok(await readTable(db.manager, params.id, query))
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/possessions/batch',
    summary: 'Change one field in many possessions that hold the old value',
    action: 'scouting:write',
    params: InTeam,
    body: BatchBody,
    response: BatchResult,
    handle: async ({ caller, body }) =>
      ok(await changeMany(db, { teamId: caller.teamId, by: caller.personId, now: clock() }, body)),
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/possessions/batch/:batch/undo',
    summary: 'Put back what was changed in many possessions at once, within a day',
    action: 'scouting:write',
    params: z.object({ team: Id, batch: Id }),
    response: BatchResult,
    handle: async ({ caller, params }) => {
      const asking = { teamId: caller.teamId, by: caller.personId, now: clock() }
      return ok(await undoMany(db, asking, params.batch, randomUUID()))
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/possessions/:id/put-back',
    summary: 'Put one field of a possession back to what it was before a line of its history',
    action: 'scouting:write',
    params: OneRow,
    body: PutBackBody,
    response: PossessionRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const write = { id: params.id, teamId: caller.teamId, ifMatch, now: clock(), by: caller.personId }
      const { put, whole } = await putBack(db, write, body)
      return putReply(put, presentPossession(whole))
    },
  }),
]

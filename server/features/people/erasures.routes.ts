import { ErasureBody, ErasurePreview, ErasureRow } from '@shared/people/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { putReply } from '../../http/present'
import { describeErasure, previewErasure, putErasure, stopErasure } from './erasures.service'

export const erasureRoutes = ({ db, clock, config }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/erasures/preview',
    summary: 'What erasing somebody takes and what it leaves, counted',
    action: 'person:erase',
    params: InTeam,
    query: ErasureBody,
    response: ErasurePreview,
    handle: async ({ caller, query }) => {
      const { backupDays } = config
      return ok(await previewErasure(db, { teamId: caller.teamId, body: query, now: clock(), backupDays }))
    },
  }),
  endpoint({
    method: 'put',
    path: '/teams/:team/erasures/:id',
    summary: 'Erase somebody at the next midnight of the team',
    action: 'person:erase',
    params: OneRow,
    body: ErasureBody,
    response: ErasureRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const { teamId, personId: by } = caller
      const put = await putErasure(db, { teamId, id: params.id, by, body, ifMatch, now: clock() })
      return putReply(put, await describeErasure(db.manager, teamId, put.row.id))
    },
  }),
  endpoint({
    method: 'post',
    path: '/teams/:team/erasures/:id/stop',
    summary: 'Stop an erasure while it waits',
    action: 'team:read',
    params: OneRow,
    response: ErasureRow,
    problems: { 409: 'It is done' },
    handle: async ({ caller, params }) => {
      const { teamId, personId: by } = caller
      const row = await stopErasure(db, { teamId, id: params.id, by, now: clock() })
      return ok(await describeErasure(db.manager, teamId, row.id), row.version)
    },
  }),
]

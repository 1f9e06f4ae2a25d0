import { z } from 'zod'
import { CounterFile, CounterPreview, counterFile } from '@shared/counters/counterFile'
import { CounterInput, CounterList, CounterQuery, CounterRow } from '@shared/counters/schemas'
import type { Context } from '../../context'
import { endpoint, ok, type Caller } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { getCounter, listCounters } from './counters.service'
import { previewCounter } from './importCounter'
import { archiveCounter, putCounter, walkedCounter } from './writeCounter'

export const counterRoutes = ({ db, clock }: Context) => {
  const which = (caller: Caller, params: { id: string }) => ({
    id: params.id,
    teamId: caller.teamId,
    now: clock(),
    by: caller.personId,
  })
  const archiving = (word: 'archive' | 'unarchive', summary: string) =>
    endpoint({
      method: 'post',
      path: `/teams/:team/counters/:id/${word}`,
      summary,
      action: 'counter:write',
      params: OneRow,
      response: CounterRow,
      handle: async ({ caller, params, ifMatch }) => {
        const archive = word === 'archive'
        const row = await archiveCounter(db, { ...which(caller, params), archive, ifMatch })
        return ok(row, row.version)
      },
    })
  return [
    endpoint({
      method: 'get',
      path: '/teams/:team/counters',
      summary:
        'The team’s library of counters, with our own record of each; drafts and archived ones if asked',
      action: 'counter:read',
      params: InTeam,
      query: CounterQuery,
      response: CounterList,
      handle: async ({ caller, query }) =>
        listReply(await listCounters(db.manager, caller.teamId, query.show)),
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/counters/preview',
      summary:
        'What a file would bring: the counter as it would be read, what was mended, its faults; nothing is kept',
      action: 'counter:write',
      params: InTeam,
      body: z.unknown(),
      response: CounterPreview,
      handle: ({ body }) => Promise.resolve(ok(previewCounter(body))),
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/counters/:id',
      summary: 'One counter, also a draft or an archived one',
      action: 'counter:read',
      params: OneRow,
      response: CounterRow,
      handle: async ({ caller, params }) => {
        const row = await getCounter(db.manager, caller.teamId, params.id)
        return ok(row, row.version)
      },
    }),
    endpoint({
      method: 'put',
      path: '/teams/:team/counters/:id',
      summary: 'Draw a counter or change it; a draft is kept with its faults, the book takes none',
      action: 'counter:write',
      params: OneRow,
      body: CounterInput,
      response: CounterRow,
      handle: async ({ caller, params, body, ifMatch }) => {
        const { put, row } = await putCounter(db, { ...which(caller, params), body, ifMatch })
        return putReply(put, row)
      },
    }),
    archiving('archive', 'Take a counter out of the book; it keeps its record'),
    archiving('unarchive', 'Put an archived counter back in the book'),
    endpoint({
      method: 'post',
      path: '/teams/:team/counters/:id/walked',
      summary: 'Note that a counter was walked on a screen',
      action: 'counter:write',
      params: OneRow,
      response: CounterRow,
      handle: async ({ caller, params }) => {
        const row = await walkedCounter(db.manager, which(caller, params))
        return ok(row, row.version)
      },
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/counters/:id/export.json',
      summary: 'One counter as a file that another team can take',
      action: 'counter:read',
      params: OneRow,
      response: CounterFile,
      handle: async ({ caller, params, res }) => {
        const row = await getCounter(db.manager, caller.teamId, params.id)
        const name = row.name.replace(/[^\p{L}\p{N}]+/gu, '-').replace(/^-|-$/g, '') || 'counter'
        res.attachment(`${name}.json`)
        return ok(CounterFile.parse(counterFile(row, clock())))
      },
    }),
  ]
}

import {
  CopiesBody,
  CopiesPdfQuery,
  CopyChange,
  CopyList,
  CopyRow,
  LettersBody,
  LettersMade,
  OpeningList,
} from '@shared/sheets/handOut'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listReply } from '../../http/present'
import { BadInput, NotFound } from '../../http/problem'
import { lastNumber, listCopies, makeCopies, moveCopy } from './copies.service'
import { drawSheet, sendPdf } from './drawSheet'
import { writeLetters } from './letters.service'
import { listOpenings } from './openings.service'
import { getSheet } from './sheets.service'

/** Putting a sheet into hands, and getting it back; for staff. */
export const handOutRoutes = (context: Context) => {
  const { db, clock } = context
  return [
    endpoint({
      method: 'get',
      path: '/teams/:team/sheets/:id/copies',
      summary: 'Numbered papers and letters of a sheet',
      action: 'sheet:hand-out',
      params: OneRow,
      response: CopyList,
      handle: async ({ caller, params }) => listReply(await listCopies(db.manager, caller.teamId, params.id)),
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/sheets/:id/copies',
      summary: 'Make numbered papers; the same ids again make nothing new',
      action: 'sheet:hand-out',
      params: OneRow,
      body: CopiesBody,
      response: CopyList,
      problems: { 409: 'Called back, an id is taken, or there are too many' },
      handle: async ({ caller, params, body }) => {
        const { teamId, personId: by } = caller
        return listReply(await makeCopies(db, { teamId, sheetId: params.id, body, now: clock(), by }))
      },
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/sheets/:id/copies.pdf',
      summary: 'Numbered papers in one file, a page each',
      action: 'sheet:hand-out',
      params: OneRow,
      query: CopiesPdfQuery,
      media: { response: 'application/pdf' },
      problems: { 409: 'Holds more than one page can' },
      handle: async ({ caller, params, query, res }) => {
        const whole = await getSheet(db.manager, caller.teamId, params.id)
        const papers = (await listCopies(db.manager, caller.teamId, params.id)).filter(
          ({ way }) => way === 'paper',
        )
        const asked = query.ids === undefined ? papers : papers.filter(({ id }) => query.ids?.includes(id))
        if (query.ids !== undefined && asked.length < new Set(query.ids).size) throw new NotFound('copy')
        if (asked.length === 0)
          throw new BadInput([{ field: 'ids', message: 'Name at least one copy. Make some first.' }])
        const pages = asked.map(({ squadPlayerId, number }) => ({
          reader: squadPlayerId,
          copy: number ?? undefined,
        }))
        const copies = await lastNumber(db.manager, params.id)
        return sendPdf(res, 'copies.pdf', await drawSheet(whole, pages, query.paper, copies))
      },
    }),
    endpoint({
      method: 'patch',
      path: '/teams/:team/copies/:id',
      summary: 'Give a paper out and say to whom, take it back, or put it in the bag again',
      action: 'sheet:hand-out',
      params: OneRow,
      body: CopyChange,
      response: CopyRow,
      problems: { 409: 'Its sheet was called back, or it is a letter' },
      handle: async ({ caller, params, body, ifMatch }) => {
        const { teamId, personId: by } = caller
        const options = { teamId, id: params.id, ...body, ifMatch, now: clock(), by }
        const row = await moveCopy(db, options)
        return ok(row, row.version)
      },
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/sheets/:id/letters',
      summary: 'Send a sheet to players, guardians and coaches; nobody gets it twice',
      action: 'sheet:hand-out',
      params: OneRow,
      body: LettersBody,
      response: LettersMade,
      problems: { 409: 'Called back' },
      handle: async ({ caller, params, body }) =>
        ok(await writeLetters(context, { teamId: caller.teamId, sheetId: params.id, body, now: clock() })),
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/sheets/:id/openings',
      summary: 'Who has opened a sheet',
      action: 'sheet:hand-out',
      params: OneRow,
      response: OpeningList,
      handle: async ({ caller, params }) =>
        listReply(await listOpenings(db.manager, caller.teamId, params.id)),
    }),
  ]
}

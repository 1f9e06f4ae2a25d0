import { SheetList, SheetPdfQuery, SheetView } from '@shared/sheets/schemas'
import { sheetPdf } from '../../adapters/pdf/sheetPdf'
import { SheetTooFull } from '../../adapters/pdf/sheetTooFull'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply } from '../../http/present'
import { Conflict, NotAllowed } from '../../http/problem'
import { mayDrawFor } from './sheets.policy'
import { pageOfSheet, presentSheet } from './sheets.presenter'
import { checkReader, getSheet, listSheets } from './sheets.service'

export const sheetRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/sheets',
    summary: 'Sheets that have been handed out, newest first',
    action: 'sheet:read',
    params: InTeam,
    response: SheetList,
    handle: async ({ caller }) => listReply(await listSheets(db, caller.teamId)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/games/:id/sheets',
    summary: 'Sheets of one game, newest first',
    action: 'sheet:read',
    params: OneRow,
    response: SheetList,
    handle: async ({ caller, params }) => listReply(await listSheets(db, caller.teamId, params.id)),
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/sheets/:id.pdf',
    summary: 'The printed page of a sheet',
    action: 'sheet:read',
    params: OneRow,
    query: SheetPdfQuery,
    media: { response: 'application/pdf' },
    problems: { 409: 'Holds more than one page can' },
    handle: async ({ caller, params, query, res }) => {
      const reader = query.player ?? (caller.role === 'player' ? caller.squadPlayerId : null)
      if (!mayDrawFor(caller, reader)) throw new NotAllowed('You can open your own copy or the general one.')
      const whole = await getSheet(db, caller.teamId, params.id)
      if (query.player !== undefined) await checkReader(db, caller.teamId, query.player)
      const { paper, copy } = query
      const pdf = await sheetPdf(pageOfSheet(whole, reader), { paper, copy }).catch((error: unknown) => {
        throw error instanceof SheetTooFull ? new Conflict(error.message) : error
      })
      res.type('application/pdf').set('Content-Disposition', 'inline; filename="sheet.pdf"').send(pdf)
      return undefined
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/sheets/:id',
    summary: 'A sheet as the reader sees it',
    action: 'sheet:read',
    params: OneRow,
    response: SheetView,
    handle: async ({ caller, params }) => {
      const whole = await getSheet(db, caller.teamId, params.id)
      return ok(presentSheet(whole, caller.role === 'player' ? caller.squadPlayerId : null))
    },
  }),
]

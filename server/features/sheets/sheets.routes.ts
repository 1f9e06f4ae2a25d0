import { Recalled, SheetChange } from '@shared/sheets/handOut'
import { SheetList, SheetPdfQuery, SheetView } from '@shared/sheets/schemas'
import type { Context } from '../../context'
import { endpoint, ok, type Caller } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { listReply } from '../../http/present'
import { NotAllowed } from '../../http/problem'
import { drawAttachmentsOf } from '../mail/attachments'
import { calledBack, drawAttached, drawSheet, sendPdf } from './drawSheet'
import { noteOpening } from './openings.service'
import { recallSheet } from './recall.service'
import { mayDrawFor } from './sheets.policy'
import { presentSheet } from './sheets.presenter'
import { checkReader, chooseFuller, getSheet, listSheets } from './sheets.service'

export const sheetRoutes = (context: Context) => {
  const { db, clock } = context
  drawAttachmentsOf('sheet', drawAttached)
  const opened = ({ teamId, personId }: Caller, sheetId: string) =>
    noteOpening(db.manager, { teamId, sheetId, personId, now: clock() })
  const read = async (caller: Caller, id: string) =>
    presentSheet(
      await getSheet(db.manager, caller.teamId, id),
      caller.role === 'player' ? caller.squadPlayerId : null,
    )
  return [
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
      problems: { 409: 'Holds more than one page can', 410: 'Called back; players get the newest one' },
      handle: async ({ caller, params, query, res }) => {
        const reader = query.player ?? (caller.role === 'player' ? caller.squadPlayerId : null)
        if (!mayDrawFor(caller, reader))
          throw new NotAllowed('You can open your own copy or the general one.')
        const whole = await getSheet(db.manager, caller.teamId, params.id)
        if (query.player !== undefined) await checkReader(db, caller.teamId, query.player)
        if (caller.role === 'player' && whole.sheet.recalledAt !== null) throw calledBack(whole.newest)
        const pdf = await drawSheet(whole, [{ reader, copy: query.copy }], query.paper)
        await opened(caller, params.id)
        return sendPdf(res, 'sheet.pdf', pdf)
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
        const view = await read(caller, params.id)
        await opened(caller, params.id)
        return ok(view)
      },
    }),
    endpoint({
      method: 'patch',
      path: '/teams/:team/sheets/:id',
      summary: 'Choose the fuller page, or the light one again',
      // Whoever signs the plan answers for how much its page holds.
      action: 'plan:sign-off',
      params: OneRow,
      body: SheetChange,
      response: SheetView,
      problems: { 409: 'Holds too many words for the fuller page' },
      handle: async ({ caller, params, body }) => {
        await chooseFuller(db, { teamId: caller.teamId, sheetId: params.id, fuller: body.fuller })
        return ok(await read(caller, params.id))
      },
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/sheets/:id/recall',
      summary: 'Call a sheet back: tell its readers, stop its letters, list the papers that are out',
      action: 'sheet:recall',
      params: OneRow,
      response: Recalled,
      handle: async ({ caller, params }) =>
        ok(await recallSheet(context, { teamId: caller.teamId, sheetId: params.id, now: clock() })),
    }),
  ]
}

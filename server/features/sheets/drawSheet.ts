import type { Response } from 'express'
import type { Paper, SheetView } from '@shared/sheets/schemas'
import { copiesPdf } from '../../adapters/pdf/sheetPdf'
import { SheetTooFull } from '../../adapters/pdf/sheetTooFull'
import { Conflict, HttpError } from '../../http/problem'
import type { DrawAttachment } from '../mail/attachments'
import { pageOfSheet, type WholeSheet } from './sheets.presenter'
import { getSheet } from './sheets.service'

/** One page of a file: whose it is (null is everybody's) and its number. */
export interface DrawnCopy {
  reader: string | null
  copy?: number
}

/**
 * Pages of a sheet in one file.
 * @param copies how many numbered copies the sheet has
 * @throws Conflict when one of them does not fit on its page
 */
export function drawSheet(
  whole: WholeSheet,
  pages: readonly DrawnCopy[],
  paper: Paper,
  copies?: number,
): Promise<Buffer> {
  return copiesPdf(
    pages.map(({ reader, copy }) => ({ view: pageOfSheet(whole, reader), copy })),
    paper,
    copies,
  ).catch((error: unknown) => {
    throw error instanceof SheetTooFull ? new Conflict(error.message) : error
  })
}

/** Hands a file to the browser to show. */
export function sendPdf(res: Response, name: string, pdf: Buffer): undefined {
  res.type('application/pdf').set('Content-Disposition', `inline; filename="${name}"`).send(pdf)
  return undefined
}

/** What a player is told of a paper that no longer holds. */
export const calledBack = (newest: SheetView['newest']): HttpError =>
  new HttpError(
    410,
    'called-back',
    'Called back',
    newest === null
      ? 'This one is called back. Wait for the next one.'
      : `This one is called back. Open the newest one, from plan ${newest.planNumber}.`,
    { current: newest },
  )

/** What goes with a guardian's letter: her copy without anybody's name. @throws NotFound, HttpError once called back */
export const drawAttached: DrawAttachment = async ({ db }, teamId, { sheetId, squadPlayerId, paper }) => {
  const whole = await getSheet(db.manager, teamId, sheetId)
  if (whole.sheet.recalledAt !== null) throw calledBack(whole.newest)
  const content = await drawSheet({ ...whole, players: [] }, [{ reader: squadPlayerId }], paper)
  return { name: 'sheet.pdf', contentType: 'application/pdf', content }
}

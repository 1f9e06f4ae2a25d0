import { budgetOf } from '@shared/sheets/budget'
import { readBy } from '@shared/sheets/reader'
import type { FrozenPlan, SheetRow, SheetView } from '@shared/sheets/schemas'
import type { Sheet } from '../../database/entities/Sheet'

/** A sheet with everything that is looked up for it at this moment. */
export interface WholeSheet {
  sheet: Sheet
  gameId: string
  planNumber: number
  content: FrozenPlan
  timeZone: string
  /** Names as they are now; an erased player is not among them. */
  players: SheetView['players']
  newest: SheetView['newest']
}

/** The row of a list. */
export const presentSheetRow = ({
  sheet,
  gameId,
  planNumber,
  content,
  signedBy,
}: Omit<WholeSheet, 'timeZone' | 'players' | 'newest'> & { signedBy: string | null }): SheetRow => ({
  id: sheet.id,
  gameId,
  planId: sheet.planId,
  planNumber,
  opponentName: content.opponentName,
  tipOff: content.tipOff,
  createdAt: sheet.createdAt,
  signedBy,
  fuller: sheet.fuller,
  recalledAt: sheet.recalledAt,
})

/** What stands on the sheet of one reader; `readerId` is a squad player, or null for the general sheet. */
export const pageOfSheet = (whole: WholeSheet, readerId: string | null): Omit<SheetView, 'budget'> =>
  readBy(
    {
      id: whole.sheet.id,
      gameId: whole.gameId,
      planNumber: whole.planNumber,
      createdAt: whole.sheet.createdAt,
      timeZone: whole.timeZone,
      content: whole.content,
      players: whole.players,
      mine: null,
      fuller: whole.sheet.fuller,
      recalledAt: whole.sheet.recalledAt,
      newest: whole.newest,
    },
    readerId,
  )

/** The same with its word budget, for the screen. */
export function presentSheet(whole: WholeSheet, readerId: string | null): SheetView {
  const page = pageOfSheet(whole, readerId)
  return { ...page, budget: budgetOf(page) }
}

import { budgetOf } from '@shared/sheets/budget'
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
}

/** The row of a list. */
export const presentSheetRow = ({
  sheet,
  gameId,
  planNumber,
  content,
}: Omit<WholeSheet, 'timeZone' | 'players'>): SheetRow => ({
  id: sheet.id,
  gameId,
  planId: sheet.planId,
  planNumber,
  opponentName: content.opponentName,
  tipOff: content.tipOff,
  createdAt: sheet.createdAt,
})

const roleIn = (counter: FrozenPlan['changeUp'], squadPlayerId: string) =>
  counter?.roles.find((role) => role.squadPlayerId === squadPlayerId)?.role ?? null

/** The sheet for one reader; `readerId` is a squad player, or null for the general sheet. */
export function presentSheet(whole: WholeSheet, readerId: string | null): SheetView {
  const { sheet, content } = whole
  const view: Omit<SheetView, 'budget'> = {
    id: sheet.id,
    gameId: whole.gameId,
    planNumber: whole.planNumber,
    createdAt: sheet.createdAt,
    timeZone: whole.timeZone,
    content,
    players: whole.players,
    mine:
      readerId === null
        ? null
        : {
            squadPlayerId: readerId,
            firstCallRole: roleIn(content.firstCall, readerId),
            changeUpRole: roleIn(content.changeUp, readerId),
          },
  }
  return { ...view, budget: budgetOf(view) }
}

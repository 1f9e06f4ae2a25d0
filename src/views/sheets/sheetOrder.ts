import type { SheetRow } from '@shared/sheets/schemas'

export interface ListedSheet {
  row: SheetRow
  /** Number of the newer plan of the same game, when there is one. */
  replacedBy: number | null
}

/** A game stays the next one until it is surely over. */
const GAME_HOURS = 3

/** Newest first; a sheet of an older plan says which plan took its place. */
export function listed(rows: readonly SheetRow[]): ListedSheet[] {
  return [...rows]
    .sort((a, b) => Date.parse(b.createdAt) - Date.parse(a.createdAt))
    .map((row) => {
      const newest = Math.max(
        ...rows.filter(({ gameId }) => gameId === row.gameId).map(({ planNumber }) => planNumber),
      )
      return { row, replacedBy: newest > row.planNumber ? newest : null }
    })
}

/** The sheet in force of the game that is played next; null when every game is over. */
export function nextSheet(rows: readonly SheetRow[], now: number): SheetRow | null {
  const ahead = listed(rows).filter(
    ({ row, replacedBy }) =>
      replacedBy === null && !row.recalledAt && Date.parse(row.tipOff) + GAME_HOURS * 3_600_000 > now,
  )
  const [next] = ahead.sort((a, b) => Date.parse(a.row.tipOff) - Date.parse(b.row.tipOff))
  return next?.row ?? null
}

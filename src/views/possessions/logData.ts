import { z } from 'zod'
import { OpponentRow } from '@shared/opponents/schemas'
import { PossessionRow, type StillRow } from '@shared/possessions/schemas'
import { LogGame } from './logGame'

/** All that the log page needs, as it was last loaded. */
export const LogData = z.object({
  game: LogGame,
  opponent: OpponentRow,
  rows: z.array(PossessionRow),
  /** Our counters by name, for a game of our own. */
  calls: z.array(z.object({ id: z.uuid(), name: z.string() })),
})
export type LogData = z.infer<typeof LogData>

/** The rows with one put in or replaced, in the order they were played. */
export function withRow(rows: readonly PossessionRow[], row: PossessionRow): PossessionRow[] {
  return [...rows.filter((each) => each.id !== row.id), row].sort(
    (a, b) => a.number - b.number || (a.createdAt < b.createdAt ? -1 : 1),
  )
}

export const withoutRow = (rows: readonly PossessionRow[], id: string): PossessionRow[] =>
  rows.filter((row) => row.id !== id)

/** The rows with the stills of one changed. */
export function withStills(
  rows: readonly PossessionRow[],
  possession: string,
  change: (stills: readonly StillRow[]) => StillRow[],
): PossessionRow[] {
  return rows.map((row) => (row.id === possession ? { ...row, stills: change(row.stills) } : row))
}

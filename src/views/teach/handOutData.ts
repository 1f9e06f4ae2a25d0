import { listCopies, listOpenings } from '@/api/handOut'
import { getSheet } from '@/api/sheets'
import { changesBetween, type SheetChangeLine } from '@shared/sheets/changes'
import type { CopyRow, OpeningRow } from '@shared/sheets/handOut'
import type { SheetRow, SheetView } from '@shared/sheets/schemas'

export interface Version {
  row: SheetRow
  opened: OpeningRow[]
  /** Papers that are out. */
  out: CopyRow[]
  changes: SheetChangeLine[]
}

/** All there is to the hand-out of one game; `sheet` is the newest one. */
export interface HandOut {
  sheet: SheetView
  copies: CopyRow[]
  /** Newest first. */
  versions: Version[]
}

/** Versions shown with what changed; older ones are in the list of sheets. */
const SHOWN = 4

/** Loads the newest sheet's copies and what is known of the versions before it. */
export async function loadHandOut(
  team: string,
  rows: readonly SheetRow[],
  signal?: AbortSignal,
): Promise<HandOut | null> {
  const shown = [...rows].sort((a, b) => b.planNumber - a.planNumber).slice(0, SHOWN)
  const loaded = await Promise.all(
    shown.map(async (row) => ({
      row,
      view: await getSheet(team, row.id, signal),
      copies: (await listCopies(team, row.id, signal)).rows,
      opened: (await listOpenings(team, row.id, signal)).rows,
    })),
  )
  const [newest] = loaded
  if (!newest) return null
  return {
    sheet: newest.view,
    copies: newest.copies,
    versions: loaded.map(({ row, view, copies, opened }, at) => {
      const older = loaded[at + 1]
      const names = [...view.players, ...(older?.view.players ?? [])]
      const nameOf = (id: string) => names.find((one) => one.squadPlayerId === id)?.firstName ?? null
      return {
        row,
        opened,
        out: copies.filter(({ place }) => place === 'out'),
        changes: older ? changesBetween(older.view.content, view.content, nameOf) : [],
      }
    }),
  }
}

import type { CounterRow } from '@shared/counters/schemas'
import { thin } from '@shared/stats/evidence'
import { wilson } from '@shared/stats/wilson'
import type { Shape } from '@shared/vocabulary'

/** The presses that a record is kept against, zones from the front first, and what their column is called. */
export const PRESSES = [
  { shape: '1-2-1-1', label: '1-2-1-1' },
  { shape: '2-2-1', label: '2-2-1' },
  { shape: '1-3-1', label: '1-3-1' },
  { shape: 'other-zone', label: 'Other zone' },
  { shape: 'person', label: 'Person to person' },
] as const satisfies readonly { shape: Shape; label: string }[]
export type Press = (typeof PRESSES)[number]['shape']

/** Our game trips with a counter against one press; `range` is the Wilson 95 of the raw count, null when not tried. */
export interface RecordCell {
  shape: Press
  k: number
  n: number
  range: { low: number; high: number } | null
  thin: boolean
}

/** In how many games is not told with a record, so that only amount and width make it thin. */
const ENOUGH_GAMES = 2

/** One cell for each press, also for those not tried; rows against anything else are no press and left out. */
export function recordCells(record: CounterRow['record']): RecordCell[] {
  return PRESSES.map(({ shape }) => {
    const rows = record.filter((row) => row.shape === shape)
    const k = rows.reduce((sum, row) => sum + row.k, 0)
    const n = rows.reduce((sum, row) => sum + row.n, 0)
    return { shape, k, n, range: wilson(k, n), thin: thin(k, n, ENOUGH_GAMES) }
  })
}

/** All counters of a list together, press by press. */
export function totalCells(counters: readonly Pick<CounterRow, 'record'>[]): RecordCell[] {
  return recordCells(counters.flatMap((counter) => counter.record))
}

/** "Thinnest: 1-3-1, only 15 tries": the press with the fewest tries among those tried; empty when none was. */
export function thinnestWords(totals: readonly RecordCell[]): string {
  const [least] = totals.filter((cell) => cell.n > 0).sort((one, two) => one.n - two.n)
  if (least === undefined) return ''
  const label = PRESSES.find((press) => press.shape === least.shape)?.label ?? least.shape
  return `Thinnest: ${label}, only ${least.n} ${least.n === 1 ? 'try' : 'tries'}`
}

/** "Not tried against 1-3-1 or other zone": every press without a game trip, said once; empty when all were tried. */
export function untriedWords(cells: readonly RecordCell[]): string {
  const labels = cells
    .filter(({ n }) => n === 0)
    .map(({ shape }) => PRESSES.find((press) => press.shape === shape)?.label ?? shape)
    .map((label) => (/^\d/.test(label) ? label : label.toLowerCase()))
  if (labels.length === 0) return ''
  if (labels.length === cells.length) return 'Not tried in a game yet.'
  const last = labels.at(-1) ?? ''
  const list = labels.length === 1 ? last : `${labels.slice(0, -1).join(', ')} or ${last}`
  return `Not tried against ${list}.`
}

/** Counters whose name, call or alignment holds the words looked for, of one family where one is chosen. */
export function findCounters<Row extends Pick<CounterRow, 'name' | 'call' | 'alignment' | 'family'>>(
  rows: readonly Row[],
  find: string,
  family: string,
): Row[] {
  const wanted = find.trim().toLowerCase()
  return rows.filter(
    (row) =>
      (family === '' || row.family === family) &&
      [row.name, row.call, row.alignment].some((text) => text.toLowerCase().includes(wanted)),
  )
}

/** Best record first: by the low end of the range over all our game trips; those never tried in a game last, by name. */
export function byRecord<Row extends Pick<CounterRow, 'name' | 'record'>>(rows: readonly Row[]): Row[] {
  const surely = (row: Row) => {
    const cells = recordCells(row.record)
    const sum = (of: (cell: RecordCell) => number) => cells.reduce((total, cell) => total + of(cell), 0)
    return (
      wilson(
        sum((cell) => cell.k),
        sum((cell) => cell.n),
      )?.low ?? -1
    )
  }
  return [...rows].sort((one, two) => surely(two) - surely(one) || one.name.localeCompare(two.name))
}

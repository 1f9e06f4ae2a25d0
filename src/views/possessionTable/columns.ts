import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import type { PossessionRow } from '@shared/possessions/schemas'
import type { Fix, TableRow, TableSort } from '@shared/possessions/table'
import { capital, isSeveral, timeLeft, trapWords, valueWords } from './fieldWords'

/** A column of the table. */
export interface Column {
  key: string
  head: string
  sort: TableSort
  /** The field of the record that it shows; a change of it is marked in the cell. */
  field: keyof PossessionRow & string
  /** What they did stands in their ink. */
  their: boolean
}

export const COLUMNS: readonly Column[] = [
  { key: 'clock', head: 'Clock', sort: 'clock', field: 'clock', their: false },
  { key: 'trigger', head: 'After', sort: 'trigger', field: 'trigger', their: false },
  { key: 'pickup', head: 'Picked up', sort: 'pickup', field: 'pickup', their: true },
  { key: 'shape', head: 'In a', sort: 'shape', field: 'shape', their: true },
  { key: 'firstTrap', head: 'First trap, s', sort: 'firstTrap', field: 'traps', their: true },
  { key: 'tookAway', head: 'Took away', sort: 'tookAway', field: 'tookAway', their: true },
  { key: 'secondTrap', head: 'Second trap, s', sort: 'secondTrap', field: 'traps', their: true },
  { key: 'outcome', head: 'Ended', sort: 'outcome', field: 'outcome', their: false },
]

/** A word struck out, the word beside it, and who did it. */
export interface Correction {
  was: string
  now: string
  initials: string
}

export interface Cell {
  words: string
  /** The cell was changed after it was logged. */
  fix: Correction | null
}

/** Endings in one or two words, where a column is narrow. */
const ENDED: Readonly<Record<string, string>> = {
  'through-with-numbers': 'With numbers',
  'foul-drawn': 'Fouled',
  count: 'Count called',
}

const asList = (value: unknown): readonly unknown[] => (Array.isArray(value) ? value : [])

/** What a column says of a value of its field; empty where there is nothing to say. */
function cellWords(column: Column, value: unknown, row: PossessionRow, pack: RulePack): string {
  if (column.key === 'clock') {
    const period = row.period === null ? '' : periodLabel(pack, row.period)
    return [period, typeof value === 'number' ? timeLeft(value) : ''].filter(Boolean).join(' ')
  }
  if (column.key === 'firstTrap' || column.key === 'secondTrap') {
    const index = column.key === 'firstTrap' ? 0 : 1
    if (!Array.isArray(value)) return index === 0 && value !== null ? valueWords('traps', value) : ''
    if (value.length === 0) return index === 0 ? 'No trap' : ''
    return capital(trapWords(asList(value)[index]))
  }
  if (column.key === 'pickup' && row.pressed === false)
    return row.shape === null ? '' : capital(valueWords('shape', row.shape))
  if (column.key === 'shape' && row.pressed === false) return ''
  if (value === null || value === undefined) return ''
  if (column.key === 'outcome') return ENDED[value as string] ?? capital(valueWords('outcome', value))
  const words = valueWords(column.field, value, pack)
  return isSeveral(column.field) ? words : capital(words)
}

/** The cell of a row, with the correction of whoever changed it last. */
export function cellOf(column: Column, row: TableRow, pack: RulePack): Cell {
  const { possession, fixes } = row
  const now = cellWords(column, possession[column.field], possession, pack)
  const fix = fixes.find((each) => each.field === column.field)
  return { words: now, fix: fix === undefined ? null : correctionOf(column, fix, possession, now, pack) }
}

function correctionOf(
  column: Column,
  fix: Fix,
  row: PossessionRow,
  now: string,
  pack: RulePack,
): Correction | null {
  if (column.key === 'pickup' && row.pressed === false) return null
  const said = cellWords(column, fix.from, row, pack)
  const was = said === '' ? 'nothing' : said
  if (was === now || (said === '' && now === '')) return null
  return { was, now: now === '' ? 'nothing' : now, initials: fix.initials ?? '' }
}

/** A correction as it is read out: "was nothing, now pass back, TR". */
export const correctionWords = ({ was, now, initials }: Correction): string =>
  [`was ${was}`, `now ${now}`, initials].filter(Boolean).join(', ')

/** How a possession ended, as a mark: kept, to the basket, or lost. */
export function endMark({ outcome }: PossessionRow): 'kept' | 'scored' | 'lost' | 'none' {
  if (outcome === null || outcome === 'stopped') return 'none'
  if (outcome === 'through-with-numbers') return 'scored'
  return outcome === 'through' || outcome === 'foul-drawn' ? 'kept' : 'lost'
}

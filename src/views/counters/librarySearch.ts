import type { LocationQuery } from 'vue-router'
import { CounterQuery, type CounterRow, type CounterShow } from '@shared/counters/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import { assignRoles, LEAST_FIT } from '@shared/stats/roles'
import { byRecord, findCounters, PRESSES, recordCells, type Press } from './recordCells'

export const SORTS = [
  { value: 'record', label: 'By how surely they got us through' },
  { value: 'name', label: 'By name' },
  { value: 'walked', label: 'Last walked first' },
  { value: 'reps', label: 'Most live reps first' },
] as const
export type LibrarySort = (typeof SORTS)[number]['value']

export const SHELVES = [
  { value: 'book', label: 'In the book' },
  { value: 'drafts', label: 'Being drawn' },
  { value: 'archived', label: 'Taken out' },
] as const satisfies readonly { value: CounterShow; label: string }[]

/** What of the library is looked at; as it stands in the address. */
export interface LibraryAsk {
  find: string
  /** A family, or empty for all. */
  family: string
  /** The press that it got us through more often than not; empty for any. */
  beats: Press | ''
  /** Only those whose every role somebody who is available can fill. */
  atHand: boolean
  sort: LibrarySort
  show: (typeof SHELVES)[number]['value']
}

export const ASK_ALL: LibraryAsk = {
  find: '',
  family: '',
  beats: '',
  atHand: false,
  sort: 'record',
  show: 'book',
}

const oneOf = <T extends string>(values: readonly { value: T }[], value: string, otherwise: T): T =>
  values.find((one) => one.value === value)?.value ?? otherwise

/** The ask of an address; what it cannot mean is left at its default. */
export function askOf(query: LocationQuery): LibraryAsk {
  const text = (name: string) => {
    const value = query[name]
    return typeof value === 'string' ? value : ''
  }
  const show = CounterQuery.shape.show.safeParse(text('show'))
  return {
    find: text('find'),
    family: text('family'),
    beats: PRESSES.find(({ shape }) => shape === text('beats'))?.shape ?? '',
    atHand: text('athand') === '1',
    sort: oneOf(SORTS, text('sort'), 'record'),
    show: show.success ? oneOf(SHELVES, show.data, 'book') : 'book',
  }
}

/** Only what differs from the whole book stands in the address. */
export function queryOfAsk(ask: LibraryAsk): Record<string, string> {
  const query: Record<string, string> = {
    find: ask.find,
    family: ask.family,
    beats: ask.beats,
    athand: ask.atHand ? '1' : '',
    sort: ask.sort === 'record' ? '' : ask.sort,
    show: ask.show === 'book' ? '' : ask.show,
  }
  return Object.fromEntries(Object.entries(query).filter(([, value]) => value !== ''))
}

type Row = Pick<
  CounterRow,
  'name' | 'call' | 'alignment' | 'family' | 'record' | 'roles' | 'walkedAt' | 'liveReps'
>

/** Whether everybody that a counter needs is there. */
export const allAtHand = (row: Pick<Row, 'roles'>, squad: readonly SquadPlayerRow[]): boolean =>
  row.roles.length > 0 && assignRoles(row.roles, squad, LEAST_FIT).unfillable === null

const cellOf = (row: Pick<Row, 'record'>, press: Press) =>
  recordCells(row.record).find(({ shape }) => shape === press)

/** Through more often than not, as counted; whoever shows it sees the range beside it. */
const beats = (row: Pick<Row, 'record'>, press: Press): boolean => {
  const cell = cellOf(row, press)
  return cell !== undefined && cell.n > 0 && cell.k * 2 > cell.n
}

/** The counters that fit, in the order asked for. Without a squad nobody is known to be at hand, and all stay. */
export function searched<R extends Row>(
  rows: readonly R[],
  ask: LibraryAsk,
  squad: readonly SquadPlayerRow[] | null,
): R[] {
  const { beats: press } = ask
  const found = findCounters(rows, ask.find, ask.family)
    .filter((row) => press === '' || beats(row, press))
    .filter((row) => !ask.atHand || squad === null || allAtHand(row, squad))
  const byName = (one: R, two: R) => one.name.localeCompare(two.name)
  switch (ask.sort) {
    case 'name':
      return found.sort(byName)
    case 'walked':
      return found.sort((a, b) => (b.walkedAt ?? '').localeCompare(a.walkedAt ?? '') || byName(a, b))
    case 'reps':
      return found.sort((a, b) => b.liveReps - a.liveReps || byName(a, b))
    case 'record':
      if (press === '') return byRecord(found)
      return found.sort((a, b) => low(b, press) - low(a, press) || byName(a, b))
  }
}

const low = (row: Pick<Row, 'record'>, press: Press): number => cellOf(row, press)?.range?.low ?? -1

import { SPOT_NAMES } from '@shared/court/trapSpots'
import type { TableFilter, TableGame, TableSort } from '@shared/possessions/table'
import { spotLabel } from '@shared/tendencies/habits'
import { shortDay } from '@/composables/when'
import { capital, termsOf, valueWords } from './fieldWords'

/** A choice below the sentence. */
export interface Choice {
  value: string
  label: string
}

/** One word of the filter sentence. */
export interface FilterSlot {
  key: keyof TableFilter
  /** Words before it: "picked up". */
  lead: string
  /** What it says while nothing is chosen. */
  any: string
  /** The name of it in the list of what can be added. */
  name: string
  /** Always in the sentence, or only once it is said. */
  always: boolean
  how: 'several' | 'one' | 'typed'
}

export const FILTER_SLOTS: readonly FilterSlot[] = [
  slot('game', 'against', 'anybody', 'The game', true),
  slot('trigger', 'after', 'anything', 'What came before', true),
  slot('pressed', '', 'pressed or not', 'Pressed or not', true, 'one'),
  slot('pickup', 'picked up', 'anywhere', 'Picked up'),
  slot('shape', 'in a', 'any shape', 'In a'),
  slot('trap', 'trapped at', 'any place', 'Trapped at'),
  slot('cue', 'trapped', 'on any cue', 'Cue of the trap'),
  slot('tookAway', 'with', 'anything', 'Took away'),
  slot('leftOpen', 'with', 'anything', 'Left open'),
  slot('denied', 'denying', 'anybody', 'Denied'),
  slot('onBall', 'the ball', 'in any way', 'On the ball'),
  slot('handler', 'with', 'any handler', 'Who had it'),
  slot('throwerGuard', 'on the thrower', 'anything', 'On the thrower'),
  slot('goalie', 'the safety', 'anywhere', 'The safety'),
  slot('forcedSide', 'steered', 'anywhere', 'Steered to'),
  slot('fallback', 'then in', 'anything', 'Then they played'),
  slot('outcome', 'ended', 'in any way', 'How it ended'),
  slot('outcomePlace', 'it ended', 'anywhere', 'Where it ended'),
  slot('finish', 'it came to', 'anything', 'The finish'),
  slot('period', 'in', 'any period', 'Period'),
  slot('margin', 'with them', 'ahead or behind', 'Score'),
  slot('jersey', 'with their', 'anybody', 'Shirt number', false, 'typed'),
  slot('text', 'noted', 'anything', 'Words in the note', false, 'typed'),
]

function slot(
  key: keyof TableFilter,
  lead: string,
  any: string,
  name: string,
  always = false,
  how: FilterSlot['how'] = 'several',
): FilterSlot {
  return { key, lead, any, name, always, how }
}

const MARGIN_WORDS = { behind: 'behind by 6 or more', level: 'within 5', ahead: 'ahead by 6 or more' }

/** "Tarn Valley, 14 March"; ours are "us, 14 March". */
export const gameName = ({ label, playedOn }: Pick<TableGame, 'label' | 'playedOn'>): string =>
  `${label.replace(/^v /, '').replace(/^against /, '')}, ${shortDay(playedOn).replace(/^\S+ /, '')}`

/** What can be chosen for a slot, in the order of the list. */
export function choicesOf(key: keyof TableFilter, games: readonly TableGame[]): Choice[] {
  if (key === 'game') return games.map((game) => ({ value: game.id, label: gameName(game) }))
  if (key === 'pressed')
    return [
      { value: 'yes', label: 'pressed' },
      { value: 'no', label: 'not pressed' },
    ]
  if (key === 'margin') return Object.entries(MARGIN_WORDS).map(([value, label]) => ({ value, label }))
  if (key === 'period')
    return [1, 2, 3, 4, 5, 6].map((period) => ({
      value: String(period),
      label: period <= 4 ? `period ${period}` : `overtime ${period - 4}`,
    }))
  if (key === 'trap')
    return [
      ...SPOT_NAMES.map((spot) => ({
        value: spot,
        label: spot === 'other' ? 'elsewhere' : spotLabel(spot, 'any'),
      })),
      { value: 'none', label: 'no trap' },
    ]
  return (termsOf(key) ?? []).map(({ value, label }) => ({ value, label }))
}

/** Which values a slot holds, as text. */
export function chosenOf(filter: TableFilter, key: keyof TableFilter): string[] {
  const value: unknown = filter[key]
  if (value === undefined || value === null) return []
  return (Array.isArray(value) ? value : [value]).map(String)
}

const AFTER: Partial<Record<keyof TableFilter, string>> = {
  tookAway: ' taken away',
  leftOpen: ' left open',
  jersey: ' in it',
}

/** What stands in the sentence for a slot: its values joined with "or", or that it may be anything. */
export function slotWords(each: FilterSlot, filter: TableFilter, games: readonly TableGame[]): string {
  const chosen = chosenOf(filter, each.key)
  if (chosen.length === 0) return each.any
  const choices = choicesOf(each.key, games)
  const words = chosen.map(
    (value) => choices.find((choice) => choice.value === value)?.label ?? fallbackWords(each.key, value),
  )
  return `${orWords(words)}${AFTER[each.key] ?? ''}`
}

const fallbackWords = (key: keyof TableFilter, value: string): string =>
  key === 'game' ? 'another game' : valueWords(key, value)

/** "a", "a or b", "a, b or c"; from the fifth on only how many. */
export function orWords(words: readonly string[]): string {
  const last = words.at(-1)
  if (last === undefined) return ''
  if (words.length > 4) return `${words.length} of them`
  return words.length === 1 ? last : `${words.slice(0, -1).join(', ')} or ${last}`
}

/** The orders that the sentence offers; a column's own order is chosen at its head. */
const SORT_WORDS: Partial<Record<TableSort, string>> = {
  played: 'they were played',
  number: 'of their numbers',
  clock: 'of the clock',
  trigger: 'of what came before',
  pickup: 'of the pick-up',
  shape: 'of the shape',
  firstTrap: 'of the first trap',
  secondTrap: 'of the second trap',
  tookAway: 'of what they took away',
  outcome: 'of how they ended',
  filmTime: 'of the film',
  updatedAt: 'they were changed',
}

export const SORT_CHOICES: readonly Choice[] = Object.entries(SORT_WORDS).map(([value, label]) => ({
  value,
  label,
}))

/** "they were played", "of the clock, last first" */
export function sortWords(sort: TableSort, direction: 'asc' | 'desc'): string {
  const words = SORT_WORDS[sort] ?? `of ${sort}`
  return direction === 'asc' ? words : `${words}, last first`
}

/** Of the parts of a filter that lets nothing through, the one without which most rows would be there. */
export function narrowest<T extends { total: number }>(without: readonly T[]): T | null {
  const most = without.reduce<T | null>(
    (best, each) => (best === null || each.total > best.total ? each : best),
    null,
  )
  return most === null || most.total === 0 ? null : most
}

export const slotName = (key: keyof TableFilter): string =>
  FILTER_SLOTS.find((each) => each.key === key)?.name ?? capital(key)

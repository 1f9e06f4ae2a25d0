import { Id } from '@shared/http/common'
import { LIMITS } from '@shared/limits'
import { MARGINS, type TendencyFilter } from '@shared/tendencies/schemas'
import { PICKUPS, SHAPES, TRIGGERS, valuesOf } from '@shared/vocabulary'

/** A page's query as the router hands it over. */
export type Query = Readonly<Record<string, string | null | undefined | readonly (string | null)[]>>

/** The filter's names in the address, in the order in which they are written. */
export const FILTER_KEYS = ['trigger', 'period', 'margin', 'pickup', 'shape', 'game'] as const
export type FilterKey = (typeof FILTER_KEYS)[number]

/** The words of a comma-separated value, also when the name stands in the address more than once. */
function words(value: Query[string]): string[] {
  const all = value === null || value === undefined ? [] : typeof value === 'string' ? [value] : value
  return all.flatMap((text) => (text ?? '').split(',')).map((word) => word.trim())
}

/** Those of a closed list that are asked for, in the list's order; undefined when none is. */
function chosen<T extends string>(value: Query[string], list: readonly T[]): T[] | undefined {
  const asked = new Set(words(value))
  return orNone(list.filter((entry) => asked.has(entry)))
}

const orNone = <T>(list: T[]): T[] | undefined => (list.length === 0 ? undefined : list)

/**
 * The situation that an address asks for. What it does not know is left out rather than refused: a link
 * from another season still opens.
 */
export function filterOf(query: Query): TendencyFilter {
  const periods = words(query['period']).map(Number)
  const games = words(query['game']).flatMap((text) => {
    const id = Id.safeParse(text)
    return id.success ? [id.data] : []
  })
  const filter: TendencyFilter = {
    trigger: chosen(query['trigger'], valuesOf(TRIGGERS)),
    period: orNone(
      [...new Set(periods)]
        .filter((period) => Number.isInteger(period) && period >= 1 && period <= LIMITS.periods)
        .sort((a, b) => a - b),
    ),
    margin: chosen(query['margin'], MARGINS),
    pickup: chosen(query['pickup'], valuesOf(PICKUPS)),
    shape: chosen(query['shape'], valuesOf(SHAPES)),
    game: orNone([...new Set(games)]),
  }
  return Object.fromEntries(Object.entries(filter).filter(([, list]) => list !== undefined))
}

/** The filter as it stands in the address; undoes filterOf. Nothing chosen is no word at all. */
export function queryOf(filter: TendencyFilter): Record<string, string> {
  return Object.fromEntries(
    FILTER_KEYS.flatMap((key) => {
      const list = filter[key]
      return list === undefined || list.length === 0 ? [] : [[key, list.join(',')]]
    }),
  )
}

/** A list with a value put in or taken out; undefined when nothing is left in it. */
export function toggled<T>(list: readonly T[] | undefined, value: T): T[] | undefined {
  const present = list ?? []
  return orNone(present.includes(value) ? present.filter((entry) => entry !== value) : [...present, value])
}

/** How many of the filter's parts other than the trigger narrow the view. */
export const narrowedBy = (filter: TendencyFilter): number =>
  FILTER_KEYS.filter((key) => key !== 'trigger' && filter[key] !== undefined).length

import type { TableBars } from '@shared/possessions/table'
import { shortDay } from '@/composables/when'

/** One bar of the ruler, or a bin of several. */
export interface Bar {
  /** The first row of it. */
  id: string
  /** Rows in it. */
  rows: number
  /** Share of them in which they pressed, 0 to 1. */
  pressed: number
  /** Some row of it is in the filter. */
  shown: boolean
  /** Rows of the filter before it: where it stands in the table in the order played. */
  at: number
}

export interface RulerGame {
  id: string
  /** "14 Mar" */
  day: string
  label: string
  bars: Bar[]
}

/** Up to here every possession has a bar of its own. */
export const SINGLE_BARS = 600

/** The rows of an opponent as the ruler draws them: game after game, one bar each, or bins where there are too many. */
export function rulerOf(bars: TableBars, most = SINGLE_BARS): RulerGame[] {
  const bin = Math.max(1, Math.ceil(bars.ids.length / most))
  let from = 0
  let before = 0
  return bars.games.map((game) => {
    const made: Bar[] = []
    for (let start = from; start < from + game.rows; start += bin) {
      const end = Math.min(start + bin, from + game.rows)
      const shown = sum(bars.shown, start, end)
      made.push({
        id: bars.ids[start] ?? '',
        rows: end - start,
        pressed: sum(bars.pressed, start, end) / (end - start),
        shown: shown > 0,
        at: before,
      })
      before += shown
    }
    from += game.rows
    return { id: game.id, day: shortDay(game.playedOn).replace(/^\S+ /, ''), label: game.label, bars: made }
  })
}

const sum = (list: readonly number[], from: number, to: number): number =>
  list.slice(from, to).reduce((all, each) => all + each, 0)

/** The page that holds the row at a place of the filter, from 1. */
export const pageOf = (at: number, rows: number): number => Math.floor(at / rows) + 1

/** Numbers of marked rows that do not stand on this page, as words: "no. 21 is further down". */
export function elsewhereWords(
  marked: readonly { id: string; number: number }[],
  here: readonly string[],
): string {
  const away = marked.filter((each) => !here.includes(each.id))
  const on = marked.length - away.length
  if (away.length === 0) return ''
  const names = away.length > 3 ? `${away.length} others are` : away.map((each) => `no. ${each.number}`)
  const who = typeof names === 'string' ? names : `${listed(names)} ${names.length === 1 ? 'is' : 'are'}`
  const many = on === 1 ? '1 is' : `${on} are`
  return `${on === 0 ? 'None is' : many} on the screen, ${who} elsewhere.`
}

function listed(words: readonly string[]): string {
  const last = words.at(-1) ?? ''
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} and ${last}`
}

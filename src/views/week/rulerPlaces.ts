import type { WeekMark } from '@shared/week/schemas'
import { calendarDay, weekdayAndTime } from '@/composables/when'

/** A mark on the ruler: its place along the week, 0 to 7 in days, and its words. */
export interface Placed {
  mark: WeekMark
  days: number
  title: string
  under: string
}

/** How far into the week an instant is, 0 to 7 by the wall clock of the zone; null outside it. */
export function placeInWeek(instant: string, days: readonly string[], timeZone: string): number | null {
  const day = days.indexOf(calendarDay(instant, timeZone))
  if (day < 0) return null
  const [hour = 0, minute = 0] = (weekdayAndTime(instant, timeZone).split(' ')[1] ?? '')
    .split(':')
    .map(Number)
  return day + (hour + minute / 60) / 24
}

/** A label on a line of its own under the ruler, so that no two words lie over one another. */
export interface Label extends Placed {
  lane: number
  /** Px from the left. */
  left: number
  /** The words stand left of their mark. */
  before: boolean
}

/** Px: a letter at the labels' size, on average, and what stands between two labels. */
const LETTER = 7.4
const GAP = 14

/** Px that the words of a mark take. */
export const widthOf = ({ title, under }: Pick<Placed, 'title' | 'under'>): number =>
  Math.max(title.length, under.length) * LETTER + 8

/** Lays labels out from the left: each in the first lane where it is free, turned round at the right edge. */
export function layOut(placed: readonly Placed[], width: number): Label[] {
  const taken: { from: number; to: number }[][] = []
  return [...placed]
    .sort((a, b) => a.days - b.days)
    .map((each) => {
      const at = (each.days / 7) * width
      const wide = widthOf(each)
      const before = at + wide > width && at - wide >= 0
      const from = before ? at - wide : Math.min(at, Math.max(0, width - wide))
      const span = { from: from - GAP / 2, to: from + wide + GAP / 2 }
      const free = taken.findIndex((lane) =>
        lane.every(({ from: a, to: b }) => span.to <= a || span.from >= b),
      )
      const lane = free === -1 ? taken.length : free
      taken[lane] = [...(taken[lane] ?? []), span]
      return { ...each, lane, left: from, before }
    })
}

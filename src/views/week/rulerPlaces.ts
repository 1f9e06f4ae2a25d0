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
  /** Px. */
  left: number
  width: number
  /** The words stand left of their mark. */
  before: boolean
}

/** Px: a letter at the labels' size, on average and not too little, and what stands between two labels. */
const LETTER = 6.9
const GAP = 12

/** Px that the words of a mark take. */
export const widthOf = ({ title, under }: Pick<Placed, 'title' | 'under'>): number =>
  Math.ceil(Math.max(title.length, under.length) * LETTER) + 8

/**
 * Lays labels out from the left: each in the first lane where its words are free right of the mark, or left of it.
 * @param width px of the whole week
 */
export function layOut(placed: readonly Placed[], width: number): Label[] {
  const lanes: { from: number; to: number }[][] = []
  const isFree = (lane: number, from: number, to: number) =>
    (lanes[lane] ?? []).every((taken) => to + GAP <= taken.from || from - GAP >= taken.to)
  return [...placed]
    .sort((a, b) => a.days - b.days)
    .map((each): Label => {
      const at = (each.days / 7) * width
      const wide = Math.min(widthOf(each), width)
      const sides = [
        { left: at, before: false },
        { left: at - wide, before: true },
      ].filter(({ left }) => left >= 0 && left + wide <= width)
      // Too long for either side: as far as the edge lets it.
      if (sides.length === 0) sides.push({ left: Math.max(0, width - wide), before: false })
      for (let lane = 0; ; lane += 1) {
        const side = sides.find(({ left }) => isFree(lane, left, left + wide))
        if (side === undefined) continue
        lanes[lane] = [...(lanes[lane] ?? []), { from: side.left, to: side.left + wide }]
        return { ...each, ...side, lane, width: wide }
      }
    })
}

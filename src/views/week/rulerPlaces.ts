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

/** With more labels than this on one ruler each is put where it fits first, without looking for the fewest lanes. */
const MOST_TRIED = 10

type Side = Pick<Label, 'left' | 'before'>

/** Where a label's words may stand: right of their mark, or left of it; else as far as the edge lets them. */
function sidesOf(at: number, wide: number, width: number): [Side, ...Side[]] {
  const right = { left: at, before: false }
  const left = { left: at - wide, before: true }
  const fits = [right, left].filter((side) => side.left >= 0 && side.left + wide <= width)
  const [first, ...others] = fits
  return first === undefined ? [{ left: Math.max(0, width - wide), before: false }] : [first, ...others]
}

/** Puts each label into the first lane that is free where it stands; `first` says which sides are tried first. */
function inLanes(labels: readonly (Label & { sides: readonly Side[] })[], first: number): Label[] {
  const lanes: { from: number; to: number }[][] = []
  const isFree = (lane: number, from: number, to: number) =>
    (lanes[lane] ?? []).every((taken) => to + GAP <= taken.from || from - GAP >= taken.to)
  return labels.map(({ sides, ...label }, index) => {
    const turned = (first >> index) % 2 === 1 ? [...sides].reverse() : sides
    for (let lane = 0; ; lane += 1) {
      const side = turned.find(({ left }) => isFree(lane, left, left + label.width))
      if (side === undefined) continue
      lanes[lane] = [...(lanes[lane] ?? []), { from: side.left, to: side.left + label.width }]
      return { ...label, ...side, lane }
    }
  })
}

/**
 * Lays labels out under the ruler, right of their marks or left of them, in as few lanes as that needs; of two ways
 * with the same lanes the one with more words high up and right of their marks.
 * @param width px of the whole week
 */
export function layOut(placed: readonly Placed[], width: number): Label[] {
  const labels = [...placed]
    .sort((a, b) => a.days - b.days)
    .map((each) => {
      const wide = Math.min(widthOf(each), width)
      const sides = sidesOf((each.days / 7) * width, wide, width)
      return { ...each, ...sides[0], lane: 0, width: wide, sides }
    })
  const cost = (laid: readonly Label[]) =>
    Math.max(0, ...laid.map(({ lane }) => lane)) * 1000 +
    laid.reduce((all, { lane, before }) => all + lane * 4 + (before ? 1 : 0), 0)
  let best = inLanes(labels, 0)
  if (labels.length > MOST_TRIED) return best
  for (let first = 1; first < 2 ** labels.length; first += 1) {
    const laid = inLanes(labels, first)
    if (cost(laid) < cost(best)) best = laid
  }
  return best
}

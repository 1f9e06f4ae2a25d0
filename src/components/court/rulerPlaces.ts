import { textWidth } from '@shared/court/textWidth'
import { standingAt } from '@shared/court/walk/standing'
import type { Timeline } from '@shared/court/walk/timeline'

/** Where the count ruler lies over a court, px from its left edge: the throw-in's own count, then the court itself. */
export interface RulerAxis {
  throwIn: { from: number; to: number }
  /** The endline. */
  left: number
  pxPerMetre: number
  /** Where the drawing ends. */
  right: number
}

/** A moment on the ruler: on the throw-in's count until the first touch, then where the ball is. */
export function rulerPlace(timeline: Timeline, seconds: number, axis: RulerAxis): number {
  const { touch, pack } = timeline
  if (touch === null || seconds < touch.seconds) {
    const share = Math.min(1, Math.max(0, seconds) / pack.throwInSeconds)
    return axis.throwIn.from + share * (axis.throwIn.to - axis.throwIn.from)
  }
  const { x } = standingAt(timeline, seconds).ball.at
  return Math.min(axis.right, axis.left + Math.max(0, x) * axis.pxPerMetre)
}

const FRAME = 1 / 30
/** Moments whose place is as near as this to the nearest one are alike, px. */
const ALIKE = 3

/**
 * The moment that a place on the ruler stands for. The ball may come to one place more than once: the moment
 * nearest to `near` is meant, so that a drag never jumps where it need not.
 */
export function secondsAt(timeline: Timeline, px: number, axis: RulerAxis, near: number): number {
  const moments = Array.from({ length: Math.ceil(timeline.duration / FRAME) + 1 }, (_, i) => {
    const seconds = Math.min(timeline.duration, i * FRAME)
    return { seconds, off: Math.abs(rulerPlace(timeline, seconds, axis) - px) }
  })
  const least = Math.min(...moments.map(({ off }) => off))
  const [best] = moments
    .filter(({ off }) => off <= least + ALIKE)
    .sort((a, b) => Math.abs(a.seconds - near) - Math.abs(b.seconds - near))
  return best?.seconds ?? 0
}

export interface StationLabel {
  /** Px from the ruler's left edge. */
  left: number
  width: number
  titled: boolean
}

const TYPE = 14
const NUMBER = 20
const PAD = 16
const GAP = 2

/**
 * Labels of the steps over their places: with their titles where all fit, else only the one in hand has its title,
 * else none. They keep their order, never overlap and never leave the ruler.
 * @param least the least width of a label, px: what a finger needs
 */
export function stationLabels(
  stations: readonly { x: number; title: string }[],
  current: number,
  width: number,
  least: number,
): StationLabel[] {
  const share = (width + GAP) / Math.max(1, stations.length) - GAP
  const bare = Math.min(Math.max(least, NUMBER + PAD), share)
  const full = stations.map(({ title }) => Math.max(bare, NUMBER + PAD + textWidth(title, TYPE, 'label')))
  const room = (widths: readonly number[]) => widths.reduce((sum, one) => sum + one + GAP, -GAP) <= width
  const one = full.map((wide, i) => (i === current ? wide : bare))
  const widths = room(full) ? full : room(one) ? one : full.map(() => bare)
  const titled = (i: number) => (widths[i] ?? 0) >= (full[i] ?? 0) - 1e-9 && widths[i] !== bare
  const lefts: number[] = []
  let end = 0
  stations.forEach(({ x }, i) => {
    const left = Math.max(end, x - 10)
    lefts.push(left)
    end = left + (widths[i] ?? 0) + GAP
  })
  let limit = width
  for (let i = lefts.length - 1; i >= 0; i -= 1) {
    const left = Math.max(0, Math.min(lefts[i] ?? 0, limit - (widths[i] ?? 0)))
    lefts[i] = left
    limit = left - GAP
  }
  return lefts.map((left, i) => ({ left, width: widths[i] ?? 0, titled: titled(i) }))
}

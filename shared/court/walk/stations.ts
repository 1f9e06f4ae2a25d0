import { toPlace, type InMetres } from '../frame'
import type { BallTick } from '../rulerTicks'
import { standingAt } from './standing'
import type { Timeline } from './timeline'

/** Where a step begins on the court's edge: on the throw-in's own count, or where the ball is. */
export interface Station {
  step: number
  title: string
  /** On the timeline. */
  seconds: number
  /** Seconds from the first touch; below 0 on the throw-in's count. */
  t: number
  /** Share of the throw-in count that is gone, 0 to 1; null once the ball is in. */
  throwInShare: number | null
  /** The ball, metres. */
  ball: InMetres
}

/** The steps as stations of the count ruler, in order. */
export function stationsOf(timeline: Timeline): Station[] {
  const touch = timeline.touch?.seconds ?? Infinity
  return timeline.steps.map(({ index, title, start }) => ({
    step: index,
    title,
    seconds: start,
    t: touch === Infinity ? start : start - touch,
    throwInShare: start < touch ? Math.min(1, start / timeline.pack.throwInSeconds) : null,
    ball: standingAt(timeline, start).ball.at,
  }))
}

/** Ticks of the ruler as the counter is drawn: where the ball is 1, 2, 3 ... seconds after the first touch. */
export function drawnBySecond(timeline: Timeline): BallTick[] {
  const { touch, duration, pack } = timeline
  if (!touch) return []
  const seconds = Math.floor(duration - touch.seconds + 1e-9)
  return Array.from({ length: seconds }, (_, i) => ({
    second: i + 1,
    x: toPlace(pack, standingAt(timeline, touch.seconds + i + 1).ball.at).x,
  }))
}

import type { DefenderId } from '../diagram'
import type { InMetres } from '../frame'
import type { PassFlight } from './passFlight'
import type { WalkSettings } from './settings'

export type Verdict = 'open' | 'tight' | 'closed'

/** A pass as the defence meets it. */
export interface Lane {
  from: InMetres
  at: InMetres
  flight: Pick<PassFlight, 'seconds' | 'heightAt'>
}

export interface Defender {
  id: DefenderId
  at: InMetres
}

/** The one of theirs that a pass turns on. Metres. */
export interface Threat {
  id: DefenderId
  /** How far from the ball's way this one must be for the pass to be on. */
  needs: number
  /** How far away this one is drawn at the release. */
  has: number
  /** Whether the pass is lost where it is caught, or on its way. */
  where: 'lane' | 'catch'
}

export interface LaneWindow {
  verdict: Verdict
  threat: Threat | null
  /** Of all who count: who stands nearest to the ball's way, and who to the catch. */
  nearestLane: { id: DefenderId; metres: number } | null
  nearestCatch: { id: DefenderId; metres: number } | null
  /** Guards on the passer: not counted for the lane. */
  guards: readonly DefenderId[]
}

/** Metres between the places of a lane that are looked at. */
const SPACING = 0.2
/** From this share of the flight on, it is the catch that is contested. */
const CATCH_FROM = 0.8

/**
 * Whether a pass gets there. A defender who sees it after `reaction` seconds and closes at `closingSpeed` gets
 * a hand on the ball at a place on its way that lies nearer than
 * needs = reach + closingSpeed x max(0, seconds of flight to there - reaction).
 * A lob is out of hand where it is higher than `reachHeight`, but never at the catch. Open: nobody is nearer
 * than that anywhere. Closed: somebody stands within reach of the way, or is more than a stride too near.
 * Tight: within a stride. A slower flight is never more open, nor is a pass with one more of theirs.
 */
export function laneWindow(lane: Lane, defenders: readonly Defender[], settings: WalkSettings): LaneWindow {
  const guards = defenders.filter(({ at }) => {
    const fromPasser = apart(at, lane.from)
    return fromPasser <= settings.guardWithin && fromPasser < apart(at, lane.at)
  })
  const counted = defenders.filter((one) => !guards.includes(one))
  const places = placesOf(lane, settings)
  let worst: (Threat & { short: number }) | null = null
  let inLane: (Threat & { short: number }) | null = null
  for (const { id, at } of counted)
    for (const { point, seconds, share } of places) {
      const needs = settings.reach + settings.closingSpeed * Math.max(0, seconds - settings.reaction)
      const has = apart(at, point)
      const one = {
        id,
        needs,
        has,
        where: share >= CATCH_FROM ? 'catch' : 'lane',
        short: needs - has,
      } as const
      if (!worst || one.short > worst.short) worst = one
      if (has <= settings.reach && (!inLane || has < inLane.has)) inLane = one
    }
  const deciding = inLane ?? worst
  const verdict: Verdict =
    !deciding || (deciding.short <= 0 && !inLane)
      ? 'open'
      : inLane || deciding.short > settings.stride
        ? 'closed'
        : 'tight'
  const whole = placesOf({ ...lane, flight: { ...lane.flight, heightAt: null } }, settings)
  return {
    verdict,
    threat: deciding && { id: deciding.id, needs: deciding.needs, has: deciding.has, where: deciding.where },
    nearestLane: nearest(counted, ({ at }) => Math.min(...whole.map(({ point }) => apart(at, point)))),
    nearestCatch: nearest(counted, ({ at }) => apart(at, lane.at)),
    guards: guards.map(({ id }) => id),
  }
}

const apart = (a: { x: number; y: number }, b: { x: number; y: number }): number =>
  Math.hypot(a.x - b.x, a.y - b.y)

/** Where a hand may meet the ball: places on its way with the seconds since the release. */
function placesOf(
  { from, at, flight }: Lane,
  { reachHeight }: WalkSettings,
): { point: { x: number; y: number }; seconds: number; share: number }[] {
  const pieces = Math.max(1, Math.ceil(apart(from, at) / SPACING))
  return Array.from({ length: pieces + 1 }, (_, i) => i / pieces)
    .filter((share) => share === 1 || !flight.heightAt || flight.heightAt(share) <= reachHeight)
    .map((share) => ({
      point: { x: from.x + (at.x - from.x) * share, y: from.y + (at.y - from.y) * share },
      seconds: flight.seconds * share,
      share,
    }))
}

function nearest(
  defenders: readonly Defender[],
  far: (one: Defender) => number,
): { id: DefenderId; metres: number } | null {
  let best: { id: DefenderId; metres: number } | null = null
  for (const one of defenders) {
    const metres = far(one)
    if (!best || metres < best.metres) best = { id: one.id, metres }
  }
  return best
}

import type { Role } from '../../vocabulary'
import type { DefenderId } from '../diagram'
import { inMetres, type InMetres } from '../frame'
import { sprintDistance } from './sprint'
import type { Timeline, Track } from './timeline'
import { alongWay } from './way'

/** Where the ball is: with somebody, or in the air between two. */
export interface BallStanding {
  at: InMetres
  /** Who has it; null in flight. */
  holder: Role | null
  /** In flight: from whom to whom, and the share of the way that is done. */
  flight: { by: Role; to: Role; share: number } | null
  /** Metres above the floor, where a lob is in the air. */
  height: number | null
}

/** Where the ten and the ball are at one moment, metres. */
export interface WalkStanding {
  seconds: number
  ours: ReadonlyMap<Role, InMetres>
  theirs: ReadonlyMap<DefenderId, InMetres>
  ball: BallStanding
}

/** Everybody's place at a moment; before the start and past the end they stand. Cheap enough for every frame. */
export function standingAt(timeline: Timeline, seconds: number): WalkStanding {
  const now = Math.min(Math.max(0, seconds || 0), timeline.duration)
  const ours = new Map<Role, InMetres>()
  for (const [role, track] of timeline.ours) ours.set(role, onTrack(track, now))
  const theirs = new Map<DefenderId, InMetres>()
  for (const [id, track] of timeline.theirs) theirs.set(id, onTrack(track, now))
  return { seconds: now, ours, theirs, ball: ballIn(timeline, now, ours) }
}

/** Where one player is at a moment, metres. */
export function onTrack({ start, legs }: Track, seconds: number): InMetres {
  let at = start
  for (const leg of legs) {
    if (leg.start > seconds) break
    at =
      seconds >= leg.end
        ? (leg.way.points.at(-1) ?? at)
        : alongWay(leg.way, sprintDistance(leg.sprint, seconds - leg.start))
  }
  return at
}

function ballIn(timeline: Timeline, seconds: number, ours: ReadonlyMap<Role, InMetres>): BallStanding {
  let holder = timeline.firstHolder
  for (const { by, to, start, end, from, at, heightAt } of timeline.flights) {
    if (start > seconds) break
    if (seconds < end) {
      const share = (seconds - start) / (end - start)
      return {
        at: inMetres(from.x + (at.x - from.x) * share, from.y + (at.y - from.y) * share),
        holder: null,
        flight: { by, to, share },
        height: heightAt ? heightAt(share) : null,
      }
    }
    holder = to
  }
  return {
    at: ours.get(holder) ?? inMetres(0, timeline.pack.court.width / 2),
    holder,
    flight: null,
    height: null,
  }
}

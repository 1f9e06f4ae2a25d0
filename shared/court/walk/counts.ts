import type { DiagramFault } from '../diagramFaults'
import { toPlace, type InMetres } from '../frame'
import type { RulePack } from '../rulePacks'
import type { WalkSettings } from './settings'
import { sprintSeconds } from './sprint'
import { standingAt } from './standing'
import type { BallFlight, TimedMove, Timeline } from './timeline'
import type { Carry } from './tripClock'
import { alongWay, metresToX } from './way'

/** Where in a diagram something happens: seconds on the timeline, step, move, and the place in metres. */
export interface Moment {
  seconds: number
  step: number
  move: number
  at: InMetres
}

/** The moments that the two counts turn on; null where the drawing never gets there. */
export interface CountTimes {
  /** The thrower lets go: the throw-in count stops. */
  release: Moment | null
  /** The first touch in court: the ball is in. */
  touch: Moment | null
  /** The backcourt count starts: at the touch or at control, as the book says. Null when first touched past half. */
  countStart: number | null
  /** The ball is over half: caught past it, or dribbled over the line. */
  overHalf: Moment | null
}

/** Finds the moments of both counts. The throw-in is the pass marked as one, else the first pass. */
export function countTimes(
  moves: readonly TimedMove[],
  flights: readonly BallFlight[],
  carries: readonly Carry[],
  pack: RulePack,
  settings: WalkSettings,
): CountTimes {
  const isThrowIn = ({ step, index }: BallFlight) =>
    moves.some(
      (one) => one.step === step && one.index === index && one.move.kind === 'pass' && one.move.throwIn,
    )
  const throwIn = flights.find(isThrowIn) ?? flights[0]
  if (!throwIn) return { release: null, touch: null, countStart: null, overHalf: null }
  const { step, index: move } = throwIn
  const release: Moment = { seconds: throwIn.start, step, move, at: throwIn.from }
  const touch: Moment = { seconds: throwIn.end, step, move, at: throwIn.at }
  const half = pack.court.length / 2
  const overHalf = [
    ...flights
      .filter(({ end, at }) => end >= touch.seconds && at.x > half)
      .map((one): Moment => ({ seconds: one.end, step: one.step, move: one.index, at: one.at })),
    ...carries
      .filter(({ leg }) => leg.start >= touch.seconds)
      .flatMap((carry) => crossing(carry, half) ?? []),
  ].sort((a, b) => a.seconds - b.seconds)[0]
  const inBackcourt = touch.at.x <= half
  const wait = pack.countStarts === 'control' ? settings.controlAfterTouch : 0
  return {
    release,
    touch,
    countStart: inBackcourt ? touch.seconds + wait : null,
    overHalf: overHalf ?? null,
  }
}

function crossing({ step, index, leg }: Carry, half: number): Moment | null {
  const metres = metresToX(leg.way, half)
  if (metres === null) return null
  const seconds = leg.start + sprintSeconds(leg.sprint, metres)
  return { seconds, step, move: index, at: alongWay(leg.way, metres) }
}

/** One count: how long it may last, how long it did (null: it never began), and what was left (below 0: over). */
export interface Count {
  limit: number
  taken: number | null
  left: number
  /** Whether the drawing brings the count to its end: the ball let go, or over half. */
  done: boolean
}

export interface Counts {
  throwIn: Count
  backcourt: Count
}

/** Both counts over the whole timeline, or up to some seconds of it. */
export function countsAt(timeline: Timeline, seconds = Infinity): Counts {
  const { pack, release, countStart, overHalf, duration } = timeline
  const now = Math.min(Math.max(0, seconds), duration)
  const count = (limit: number, from: number | null, to: number | undefined): Count => {
    if (from === null || now < from) return { limit, taken: null, left: limit, done: false }
    const done = to !== undefined && to <= now
    const taken = Math.max(0, (done ? to : now) - from)
    return { limit, taken, left: limit - taken, done }
  }
  return {
    throwIn: count(pack.throwInSeconds, 0, release?.seconds),
    backcourt: count(pack.backcourtSeconds, countStart, overHalf?.seconds),
  }
}

/** Which clock runs at a moment, and what it shows. */
export interface ClockReading {
  runs: 'throw-in' | 'backcourt' | 'none'
  /** Seconds gone on it. */
  gone: number
  /** Seconds left on it; below 0 the count is over. Null where none runs. */
  left: number | null
  /** Seconds from the first touch, below 0 before it: the t of a possession (RECORD.md section 2). */
  t: number
}

/** The count in force at a moment of the timeline. */
export function clockAt(timeline: Timeline, seconds: number): ClockReading {
  const { pack, release, touch, countStart, overHalf } = timeline
  const t = touch === null ? seconds : seconds - touch.seconds
  if (release === null || seconds < release.seconds)
    return { runs: 'throw-in', gone: seconds, left: pack.throwInSeconds - seconds, t }
  const counting = countStart !== null && seconds >= countStart
  if (!counting || (overHalf !== null && seconds >= overHalf.seconds))
    return { runs: 'none', gone: 0, left: null, t }
  return {
    runs: 'backcourt',
    gone: seconds - countStart,
    left: pack.backcourtSeconds - seconds + countStart,
    t,
  }
}

const tenths = (seconds: number): string => (Math.round(seconds * 10) / 10).toFixed(1)

/** More than the limit by less than this is a matter of rounding, not of the play; seconds. */
const GRACE = 0.05

/** Counts that run out as drawn: where the ball is then, and in which step and move. In order of time. */
export function countFaults(timeline: Timeline): DiagramFault[] {
  const { pack, countStart, release } = timeline
  const counts = countsAt(timeline)
  const faults: DiagramFault[] = []
  if (counts.throwIn.left < -GRACE) {
    const { limit, taken } = counts.throwIn
    faults.push({
      step: release?.step ?? 0,
      move: release?.move ?? null,
      message: counts.throwIn.done
        ? `Thrown in after ${tenths(taken ?? 0)} s; the count is ${limit}. Throw sooner, or leave out what comes before.`
        : `The ball is not in after ${tenths(taken ?? 0)} s; the count is ${limit}.`,
      ...(release ? { place: toPlace(pack, release.at) } : {}),
    })
  }
  if (countStart !== null && counts.backcourt.left < -GRACE) {
    const { limit, taken, done } = counts.backcourt
    const ranOut = countStart + limit
    const { step, move } = moveAt(timeline, ranOut)
    faults.push({
      step,
      move,
      message: done
        ? `Over half after ${tenths(taken ?? 0)} s; the count is ${limit}. Bring the ball on sooner.`
        : `Still short of half after ${tenths(taken ?? 0)} s; the count is ${limit}.`,
      place: toPlace(pack, standingAt(timeline, ranOut).ball.at),
    })
  }
  return faults
}

/** The move of the ball that a moment falls in, or the last one before it. */
function moveAt(timeline: Timeline, seconds: number): { step: number; move: number | null } {
  const last = timeline.moves
    .filter(({ move, start }) => start <= seconds && (move.kind === 'pass' || move.kind === 'dribble'))
    .at(-1)
  return last ? { step: last.step, move: last.index } : { step: 0, move: null }
}

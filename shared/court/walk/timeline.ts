import type { Role } from '../../vocabulary'
import type { DefenderId, Diagram, Move } from '../diagram'
import { startOfDiagram, walkDiagram } from '../diagramWalk'
import type { InMetres } from '../frame'
import type { RulePack } from '../rulePacks'
import { countTimes, type CountTimes } from './counts'
import { DEFAULT_WALK, type Sprint, type WalkSettings } from './settings'
import { TripClock } from './tripClock'
import type { Way } from './way'

/** A move with its time. Seconds count from the moment the thrower has the ball. */
export interface TimedMove {
  step: number
  /** Index in the step's list. */
  index: number
  move: Move
  from: InMetres
  to: InMetres
  start: number
  /** For a pass the catch, for a screen the moment it stands. */
  end: number
  /** Metres walked or flown. */
  length: number
}

/** A walk of one player: along `way` by a sprint from rest. */
export interface Leg {
  start: number
  end: number
  way: Way
  sprint: Sprint
}

/** The ball in the air. */
export interface BallFlight {
  step: number
  index: number
  by: Role
  to: Role
  start: number
  end: number
  from: InMetres
  at: InMetres
  /** Metres above the floor at a share of the flight; null where height plays no part. */
  heightAt: ((share: number) => number) | null
  /** The highest that it gets, metres; null where height plays no part. */
  top: number | null
}

/** One player's whole trip, in order of time. */
export interface Track {
  start: InMetres
  legs: readonly Leg[]
}

export interface TimedStep {
  index: number
  title: string
  /** When its first beat begins. */
  start: number
  /** When its last move ends: a long run may last into the next step. */
  end: number
}

/** A diagram walked against the clock. */
export interface Timeline extends CountTimes {
  pack: RulePack
  settings: WalkSettings
  steps: readonly TimedStep[]
  /** In order of their start. */
  moves: readonly TimedMove[]
  /** When everything has ended. */
  duration: number
  /** What standingAt() reads. */
  ours: ReadonlyMap<Role, Track>
  theirs: ReadonlyMap<DefenderId, Track>
  firstHolder: Role
  flights: readonly BallFlight[]
}

/**
 * Times every move of a diagram. The ball leads: a beat begins once the ball is where the beat needs it, and
 * nobody waits for a run that the beat does not need, so that a long sprint goes on through the next steps.
 * - Cuts, dribbles and screens take the time of a sprint from rest over their drawn way; a dribble at a share
 *   of the top speed.
 * - A pass is let go so that it comes when its receiver does; it never waits for anybody else.
 * - Whoever is screened for goes on once the screen has stood for its wait.
 * - Theirs begin with the beat they are drawn in.
 * Faults of the drawing are walked as drawn; diagramFaults() names them.
 */
export function timeline(diagram: Diagram, pack: RulePack, settings: WalkSettings = DEFAULT_WALK): Timeline {
  const clock = new TripClock(startOfDiagram(diagram), pack, settings)
  const steps = walkDiagram(diagram).map(({ moves }, index): TimedStep => {
    return { index, title: diagram.steps[index]?.title ?? '', ...clock.step(index, moves) }
  })
  const moves = [...clock.moves].sort((a, b) => a.start - b.start)
  return {
    pack,
    settings,
    steps,
    moves,
    duration: Math.max(0, ...moves.map(({ end }) => end)),
    ours: clock.ours,
    theirs: clock.theirs,
    firstHolder: diagram.start.ball,
    flights: clock.flights,
    ...countTimes(moves, clock.flights, clock.carries, pack, settings),
  }
}

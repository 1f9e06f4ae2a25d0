import type { DefenderId, Diagram, Move, Place } from './diagram'
import type { Role } from '../vocabulary'

/** Where everybody stands and who has the ball at one moment; a player that is not drawn is missing. */
export interface Standing {
  ours: ReadonlyMap<Role, Place>
  theirs: ReadonlyMap<DefenderId, Place>
  /** Who has the ball. */
  ball: Role
}

/** A move as it is walked: from where it starts to where it ends; for a pass the ball's way. */
export interface WalkedMove {
  move: Move
  /** Index in the step's list. */
  index: number
  from: Place
  to: Place
}

export interface WalkedStep {
  before: Standing
  after: Standing
  /** In the order they happen. */
  moves: readonly WalkedMove[]
}

/** Where ten stand before the first step. Of two players with one number the last one stands. */
export function startOfDiagram(diagram: Diagram): Standing {
  return {
    ours: new Map(diagram.start.ours.map(({ role, at }) => [role, at])),
    theirs: new Map(diagram.start.theirs.map(({ id, at }) => [id, at])),
    ball: diagram.start.ball,
  }
}

/**
 * Walks one step from where everybody stands. Moves of one beat happen together: a pass goes to where its
 * receiver is at the end of the beat. Moves of players who are not drawn are left out; faults of the
 * drawing (a pass without the ball) are walked as drawn, and named by diagramFaults.
 */
export function walkStep(before: Standing, moves: readonly Move[]): WalkedStep {
  const ours = new Map(before.ours)
  const theirs = new Map(before.theirs)
  let ball = before.ball
  const walked: WalkedMove[] = []
  for (const beat of beatsOf(moves)) {
    const began = new Map(ours)
    for (const { move, index } of beat) {
      if (move.kind === 'pass') continue
      const from = move.kind === 'theirs' ? theirs.get(move.who) : ours.get(move.who)
      if (!from) continue
      if (move.kind === 'theirs') theirs.set(move.who, move.to)
      else ours.set(move.who, move.to)
      walked.push({ move, index, from, to: move.to })
    }
    for (const { move, index } of beat) {
      if (move.kind !== 'pass') continue
      // A dribbler passes where the dribble ends; anybody else passes from where the beat found them.
      const dribbles = beat.some((other) => other.move.kind === 'dribble' && other.move.who === move.from)
      const from = (dribbles ? ours : began).get(move.from)
      const to = ours.get(move.to)
      if (!from || !to) continue
      ball = move.to
      walked.push({ move, index, from, to })
    }
  }
  return { before, after: { ours, theirs, ball }, moves: walked }
}

/** The moves of a step, beat by beat, each beat in the order it was written. */
export function beatsOf(moves: readonly Move[]): { move: Move; index: number }[][] {
  const beats = new Map<number, { move: Move; index: number }[]>()
  moves.forEach((move, index) => {
    beats.set(move.beat, [...(beats.get(move.beat) ?? []), { move, index }])
  })
  return [...beats.entries()].sort(([a], [b]) => a - b).map(([, list]) => list)
}

/** Every step of a diagram, walked in order. */
export function walkDiagram(diagram: Diagram): WalkedStep[] {
  const steps: WalkedStep[] = []
  let standing = startOfDiagram(diagram)
  for (const step of diagram.steps) {
    const walked = walkStep(standing, step.moves)
    steps.push(walked)
    standing = walked.after
  }
  return steps
}

/**
 * Where everybody stands at the start of a step and after it. A step before the first reads as the first,
 * one past the last as the last.
 */
export function stateAt(diagram: Diagram, stepIndex: number): WalkedStep {
  const steps = walkDiagram(diagram)
  const index = Math.min(Math.max(0, Math.trunc(stepIndex) || 0), steps.length - 1)
  const step = steps[index]
  if (step) return step
  const start = startOfDiagram(diagram)
  return { before: start, after: start, moves: [] }
}

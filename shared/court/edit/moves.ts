import type { DefenderId, Diagram, Move, Place, Step } from '../diagram'
import type { Role } from '../../vocabulary'
import { beatsOf } from '../diagramWalk'
import { moveWords } from '../diagramWords'
import { NEW_STEP } from './blank'
import { heldBend, heldPlace, LAST_BEAT, MOVES, TITLE } from './bounds'

/** A move in the order it is read, and whether it follows the one before it or happens with it. */
export interface Joined {
  move: Move
  /** Index in the step's stored list; -1 for a new one. */
  index: number
  then: boolean
}

/** The moves of a step in reading order. */
export function joinedOf(moves: readonly Move[]): Joined[] {
  return beatsOf(moves).flatMap((beat, at) =>
    beat.map(({ move, index }, i) => ({ move, index, then: at > 0 && i === 0 })),
  )
}

/** The stored list of moves in reading order; past the last beat what should follow happens together. */
export function storedMoves(list: readonly Joined[]): Move[] {
  let beat = 0
  return list.map(({ move, then }, i) => {
    if (then && i > 0) beat = Math.min(LAST_BEAT, beat + 1)
    return { ...move, beat }
  })
}

/** Everybody who has a part in a move. */
export function partsIn(move: Move): (Role | DefenderId)[] {
  if (move.kind === 'pass') return [move.from, move.to]
  return move.kind === 'screen' ? [move.who, move.for] : [move.who]
}

/** A move as a diagram may hold it: places and bend in bounds. */
export function heldMove(move: Move): Move {
  if (move.kind === 'pass') return move
  const to = heldPlace(move.to)
  return move.kind === 'screen' ? { ...move, to } : { ...move, to, bend: heldBend(move.bend) }
}

/** Whether a new move has to wait for those before it: somebody in it is still busy with the last of them. */
export function mustFollow(moves: readonly Move[], move: Move): boolean {
  const last = beatsOf(moves).at(-1) ?? []
  return last.some((other) => partsIn(other.move).some((who) => partsIn(move).includes(who)))
}

/** The same diagram with one step changed; the diagram itself where nothing is. */
export function withStep(diagram: Diagram, index: number, change: (step: Step) => Step | null): Diagram {
  const step = diagram.steps[index]
  const next = step && change(step)
  if (!step || !next || next === step) return diagram
  return { ...diagram, steps: diagram.steps.map((one, i) => (i === index ? next : one)) }
}

const withMoves = (
  diagram: Diagram,
  step: number,
  change: (list: Joined[], step: Step) => readonly Joined[] | null,
): Diagram =>
  withStep(diagram, step, (one) => {
    const list = change(joinedOf(one.moves), one)
    return list && { ...one, moves: storedMoves(list) }
  })

/** Without `then`, a move follows where it has to, and happens with the last ones where it can. */
export function addMove(diagram: Diagram, step: number, move: Move, then?: boolean): Diagram {
  const moves = diagram.steps[step]?.moves ?? []
  if (moves.length >= MOVES) return diagram
  const follows = moves.length > 0 && (then ?? mustFollow(moves, move))
  const added = withMoves(diagram, step, (list) => [
    ...list,
    { move: heldMove(move), index: -1, then: follows },
  ])
  // The first sentence is the step's first title.
  return withStep(added, step, (one) =>
    one.title === NEW_STEP && moves.length === 0
      ? { ...one, title: moveWords(move).slice(0, TITLE).trim() }
      : one,
  )
}

export function changeMove(diagram: Diagram, step: number, index: number, move: Move): Diagram {
  return withStep(diagram, step, (one) => {
    const before = one.moves[index]
    if (!before) return null
    const next = { ...heldMove(move), beat: before.beat }
    // A title that only repeats the sentence goes with it.
    const title = one.title === moveWords(before) ? moveWords(next).slice(0, TITLE).trim() : one.title
    return { ...one, title, moves: one.moves.map((old, i) => (i === index ? next : old)) }
  })
}

/** Where a walk or a screen ends; a pass ends where its receiver is. */
export function aimMove(diagram: Diagram, step: number, index: number, to: Place): Diagram {
  const move = diagram.steps[step]?.moves[index]
  return move && move.kind !== 'pass' ? changeMove(diagram, step, index, { ...move, to }) : diagram
}

export function bendMove(diagram: Diagram, step: number, index: number, bend: number): Diagram {
  const move = diagram.steps[step]?.moves[index]
  return move && 'bend' in move ? changeMove(diagram, step, index, { ...move, bend }) : diagram
}

/** Who follows the one that is gone takes its place in the order. */
export function removeMove(diagram: Diagram, step: number, index: number): Diagram {
  return withMoves(diagram, step, (list) => {
    const at = list.findIndex((one) => one.index === index)
    if (at < 0) return null
    const then = list[at]?.then ?? false
    return list
      .filter((_, i) => i !== at)
      .map((one, i) => (i === at ? { ...one, then: one.then || then } : one))
  })
}

/** One place up (-1) or down (1); what is "then" stays where it is, the sentences change places. */
export function orderMove(diagram: Diagram, step: number, index: number, by: -1 | 1): Diagram {
  return withMoves(diagram, step, (list) => {
    const at = list.findIndex((one) => one.index === index)
    const [one, other] = [list[at], list[at + by]]
    if (!one || !other) return null
    return list.map((old, i) =>
      i === at ? { ...other, then: old.then } : i === at + by ? { ...one, then: old.then } : old,
    )
  })
}

/** Whether a move follows the one before it, or happens with it. */
export function joinMove(diagram: Diagram, step: number, index: number, then: boolean): Diagram {
  return withMoves(diagram, step, (list) => {
    const at = list.findIndex((one) => one.index === index)
    if (at < 1 || list[at]?.then === then) return null
    return list.map((one, i) => (i === at ? { ...one, then } : one))
  })
}

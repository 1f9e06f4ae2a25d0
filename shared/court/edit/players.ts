import type { DefenderId, Diagram, Move, Place } from '../diagram'
import type { Role } from '../../vocabulary'
import { mirrorPlace } from '../frame'
import { heldBend, heldPlace } from './bounds'

/** Where somebody of either side stands before the first step. */
export function placePlayer(diagram: Diagram, who: Role | DefenderId, at: Place): Diagram {
  const { start } = diagram
  const held = heldPlace(at)
  return {
    ...diagram,
    start: {
      ...start,
      ours: start.ours.map((one) => (one.role === who ? { ...one, at: held } : one)),
      theirs: start.theirs.map((one) => (one.id === who ? { ...one, at: held } : one)),
    },
  }
}

/** Who throws in: that player and the one who did change numbers throughout, so that the play stays the same. */
export function changeThrower(diagram: Diagram, role: Role): Diagram {
  const old = diagram.start.ball
  if (role === old || !diagram.start.ours.some((one) => one.role === role)) return diagram
  const swap = (one: Role): Role => (one === role ? old : one === old ? role : one)
  return {
    ...diagram,
    start: {
      ...diagram.start,
      ball: role,
      ours: diagram.start.ours.map((one) => ({ ...one, role: swap(one.role) })),
    },
    steps: diagram.steps.map((step) => ({ ...step, moves: step.moves.map((move) => renamed(move, swap)) })),
  }
}

function renamed(move: Move, swap: (role: Role) => Role): Move {
  if (move.kind === 'theirs') return move
  if (move.kind === 'pass') return { ...move, from: swap(move.from), to: swap(move.to) }
  if (move.kind === 'screen') return { ...move, who: swap(move.who), for: swap(move.for) }
  return { ...move, who: swap(move.who) }
}

export function addDefender(diagram: Diagram, id: DefenderId, at: Place): Diagram {
  const { theirs } = diagram.start
  if (theirs.length >= 5 || theirs.some((one) => one.id === id)) return diagram
  return { ...diagram, start: { ...diagram.start, theirs: [...theirs, { id, at: heldPlace(at) }] } }
}

/** With everything that defender does. */
export function removeDefender(diagram: Diagram, id: DefenderId): Diagram {
  const theirs = diagram.start.theirs.filter((one) => one.id !== id)
  if (theirs.length === diagram.start.theirs.length) return diagram
  const steps = diagram.steps.map((step) => ({
    ...step,
    moves: step.moves.filter((move) => move.kind !== 'theirs' || move.who !== id),
  }))
  return { ...diagram, start: { ...diagram.start, theirs }, steps }
}

/** The whole play from the other side: left and right change, a bend turns over. */
export function mirrorDiagram(diagram: Diagram): Diagram {
  const over = (place: Place): Place => heldPlace(mirrorPlace(place))
  const { start } = diagram
  return {
    ...diagram,
    start: {
      ...start,
      ours: start.ours.map((one) => ({ ...one, at: over(one.at) })),
      theirs: start.theirs.map((one) => ({ ...one, at: over(one.at) })),
    },
    steps: diagram.steps.map((step) => ({
      ...step,
      ...(step.words ? { words: step.words.map((word) => ({ ...word, at: over(word.at) })) } : {}),
      moves: step.moves.map((move): Move => {
        if (move.kind === 'pass') return move
        if (move.kind === 'screen') return { ...move, to: over(move.to) }
        return { ...move, to: over(move.to), bend: heldBend(-move.bend) }
      }),
    })),
  }
}

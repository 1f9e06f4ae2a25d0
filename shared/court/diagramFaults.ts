import type { Diagram, Move, Place } from './diagram'
import { walkDiagram, type Standing, type WalkedMove } from './diagramWalk'
import { toMetres, type InFractions } from './frame'
import type { RulePack } from './rulePacks'

/** Something in a drawing that cannot be run on a floor. */
export interface DiagramFault {
  /** Index of the step; the start counts as step 0. */
  step: number
  /** Index of the move in its step; null when the fault is where they stand. */
  move: number | null
  message: string
  place?: Place
}

/** Metres: closer than this two players stand on each other. */
const TOO_CLOSE = 0.5

/**
 * What is wrong with a diagram, in the order it is met: who stands, the throw-in, who has the ball,
 * screens that free nobody, the ball taken back over half. Timing is not looked at.
 */
export function diagramFaults(diagram: Diagram, pack: RulePack): DiagramFault[] {
  return [
    ...startFaults(diagram, pack),
    ...throwInFaults(diagram),
    ...moveFaults(diagram),
    ...screenFaults(diagram),
  ].sort((a, b) => a.step - b.step || (a.move ?? -1) - (b.move ?? -1))
}

const outOfBounds = ({ x, y }: InFractions): boolean => x < 0 || x > 1 || y < 0 || y > 1

function startFaults({ start }: Diagram, pack: RulePack): DiagramFault[] {
  const faults: DiagramFault[] = []
  const fault = (message: string, place?: Place) => faults.push({ step: 0, move: null, message, place })
  const roles = start.ours.map(({ role }) => role)
  const ids = start.theirs.map(({ id }) => id)
  for (const role of repeated(roles))
    fault(`Two of ours have the number ${role}.`, start.ours.find((one) => one.role === role)?.at)
  for (const id of repeated(ids))
    fault(`Two of theirs are called ${id}.`, start.theirs.find((one) => one.id === id)?.at)
  if (start.theirs.length < 5)
    fault(`Only ${start.theirs.length} of theirs stand on the court. Draw all five.`)
  if (!roles.includes(start.ball)) fault(`The ball starts with ${start.ball}, who is not in the drawing.`)
  start.ours.forEach((one, i) => {
    const other = start.ours.slice(i + 1).find(({ at }) => {
      const [a, b] = [toMetres(pack, one.at), toMetres(pack, at)]
      return Math.hypot(a.x - b.x, a.y - b.y) < TOO_CLOSE
    })
    if (other) fault(`${one.role} and ${other.role} stand on the same spot.`, one.at)
  })
  return faults
}

/** The trip starts with a throw-in from out of bounds, and has one only. */
function throwInFaults(diagram: Diagram): DiagramFault[] {
  const faults: DiagramFault[] = []
  let live = false
  walkDiagram(diagram).forEach((walked, step) => {
    for (const { move, index, from } of walked.moves) {
      if (move.kind !== 'pass' && move.kind !== 'dribble') continue
      const fault = (message: string) => faults.push({ step, move: index, message, place: from })
      const throwsIn = move.kind === 'pass' && move.throwIn
      if (!live && !throwsIn)
        fault(
          move.kind === 'pass'
            ? 'The first pass of the trip is the throw-in. Mark it as one.'
            : `${move.who} dribbles before the throw-in.`,
        )
      if (throwsIn && live) fault('The ball is already in play. Only the first pass is a throw-in.')
      else if (throwsIn && !outOfBounds(from))
        fault(`${move.from} throws in from inside the court. Put ${move.from} behind the line.`)
      live = true
    }
  })
  if (!live) faults.push({ step: 0, move: null, message: 'Nobody throws the ball in.' })
  return faults
}

/** Every move by somebody who is there, and every ball move by whoever has the ball. */
function moveFaults(diagram: Diagram): DiagramFault[] {
  const faults: DiagramFault[] = []
  let ball = diagram.start.ball
  let overHalf = false
  walkDiagram(diagram).forEach((walked, step) => {
    const moves = diagram.steps[step]?.moves ?? []
    moves.forEach((move, index) => {
      const message = unknownPlayer(move, walked.before)
      if (message) faults.push({ step, move: index, message })
    })
    for (const one of walked.moves) {
      const message = ballFault(one, ball)
      if (message) faults.push({ step, move: one.index, message, place: one.from })
      if (one.move.kind === 'pass') ball = one.move.to
      if (one.move.kind !== 'pass' && one.move.kind !== 'dribble') continue
      if (overHalf && one.to.x < 0.5)
        faults.push({ step, move: one.index, message: 'The ball goes back over half court.', place: one.to })
      overHalf = one.to.x > 0.5
    }
  })
  return faults
}

function unknownPlayer(move: Move, standing: Standing): string | null {
  if (move.kind === 'theirs')
    return standing.theirs.has(move.who) ? null : `${move.who} moves but does not stand in the drawing.`
  const named =
    move.kind === 'pass' ? [move.from, move.to] : move.kind === 'screen' ? [move.who, move.for] : [move.who]
  const missing = named.find((role) => !standing.ours.has(role))
  return missing === undefined ? null : `${missing} is in this move but does not stand in the drawing.`
}

function ballFault({ move, to }: WalkedMove, ball: string): string | null {
  if (move.kind === 'pass') {
    if (move.from === move.to) return `${move.from} passes to ${move.to}. Choose somebody else.`
    return move.from === ball ? null : `${move.from} passes, but ${ball} has the ball.`
  }
  if (move.kind === 'dribble') {
    if (move.who !== ball) return `${move.who} dribbles, but ${ball} has the ball.`
    return outOfBounds(to) ? `${move.who} dribbles out of bounds.` : null
  }
  // A thrower may run the line with the ball; nobody may carry it in the court.
  if (move.kind !== 'theirs' && move.who === ball && !outOfBounds(to))
    return `${move.who} has the ball and moves. Make it a dribble, or pass first.`
  return null
}

/** A screen is for somebody who then moves, in this step or the next. */
function screenFaults(diagram: Diagram): DiagramFault[] {
  const faults: DiagramFault[] = []
  diagram.steps.forEach(({ moves }, step) => {
    moves.forEach((move, index) => {
      if (move.kind !== 'screen') return
      const fault = (message: string) => faults.push({ step, move: index, message, place: move.to })
      if (move.for === move.who)
        return fault(`${move.who} cannot screen for ${move.for}. Choose somebody else.`)
      const later = [
        ...moves.filter((other) => other.beat >= move.beat),
        ...(diagram.steps[step + 1]?.moves ?? []),
      ]
      const uses = later.some((other) => other !== move && other.kind !== 'pass' && other.who === move.for)
      if (!uses) fault(`${move.who} screens for ${move.for}, but ${move.for} does not move after it.`)
    })
  })
  return faults
}

function repeated<T>(list: readonly T[]): T[] {
  return [...new Set(list.filter((one, i) => list.indexOf(one) !== i))]
}

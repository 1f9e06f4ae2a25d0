import { beatsOf, walkDiagram } from './diagramWalk'
import type { Diagram, Move } from './diagram'
import { placeWords } from './placeWords'

/** One move as a plain sentence part: "1 passes to 2", "4 screens for 1". */
export function moveWords(move: Move): string {
  switch (move.kind) {
    case 'pass': {
      if (move.throwIn) return `${move.from} throws in to ${move.to}${flightWords(move.flight)}`
      return `${move.from} passes to ${move.to}${flightWords(move.flight)}`
    }
    case 'cut':
      return `${move.who} cuts to ${placeWords(move.to)}`
    case 'dribble':
      return `${move.who} dribbles to ${placeWords(move.to)}`
    case 'screen':
      return `${move.who} screens${move.blind ? ' blind' : ''} for ${move.for}`
    case 'theirs':
      return `${move.who} goes to ${placeWords(move.to)}`
  }
}

const flightWords = (flight: 'straight' | 'lob' | 'bounce'): string =>
  flight === 'lob' ? ' over the top' : flight === 'bounce' ? ' on the bounce' : ''

/**
 * What happens in a step, one sentence: what happens together is joined by "and", what follows by "then".
 * The text that stands for the drawing where it cannot be seen. Empty for a step that does not exist.
 */
export function stepSentence(diagram: Diagram, step: number): string {
  const moves = diagram.steps[step]?.moves
  if (!moves) return ''
  if (moves.length === 0) return 'Nobody moves.'
  const beats = beatsOf(moves).map((beat) => listed(beat.map(({ move }) => moveWords(move))))
  return `${beats.join(', then ')}.`
}

/** What is written on the court in a step, one sentence; empty where nothing is. */
export function writtenSentence(diagram: Diagram, step: number): string {
  const words = diagram.steps[step]?.words ?? []
  if (words.length === 0) return ''
  return `Written on the court: ${listed(words.map(({ text, at }) => `‘${text}’ at ${placeWords(at)}`))}.`
}

/** A step in full: what happens in it, and what is written on the court. */
export const stepInWords = (diagram: Diagram, step: number): string =>
  [stepSentence(diagram, step), writtenSentence(diagram, step)].filter((part) => part !== '').join(' ')

/** The ball's whole way in one sentence: "5 throws in to 1, 1 passes to 2, 2 dribbles to …". */
export function ballWaySentence(diagram: Diagram): string {
  const ball = walkDiagram(diagram)
    .flatMap((step) => step.moves)
    .filter(({ move }) => move.kind === 'pass' || move.kind === 'dribble')
    .map(({ move }) => moveWords(move))
  if (ball.length === 0) return `${diagram.start.ball} holds the ball.`
  return `${ball.join(', ')}.`
}

function listed(parts: readonly string[]): string {
  const last = parts.at(-1) ?? ''
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')} and ${last}`
}

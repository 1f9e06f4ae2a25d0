import type { Diagram, Move } from '@shared/court/diagram'
import { placeWords } from '@shared/court/placeWords'
import type { Role } from '@shared/vocabulary'

const FLIGHTS = { straight: '', lob: ' over the top', bounce: ' on the bounce' } as const

/** What one role does in a step, said to whoever plays it, in order: "Screen for 1.", "Catch from 5." */
export function yourMoves(diagram: Diagram, step: number, you: Role): string[] {
  const moves = [...(diagram.steps[step]?.moves ?? [])].sort((a, b) => a.beat - b.beat)
  return moves.flatMap((move) => said(move, you) ?? [])
}

function said(move: Move, you: Role): string | null {
  switch (move.kind) {
    case 'cut':
      return move.who === you ? `Cut to ${placeWords(move.to)}.` : null
    case 'dribble':
      return move.who === you ? `Dribble to ${placeWords(move.to)}.` : null
    case 'screen':
      if (move.who === you) return `Screen for ${move.for}.`
      return move.for === you ? `Come off ${move.who}’s screen.` : null
    case 'pass':
      if (move.from === you)
        return `${move.throwIn ? 'Throw in' : 'Pass'} to ${move.to}${FLIGHTS[move.flight]}.`
      return move.to === you ? `Catch from ${move.from}.` : null
    case 'theirs':
      return null
  }
}

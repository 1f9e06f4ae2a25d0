import type { DefenderId, Diagram, Move, Place } from '../diagram'
import type { Role } from '../../vocabulary'
import { addMove, aimMove, bendMove, changeMove, joinMove, orderMove, removeMove } from './moves'
import { addDefender, changeThrower, mirrorDiagram, placePlayer, removeDefender } from './players'
import { addStep, duplicateStep, orderStep, removeStep, titleStep } from './steps'
import { addWord, changeWord, moveWord, removeWord } from './words'

/** One thing done to a drawing. Steps and moves are named by their stored index. */
export type Edit =
  | { do: 'place'; who: Role | DefenderId; at: Place }
  | { do: 'thrower'; role: Role }
  | { do: 'add-defender'; id: DefenderId; at: Place }
  | { do: 'remove-defender'; id: DefenderId }
  | { do: 'add-move'; step: number; move: Move; then?: boolean }
  | { do: 'change-move'; step: number; index: number; move: Move }
  | { do: 'remove-move'; step: number; index: number }
  | { do: 'order-move'; step: number; index: number; by: -1 | 1 }
  | { do: 'join-move'; step: number; index: number; then: boolean }
  | { do: 'aim'; step: number; index: number; to: Place }
  | { do: 'bend'; step: number; index: number; bend: number }
  | { do: 'add-step'; after: number }
  | { do: 'duplicate-step'; step: number }
  | { do: 'remove-step'; step: number }
  | { do: 'order-step'; step: number; by: -1 | 1 }
  | { do: 'title'; step: number; title: string }
  | { do: 'add-word'; step: number; text: string; at: Place }
  | { do: 'change-word'; step: number; index: number; text: string }
  | { do: 'move-word'; step: number; index: number; at: Place }
  | { do: 'remove-word'; step: number; index: number }
  | { do: 'mirror' }

/**
 * A diagram after an edit: a new one that its schema takes, or the same one where the edit finds nothing to do.
 * Faults of the play are let in; diagramFaults names them.
 */
export function applyEdit(diagram: Diagram, edit: Edit): Diagram {
  switch (edit.do) {
    case 'place':
      return placePlayer(diagram, edit.who, edit.at)
    case 'thrower':
      return changeThrower(diagram, edit.role)
    case 'add-defender':
      return addDefender(diagram, edit.id, edit.at)
    case 'remove-defender':
      return removeDefender(diagram, edit.id)
    case 'add-move':
      return addMove(diagram, edit.step, edit.move, edit.then)
    case 'change-move':
      return changeMove(diagram, edit.step, edit.index, edit.move)
    case 'remove-move':
      return removeMove(diagram, edit.step, edit.index)
    case 'order-move':
      return orderMove(diagram, edit.step, edit.index, edit.by)
    case 'join-move':
      return joinMove(diagram, edit.step, edit.index, edit.then)
    case 'aim':
      return aimMove(diagram, edit.step, edit.index, edit.to)
    case 'bend':
      return bendMove(diagram, edit.step, edit.index, edit.bend)
    case 'add-step':
      return addStep(diagram, edit.after)
    case 'duplicate-step':
      return duplicateStep(diagram, edit.step)
    case 'remove-step':
      return removeStep(diagram, edit.step)
    case 'order-step':
      return orderStep(diagram, edit.step, edit.by)
    case 'title':
      return titleStep(diagram, edit.step, edit.title)
    case 'add-word':
      return addWord(diagram, edit.step, edit.text, edit.at)
    case 'change-word':
      return changeWord(diagram, edit.step, edit.index, edit.text)
    case 'move-word':
      return moveWord(diagram, edit.step, edit.index, edit.at)
    case 'remove-word':
      return removeWord(diagram, edit.step, edit.index)
    case 'mirror':
      return mirrorDiagram(diagram)
  }
}

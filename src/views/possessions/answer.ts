import { trapsOf, type Draft } from './draft'
import type { Act } from './acts'
import type { Slot } from './slots'

/** One word of the row below the sentence, with its key. */
export interface Answer {
  /** '1' to '9', '0', '.', or 'Delete'. */
  key: string
  label: string
  hint?: string
  act: Act
  /** It is what the sentence says now. */
  chosen?: boolean
  /** An answer about the answer: could not see, take it out, and more. */
  quiet?: boolean
  /** Named for the keyboard; a finger taps the court instead. */
  spot?: boolean
}

/** One of our counters, as it can be called. */
export interface Call {
  id: string
  name: string
}

/** Which value a slot holds now. */
export function valueOf(draft: Draft, slot: Slot): unknown {
  const trap = trapsOf(draft)[slot.trap ?? 0]
  switch (slot.field) {
    case 'trap':
      return Array.isArray(draft.traps) ? (trap ?? null) : draft.traps
    case 'trapCue':
      return trap?.cue ?? null
    case 'trapResult':
      return trap?.result ?? null
    case 'trapTime':
      return trap?.t ?? null
    case 'trappers':
      return trap?.trappers ?? null
    case 'trip':
      return draft.tripId
    case 'more':
      return null
    case 'note':
      return draft.note === '' ? null : draft.note
    default:
      return draft[slot.field]
  }
}

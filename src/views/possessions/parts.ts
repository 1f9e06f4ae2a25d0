import { questionOf } from './questions'
import { sameSlot, type Slot } from './slots'

/** Who does it: an ink of the design; a third team is plain. */
export type Ink = 'their' | 'our' | 'plain'

/** Words between the slots. */
export interface TextPart {
  kind: 'text'
  text: string
}
/** A word that can be said or changed. */
export interface SlotPart {
  kind: 'slot'
  slot: Slot
  text: string
  ink: Ink
  /** `next`: the one that is open and not said yet. `unsaid`: can be said, and is not asked. */
  state: 'said' | 'next' | 'unsaid'
  /** Taken over from the last row and not told for this one. */
  carried?: boolean
}
export type Part = TextPart | SlotPart

/** Collects the parts of a sentence; knows which slot is open. */
export class Teller {
  readonly parts: Part[] = []
  constructor(private readonly open: Slot | null) {}

  text(text: string): this {
    const last = this.parts.at(-1)
    if (last?.kind === 'text') last.text += text
    else this.parts.push({ kind: 'text', text })
    return this
  }

  said(slot: Slot, text: string, ink: Ink = 'their'): this {
    this.parts.push({ kind: 'slot', slot, text, ink, state: 'said' })
    return this
  }

  /** The open question, where its answer will stand. */
  asked(slot: Slot, ink: Ink = 'their'): this {
    this.parts.push({ kind: 'slot', slot, text: questionOf(slot).short, ink, state: 'next' })
    return this
  }

  isOpen(slot: Slot): boolean {
    return sameSlot(this.open, slot)
  }
}

/** A part as it is set: punctuation right after a word never starts the next line without it. */
export type SetPart = { part: Part; after: string }

/** The parts with the punctuation that follows a slot moved to that slot. */
export function setParts(parts: readonly Part[]): SetPart[] {
  return parts.map((part, index) => {
    const before = parts[index - 1]
    const after = parts[index + 1]
    const text =
      part.kind === 'text' && before?.kind === 'slot' ? part.text.slice(leading(part.text).length) : part.text
    return {
      part: { ...part, text },
      after: part.kind === 'slot' && after?.kind === 'text' ? leading(after.text) : '',
    }
  })
}

const leading = (text: string): string => /^[,.;:)]*/.exec(text)?.[0] ?? ''

/** The sentence as plain text, for readers and lists. */
export const textOf = (parts: readonly Part[]): string => parts.map((part) => part.text).join('')

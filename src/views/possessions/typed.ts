import type { RulePack } from '@shared/court/rulePacks'
import { LIMITS } from '@shared/limits'
import { valueOf } from './answers'
import { clockWords, readClock, readMargin, readSeconds } from './clockWords'
import type { Draft } from './draft'
import type { Act } from './line'
import type { Slot } from './slots'

/** A slot that is typed: a time, a score, a note. */
export interface Typed {
  slot: Slot
  label: string
  /** An example of what can be typed. */
  example: string
  /** What it says now, as it would be typed. */
  text: string
  /** Keyboard of a phone. */
  mode: 'decimal' | 'text'
  /** Characters at most. */
  most: number
}

/** The field of a typed slot; null for one that is chosen. */
export function typedOf(draft: Draft, slot: Slot | null): Typed | null {
  if (slot === null) return null
  const value = valueOf(draft, slot)
  const number = typeof value === 'number' ? value : null
  switch (slot.field) {
    case 'clock':
      return {
        slot,
        label: 'Time left',
        example: '5:20',
        text: number === null ? '' : clockWords(number),
        mode: 'text',
        most: 7,
      }
    case 'margin':
      return {
        slot,
        label: 'They lead by, or with a minus trail by',
        example: '-2',
        text: number === null ? '' : String(number),
        mode: 'text',
        most: 8,
      }
    case 'trapTime':
    case 'crossedAt':
      return {
        slot,
        label: 'Seconds from the first touch',
        example: '1.8',
        text: number === null ? '' : String(number),
        mode: 'decimal',
        most: 6,
      }
    case 'note':
      return {
        slot,
        label: 'A few words',
        example: 'their 14 leaves early on the skip',
        text: draft.note,
        mode: 'text',
        most: LIMITS.note,
      }
    default:
      return null
  }
}

/** What was typed, as an act; a fault in words says what to type instead. Nothing typed takes the value out. */
export function readTyped(slot: Slot, text: string, pack: RulePack): Act | { fault: string } {
  const said = text.trim()
  if (slot.field === 'note') return { do: 'set', slot, value: said.slice(0, LIMITS.note) }
  if (said === '') return { do: 'set', slot, value: null }
  const act = (value: number | null, fault: string): Act | { fault: string } =>
    value === null ? { fault } : { do: 'set', slot, value }
  if (slot.field === 'clock') {
    const longest = Math.max(pack.periods.minutes, pack.periods.overtimeMinutes)
    return act(readClock(said, longest), `Write the time left as 5:20, at most ${longest}:00.`)
  }
  if (slot.field === 'margin')
    return act(readMargin(said), 'Write how many they lead by, as 3, or trail by, as -3.')
  return act(readSeconds(said, LIMITS.seconds), `Write seconds as 1.8, at most ${LIMITS.seconds}.`)
}

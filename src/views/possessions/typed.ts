import type { RulePack } from '@shared/court/rulePacks'
import { LIMITS } from '@shared/limits'
import { NOT_VISIBLE } from '@shared/vocabulary'
import type { Act } from './acts'
import { valueOf } from './answer'
import { clockWords, readClock, readMargin, readSeconds } from './clockWords'
import type { Draft } from './draft'
import { filmWords, readFilm } from './filmClock'
import { readCount, readShirts } from './shirts'
import type { Slot, SlotField } from './slots'

/** A slot that is typed: a time, a score, shirt numbers, a note. */
export interface Typed {
  slot: Slot
  label: string
  /** An example of what can be typed. */
  example: string
  /** What it says now, as it would be typed. */
  text: string
  /** Keyboard of a phone. */
  mode: 'decimal' | 'numeric' | 'text'
  /** Characters at most. */
  most: number
  /** Looked for and not seen can be said of it, with a question mark or a button. */
  unseen: boolean
}

/** What is typed for unseen. */
export const UNSEEN = '?'
/** The longest film, seconds, and the most of each count, as the record takes them. */
const LONGEST_FILM = 36_000
const MOST: Partial<Record<SlotField, number>> = { passes: 30, reversals: 20, points: 6, pointsAgainst: 6 }
/** How many shirts a word holds. */
const SHIRTS: Partial<Record<SlotField, number>> = { onFloor: 5, trappers: 3, receiver: 1, thief: 1 }

type Shape = Pick<Typed, 'label' | 'example' | 'mode' | 'most'>
const SHAPES: Partial<Record<SlotField, Shape>> = {
  clock: { label: 'Time left', example: '5:20', mode: 'text', most: 7 },
  margin: { label: 'They lead by, or with a minus trail by', example: '-2', mode: 'text', most: 8 },
  trapTime: { label: 'Seconds from the first touch', example: '1.8', mode: 'decimal', most: 6 },
  crossedAt: { label: 'Seconds from the first touch', example: '1.8', mode: 'decimal', most: 6 },
  note: {
    label: 'A few words',
    example: 'their 14 leaves early on the skip',
    mode: 'text',
    most: LIMITS.note,
  },
  onFloor: { label: 'Their five, by shirt number', example: '4 7 11 12 15', mode: 'text', most: 20 },
  trappers: { label: 'Who trapped, by shirt number', example: '4 11', mode: 'text', most: 12 },
  receiver: { label: 'Who caught it, by shirt number', example: '12', mode: 'text', most: 2 },
  thief: { label: 'Who took it, by shirt number', example: '7', mode: 'text', most: 2 },
  passes: { label: 'Passes', example: '4', mode: 'numeric', most: 2 },
  reversals: { label: 'Changes of side', example: '1', mode: 'numeric', most: 2 },
  points: { label: 'Points of the offence, free throws with them', example: '2', mode: 'numeric', most: 1 },
  pointsAgainst: { label: 'Points they scored within 8 s of it', example: '2', mode: 'numeric', most: 1 },
  filmTime: { label: 'Time on the film, from its start', example: '31:07.4', mode: 'text', most: 10 },
}
const MAY_BE_UNSEEN: readonly SlotField[] = ['receiver', 'thief']

/** The field of a typed slot; null for one that is chosen. */
export function typedOf(draft: Draft, slot: Slot | null): Typed | null {
  const shape = slot === null ? undefined : SHAPES[slot.field]
  if (slot === null || shape === undefined) return null
  return {
    slot,
    ...shape,
    text: asTyped(slot.field, valueOf(draft, slot)),
    unseen: MAY_BE_UNSEEN.includes(slot.field),
  }
}

function asTyped(field: SlotField, value: unknown): string {
  if (value === NOT_VISIBLE) return UNSEEN
  if (Array.isArray(value)) return value.join(' ')
  if (typeof value === 'number')
    return field === 'clock' ? clockWords(value) : field === 'filmTime' ? filmWords(value) : String(value)
  return typeof value === 'string' ? value : ''
}

/** What was typed, as an act; a fault in words says what to type instead. Nothing typed takes the value out. */
export function readTyped(slot: Slot, text: string, pack: RulePack): Act | { fault: string } {
  const said = text.trim()
  const { field } = slot
  if (field === 'note') return { do: 'set', slot, value: said.slice(0, LIMITS.note) }
  if (said === '') return { do: 'set', slot, value: null }
  if (said === UNSEEN && MAY_BE_UNSEEN.includes(field)) return { do: 'set', slot, value: NOT_VISIBLE }
  const act = (value: number | number[] | null, fault: string): Act | { fault: string } =>
    value === null ? { fault } : { do: 'set', slot, value }
  if (field === 'clock') {
    const longest = Math.max(pack.periods.minutes, pack.periods.overtimeMinutes)
    return act(readClock(said, longest), `Write the time left as 5:20, at most ${longest}:00.`)
  }
  if (field === 'margin')
    return act(readMargin(said), 'Write how many they lead by, as 3, or trail by, as -3.')
  if (field === 'filmTime')
    return act(readFilm(said, LONGEST_FILM), 'Write the time on the film as 31:07, at most 10:00:00.')
  const shirts = SHIRTS[field]
  if (shirts === 1)
    return act(
      readShirts(said, 1)?.[0] ?? null,
      `Write one shirt number, at most ${LIMITS.jersey}, or ${UNSEEN} if it could not be read.`,
    )
  if (shirts !== undefined)
    return act(
      readShirts(said, shirts),
      `Write up to ${shirts} shirt numbers with spaces between, none over ${LIMITS.jersey}.`,
    )
  const most = MOST[field]
  if (most !== undefined) return act(readCount(said, most), `Write a whole number, at most ${most}.`)
  return act(readSeconds(said, LIMITS.seconds), `Write seconds as 1.8, at most ${LIMITS.seconds}.`)
}

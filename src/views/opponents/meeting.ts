import type { OpponentBody } from '@shared/opponents/schemas'
import type { GameBody } from '@shared/games/schemas'
import { LIMITS } from '@shared/limits'
import { instantOf } from '@/composables/when'

/** The sentence as it is being said: empty text is a slot not yet said. */
export interface Meeting {
  name: string
  shortName: string
  /** Calendar day, "2026-05-02". */
  date: string
  /** "14:00" */
  time: string
  place: GameBody['place'] | ''
}

export type Slot = 'name' | 'date' | 'time' | 'place'
export const SLOTS: readonly Slot[] = ['name', 'date', 'time', 'place']

const SHORT_MOST = 20
const NOT_DUE: GameBody['due'] = { scout: null, read: null, teach: null, review: null }

export const isSaid = (meeting: Meeting, slot: Slot): boolean => {
  if (slot === 'name') return meeting.name.trim() !== ''
  if (slot === 'date') return /^\d{4}-\d{2}-\d{2}$/.test(meeting.date)
  if (slot === 'time') return /^([01]\d|2[0-3]):[0-5]\d$/.test(meeting.time)
  return meeting.place !== ''
}

/** Reads a time as it is typed: "19:15", "19.15", "1915", "7:15", "19 h"; null when it is none. */
export function timeOf(typed: string): string | null {
  const found = /^\s*(\d{1,2})(?:\s*[:.h]?\s*(\d{2}))?\s*h?\s*$/i.exec(typed)
  if (found === null) return null
  const [hour, minute] = [Number(found[1]), Number(found[2] ?? 0)]
  if (hour > 23 || minute > 59) return null
  return `${String(hour).padStart(2, '0')}:${String(minute).padStart(2, '0')}`
}

/** The first slot still to say, or null when the sentence is whole. */
export const nextSlot = (meeting: Meeting): Slot | null =>
  SLOTS.find((slot) => !isSaid(meeting, slot)) ?? null

/** What a team is called for short: the last word of its name. */
export function shortOf(name: string): string {
  const words = name.trim().split(/\s+/)
  return (words.at(-1) ?? '').slice(0, SHORT_MOST)
}

/** Both bodies of a whole sentence; null while a slot is open. */
export function bodiesOf(
  meeting: Meeting,
  opponentId: string,
  rulePack: GameBody['rulePack'],
  timeZone: string,
): { opponent: OpponentBody; game: GameBody } | null {
  if (nextSlot(meeting) !== null || meeting.place === '') return null
  const name = meeting.name.trim().slice(0, LIMITS.name)
  return {
    opponent: { name, shortName: meeting.shortName.trim() || shortOf(name), notes: '' },
    game: {
      opponentId,
      tipOff: instantOf(meeting.date, meeting.time, timeZone),
      place: meeting.place,
      rulePack,
      chooseBy: null,
      due: NOT_DUE,
      notes: '',
    },
  }
}

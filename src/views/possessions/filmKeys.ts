import { LIMITS } from '@shared/limits'
import { trapsOf, type Draft } from './draft'
import type { Slot } from './slots'

/** What a key does to the film beside the log, and what it says in the row. */
export type FilmKey = 'play' | 'back' | 'frame' | 'touch' | 'trap' | 'over' | 'still'

/** The keys in the order in which they are shown. */
export const FILM_KEYS: readonly { key: string; shown: string; does: FilmKey; label: string }[] = [
  { key: ' ', shown: 'Space', does: 'play', label: 'play' },
  { key: ',', shown: ',', does: 'back', label: '2 s back' },
  { key: 'f', shown: 'F', does: 'frame', label: 'frame on' },
  { key: 'z', shown: 'Z', does: 'touch', label: 'first touch here' },
  { key: 't', shown: 'T', does: 'trap', label: 'trap here, now' },
  { key: 'o', shown: 'O', does: 'over', label: 'over half now' },
  { key: 's', shown: 'S', does: 'still', label: 'keep this frame' },
]

/** Seconds since the first touch, to a tenth; null before it, without it, or when it is past any possession. */
export function countAt(filmTime: number | null, now: number): number | null {
  if (filmTime === null) return null
  const count = Math.round((now - filmTime) * 10) / 10
  return count >= 0 && count <= LIMITS.seconds ? count : null
}

/**
 * The slot that "trap here, now" fills: the time of the newest trap that has none; otherwise where they trapped, which
 * the court answers. Null when the row takes no more.
 */
export function trapSlot(draft: Draft): Slot | null {
  const traps = trapsOf(draft)
  const untimed = traps.findIndex((trap) => trap.t === null)
  if (untimed >= 0) return { field: 'trapTime', trap: untimed }
  return traps.length < LIMITS.traps ? { field: 'trap', trap: traps.length } : null
}

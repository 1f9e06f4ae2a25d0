import type { SpotName } from '@shared/court/trapSpots'
import { SHAPE_VARIANTS, type Shape } from '@shared/vocabulary'
import { isPressed, trapsOf, type Draft } from './draft'

/** Five touches, in the order they are asked (RECORD.md section 1). */
export const QUICK = ['trigger', 'shape', 'pickup', 'trap', 'outcome'] as const
export type QuickField = (typeof QUICK)[number]

export type SlotField =
  | QuickField
  | 'period'
  | 'clock'
  | 'margin'
  | 'onFloor'
  | 'shapeVariant'
  | 'outcomePlace'
  | 'throwerGuard'
  | 'denied'
  | 'tookAway'
  | 'leftOpen'
  | 'onBall'
  | 'handler'
  | 'goalie'
  | 'shownShape'
  | 'trapCue'
  | 'trapResult'
  | 'trapTime'
  | 'trappers'
  | 'forcedSide'
  | 'entrySpot'
  | 'receiver'
  | 'thief'
  | 'passes'
  | 'reversals'
  | 'fallback'
  | 'finish'
  | 'points'
  | 'pointsAgainst'
  | 'timeOutBurned'
  | 'filmTime'
  | 'counterId'
  | 'rightCall'
  | 'runWell'
  | 'crossedAt'
  | 'note'
  | 'trip'
  | 'more'

/** A place in the sentence that can be said. */
export interface Slot {
  field: SlotField
  /** Which trap, from 0, for `trap` and what is said about one. */
  trap?: number
  /** A trap spot that was named by key and still wants its side. */
  spot?: SpotName
  /** Page of a list that is longer than its keys: of what film can add, of our counters. */
  page?: number
}

export const isQuick = (field: SlotField): field is QuickField =>
  (QUICK as readonly SlotField[]).includes(field)

export const sameSlot = (a: Slot | null, b: Slot | null): boolean =>
  a !== null && b !== null && a.field === b.field && (a.trap ?? 0) === (b.trap ?? 0)

/** A stable name for lists and for finding a word on the page. */
export const slotKey = (slot: Slot): string =>
  slot.trap === undefined ? slot.field : `${slot.field}-${slot.trap}`

/** Whether the row asks for this quick field at all: pick-up and traps only when they press. */
export function isAsked(draft: Draft, field: QuickField): boolean {
  if (field === 'pickup' || field === 'trap') return isPressed(draft)
  // How an unpressed trip ended may be told and need not be: two touches are enough.
  if (field === 'outcome') return draft.shape === null || isPressed(draft)
  return true
}

export function isSaid(draft: Draft, field: QuickField): boolean {
  return field === 'trap' ? draft.traps !== null : draft[field] !== null
}

/** The next quick field to say; null when the row is complete. `passed`: said to be unseen. */
export function nextQuick(draft: Draft, passed: readonly QuickField[]): Slot | null {
  const field = QUICK.find((each) => isAsked(draft, each) && !isSaid(draft, each) && !passed.includes(each))
  if (field === undefined) return null
  return field === 'trap' ? { field, trap: 0 } : { field }
}

export const hasVariants = (shape: Shape | null): boolean =>
  SHAPE_VARIANTS.some((variant) => variant.parent === shape)

/** The row before this one, of whose trip this may be a fresh throw-in. */
export interface Before {
  number: number
  tripId: string
}

/** A trap was seen in place and nothing more; its parts are told one after the other. */
export const isTrapPart = (field: SlotField): field is 'trapCue' | 'trapResult' | 'trapTime' | 'trappers' =>
  field === 'trapCue' || field === 'trapResult' || field === 'trapTime' || field === 'trappers'

/** What about the traps is not told yet: cue, then result, time and who, trap after trap. */
export function nextOfTraps(draft: Draft, from = 0): Slot | null {
  const traps = trapsOf(draft)
  for (let trap = from; trap < traps.length; trap += 1) {
    const one = traps[trap]
    if (one === undefined) continue
    if (one.cue === null) return { field: 'trapCue', trap }
    if (one.result === null) return { field: 'trapResult', trap }
    if (one.t === null) return { field: 'trapTime', trap }
    if (one.trappers === null) return { field: 'trappers', trap }
  }
  return null
}

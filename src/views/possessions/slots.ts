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
  /** Page of the list of film slots, 1 or 2. */
  page?: 1 | 2
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

/** Outcomes after which it can be told where the ball was: those that did not get through. */
const endsSomewhere = (draft: Draft): boolean =>
  draft.outcome !== null && draft.outcome !== 'through' && draft.outcome !== 'through-with-numbers'

/** The row before this one, of whose trip this may be a fresh throw-in. */
export interface Before {
  number: number
  tripId: string
}

export interface FilmSlot {
  key: string
  slot: Slot
  label: string
}

/** What about the traps is not told yet: cue, then result, then time, trap after trap. */
export function nextOfTraps(draft: Draft, from = 0): Slot | null {
  const traps = trapsOf(draft)
  for (let trap = from; trap < traps.length; trap += 1) {
    const one = traps[trap]
    if (one === undefined) continue
    if (one.cue === null) return { field: 'trapCue', trap }
    if (one.result === null) return { field: 'trapResult', trap }
    if (one.t === null) return { field: 'trapTime', trap }
  }
  return null
}

/**
 * What film can add, in two pages. Keys stay where they are from row to row, so that fingers learn them; what does
 * not apply to this row is left out.
 */
export function filmSlots(draft: Draft, page: 1 | 2, before: Before | null = null): FilmSlot[] {
  const pressed = isPressed(draft)
  const one = (key: string, field: SlotField, label: string, when: boolean, slot: Slot = { field }) =>
    when ? [{ key, slot, label }] : []
  const traps = trapsOf(draft)
  if (page === 1)
    return [
      ...one('1', 'throwerGuard', 'The thrower', pressed && draft.trigger !== 'live'),
      ...one('2', 'denied', 'Denied', pressed),
      ...one('3', 'leftOpen', 'Left open', pressed),
      ...one('4', 'onBall', 'On the ball', pressed),
      ...one('5', 'handler', 'Who had it', pressed),
      ...one('6', 'goalie', 'The safety', pressed),
      ...one(
        '7',
        'trapCue',
        traps.length > 1 ? 'The traps' : 'The trap',
        traps.length > 0,
        nextOfTraps(draft) ?? { field: 'trapCue', trap: 0 },
      ),
      ...one('8', 'outcomePlace', 'Where it ended', endsSomewhere(draft)),
      ...one('9', 'crossedAt', 'Over half at', draft.shape !== null),
    ]
  return [
    ...one('1', 'note', 'A note', true),
    ...one('2', 'shownShape', 'Showed first', pressed),
    ...one('3', 'tookAway', 'Took away', pressed),
    ...one('4', 'shapeVariant', 'Which kind', hasVariants(draft.shape)),
    ...one('5', 'trap', 'Trapped again', traps.length > 0 && traps.length < 6, {
      field: 'trap',
      trap: traps.length,
    }),
    ...one('6', 'outcome', 'How it ended', draft.shape !== null && !pressed),
    ...one('7', 'trip', 'Same trip', before !== null && draft.trigger === 'dead-ball'),
  ]
}

import { isPressed, isThrownIn, trapsOf, type Draft } from './draft'
import { hasVariants, nextOfTraps, type Before, type Slot, type SlotField } from './slots'

/** A word that film can add, on its key. */
export interface FilmSlot {
  key: string
  slot: Slot
  label: string
}

/** Outcomes after which it can be told where the ball was: those that did not get through. */
const endsSomewhere = (draft: Draft): boolean =>
  draft.outcome !== null && draft.outcome !== 'through' && draft.outcome !== 'through-with-numbers'

const isLost = (draft: Draft): boolean => draft.outcome === 'lost-live' || draft.outcome === 'lost-dead'

/** One slot of a page: its key, its words, and whether the row has it. */
type Entry = [field: SlotField, label: string, when: boolean, slot?: Slot]

/**
 * What film can add, on four pages. Keys stay where they are from row to row, so that fingers learn them; what does
 * not apply to this row is left out.
 */
function pagesOf(draft: Draft, before: Before | null): Entry[][] {
  const pressed = isPressed(draft)
  const thrownIn = isThrownIn(draft)
  const traps = trapsOf(draft)
  const ours = draft.gameId !== null
  return [
    [
      ['throwerGuard', 'The thrower', pressed && thrownIn],
      ['denied', 'Denied', pressed],
      ['leftOpen', 'Left open', pressed],
      ['onBall', 'On the ball', pressed],
      ['handler', 'Who had it', pressed],
      ['goalie', 'The safety', pressed],
      [
        'trapCue',
        traps.length > 1 ? 'The traps' : 'The trap',
        traps.length > 0,
        nextOfTraps(draft) ?? { field: 'trapCue', trap: 0 },
      ],
      ['outcomePlace', 'Where it ended', endsSomewhere(draft)],
      ['crossedAt', 'Over half at', draft.shape !== null],
    ],
    [
      ['note', 'A note', true],
      ['shownShape', 'Showed first', pressed],
      ['tookAway', 'Took away', pressed],
      ['shapeVariant', 'Which kind', hasVariants(draft.shape)],
      ['trap', 'Trapped again', traps.length > 0 && traps.length < 6, { field: 'trap', trap: traps.length }],
      ['outcome', 'How it ended', draft.shape !== null && !pressed],
      ['trip', 'Same trip', before !== null && draft.trigger === 'dead-ball'],
      ['forcedSide', 'Steered to', pressed],
      ['filmTime', 'On film at', true],
    ],
    [
      ['entrySpot', 'Caught where', thrownIn],
      ['receiver', 'Who caught it', thrownIn],
      ['onFloor', 'Their five', true],
      ['thief', 'Who took it', isLost(draft)],
      ['pointsAgainst', 'Scored off it', draft.outcome === 'lost-live'],
      ['passes', 'Passes', draft.shape !== null],
      ['reversals', 'Changes of side', draft.shape !== null],
      ['finish', 'The finish', draft.outcome !== null],
      ['points', 'Points', draft.outcome !== null],
    ],
    [
      ['fallback', 'Then they played', pressed],
      ['timeOutBurned', 'A time-out', draft.shape !== null],
      ['counterId', 'Our call', ours],
      ['rightCall', 'The right call', ours],
      ['runWell', 'Run well', ours],
    ],
  ]
}

/** How many pages `filmSlots` has. */
export const FILM_PAGES = 4

/** The slots of one page, from 1, on their keys. */
export function filmSlots(draft: Draft, page: number, before: Before | null = null): FilmSlot[] {
  return (pagesOf(draft, before)[page - 1] ?? []).flatMap(([field, label, when, slot = { field }], index) =>
    when ? [{ key: String(index + 1), slot, label }] : [],
  )
}

/** The next page that has a word for this row; the first after the last. */
export function pageAfter(draft: Draft, page: number, before: Before | null): number {
  for (let step = 1; step <= FILM_PAGES; step += 1) {
    const next = ((page - 1 + step) % FILM_PAGES) + 1
    if (filmSlots(draft, next, before).length > 0) return next
  }
  return 1
}

/** What is told next on the way through film, once a word is said; nothing is asked that the row does not have. */
const ON_FROM: Partial<Record<SlotField, SlotField>> = {
  entrySpot: 'receiver',
  thief: 'pointsAgainst',
  passes: 'reversals',
  finish: 'points',
  counterId: 'rightCall',
  rightCall: 'runWell',
}

/** The word that goes with one just said, if it is not said yet; null when there is none. */
export function goesWith(draft: Draft, field: SlotField): Slot | null {
  const next = ON_FROM[field]
  if (next === undefined || (next in draft && draft[next as keyof Draft] !== null)) return null
  const has = pagesOf(draft, null).some((page) => page.some(([each, , when]) => each === next && when))
  return has ? { field: next } : null
}

/** What unfolds from a word of the sentence when its own value is pressed again. */
export function unfolds(draft: Draft, { field, trap = 0 }: Slot): Slot | null {
  if (field === 'shape') return hasVariants(draft.shape) ? { field: 'shapeVariant' } : null
  if (field === 'trigger') return isThrownIn(draft) ? { field: 'entrySpot' } : null
  if (field === 'pickup') return isPressed(draft) ? { field: 'onBall' } : null
  if (field === 'trap') return trapsOf(draft)[trap] === undefined ? null : { field: 'trapCue', trap }
  if (field === 'outcome') return endsSomewhere(draft) ? { field: 'outcomePlace' } : { field: 'finish' }
  if (field === 'onBall') return { field: 'forcedSide' }
  if (field === 'outcomePlace') return isLost(draft) ? { field: 'thief' } : null
  return null
}

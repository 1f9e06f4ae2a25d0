import type { PossessionBody, PossessionRow } from '@shared/possessions/schemas'
import { NOT_PRESSED, NOT_VISIBLE, type Trigger } from '@shared/vocabulary'

/** A possession while it is being said: the row's body, in which even the trigger may still be open. */
export type Draft = Omit<PossessionBody, 'trigger'> & { trigger: Trigger | null }

/** What the next row takes over from the last one (RECORD.md section 1). */
export const CARRIED = ['period', 'clock', 'margin', 'onFloor'] as const
export type Carried = (typeof CARRIED)[number]

/** Fields that say something only when they press; they go when the shape says that they do not. */
const ONLY_PRESSED = [
  'shapeVariant',
  'pickup',
  'traps',
  'throwerGuard',
  'denied',
  'tookAway',
  'leftOpen',
  'onBall',
  'handler',
  'goalie',
  'shownShape',
  'forcedSide',
  'fallback',
] as const satisfies readonly (keyof Draft)[]

/**
 * An empty row of a game.
 * @param game the game that a scout watched, or one of our own
 * @param tripId a row starts a trip of its own; a fresh throw-in of the same trip takes over the earlier one's
 * @param ours true for one of our own games
 */
export function emptyDraft(game: string, number: number, tripId: string | null = null, ours = false): Draft {
  return {
    frame: 1,
    scoutedGameId: ours ? null : game,
    gameId: ours ? game : null,
    tripId,
    number,
    period: null,
    clock: null,
    margin: null,
    trigger: null,
    shape: null,
    shapeVariant: null,
    pickup: null,
    traps: null,
    outcome: null,
    outcomePlace: null,
    throwerGuard: null,
    denied: null,
    tookAway: null,
    leftOpen: null,
    onBall: null,
    handler: null,
    goalie: null,
    shownShape: null,
    forcedSide: null,
    entrySpot: null,
    receiver: null,
    onFloor: null,
    thief: null,
    passes: null,
    reversals: null,
    fallback: null,
    finish: null,
    points: null,
    pointsAgainst: null,
    timeOutBurned: null,
    filmTime: null,
    crossedAt: null,
    track: null,
    note: '',
    counterId: null,
    rightCall: null,
    runWell: null,
  }
}

/** The saved row as a draft: what the server derives (spots, pressed, stills) is left out. */
export function draftOfRow(row: PossessionRow): Draft {
  const draft = emptyDraft('', row.number)
  for (const key of Object.keys(draft) as (keyof Draft)[]) Object.assign(draft, { [key]: row[key] })
  if (Array.isArray(row.traps))
    draft.traps = row.traps.map(({ x, y, t, cue, trappers, result }) => ({ x, y, t, cue, trappers, result }))
  return draft
}

/** The body to send; null while the trigger is open, without which there is no row. */
export function bodyOfDraft(draft: Draft): PossessionBody | null {
  const { trigger } = draft
  return trigger === null ? null : { ...draft, trigger }
}

export const isPressed = (draft: Pick<Draft, 'shape'>): boolean =>
  draft.shape !== null && !NOT_PRESSED.includes(draft.shape)

/** The traps that were seen, in order; none when they were not logged or could not be seen. */
export const trapsOf = (draft: Draft) => (Array.isArray(draft.traps) ? draft.traps : [])

/** Whether the ball was thrown in: a rebound or a steal has no thrower and no first catch. */
export const isThrownIn = (draft: Pick<Draft, 'trigger'>): boolean =>
  draft.trigger !== null && draft.trigger !== 'live'

/** Takes out what the rest of the row no longer allows: a press, a throw-in or a loss that did not happen. */
export function withoutUntrue(draft: Draft): Draft {
  return {
    ...draft,
    ...(isPressed(draft) ? {} : Object.fromEntries(ONLY_PRESSED.map((field) => [field, null]))),
    ...(draft.trigger === 'live' ? { entrySpot: null, receiver: null } : {}),
    ...(draft.outcome === 'lost-live' ? {} : { pointsAgainst: null }),
    ...(draft.outcome === 'lost-live' || draft.outcome === 'lost-dead' ? {} : { thief: null }),
  }
}

/** True when both would be the same row on the server. */
export function sameBody(a: Draft, b: Draft): boolean {
  return JSON.stringify(ordered(a)) === JSON.stringify(ordered(b))
}

function ordered(draft: Draft): unknown[] {
  return (Object.keys(emptyDraft('', 1)) as (keyof Draft)[]).map((key) => {
    const value = draft[key]
    if (key === 'traps' && Array.isArray(draft.traps))
      return draft.traps.map(({ x, y, t, cue, trappers, result }) => [
        x,
        y,
        t,
        cue,
        inOrder(trappers),
        result,
      ])
    // The server keeps lists of words and of shirts sorted: their order says nothing.
    if (Array.isArray(value) && value.every((each) => typeof each === 'string')) return [...value].sort()
    if (key === 'onFloor') return inOrder(draft.onFloor)
    if (key === 'entrySpot' && draft.entrySpot !== null && draft.entrySpot !== NOT_VISIBLE)
      return [draft.entrySpot.x, draft.entrySpot.y]
    return value ?? null
  })
}

const inOrder = (shirts: readonly number[] | null): number[] | null =>
  shirts === null ? null : [...shirts].sort((a, b) => a - b)

import { spotCell, type SpotName, type SpotSide, spotCentre } from '@shared/court/trapSpots'
import { LIMITS } from '@shared/limits'
import type { PossessionRow } from '@shared/possessions/schemas'
import { clear, none, placed, set, toggled, type Act } from './acts'
import {
  CARRIED,
  draftOfRow,
  emptyDraft,
  isPressed,
  trapsOf,
  withoutUntrue,
  type Carried,
  type Draft,
} from './draft'
import { goesWith, unfolds } from './filmSlots'
import {
  isAsked,
  isQuick,
  isSaid,
  isTrapPart,
  nextOfTraps,
  nextQuick,
  QUICK,
  type Before,
  type QuickField,
  type Slot,
} from './slots'

/** What can be stepped back to. */
interface Moment {
  draft: Draft
  open: Slot | null
  passed: readonly QuickField[]
  carried: readonly Carried[]
}

/** The call line: one possession being said, the slot that is open, and the way back. Plain values; never changed in place. */
export interface Line extends Moment {
  id: string
  /** The version this edit is based on; null for a new row. */
  version: number | null
  before: Before | null
  past: readonly Moment[]
}

const FAR_BACK = 60

/** The next row of a game; period, clock, margin and their five come from the last one and stay marked as carried until told. */
export function newLine(
  id: string,
  game: string,
  rows: readonly (Pick<PossessionRow, Carried | 'number' | 'tripId'> & { number: number })[],
  ours = false,
): Line {
  const last = rows.reduce<(typeof rows)[number] | null>(
    (latest, row) => (latest === null || row.number > latest.number ? row : latest),
    null,
  )
  const draft = emptyDraft(game, (last?.number ?? 0) + 1, id, ours)
  if (last === null)
    return { ...lineOf(id, { ...draft, period: 1, margin: 0 }, null), carried: ['period', 'margin'] }
  for (const field of CARRIED) Object.assign(draft, { [field]: last[field] })
  const before = last.tripId === null ? null : { number: last.number, tripId: last.tripId }
  return { ...lineOf(id, draft, null, before), carried: CARRIED.filter((field) => last[field] !== null) }
}

/** A saved row, opened again: what it leaves unsaid was left so and is not asked anew. */
export function lineOfRow(row: PossessionRow): Line {
  return lineOf(row.id, draftOfRow(row), row.version)
}

export function lineOf(id: string, draft: Draft, version: number | null, before: Before | null = null): Line {
  const passed =
    version === null ? [] : QUICK.filter((field) => isAsked(draft, field) && !isSaid(draft, field))
  return { id, version, before, draft, passed, open: nextQuick(draft, passed), carried: [], past: [] }
}

/** Every quick field is said, or said to be unseen: the row can be saved. */
export const isComplete = (line: Line): boolean =>
  line.draft.trigger !== null && nextQuick(line.draft, line.passed) === null

/** Opens a word to say or change it. */
export const openSlot = (line: Line, slot: Slot | null): Line => ({ ...line, open: slot })

/** The line after an answer: the row changed, and the next slot open. */
export function applyAct(line: Line, act: Act): Line {
  const { slot } = act
  if (act.do === 'open') return openSlot(line, slot)
  if (act.do === 'go-on') return goOn(line, slot)
  if (act.do === 'pass' && isQuick(slot.field)) {
    const draft = clear(line.draft, slot)
    return next(line, draft, slot, [...line.passed, slot.field])
  }
  if (act.do === 'toggle') return remember(line, { draft: toggled(line.draft, act), open: slot })
  const draft =
    act.do === 'place'
      ? placed(line.draft, act)
      : act.do === 'set'
        ? set(line.draft, act)
        : none(line.draft, slot)
  // The same value a second time unfolds what film can add to it.
  if (isSame(line.draft, draft, slot)) {
    const inside = unfolds(draft, slot)
    if (inside !== null) return openSlot(line, inside)
  }
  return next(
    line,
    draft,
    slot,
    line.passed.filter((field) => field !== slot.field),
  )
}

/** Whether an answer said what was there already; an answer that says nothing is none. */
function isSame(before: Draft, after: Draft, { field, trap = 0 }: Slot): boolean {
  if (field === 'trap') {
    const [was, is] = [trapsOf(before)[trap], trapsOf(after)[trap]]
    return was !== undefined && is !== undefined && was.x === is.x && was.y === is.y
  }
  if (isTrapPart(field) || field === 'more' || field === 'trip' || field === 'note') return false
  return before[field] !== null && before[field] === after[field]
}

/** A tap on the court: where two came to the ball, or where the throw-in was caught. Null when it says nothing now. */
export function courtTap(line: Line, place: { x: number; y: number }): Act | null {
  if (line.open?.field === 'entrySpot') return { do: 'place', slot: { field: 'entrySpot' }, ...place }
  if (!isPressed(line.draft)) return null
  const traps = trapsOf(line.draft)
  const open = line.open?.field === 'trap' ? (line.open.trap ?? 0) : traps.length
  if (open >= LIMITS.traps) return null
  return { do: 'place', slot: { field: 'trap', trap: open }, ...place }
}

/** A spot named by key: placed at its middle once its side is known. */
export function spotAct(slot: Slot, spot: SpotName, side: SpotSide | null): Act {
  const known = side ?? (spotCell(spot, 'middle') ? 'middle' : null)
  const place = known === null ? null : spotCentre(spot, known)
  if (place === null) return { do: 'open', slot: { ...slot, spot } }
  const kept = (value: number) => Math.round(value * 1e4) / 1e4
  const whole: Slot =
    slot.field === 'entrySpot' ? { field: 'entrySpot' } : { field: 'trap', trap: slot.trap ?? 0 }
  return { do: 'place', slot: whole, x: kept(place.x), y: kept(place.y) }
}

/** Undoes the last answer; a word that was only opened is closed; with nothing to undo, the word before the open one. */
export function stepBack(line: Line): Line {
  const { open, draft, passed } = line
  const last = line.past.at(-1)
  if (open?.spot !== undefined) return openSlot(line, withoutSpot(open))
  const onlyOpened = open !== null && !touched(line) && (!isQuick(open.field) || isSaid(draft, open.field))
  if (onlyOpened && (last !== undefined || !isQuick(open.field)))
    return openSlot(line, nextQuick(draft, passed))
  if (last !== undefined) return { ...line, ...last, past: line.past.slice(0, -1) }
  const order = QUICK.filter((field) => isAsked(draft, field))
  const at = open !== null && isQuick(open.field) ? order.indexOf(open.field) : order.length
  const field = order[at - 1]
  if (field === undefined) return line
  return openSlot(
    line,
    field === 'trap' ? { field, trap: Math.max(0, trapsOf(draft).length - 1) } : { field },
  )
}

/** The slot before one of its places was named by key. */
export const withoutSpot = ({ field, trap }: Slot): Slot =>
  field === 'trap' ? { field, trap: trap ?? 0 } : { field }

/** Whether the last answer was given in the slot that is open, as in a list of several. */
function touched(line: Line): boolean {
  const last = line.past.at(-1)
  return last !== undefined && last.open !== null && line.open !== null && last.open.field === line.open.field
}

function next(line: Line, draft: Draft, slot: Slot, passed: readonly QuickField[]): Line {
  const carried = line.carried.filter((field) => field !== slot.field)
  const whole = withoutUntrue(draft)
  return remember(line, { draft: whole, passed, carried, open: following(whole, slot, passed) })
}

/** About the traps, one thing leads to the next; else the next quick field, or nothing. */
function following(draft: Draft, slot: Slot, passed: readonly QuickField[]): Slot | null {
  const quick = nextQuick(draft, passed)
  if (quick !== null) return quick
  if (isTrapPart(slot.field)) return nextOfTraps(draft, slot.trap ?? 0)
  return goesWith(draft, slot.field)
}

function remember(line: Line, now: Partial<Moment>): Line {
  const { draft, open, passed, carried } = line
  return { ...line, ...now, past: [...line.past, { draft, open, passed, carried }].slice(-FAR_BACK) }
}

/** Leaves a slot as it is. */
function goOn(line: Line, slot: Slot): Line {
  const trap = slot.trap ?? 0
  const quick = nextQuick(line.draft, line.passed)
  if (quick !== null) return openSlot(line, quick)
  if (slot.field === 'trapCue') return openSlot(line, { field: 'trapResult', trap })
  if (slot.field === 'trapResult') return openSlot(line, { field: 'trapTime', trap })
  if (slot.field === 'trapTime') return openSlot(line, { field: 'trappers', trap })
  if (slot.field === 'trappers') return openSlot(line, nextOfTraps(line.draft, trap + 1))
  return openSlot(line, goesWith(line.draft, slot.field))
}

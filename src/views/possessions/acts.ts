import { NOT_VISIBLE } from '@shared/vocabulary'
import { trapsOf, type Draft } from './draft'
import { isTrapPart, type Slot } from './slots'

/** What an answer does to the row. Values are those of the record. */
export type Act =
  | { do: 'set'; slot: Slot; value: string | number | boolean | readonly number[] | null }
  | { do: 'toggle'; slot: Slot; value: string }
  | { do: 'none'; slot: Slot }
  | { do: 'place'; slot: Slot; x: number; y: number }
  | { do: 'pass'; slot: Slot }
  | { do: 'open'; slot: Slot }
  | { do: 'go-on'; slot: Slot }

/** A value put in, or taken out with null. */
export function set(draft: Draft, { slot, value }: Extract<Act, { do: 'set' }>): Draft {
  const { field, trap = 0 } = slot
  if (field === 'more') return draft
  if (field === 'trap')
    return value === null
      ? withTraps(
          draft,
          trapsOf(draft).filter((_, index) => index !== trap),
        )
      : { ...draft, traps: NOT_VISIBLE }
  if (isTrapPart(field)) {
    const part = { trapCue: 'cue', trapResult: 'result', trapTime: 't', trappers: 'trappers' }[field]
    return {
      ...draft,
      traps: trapsOf(draft).map((each, index) => (index === trap ? { ...each, [part]: value } : each)),
    }
  }
  if (field === 'trip') return { ...draft, tripId: String(value) }
  if (field === 'note') return { ...draft, note: String(value ?? '') }
  if (field === 'shape')
    return {
      ...draft,
      shape: value as Draft['shape'],
      shapeVariant: value === draft.shape ? draft.shapeVariant : null,
    }
  if (field === 'outcome') {
    // A way through needs no place; a place told for another ending would be untrue.
    const outcome = value as Draft['outcome']
    return { ...draft, outcome, outcomePlace: outcome === draft.outcome ? draft.outcomePlace : null }
  }
  return { ...draft, [field]: value }
}

/** Takes a value out: not logged. */
export function clear(draft: Draft, slot: Slot): Draft {
  if (slot.field === 'trap') return { ...draft, traps: null }
  return set(draft, { do: 'set', slot, value: null })
}

/** Looked, and there was none. */
export function none(draft: Draft, { field }: Slot): Draft {
  if (field === 'trap') return { ...draft, traps: [] }
  return field === 'denied' || field === 'tookAway' || field === 'leftOpen'
    ? { ...draft, [field]: [] }
    : draft
}

/** One of several, in or out. */
export function toggled(draft: Draft, { slot: { field }, value }: Extract<Act, { do: 'toggle' }>): Draft {
  if (field !== 'denied' && field !== 'tookAway' && field !== 'leftOpen') return draft
  const there = draft[field]
  const list: readonly string[] = Array.isArray(there) ? there : []
  return {
    ...draft,
    [field]: list.includes(value) ? list.filter((each) => each !== value) : [...list, value],
  }
}

/** A place on the court: of a trap, or of the first catch. */
export function placed(draft: Draft, { slot, x, y }: Extract<Act, { do: 'place' }>): Draft {
  if (slot.field === 'entrySpot') return { ...draft, entrySpot: { x, y } }
  const traps = trapsOf(draft)
  const at = Math.min(slot.trap ?? 0, traps.length)
  const there = traps[at]
  const trap =
    there === undefined ? { x, y, t: null, cue: null, trappers: null, result: null } : { ...there, x, y }
  return withTraps(draft, [...traps.slice(0, at), trap, ...traps.slice(at + 1)])
}

const withTraps = (draft: Draft, traps: Exclude<Draft['traps'], string | null>): Draft => ({
  ...draft,
  traps,
})

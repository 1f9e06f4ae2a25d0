import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import { SPOT_NAMES, type SpotName } from '@shared/court/trapSpots'
import { spotLabel } from '@shared/tendencies/habits'
import {
  DENIED,
  GOALIES,
  HANDLERS,
  LANES,
  NOT_VISIBLE,
  ON_BALL,
  OUTCOME_PLACES,
  OUTCOMES,
  PICKUPS,
  SHAPE_VARIANTS,
  SHAPES,
  THROWER_GUARDS,
  TRAP_CUES,
  TRAP_RESULTS,
  TRIGGERS,
  type Term,
} from '@shared/vocabulary'
import { isPressed, trapsOf, type Draft } from './draft'
import { isComplete, spotAct, type Act, type Line } from './line'
import { filmSlots, hasVariants, isQuick, type Slot, type SlotField } from './slots'
import { capital } from './words'

/** One word of the row below the sentence, with its key. */
export interface Answer {
  /** '1' to '9', '0', '.', or 'Delete'. */
  key: string
  label: string
  hint?: string
  act: Act
  /** It is what the sentence says now. */
  chosen?: boolean
  /** An answer about the answer: could not see, take it out, and more. */
  quiet?: boolean
  /** Named for the keyboard; a finger taps the court instead. */
  spot?: boolean
}

const CHOICES: Partial<Record<SlotField, readonly Term[]>> = {
  trigger: TRIGGERS,
  shape: SHAPES,
  pickup: PICKUPS,
  outcome: OUTCOMES,
  outcomePlace: OUTCOME_PLACES,
  throwerGuard: THROWER_GUARDS,
  onBall: ON_BALL,
  handler: HANDLERS,
  goalie: GOALIES,
  shownShape: SHAPES,
  trapCue: TRAP_CUES,
  trapResult: TRAP_RESULTS,
}
const SEVERAL: Partial<Record<SlotField, readonly Term[]>> = {
  denied: DENIED,
  tookAway: LANES,
  leftOpen: LANES,
}
/** Where the record has no word for unseen, the field is left open instead (RECORD.md section 1). */
const NO_UNSEEN: readonly SlotField[] = ['shapeVariant', 'shownShape', 'period', 'trip']

/** Which value a slot holds now. */
export function valueOf(draft: Draft, slot: Slot): unknown {
  const trap = trapsOf(draft)[slot.trap ?? 0]
  switch (slot.field) {
    case 'trap':
      return Array.isArray(draft.traps) ? (trap ?? null) : draft.traps
    case 'trapCue':
      return trap?.cue ?? null
    case 'trapResult':
      return trap?.result ?? null
    case 'trapTime':
      return trap?.t ?? null
    case 'trip':
      return draft.tripId
    case 'more':
      return null
    case 'note':
      return draft.note === '' ? null : draft.note
    default:
      return draft[slot.field]
  }
}

/** The answers of the open slot, in the order of their keys; of the whole line when nothing is open. */
export function answersOf(line: Line, pack: RulePack): Answer[] {
  const { open, draft } = line
  if (open === null || open.field === 'more') return filmAnswers(line, open?.page ?? 1)
  const value = valueOf(draft, open)
  const main =
    open.field === 'trap'
      ? trapAnswers(line, open)
      : open.field === 'shapeVariant'
        ? fromTerms(
            line,
            open,
            SHAPE_VARIANTS.filter((variant) => variant.parent === draft.shape),
            pack,
          )
        : open.field === 'period'
          ? periodAnswers(open, draft, pack)
          : open.field === 'trip'
            ? tripAnswers(line, open)
            : SEVERAL[open.field] !== undefined
              ? severalAnswers(draft, open, SEVERAL[open.field] ?? [])
              : fromTerms(line, open, CHOICES[open.field] ?? [], pack)
  const quiet: Answer[] = []
  const answer = (key: string, label: string, act: Act, chosen = false) =>
    quiet.push({ key, label, act, chosen, quiet: true })
  const isTyped = CHOICES[open.field] === undefined && main.length === 0
  if (open.field === 'trigger' || isTyped || NO_UNSEEN.includes(open.field)) {
    // A trigger is always known, and what is typed was seen.
  } else if (open.field === 'shape' || open.field === 'outcome')
    answer('0', 'Did not see', { do: 'pass', slot: open }, value === null && line.passed.includes(open.field))
  else if ((open.spot === undefined && (open.trap ?? 0) === 0) || open.field !== 'trap')
    answer('0', 'Could not see', { do: 'set', slot: open, value: NOT_VISIBLE }, value === NOT_VISIBLE)
  if (mayTakeOut(line, open) && value !== null)
    answer('Delete', 'Take it out', { do: 'set', slot: open, value: null })
  const more = moreAnswer(line, open)
  return more === null ? [...main, ...quiet] : [...main, ...quiet, more]
}

/** Quick fields are changed, not taken out; but the last of several traps may go, and all that film adds. */
function mayTakeOut(line: Line, open: Slot): boolean {
  if (open.field === 'trap')
    return (
      open.spot === undefined &&
      trapsOf(line.draft)[open.trap ?? 0] !== undefined &&
      trapsOf(line.draft).length > 1
    )
  if (open.field === 'trip') return false
  return !isQuick(open.field) || (open.field === 'outcome' && !isPressed(line.draft))
}

/** The dot key: what more can be said of this word, or of the row, or on to the next. */
function moreAnswer(line: Line, open: Slot): Answer | null {
  const dot = (label: string, act: Act): Answer => ({ key: '.', label, act, quiet: true })
  const { draft } = line
  const unfold = hasVariants(draft.shape) && draft.shapeVariant === null
  if (open.field === 'trigger') return null
  if (open.field === 'shape')
    return unfold ? dot('which kind', { do: 'open', slot: { field: 'shapeVariant' } }) : null
  if (open.field === 'shapeVariant') return dot('another shape', { do: 'open', slot: { field: 'shape' } })
  if (open.field === 'pickup' && unfold)
    return dot('which kind', { do: 'open', slot: { field: 'shapeVariant' } })
  if (isQuick(open.field) && open.spot === undefined)
    return dot('and more', { do: 'open', slot: { field: 'more' } })
  if (open.spot !== undefined)
    return dot('another place', { do: 'open', slot: { field: 'trap', trap: open.trap } })
  return dot('go on', { do: 'go-on', slot: open })
}

function fromTerms(line: Line, slot: Slot, list: readonly Term[], pack: RulePack): Answer[] {
  const value = valueOf(line.draft, slot)
  const answers = list.map((term, index): Answer => ({
    key: String(index + 1),
    label: capital(term.label),
    hint: hintOf(slot, term.value, pack),
    act: { do: 'set', slot, value: term.value },
    chosen: term.value === value,
  }))
  const traps = trapsOf(line.draft)
  if (slot.field === 'outcome' && traps.length > 0 && traps.length < 6)
    answers.push({
      key: '8',
      label: 'Trapped again',
      act: { do: 'open', slot: { field: 'trap', trap: traps.length } },
    })
  return answers
}

function hintOf(slot: Slot, value: string, pack: RulePack): string | undefined {
  if (slot.field === 'outcome' && value === 'count')
    return `${pack.throwInSeconds} s or ${pack.backcourtSeconds} s`
  if (slot.field === 'outcome' && value === 'stopped') return 'other whistle'
  return undefined
}

function severalAnswers(draft: Draft, slot: Slot, list: readonly Term[]): Answer[] {
  const value = valueOf(draft, slot)
  const said: readonly unknown[] = Array.isArray(value) ? value : []
  return [
    ...list.map((term, index): Answer => ({
      key: String(index + 1),
      label: capital(term.label),
      act: { do: 'toggle', slot, value: term.value },
      chosen: said.includes(term.value),
    })),
    {
      key: String(list.length + 1),
      label: slot.field === 'denied' ? 'Nobody' : 'Nothing',
      act: { do: 'none', slot },
      chosen: Array.isArray(value) && said.length === 0,
    },
  ]
}

function trapAnswers(line: Line, slot: Slot): Answer[] {
  const { draft } = line
  if (slot.spot !== undefined) {
    const { spot } = slot
    return (['left', 'right'] as const).map((side, index) => ({
      key: String(index + 1),
      label: capital(spotLabel(spot, side)),
      act: spotAct(slot, spot, side),
    }))
  }
  const spots: readonly SpotName[] = SPOT_NAMES.filter((spot) => spot !== 'other')
  const answers = spots.map((spot, index): Answer => ({
    key: String(index + 1),
    label: capital(spotLabel(spot, 'any')),
    act: spotAct(slot, spot, null),
    spot: true,
  }))
  if ((slot.trap ?? 0) > 0) return answers
  const none: Answer = {
    key: '8',
    label: 'No trap',
    act: { do: 'none', slot },
    chosen: Array.isArray(draft.traps) && draft.traps.length === 0,
  }
  return [...answers, none]
}

function periodAnswers(slot: Slot, draft: Draft, pack: RulePack): Answer[] {
  return Array.from({ length: pack.periods.count + 3 }, (_, index) => ({
    key: String(index + 1),
    label: periodLabel(pack, index + 1),
    act: { do: 'set' as const, slot, value: index + 1 },
    chosen: draft.period === index + 1,
  }))
}

function tripAnswers(line: Line, slot: Slot): Answer[] {
  const { before, draft, id } = line
  if (before === null) return []
  return [
    {
      key: '1',
      label: `The same trip as no. ${before.number}`,
      act: { do: 'set', slot, value: before.tripId },
      chosen: draft.tripId === before.tripId,
    },
    {
      key: '2',
      label: 'A trip of its own',
      act: { do: 'set', slot, value: id },
      chosen: draft.tripId === id,
    },
  ]
}

function filmAnswers(line: Line, page: 1 | 2): Answer[] {
  const { draft } = line
  const answers = filmSlots(draft, page, line.before).map(({ key, slot, label }): Answer => {
    const value = valueOf(draft, slot)
    const told = slot.field === 'trip' ? value === line.before?.tripId : value !== null
    return { key, label, act: { do: 'open', slot }, chosen: told }
  })
  const other = page === 1 ? 2 : 1
  const back = page === 2 && isComplete(line)
  const label = page === 1 ? 'and more' : 'the others'
  return [
    ...answers,
    { key: '.', label, act: { do: 'open', slot: { field: 'more', page: back ? 1 : other } }, quiet: true },
  ]
}

import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import { SPOT_NAMES, type SpotName } from '@shared/court/trapSpots'
import { FALLBACKS, FINISHES, FORCED_SIDES } from '@shared/filmWords'
import { spotLabel } from '@shared/tendencies/habits'
import {
  DENIED,
  GOALIES,
  HANDLERS,
  LANES,
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
import { valueOf, type Answer, type Call } from './answer'
import { trapsOf, type Draft } from './draft'
import { filmSlots, pageAfter } from './filmSlots'
import { spotAct, type Line } from './line'
import type { Slot, SlotField } from './slots'
import { capital } from './words'

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
  forcedSide: FORCED_SIDES,
  fallback: FALLBACKS,
  finish: FINISHES,
}
const SEVERAL: Partial<Record<SlotField, readonly Term[]>> = {
  denied: DENIED,
  tookAway: LANES,
  leftOpen: LANES,
}
/** Words that are answered with yes or no. */
const YES_NO: Partial<Record<SlotField, readonly [yes: string, no: string]>> = {
  timeOutBurned: ['They burned one', 'They kept it'],
  rightCall: ['The right call', 'The wrong call'],
  runWell: ['Run well', 'Not run well'],
}

/** Whether a slot is answered by words of its own; otherwise it is typed. */
export const isChosen = (field: SlotField): boolean => CHOICES[field] !== undefined

/** The words that answer the slot itself. */
export function mainAnswers(line: Line, open: Slot, pack: RulePack, calls: readonly Call[]): Answer[] {
  const { draft } = line
  const yesNo = YES_NO[open.field]
  if (yesNo !== undefined) return yesNoAnswers(draft, open, yesNo)
  switch (open.field) {
    case 'trap':
      return trapAnswers(line, open)
    case 'entrySpot':
      return spotAnswers(open)
    case 'shapeVariant':
      return fromTerms(
        line,
        open,
        SHAPE_VARIANTS.filter((variant) => variant.parent === draft.shape),
        pack,
      )
    case 'period':
      return periodAnswers(open, draft, pack)
    case 'trip':
      return tripAnswers(line, open)
    case 'counterId':
      return callAnswers(draft, open, calls)
    default: {
      const several = SEVERAL[open.field]
      return several === undefined
        ? fromTerms(line, open, CHOICES[open.field] ?? [], pack)
        : severalAnswers(draft, open, several)
    }
  }
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

/** The places by name, on their keys; then the side of the one that was named. */
function spotAnswers(slot: Slot): Answer[] {
  const { spot } = slot
  if (spot !== undefined)
    return (['left', 'right'] as const).map((side, index) => ({
      key: String(index + 1),
      label: capital(spotLabel(spot, side)),
      act: spotAct(slot, spot, side),
    }))
  const spots: readonly SpotName[] = SPOT_NAMES.filter((each) => each !== 'other')
  return spots.map((each, index) => ({
    key: String(index + 1),
    label: capital(spotLabel(each, 'any')),
    act: spotAct(slot, each, null),
    spot: true,
  }))
}

function trapAnswers(line: Line, slot: Slot): Answer[] {
  const { draft } = line
  const answers = spotAnswers(slot)
  if (slot.spot !== undefined || (slot.trap ?? 0) > 0) return answers
  const none: Answer = {
    key: '8',
    label: 'No trap',
    act: { do: 'none', slot },
    chosen: Array.isArray(draft.traps) && draft.traps.length === 0,
  }
  return [...answers, none]
}

function yesNoAnswers(draft: Draft, slot: Slot, [yes, no]: readonly [string, string]): Answer[] {
  const value = valueOf(draft, slot)
  const one = (key: string, label: string, said: boolean): Answer => ({
    key,
    label,
    act: { do: 'set', slot, value: said },
    chosen: value === said,
  })
  return [one('1', yes, true), one('2', no, false)]
}

/** A row of words has nine keys; a longer library is turned over with the dot. */
export const CALLS_A_PAGE = 9

function callAnswers(draft: Draft, slot: Slot, calls: readonly Call[]): Answer[] {
  const from = ((slot.page ?? 1) - 1) * CALLS_A_PAGE
  return calls.slice(from, from + CALLS_A_PAGE).map((call, index) => ({
    key: String(index + 1),
    label: call.name,
    act: { do: 'set', slot: { field: 'counterId' }, value: call.id },
    chosen: draft.counterId === call.id,
  }))
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

/** What film can add: one page of words, and the way to the next. */
export function filmAnswers(line: Line, page: number): Answer[] {
  const { draft, before } = line
  const answers = filmSlots(draft, page, before).map(({ key, slot, label }): Answer => {
    const value = valueOf(draft, slot)
    const told = slot.field === 'trip' ? value === before?.tripId : value !== null
    return { key, label, act: { do: 'open', slot }, chosen: told }
  })
  const next = pageAfter(draft, page, before)
  const label = next === 1 ? 'the first ones' : 'and more'
  return [
    ...answers,
    { key: '.', label, act: { do: 'open', slot: { field: 'more', page: next } }, quiet: true },
  ]
}

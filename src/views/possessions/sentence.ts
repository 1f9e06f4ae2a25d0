import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import {
  labelOf,
  NOT_VISIBLE,
  OUTCOME_PLACES,
  OUTCOMES,
  PICKUPS,
  TRAP_CUES,
  TRAP_RESULTS,
  TRIGGERS,
} from '@shared/vocabulary'
import { clockWords, marginWords, secondsWords } from './clockWords'
import { CARRIED, isPressed, trapsOf, type Carried } from './draft'
import { isComplete, type Line } from './line'
import { Teller, type Part, type SlotPart } from './parts'
import { questionOf } from './questions'
import { sameSlot, type Slot } from './slots'
import type { Call } from './answer'
import { afterParts } from './afterSentence'
import { filmParts } from './filmSentence'
import { shirtWords } from './shirts'
import { SHAPE_WORDS, TRIGGER_LEAD, trapWords, VARIANT_WORDS } from './words'

/** When it was: period, clock, margin and who of theirs was on, each a word that can be changed. */
export function whenParts(line: Line, pack: RulePack): SlotPart[] {
  const { draft } = line
  const words: Record<Carried, string | null> = {
    period: draft.period === null ? null : periodLabel(pack, draft.period),
    clock: draft.clock === null ? null : clockWords(draft.clock),
    margin: draft.margin === null ? null : marginWords(draft.margin),
    onFloor: draft.onFloor === null ? null : `their ${shirtWords(draft.onFloor)} on the floor`,
  }
  // Their five are never asked: the word stands there once it is said.
  const shown = CARRIED.filter(
    (field) => field !== 'onFloor' || words.onFloor !== null || sameSlot(line.open, { field }),
  )
  return shown.map((field) => {
    const said = words[field]
    return {
      kind: 'slot',
      slot: { field },
      text: said ?? questionOf({ field }).short,
      ink: 'plain',
      state: said !== null ? 'said' : sameSlot(line.open, { field }) ? 'next' : 'unsaid',
      carried: line.carried.includes(field),
    }
  })
}

/** The possession as a sentence: what is said, what is asked, and after it what film added. */
export function sentenceOf(line: Line, calls: readonly Call[] = []): Part[] {
  const told = new Teller(line.open)
  const { draft } = line
  if (draft.trigger === null) return told.text('After ').asked({ field: 'trigger' }, 'plain').parts
  told.text(TRIGGER_LEAD[draft.trigger]).said({ field: 'trigger' }, labelOf(TRIGGERS, draft.trigger), 'plain')
  if (draft.tripId !== null && draft.tripId === line.before?.tripId && draft.tripId !== line.id)
    told.text(', ').said({ field: 'trip' }, 'still the same trip', 'plain')
  else if (told.isOpen({ field: 'trip' })) told.text(', ').asked({ field: 'trip' }, 'plain')
  shapeParts(told, line)
  if (isPressed(draft)) trapParts(told, line)
  outcomeParts(told, line)
  filmParts(told, draft)
  afterParts(told, draft, calls)
  if (line.open?.field === 'more' && !isComplete(line)) told.text(' ').asked(line.open, 'plain')
  return told.parts
}

function shapeParts(told: Teller, line: Line): void {
  const { draft, passed } = line
  const shape: Slot = { field: 'shape' }
  if (draft.shape === null) {
    if (passed.includes('shape')) told.text(', ').said(shape, 'what they did was not seen')
    else told.text(' they ').asked(shape)
    return
  }
  told.text(' they ')
  const { lead, word } = SHAPE_WORDS[draft.shape]
  if (!isPressed(draft)) {
    told.said(shape, word)
    return
  }
  const pickup: Slot = { field: 'pickup' }
  if (draft.pickup === NOT_VISIBLE) told.text('picked up ').said(pickup, 'where not seen')
  else if (draft.pickup !== null) told.text('picked up ').said(pickup, labelOf(PICKUPS, draft.pickup))
  else if (told.isOpen(pickup)) told.text('picked up ').asked(pickup)
  else told.text('pressed')
  told.text(lead).said(shape, word)
  const variant: Slot = { field: 'shapeVariant' }
  if (draft.shapeVariant !== null) told.text(', ').said(variant, VARIANT_WORDS[draft.shapeVariant])
  else if (told.isOpen(variant)) told.text(', ').asked(variant)
}

function trapParts(told: Teller, line: Line): void {
  const { draft } = line
  const traps = trapsOf(draft)
  const first: Slot = { field: 'trap', trap: 0 }
  if (draft.traps === NOT_VISIBLE) told.text(', ').said(first, 'traps not seen')
  else if (draft.traps !== null && traps.length === 0) told.text(', ').said(first, 'no trap')
  traps.forEach((trap, index) => {
    const { lead, word } = trapWords(trap)
    told
      .text(index === 0 ? ', trapped' : ', trapped again')
      .text(lead)
      .said({ field: 'trap', trap: index }, word)
    trapMore(told, trap, index)
  })
  const open = line.open?.field === 'trap' ? line.open : null
  if (open !== null && (open.trap ?? 0) >= traps.length && (draft.traps === null || traps.length > 0))
    told.text(traps.length === 0 ? ', trapped ' : ', trapped again ').asked(open)
}

function trapMore(
  told: Teller,
  trap: { t: number | null; cue: string | null; trappers: readonly number[] | null; result: string | null },
  index: number,
): void {
  const time: Slot = { field: 'trapTime', trap: index }
  const cue: Slot = { field: 'trapCue', trap: index }
  const result: Slot = { field: 'trapResult', trap: index }
  if (trap.t !== null) told.text(' at ').said(time, secondsWords(trap.t))
  else if (told.isOpen(time)) told.text(' at ').asked(time)
  if (trap.cue === NOT_VISIBLE) told.text(' ').said(cue, '(cue not seen)')
  else if (trap.cue !== null) told.text(' ').said(cue, labelOf(TRAP_CUES, trap.cue))
  else if (told.isOpen(cue)) told.text(' ').asked(cue)
  const who: Slot = { field: 'trappers', trap: index }
  if (trap.trappers !== null) told.text(' by ').said(who, shirtWords(trap.trappers))
  else if (told.isOpen(who)) told.text(' ').asked(who)
  if (trap.result === NOT_VISIBLE) told.text(', ').said(result, 'way out not seen', 'plain')
  else if (trap.result !== null) told.text(', ').said(result, labelOf(TRAP_RESULTS, trap.result), 'plain')
  else if (told.isOpen(result)) told.text(', ').asked(result, 'plain')
}

function outcomeParts(told: Teller, line: Line): void {
  const { draft, passed } = line
  const outcome: Slot = { field: 'outcome' }
  const place: Slot = { field: 'outcomePlace' }
  if (draft.outcome !== null)
    told.text(', and it ended ').said(outcome, labelOf(OUTCOMES, draft.outcome), 'plain')
  else if (passed.includes('outcome')) told.text(', and it ended ').said(outcome, 'unseen', 'plain')
  else if (told.isOpen(outcome)) told.text(', and it ended ').asked(outcome, 'plain')
  if (draft.outcomePlace === NOT_VISIBLE) told.text(', ').said(place, 'where not seen', 'plain')
  else if (draft.outcomePlace !== null)
    told.text(' ').said(place, labelOf(OUTCOME_PLACES, draft.outcomePlace), 'plain')
  else if (told.isOpen(place)) told.text(' ').asked(place, 'plain')
  if (isComplete(line)) told.text('.')
}

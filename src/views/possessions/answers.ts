import type { RulePack } from '@shared/court/rulePacks'
import { NOT_VISIBLE } from '@shared/vocabulary'
import type { Act } from './acts'
import { valueOf, type Answer, type Call } from './answer'
import { CALLS_A_PAGE, filmAnswers, isChosen, mainAnswers } from './answerLists'
import { isPressed, trapsOf } from './draft'
import { withoutSpot, type Line } from './line'
import { hasVariants, isQuick, type Slot, type SlotField } from './slots'

/** Where the record has no word for unseen, the field is left open instead (RECORD.md section 1). */
const NO_UNSEEN: readonly SlotField[] = [
  'shapeVariant',
  'shownShape',
  'period',
  'trip',
  'timeOutBurned',
  'counterId',
  'rightCall',
  'runWell',
]

/** The answers of the open slot, in the order of their keys; of the whole line when nothing is open. */
export function answersOf(line: Line, pack: RulePack, calls: readonly Call[] = []): Answer[] {
  const { open, draft } = line
  if (open === null || open.field === 'more') return filmAnswers(line, open?.page ?? 1)
  const value = valueOf(draft, open)
  const main = mainAnswers(line, open, pack, calls)
  const quiet: Answer[] = []
  const answer = (key: string, label: string, act: Act, chosen = false) =>
    quiet.push({ key, label, act, chosen, quiet: true })
  const isTyped = !isChosen(open.field) && main.length === 0
  if (open.field === 'trigger' || isTyped || NO_UNSEEN.includes(open.field)) {
    // A trigger is always known, and what is typed was seen.
  } else if (open.field === 'shape' || open.field === 'outcome')
    answer('0', 'Did not see', { do: 'pass', slot: open }, value === null && line.passed.includes(open.field))
  else if (open.spot === undefined && ((open.trap ?? 0) === 0 || open.field !== 'trap'))
    answer('0', 'Could not see', { do: 'set', slot: open, value: NOT_VISIBLE }, value === NOT_VISIBLE)
  if (mayTakeOut(line, open) && value !== null)
    answer('Delete', 'Take it out', { do: 'set', slot: open, value: null })
  const more = moreAnswer(line, open, calls.length)
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
function moreAnswer(line: Line, open: Slot, calls: number): Answer | null {
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
  if (open.spot !== undefined) return dot('another place', { do: 'open', slot: withoutSpot(open) })
  if (open.field === 'counterId' && calls > CALLS_A_PAGE) {
    const page = (open.page ?? 1) * CALLS_A_PAGE < calls ? (open.page ?? 1) + 1 : 1
    return dot('the others', { do: 'open', slot: { field: 'counterId', page } })
  }
  return dot('go on', { do: 'go-on', slot: open })
}

import type { RulePack } from '@shared/court/rulePacks'
import type { PossessionRow } from '@shared/possessions/schemas'
import { BATCH_FIELDS, type BatchField, type BatchResult } from '@shared/possessions/table'
import { NOT_VISIBLE, NOT_PRESSED } from '@shared/vocabulary'
import { fieldName, isSeveral, isYesNo, termsOf, valueWords } from './fieldWords'

/** What the batch sentence says so far: which column, from what, to what. Undefined: still to say. */
export interface BatchDraft {
  field: BatchField | null
  from?: unknown
  to?: unknown
}

export type BatchPart = 'field' | 'from' | 'to'

/** A value that a slot can hold, with its words. */
export interface ValueChoice {
  value: unknown
  label: string
  /** Marked rows that hold it. */
  rows?: number
}

const OURS_ONLY: readonly BatchField[] = ['counterId', 'rightCall', 'runWell']
/** Told apart by place or by name: each row is changed in the log instead. */
const NOT_IN_WORDS: readonly BatchField[] = ['counterId', 'shapeVariant']

/** The columns that the sentence offers for these rows. */
export function batchFields(rows: readonly PossessionRow[]): BatchField[] {
  const ours = rows.some((row) => row.gameId !== null)
  return BATCH_FIELDS.filter((field) => !NOT_IN_WORDS.includes(field) && (ours || !OURS_ONLY.includes(field)))
}

/** One text for one value: lists of words are the same in any order. */
export function sameText(value: unknown): string {
  if (Array.isArray(value) && value.every((each) => typeof each !== 'object'))
    return JSON.stringify([...(value as unknown[])].sort())
  return JSON.stringify(value ?? null)
}

export const holds = (row: PossessionRow, field: BatchField, value: unknown): boolean =>
  sameText(row[field]) === sameText(value)

/** What the marked rows hold in a column, the most frequent first. */
export function heldValues(rows: readonly PossessionRow[], field: BatchField, pack: RulePack): ValueChoice[] {
  const found = new Map<string, ValueChoice & { rows: number }>()
  for (const row of rows) {
    const value: unknown = row[field] ?? null
    const there = found.get(sameText(value))
    if (there === undefined)
      found.set(sameText(value), { value, label: valueWords(field, value, pack), rows: 1 })
    else there.rows += 1
  }
  return [...found.values()].sort((a, b) => b.rows - a.rows)
}

const NO_UNSEEN: readonly BatchField[] = [
  'trigger',
  'shape',
  'outcome',
  'shownShape',
  'period',
  'margin',
  'passes',
  'reversals',
  'points',
  'pointsAgainst',
  'onFloor',
  'timeOutBurned',
  'rightCall',
  'runWell',
]

/** What a column can be changed to; empty where it is typed. */
export function newValues(field: BatchField, from: unknown): ValueChoice[] {
  const choices: ValueChoice[] = []
  if (isYesNo(field)) choices.push({ value: true, label: 'yes' }, { value: false, label: 'no' })
  for (const term of termsOf(field) ?? [])
    choices.push({ value: isSeveral(field) ? [term.value] : term.value, label: term.label })
  if (isSeveral(field)) choices.push({ value: [], label: valueWords(field, []) })
  if (field === 'traps') choices.push({ value: [], label: 'no trap' })
  if (choices.length > 0) {
    if (!NO_UNSEEN.includes(field)) choices.push({ value: NOT_VISIBLE, label: 'not seen' })
    if (field !== 'trigger') choices.push({ value: null, label: 'not logged' })
  }
  return choices.filter(({ value }) => sameText(value) !== sameText(from))
}

const SHIRTS: readonly BatchField[] = ['onFloor']
const MOST: Partial<Record<BatchField, number>> = {
  period: 10,
  passes: 30,
  reversals: 20,
  points: 6,
  pointsAgainst: 6,
  receiver: 99,
  thief: 99,
}

/** Reads what was typed for a column: a whole number, a margin, or their five; null says what to type instead. */
export function readValue(field: BatchField, text: string): { value: unknown } | { fault: string } {
  const said = text.trim()
  if (said === '') return { value: null }
  if (SHIRTS.includes(field)) {
    const shirts = [
      ...new Set(
        said
          .split(/[^\d]+/)
          .filter(Boolean)
          .map(Number),
      ),
    ].sort((a, b) => a - b)
    return shirts.length > 0 && shirts.length <= 5 && shirts.every((shirt) => shirt <= 99)
      ? { value: shirts }
      : { fault: 'Write up to 5 shirt numbers with spaces between.' }
  }
  if (field === 'margin') {
    const margin = /^[+-]?\d{1,2}$/.test(said) ? Number(said) : null
    return margin === null
      ? { fault: 'Write how many they lead by, as 3, or trail by, as -3.' }
      : { value: margin }
  }
  const most = MOST[field] ?? 99
  const number = /^\d{1,2}$/.test(said) ? Number(said) : null
  const least = field === 'period' ? 1 : 0
  return number === null || number > most || number < least
    ? { fault: `Write a whole number from ${least} to ${most}.` }
    : { value: number }
}

/** Only a press has these; on a row without one the change would not fit. */
const ONLY_PRESSED: readonly BatchField[] = ['pickup']
const isPressed = (row: PossessionRow): boolean => row.shape !== null && !NOT_PRESSED.includes(row.shape)

/** The marked rows that hold the old value and would be changed; the others stay as they are. */
export function changedRows<T extends PossessionRow>(rows: readonly T[], draft: BatchDraft): T[] {
  const { field } = draft
  if (field === null || !('from' in draft)) return []
  return rows.filter(
    (row) => holds(row, field, draft.from) && (isPressed(row) || !ONLY_PRESSED.includes(field)),
  )
}

/** The slot of the sentence that is to be said next; null when it is whole. */
export function nextPart(draft: BatchDraft): BatchPart | null {
  if (draft.field === null) return 'field'
  if (!('from' in draft)) return 'from'
  return 'to' in draft ? null : 'to'
}

/** All three are said, and it would change something. */
export const isWhole = (draft: BatchDraft): boolean =>
  draft.field !== null && 'from' in draft && 'to' in draft && sameText(draft.from) !== sameText(draft.to)

/** The sentence as plain text, for readers. */
export function batchSentence(marked: number, draft: BatchDraft, pack: RulePack): string {
  const field = draft.field
  const rows = marked === 1 ? '1 marked row' : `${marked} marked rows`
  if (field === null) return `In ${rows} change what?`
  const from = 'from' in draft ? valueWords(field, draft.from, pack) : 'what?'
  const to = 'to' in draft ? valueWords(field, draft.to, pack) : 'what?'
  return `In ${rows} change ${fieldName(field)} from ${from} to ${to}.`
}

const WHY: Record<BatchResult['leftOut'][number]['why'], [one: string, more: string]> = {
  'other-value': ['holds something else by now and stays', 'hold something else by now and stay'],
  'changed-since': ['was changed meanwhile and stays', 'were changed meanwhile and stay'],
  deleted: ['was thrown away', 'were thrown away'],
  'does-not-fit': ['would not fit and stays', 'would not fit and stay'],
}

/** What came of it: "4 rows changed. No. 8 and no. 9 were changed meanwhile and stay." */
export function resultWords(result: BatchResult, verb = 'changed'): string {
  const done = result.changed.length + result.already.length
  const first = done === 1 ? `1 row ${verb}.` : `${done} rows ${verb}.`
  const kinds = [...new Set(result.leftOut.map(({ why }) => why))]
  const rest = kinds.map((why) => {
    const numbers = result.leftOut.filter((each) => each.why === why).map(({ number }) => `no. ${number}`)
    const names = numbers.length > 4 ? `${numbers.length} rows` : numbers.join(', ')
    return ` ${names.charAt(0).toUpperCase()}${names.slice(1)} ${WHY[why][numbers.length === 1 ? 0 : 1]}.`
  })
  return first + rest.join('')
}

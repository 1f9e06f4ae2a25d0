import type { RuleBody, RuleRow } from '@shared/rules/schemas'
import { LIMITS } from '@shared/limits'
import { STRENGTHS, TRAITS, type Strength } from '@shared/counterWords'
import { labelOf } from '@shared/vocabulary'

/** What is changed of a rule and not kept yet, on top of the row that it was changed on. */
export interface RuleDraft {
  /** Strength by the place of its demand. */
  strengths: Readonly<Record<number, Strength>>
  /** Null while the reason stands as it was. */
  because: string | null
}

export const NOTHING_CHANGED: RuleDraft = { strengths: {}, because: null }

/** The rule as it reads with the draft in it. A strength for a demand that has none any more falls away. */
export function withDraft<T extends RuleBody>(rule: T, draft: RuleDraft): T {
  return {
    ...rule,
    because: draft.because ?? rule.because,
    then: rule.then.map((demand, index) => {
      const strength = draft.strengths[index]
      return strength !== undefined && 'strength' in demand ? { ...demand, strength } : demand
    }),
  }
}

/** The draft without what says the same as the rule; null when nothing is left. */
export function draftLeft(rule: RuleBody, draft: RuleDraft): RuleDraft | null {
  const strengths = Object.fromEntries(
    Object.entries(draft.strengths).filter(([index, strength]) => {
      const demand = rule.then[Number(index)]
      return demand !== undefined && 'strength' in demand && demand.strength !== strength
    }),
  )
  const because = draft.because === rule.because ? null : draft.because
  return Object.keys(strengths).length === 0 && because === null ? null : { strengths, because }
}

/** What is wrong with a reason, with the remedy; empty when nothing is. */
export function reasonFault(because: string): string {
  const { length } = because.trim()
  if (length === 0) return 'Say why, in one sentence.'
  const over = length - LIMITS.reasonSentence
  return over > 0 ? `${over} ${over === 1 ? 'letter' : 'letters'} too many. Make it shorter.` : ''
}

/** The body that a PUT sends: the row's own fields, with the draft in them. */
export function bodyOf(row: RuleRow, draft: RuleDraft, on = row.on): RuleBody {
  const { id: _id, version: _version, createdAt: _made, updatedAt: _changed, ...body } = withDraft(row, draft)
  return { ...body, because: body.because.trim(), on }
}

/** What somebody else changed from one row to the next, a sentence each. */
export function changeSentences(before: RuleBody, after: RuleBody): string[] {
  const sentences: string[] = []
  if (before.on !== after.on) sentences.push(after.on ? 'It was switched on.' : 'It was switched off.')
  after.then.forEach((demand, index) => {
    const was = before.then[index]
    if (!('strength' in demand) || was === undefined || !('strength' in was)) return
    if (was.trait === demand.trait && was.strength !== demand.strength)
      sentences.push(
        `${labelOf(TRAITS, demand.trait)}: ${labelOf(STRENGTHS, was.strength)} became ${labelOf(STRENGTHS, demand.strength)}.`,
      )
  })
  if (before.because !== after.because) sentences.push(`The reason now reads: ${after.because}`)
  return sentences.length === 0 ? ['What it asks was changed.'] : sentences
}

/** A kept draft as it comes back from the device; null for a text of another build. */
export function readDraft(value: unknown): RuleDraft | null {
  if (typeof value !== 'object' || value === null) return null
  const { strengths, because } = value as Partial<Record<keyof RuleDraft, unknown>>
  if (typeof strengths !== 'object' || strengths === null) return null
  if (because !== null && typeof because !== 'string') return null
  const known = Object.entries(strengths).filter(([, strength]) =>
    STRENGTHS.some(({ value: each }) => each === strength),
  )
  return { strengths: Object.fromEntries(known) as Record<number, Strength>, because }
}

import type { Condition, Demand, RuleBody } from '@shared/rules/schemas'
import { STRENGTHS, TRAITS, type Strength } from '@shared/counterWords'
import { labelOf } from '@shared/vocabulary'
import { clausesOf, type Joined } from './conditionWords'

/** A stretch of a rule's sentence and what it is; a strength and the reason can be changed where they stand. */
export type RulePart =
  | { kind: 'plain' | 'their' | 'our' | 'sure' | 'said' | 'reason'; text: string }
  | { kind: 'strength'; text: string; strength: Strength; demand: number }

const plain = (text: string): RulePart => ({ kind: 'plain', text })

/** Demands stand between commas, so that the last one keeps its own before "and". */
const joiner = (index: number, count: number): string =>
  index === 0 ? '' : index === count - 1 ? ', and ' : ', '

/** What stands before a question: a comma inside a list that reads on alike, else the joining word. */
function leadOf(list: readonly Joined[], index: number): string {
  const [before, here, after] = [list[index - 1], list[index], list[index + 1]]
  if (before === undefined || here === undefined) return ''
  if (before.clause.sure !== here.clause.sure && before.clause.sure !== '') return `, ${here.joined} `
  const readsOn = after?.joined === here.joined && after.clause.sure === here.clause.sure
  return readsOn ? ', ' : ` ${here.joined} `
}

/**
 * "they deny the near receiver and mirror the thrower, usually, from a lean up": a subject is said once while it
 * stays, and how sure once while the next question wants the same.
 */
function conditionParts(condition: Condition, starred: boolean): RulePart[] {
  const list = clausesOf(condition, starred)
  return list.flatMap(({ clause }, index): RulePart[] => {
    const sayWho = clause.subject !== '' && clause.subject !== list[index - 1]?.clause.subject
    const parts: RulePart[] = [
      plain(leadOf(list, index) + (sayWho ? `${clause.subject} ` : '')),
      { kind: clause.ink, text: clause.words },
    ]
    if (clause.sure !== '' && clause.sure !== list[index + 1]?.clause.sure)
      parts.push(plain(', '), { kind: 'sure', text: clause.sure })
    return parts
  })
}

const strengthPart = (strength: Strength, demand: number): RulePart => ({
  kind: 'strength',
  text: labelOf(STRENGTHS, strength),
  strength,
  demand,
})

const traitPart = (trait: string): RulePart => ({ kind: 'our', text: labelOf(TRAITS, trait) })

function demandParts(demand: Demand, index: number, before: Demand | undefined): RulePart[] {
  if (demand.effect === 'warn')
    return [plain('say '), { kind: 'said', text: `“${demand.text.replace(/\.$/, '')}”` }]
  if (demand.effect === 'ban') return [plain('leave out '), traitPart(demand.trait)]
  const verb = before?.effect === demand.effect ? '' : `${demand.effect} `
  return [plain(verb), traitPart(demand.trait), plain(', '), strengthPart(demand.strength, index)]
}

/** A reason as it stands after "because": its capital goes, and so does the stop that the sentence has. */
export const reasonInside = (because: string): string => {
  const text = because.trim().replace(/\.$/, '')
  return text.charAt(0).toLowerCase() + text.slice(1)
}

const whole = (parts: readonly RulePart[]): RulePart[] => parts.filter(({ text }) => text !== '')

/** If they do this, how sure, want or avoid that, how much, because of what: a rule as one sentence. */
export function ruleSentence(rule: RuleBody): RulePart[] {
  const demands = rule.then.flatMap((demand, index): RulePart[] => [
    plain(joiner(index, rule.then.length)),
    ...demandParts(demand, index, rule.then[index - 1]),
  ])
  return merged([
    plain('If '),
    ...conditionParts(rule.when, rule.starred),
    plain(', '),
    ...demands,
    plain(', because '),
    { kind: 'reason', text: reasonInside(rule.because) },
    plain('.'),
  ])
}

/** "Silent if nobody … : why", without the first word; empty when nothing silences it. */
export function unlessSentence(rule: Pick<RuleBody, 'unless' | 'unlessBecause'>): RulePart[] {
  if (rule.unless === null) return []
  const why = rule.unlessBecause === '' ? '.' : `: ${reasonInside(rule.unlessBecause)}.`
  return merged([plain('Silent if '), ...conditionParts(rule.unless, false), plain(why)])
}

/** Neighbours that are both plain are one stretch. */
function merged(parts: readonly RulePart[]): RulePart[] {
  const list: RulePart[] = []
  for (const part of whole(parts)) {
    const last = list.at(-1)
    if (part.kind === 'plain' && last?.kind === 'plain') list[list.length - 1] = plain(last.text + part.text)
    else list.push(part)
  }
  return list
}

/** The sentence as text, for readers of a switch or a flag. */
export const textOf = (parts: readonly RulePart[]): string => parts.map(({ text }) => text).join('')

import type { Reason } from '@shared/choices/schemas'
import { habitOf } from '@shared/tendencies/habits'

/** One thing that a rule asks, and whether the counter has it. */
export interface ReasonLine {
  /** "Has middle entry", "No valve behind". */
  words: string
  /** -1 to 1: the bar's length and side; positive is for, negative against. */
  length: number
  thin: boolean
}

/** Everything that one rule says about a counter: what they do, how often, why it matters, and its bars. */
export interface ReasonGroup {
  ruleId: string
  habitKey: string | null
  /** What they do; for a rule that rests on our own squad or the rule set, the rule's title. */
  what: string
  because: string
  count: { k: number; n: number; games: number | null } | null
  ink: 'their' | 'our' | 'plain'
  /** The other habits that the rule rests on. */
  also: { habitKey: string; what: string; k: number; n: number }[]
  lines: ReasonLine[]
}

/**
 * The reasons of one counter, one group per rule, in the order given (the heaviest first). Bars are drawn
 * against `heaviest`, the largest weight of all counters in view, so that columns can be compared.
 */
export function reasonGroups(reasons: readonly Reason[], heaviest: number): ReasonGroup[] {
  const groups = new Map<string, ReasonGroup>()
  for (const reason of reasons) {
    const group = groups.get(reason.ruleId) ?? startGroup(reason)
    groups.set(reason.ruleId, group)
    group.lines.push({
      words: lineWords(reason),
      length: heaviest > 0 ? Math.max(-1, Math.min(1, reason.weight / heaviest)) : 0,
      thin: reason.thin,
    })
  }
  return [...groups.values()]
}

function startGroup(reason: Reason): ReasonGroup {
  const habit = reason.habitKey === null ? undefined : habitOf(reason.habitKey)
  const { k, n, games } = reason
  return {
    ruleId: reason.ruleId,
    habitKey: reason.habitKey,
    what: habit?.label ?? reason.title,
    because: reason.because,
    count: k === null || n === null ? null : { k, n, games },
    ink: habit?.ink ?? 'plain',
    also: reason.facts
      .filter((fact) => fact.habitKey !== reason.habitKey)
      .map((fact) => ({
        habitKey: fact.habitKey,
        what: habitOf(fact.habitKey)?.label ?? fact.habitKey,
        k: fact.k,
        n: fact.n,
      })),
    lines: [],
  }
}

/** The largest weight of any reason, without its sign; 0 when there is none. */
export function heaviestOf(choices: readonly { reasons: readonly Reason[] }[]): number {
  return choices
    .flatMap((choice) => choice.reasons)
    .reduce((most, reason) => Math.max(most, Math.abs(reason.weight)), 0)
}

/** What a rule asks ("wants middle entry") turned into what this counter does about it. */
function lineWords({ asked, sign }: Pick<Reason, 'asked' | 'sign'>): string {
  const [verb = '', ...rest] = asked.split(' ')
  const trait = rest.join(' ')
  if (verb === 'avoids') return `Has ${trait}, unwanted here`
  return sign > 0 ? `Has ${trait}` : `No ${trait}`
}

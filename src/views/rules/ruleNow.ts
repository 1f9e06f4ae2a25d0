import type { Choices } from '@shared/choices/schemas'
import type { FactName, RuleRow } from '@shared/rules/schemas'
import { habitOf } from '@shared/tendencies/habits'
import type { TendencyRead } from '@shared/tendencies/schemas'
import type { Trigger } from '@shared/vocabulary'
import { factsIn, habitsIn } from './conditionWords'

/** One habit that a rule asks about, as counted of the next opponent. */
export interface NowCount {
  key: string
  label: string
  k: number
  n: number
  thin: boolean
}

/** Whether a rule speaks for the next opponent, in words, and what it rests on. */
export interface RuleNow {
  state: 'speaks' | 'silent' | 'quiet' | 'off'
  words: string
  counts: NowCount[]
}

/** Rules that were heard: in a reason, a warning, or as why a counter is not offered. */
function heardIn(choices: Choices): Set<string> {
  const heard = [
    ...choices.choices.flatMap((choice) => [...choice.reasons, ...choice.warnings]),
    ...choices.warnings,
    ...choices.leftOut,
  ]
  return new Set(heard.flatMap(({ ruleId }) => (ruleId === null ? [] : [ruleId])))
}

/** A rule that only takes away says nothing where no counter has what it takes away. */
const onlyTakesAway = (rule: RuleRow): boolean =>
  rule.then.every(({ effect }) => effect === 'ban' || effect === 'avoid')

/** Facts that are presses after a trigger: what n counts is every row after it. */
const AFTER: Partial<Record<FactName, { label: string; triggers: readonly Trigger[] }>> = {
  pressedAfterScore: {
    label: 'Press after a basket or a free throw',
    triggers: ['made-basket', 'made-free-throw'],
  },
  pressedAfterFreeThrow: { label: 'Press after a made free throw', triggers: ['made-free-throw'] },
  pressedAfterDeadBall: { label: 'Press after a whistle', triggers: ['dead-ball'] },
  pressedAfterBreak: { label: 'Press after a time-out or a new period', triggers: ['break'] },
}

function afterCount(fact: FactName, read: Pick<TendencyRead, 'situations'>): NowCount[] {
  const after = AFTER[fact]
  if (after === undefined) return []
  const rows = read.situations.filter(({ trigger }) => after.triggers.some((each) => each === trigger))
  const k = rows.reduce((sum, row) => sum + row.pressed, 0)
  const n = rows.reduce((sum, row) => sum + row.n, 0)
  return [{ key: fact, label: after.label, k, n, thin: false }]
}

/**
 * What every rule says now for one game, by its id. The order itself is the server's: this only reads who was heard
 * in it, who was kept silent and why, and the counts behind.
 */
export function rulesNow(
  rules: readonly RuleRow[],
  choices: Choices,
  read: Pick<TendencyRead, 'tendencies' | 'situations'>,
): Map<string, RuleNow> {
  const heard = heardIn(choices)
  const silenced = new Map(choices.silenced.map(({ ruleId, because }) => [ruleId, because]))
  const counted = new Map(read.tendencies.map((tendency) => [tendency.key, tendency]))
  const countsOf = (rule: RuleRow): NowCount[] => [
    ...habitsIn(rule.when).flatMap((key) => {
      const found = counted.get(key)
      const label = habitOf(key)?.label ?? key
      return found === undefined ? [] : [{ key, label, k: found.k, n: found.n, thin: found.thin }]
    }),
    ...factsIn(rule.when).flatMap((fact) => afterCount(fact, read)),
  ]
  const state = (rule: RuleRow): Pick<RuleNow, 'state' | 'words'> => {
    if (!rule.on) return { state: 'off', words: 'Switched off' }
    if (heard.has(rule.id)) return { state: 'speaks', words: 'Speaks now' }
    const because = silenced.get(rule.id)
    if (because !== undefined) return { state: 'silent', words: `Kept silent: ${because}` }
    if (onlyTakesAway(rule)) return { state: 'quiet', words: 'Touches no counter now' }
    return { state: 'quiet', words: 'Not now' }
  }
  return new Map(rules.map((rule) => [rule.id, { ...state(rule), counts: countsOf(rule) }]))
}

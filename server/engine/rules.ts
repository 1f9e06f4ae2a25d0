import { Engine, type RuleResult } from 'json-rules-engine'
import type { RuleRow } from '@shared/rules/schemas'
import { compile, held, teach, type HeldFact } from './conditions'
import type { Facts } from './facts'
import type { EngineTendency } from './tendencies'

/** What the engine needs of a rule; a stored RuleRow fits. */
export type EngineRule = Pick<
  RuleRow,
  'id' | 'number' | 'title' | 'when' | 'then' | 'because' | 'unless' | 'unlessBecause' | 'starred' | 'on'
>

/** A rule whose condition holds and that no contra-fact silences, with the facts that fired it. */
export interface FiredRule {
  rule: EngineRule
  facts: HeldFact[]
  /** Probability that what it rests on is so, 0 to 1; 1 for a starred rule. */
  credence: number
}

/** A rule that would have fired, and the contra-facts that keep it silent. */
export interface SilencedRule {
  rule: EngineRule
  because: string
  facts: HeldFact[]
}

export interface RuleRun {
  fired: FiredRule[]
  silenced: SilencedRule[]
}

/**
 * Runs the rules that are switched on against an opponent's tendencies and our own facts. Both lists keep
 * the order of the rules. Nothing is read or written: the promise is the evaluator's way, not I/O.
 */
export async function runRules(
  rules: readonly EngineRule[],
  tendencies: readonly EngineTendency[],
  facts: Facts,
): Promise<RuleRun> {
  const habits = new Map(tendencies.map((tendency) => [tendency.key, tendency]))
  const active = rules.filter((rule) => rule.on)
  const engine = new Engine()
  teach(engine, habits, facts)
  for (const rule of active) {
    engine.addRule({
      conditions: compile(rule.when, rule.starred),
      event: { type: 'when', params: { id: rule.id } },
    })
    if (rule.unless !== null)
      engine.addRule({ conditions: compile(rule.unless), event: { type: 'unless', params: { id: rule.id } } })
  }
  const { results } = await engine.run()
  const resultOf = (type: string, id: string): RuleResult | undefined =>
    results.find((result) => result.event?.type === type && result.event.params?.id === id)

  const run: RuleRun = { fired: [], silenced: [] }
  for (const rule of active) {
    const when = resultOf('when', rule.id)
    if (when === undefined) continue
    const unless = resultOf('unless', rule.id)
    if (unless) {
      const contra = held(unless.conditions, habits, facts)
      run.silenced.push({ rule, because: rule.unlessBecause || rule.title, facts: contra.facts })
      continue
    }
    const { facts: holding, credence } = held(when.conditions, habits, facts)
    run.fired.push({ rule, facts: holding, credence: rule.starred ? 1 : credence })
  }
  return run
}

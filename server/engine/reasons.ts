import type { Choice, Reason } from '@shared/choices/schemas'
import type { Demand } from '@shared/rules/schemas'
import { TRAITS, type Trait } from '@shared/counterWords'
import { labelOf } from '@shared/vocabulary'
import type { FiredRule } from './rules'
import type { EngineSettings } from './settings'

type TraitDemand = Extract<Demand, { effect: 'want' | 'avoid' }>
type Warning = Choice['warnings'][number]

const isTraitDemand = (demand: Demand): demand is TraitDemand =>
  demand.effect === 'want' || demand.effect === 'avoid'

/**
 * +1 for a wanted trait offered, -1 for one missing, -1 for an unwanted trait offered. Not having what is
 * unwanted says nothing for a counter (0): it spares a fault, it beats no press.
 */
function signOf(demand: TraitDemand, traits: readonly Trait[]): 1 | -1 | 0 {
  const offered = traits.includes(demand.trait)
  if (demand.effect === 'want') return offered ? 1 : -1
  return offered ? -1 : 0
}

/** Every demand of the fired rules that speaks for or against a counter, the heaviest first. */
export function reasonsFor(
  traits: readonly Trait[],
  fired: readonly FiredRule[],
  strengths: EngineSettings['strengths'],
): Reason[] {
  const reasons = fired.flatMap(({ rule, facts, credence }) => {
    const habits = facts.filter((fact) => fact.kind === 'habit')
    const [habit] = habits
    return rule.then.filter(isTraitDemand).flatMap((demand): Reason[] => {
      const sign = signOf(demand, traits)
      if (sign === 0) return []
      return [
        {
          ruleId: rule.id,
          ruleNumber: rule.number,
          title: rule.title,
          habitKey: habit?.key ?? null,
          because: rule.because,
          k: habit?.k ?? null,
          n: habit?.n ?? null,
          games: habit?.games ?? null,
          facts: habits.map(({ key, k, n, games, thin }) => ({ habitKey: key, k, n, games, thin })),
          asked: `${demand.effect === 'want' ? 'wants' : 'avoids'} ${labelOf(TRAITS, demand.trait)}`,
          sign,
          strength: demand.strength,
          credence,
          weight: sign * strengths[demand.strength] * credence,
          thin: habits.some((fact) => fact.thin),
        },
      ]
    })
  })
  return reasons.sort(
    (one, two) =>
      Math.abs(two.weight) - Math.abs(one.weight) || (one.ruleNumber ?? 100) - (two.ruleNumber ?? 100),
  )
}

/** The first fired rule that bans a trait of this counter. */
export function banOn(traits: readonly Trait[], fired: readonly FiredRule[]): FiredRule | null {
  const bans = ({ rule }: FiredRule) =>
    rule.then.some((demand) => demand.effect === 'ban' && traits.includes(demand.trait))
  return fired.find(bans) ?? null
}

const avoided = ({ rule }: FiredRule): Trait[] =>
  rule.then.flatMap((demand) => (demand.effect === 'avoid' ? [demand.trait] : []))

const textsOf = ({ rule }: FiredRule): Warning[] =>
  rule.then.flatMap((demand) => (demand.effect === 'warn' ? [{ ruleId: rule.id, text: demand.text }] : []))

/** Warnings said once: those of rules that avoid no trait. */
export const warningsForAll = (fired: readonly FiredRule[]): Warning[] =>
  fired.filter((one) => avoided(one).length === 0).flatMap(textsOf)

/** Warnings said beside a counter: those of rules that avoid a trait it offers. */
export const warningsFor = (traits: readonly Trait[], fired: readonly FiredRule[]): Warning[] =>
  fired.filter((one) => avoided(one).some((trait) => traits.includes(trait))).flatMap(textsOf)

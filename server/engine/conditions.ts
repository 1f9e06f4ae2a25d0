import type { Engine, TopLevelCondition } from 'json-rules-engine'
import { FACTS, type Condition, type FactName, type HabitCondition } from '@shared/rules/schemas'
import { betaCdf } from '@shared/stats/beta'
import { reaches } from '@shared/stats/evidence'
import { wilson } from '@shared/stats/wilson'
import type { Facts } from './facts'
import type { EngineTendency } from './tendencies'

type Nested = Extract<TopLevelCondition, { all: unknown }>['all'][number]

/** A condition after it was evaluated: a group, or a single question. */
export interface Evaluated {
  result?: boolean
  all?: Evaluated[]
  any?: Evaluated[]
  fact?: string
  params?: Record<string, unknown>
  value?: unknown
}

/** What a habit is asked, as it stands in a compiled condition. */
type Asked = Pick<HabitCondition, 'is' | 'threshold' | 'grade'>

/** A condition that held, with what it held on. A fact of ours is certain; a habit is as sure as its rows. */
export type HeldFact =
  | {
      kind: 'habit'
      key: string
      k: number
      n: number
      games: number
      thin: boolean
      /** Adjusted probability that the habit's rate is past the threshold; 1 where one sighting is asked. */
      credence: number
    }
  | { kind: 'fact'; fact: FactName; value: number; credence: 1 }

/**
 * Whether a habit meets what is asked. `seen` is one sighting. `above` and `below` need the grade, and the
 * 80 % Wilson bound of the raw count past the threshold (DOMAIN.md section 4, default).
 */
function meets(habit: EngineTendency | null, asked: Asked): boolean {
  if (habit === null || habit.n === 0) return false
  if (asked.is === 'seen') return habit.k >= 1
  if (!reaches(habit.grade, asked.grade)) return false
  const range = wilson(habit.k, habit.n, 0.8)
  if (range === null) return false
  return asked.is === 'above' ? range.low > asked.threshold : range.high < asked.threshold
}

function credenceOf(habit: EngineTendency, asked: Asked): number {
  if (asked.is === 'seen') return 1
  if (habit.posterior === null) return 0
  const below = betaCdf(asked.threshold, habit.posterior)
  return asked.is === 'below' ? below : 1 - below
}

/** A rule's condition in json-rules-engine's form. In a starred rule `above` acts on one sighting. */
function nested(condition: Condition, starred: boolean): Nested {
  if ('all' in condition) return { all: condition.all.map((inner) => nested(inner, starred)) }
  if ('any' in condition) return { any: condition.any.map((inner) => nested(inner, starred)) }
  if ('habit' in condition) {
    const is = starred && condition.is === 'above' ? 'seen' : condition.is
    const asked: Asked = { is, threshold: condition.threshold, grade: condition.grade }
    return { fact: 'habit', params: { key: condition.habit }, operator: 'meets', value: asked }
  }
  const operator = {
    equal: 'equal',
    'at-least': 'greaterThanInclusive',
    'at-most': 'lessThanInclusive',
  }[condition.is]
  return { fact: condition.fact, operator, value: condition.value }
}

export const compile = (condition: Condition, starred = false): TopLevelCondition => ({
  all: [nested(condition, starred)],
})

/** Gives the evaluator what conditions ask about. A habit that is not in the list never holds. */
export function teach(engine: Engine, habits: ReadonlyMap<string, EngineTendency>, facts: Facts): void {
  engine.addFact('habit', (params) => habits.get(String(params.key)) ?? null)
  engine.addOperator<EngineTendency | null, Asked>('meets', meets)
  for (const fact of FACTS) engine.addFact(fact, facts[fact])
}

const isFact = (name: string): name is FactName => FACTS.some((fact) => fact === name)

/**
 * The conditions that held in a tree that held as a whole, in the order written, and how sure the tree is:
 * `all` is as sure as its least sure part, `any` as its surest that held. (The evaluator leaves the outermost
 * group without a result of its own.)
 */
export function held(
  tree: Evaluated,
  habits: ReadonlyMap<string, EngineTendency>,
  facts: Facts,
): { facts: HeldFact[]; credence: number } {
  const group = tree.all ?? tree.any
  if (group) {
    const parts = group.filter((part) => part.result === true).map((part) => held(part, habits, facts))
    const credences = parts.map((part) => part.credence)
    return {
      facts: parts.flatMap((part) => part.facts),
      credence: tree.all ? Math.min(...credences) : Math.max(...credences),
    }
  }
  const name = tree.fact ?? ''
  if (isFact(name)) {
    // A condition on a fact without an answer does not hold, so that there is one here.
    const value = facts[name] ?? 0
    return { facts: [{ kind: 'fact', fact: name, value, credence: 1 }], credence: 1 }
  }
  const habit = habits.get(String(tree.params?.key))
  if (habit === undefined) return { facts: [], credence: 0 }
  const { key, k, n, games, thin } = habit
  const credence = credenceOf(habit, tree.value as Asked)
  return { facts: [{ kind: 'habit', key, k, n, games, thin, credence }], credence }
}

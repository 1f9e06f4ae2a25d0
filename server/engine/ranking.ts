import type { Choice } from '@shared/choices/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import { betaAfter, betaInterval, betaMean, betaOf, logistic, logit } from '@shared/stats/beta'
import type { Count } from '@shared/stats/clusters'
import type { EngineSettings } from './settings'

/** What the engine needs of a counter; a CounterRow fits. */
export type EngineCounter = Pick<
  CounterRow,
  'id' | 'name' | 'traits' | 'roles' | 'rulePacks' | 'liveReps' | 'newActions' | 'practice' | 'record'
>

/** Our own success against pressure that every prior starts from (RECORD.md section 5: base). */
export function baseOf(
  own: Count,
  { basePrior }: Pick<EngineSettings, 'basePrior'>,
): Count & { mean: number } {
  return { ...own, mean: betaMean(betaAfter(betaOf(basePrior.rate, basePrior.trips), own.k, own.n)) }
}

/** Our trips with a counter, weighted: against the shape they show most, against others, in practice. */
export function weightedRecord(
  counter: Pick<EngineCounter, 'record' | 'practice'>,
  mostly: string | null,
  weights: EngineSettings['recordWeights'],
): Count {
  const parts = [
    ...counter.record.map(({ shape, k, n }) => ({
      k,
      n,
      weight: shape === mostly ? weights.sameShape : weights.otherShape,
    })),
    { ...counter.practice, weight: weights.practice },
  ]
  return {
    k: parts.reduce((sum, part) => sum + part.weight * part.k, 0),
    n: parts.reduce((sum, part) => sum + part.weight * part.n, 0),
  }
}

export type Estimate = Pick<Choice, 'prior' | 'recordShare'> & { expected: NonNullable<Choice['expected']> }

/**
 * Expected success (RECORD.md section 5): logit p0 = logit(base) + sum of the reasons' weights + squad
 * term; then Beta(8 p0, 8 (1 - p0)) updated by our weighted record. Mean and 80 % interval.
 */
export function estimate(
  input: { base: number; weights: readonly number[]; squadTerm: number; record: Count },
  { priorTrips }: Pick<EngineSettings, 'priorTrips'>,
): Estimate {
  const sum = input.weights.reduce((total, weight) => total + weight, 0)
  const prior = logistic(logit(input.base) + sum + input.squadTerm)
  const posterior = betaAfter(betaOf(prior, priorTrips), input.record.k, input.record.n)
  return {
    prior,
    recordShare: input.record.n / (priorTrips + input.record.n),
    expected: { mean: betaMean(posterior), interval: betaInterval(posterior, 0.8) },
  }
}

/** What the order is made from. `mean` is null when nothing is known. */
export interface Contender {
  choice: Omit<Choice, 'rank'>
  newActions: number
  universal: boolean
  name: string
}

const meanOf = (one: Contender): number => one.choice.expected?.mean ?? 0

/** Tells two contenders apart when nothing else does, so that the order never depends on the database. */
const byName = (one: Contender, two: Contender): number =>
  one.name < two.name ? -1 : one.name > two.name ? 1 : one.choice.counterId < two.choice.counterId ? -1 : 1

/**
 * Best first. Among those within `tieWithin` of the best one left, the counter with the fewest actions new
 * to the squad takes the place. (Taken place by place, since nearness does not pass from pair to pair.)
 */
function byExpected(contenders: readonly Contender[], tieWithin: number): Contender[] {
  const left = [...contenders].sort((one, two) => meanOf(two) - meanOf(one) || byName(one, two))
  const order: Contender[] = []
  while (left.length > 0) {
    const best = Math.max(...left.map(meanOf))
    const tied = left.filter((one) => best - meanOf(one) <= tieWithin + 1e-9)
    const fewest = Math.min(...tied.map((one) => one.newActions))
    const next = tied.find((one) => one.newActions === fewest)
    if (next === undefined) break
    order.push(next)
    left.splice(left.indexOf(next), 1)
  }
  return order
}

/** Nothing is known of them: the counter for any press first, then the best filled, then the fewest new actions. */
const byReadiness = (contenders: readonly Contender[]): Contender[] =>
  [...contenders].sort(
    (one, two) =>
      Number(two.universal) - Number(one.universal) ||
      two.choice.squadTerm - one.choice.squadTerm ||
      one.newActions - two.newActions ||
      byName(one, two),
  )

/** Ranks from 1; counters that are not game-ready come last, in the same order among themselves. */
export function rank(contenders: readonly Contender[], unknown: boolean, tieWithin: number): Choice[] {
  const order = (some: readonly Contender[]) => (unknown ? byReadiness(some) : byExpected(some, tieWithin))
  const ready = contenders.filter((one) => one.choice.gameReady)
  const notYet = contenders.filter((one) => !one.choice.gameReady)
  return [...order(ready), ...order(notYet)].map(({ choice }, index) => ({ ...choice, rank: index + 1 }))
}

import { lnBeta, type Beta } from './beta'
import type { Count } from './clusters'

/** How strength is found (RECORD.md section 4). */
export interface PoolSettings {
  /** Bounds of the strength, in rows. */
  least: number
  most: number
  /** The strength used where the situations are too few to tell. */
  otherwise: number
  /** So many situations, each of so many counted rows, are needed to tell. */
  situations: number
  rows: number
}

export const POOL: PoolSettings = { least: 2, most: 40, otherwise: 8, situations: 3, rows: 5 }

/** A situation: k of n, weighted or not, and how many rows were counted in it before any weighting. */
export interface PoolCell extends Count {
  rows: number
}

export interface Pool {
  mean: number
  strength: number
  /** One posterior per situation, in the order given. */
  posteriors: Beta[]
}

/** The search ends once the strength is known to a ratio of 1.001. */
const NEAR = 0.001
const GOLDEN = (Math.sqrt(5) - 1) / 2

/**
 * The mean to pool towards: the overall rate of the cells, kept half a row away from 0 and 1, where a
 * beta would have no spread. Null when nothing was counted.
 */
export function overallRate(cells: readonly Count[]): number | null {
  const k = cells.reduce((sum, cell) => sum + cell.k, 0)
  const n = cells.reduce((sum, cell) => sum + cell.n, 0)
  if (n <= 0) return null
  const edge = 0.5 / (n + 1)
  return Math.min(1 - edge, Math.max(edge, k / n))
}

/** Log-likelihood of the strength for a given mean, without the terms that do not depend on it. */
export function poolLikelihood(cells: readonly Count[], mean: number, strength: number): number {
  const a = mean * strength
  const b = (1 - mean) * strength
  const before = lnBeta(a, b)
  return cells.reduce(
    (sum, cell) => (cell.n > 0 ? sum + lnBeta(a + cell.k, b + cell.n - cell.k) - before : sum),
    0,
  )
}

/**
 * How many rows the overall rate is worth in each situation, by maximum likelihood of the beta-binomial
 * with that mean, within bounds (RECORD.md section 4: 2 to 40). Searched on the logarithm by golden section.
 */
export function poolStrength(
  cells: readonly Count[],
  mean: number,
  bounds: Pick<PoolSettings, 'least' | 'most'>,
): number {
  const at = (log: number) => poolLikelihood(cells, mean, Math.exp(log))
  const ends = [Math.log(bounds.least), Math.log(bounds.most)]
  let [low = 0, high = 0] = ends
  let left = high - GOLDEN * (high - low)
  let right = low + GOLDEN * (high - low)
  let atLeft = at(left)
  let atRight = at(right)
  while (high - low > NEAR) {
    if (atLeft < atRight) {
      low = left
      left = right
      atLeft = atRight
      right = low + GOLDEN * (high - low)
      atRight = at(right)
    } else {
      high = right
      right = left
      atRight = atLeft
      left = high - GOLDEN * (high - low)
      atLeft = at(left)
    }
  }
  const best = [...ends, (low + high) / 2].reduce((held, log) => (at(log) > at(held) ? log : held))
  return Math.exp(best)
}

/**
 * A situation's rate shrunk towards the overall rate: Beta(s m + k, s (1 - m) + n - k). Strength 0 leaves
 * the raw rate, a very large one the overall rate.
 */
export function pooled(cell: Count, mean: number, strength: number): Beta {
  return { a: mean * strength + cell.k, b: (1 - mean) * strength + cell.n - cell.k }
}

/** Situations pooled by a beta-binomial; null when nothing was counted in any. */
export function betaBinomialPool(cells: readonly PoolCell[], settings: PoolSettings = POOL): Pool | null {
  const mean = overallRate(cells)
  if (mean === null) return null
  const enough = cells.filter((cell) => cell.rows >= settings.rows).length >= settings.situations
  const strength = enough ? poolStrength(cells, mean, settings) : settings.otherwise
  return { mean, strength, posteriors: cells.map((cell) => pooled(cell, mean, strength)) }
}

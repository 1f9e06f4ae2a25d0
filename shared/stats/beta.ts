/// <reference types="./jstat.d.ts" />
import jStat from 'jstat'
import type { Range } from './wilson'

/** A beta distribution by its two counts: a successes and b failures, prior taken in. Both above 0. */
export interface Beta {
  a: number
  b: number
}

/** Natural logarithm of the gamma function at x > 0. */
export const lnGamma = (x: number): number => jStat.gammaln(x)

/** Natural logarithm of the beta function. */
export const lnBeta = (a: number, b: number): number => lnGamma(a) + lnGamma(b) - lnGamma(a + b)

/** The rate below which a share p of the distribution lies. Throws a RangeError for a or b not above 0. */
export function betaQuantile(p: number, { a, b }: Beta): number {
  if (!(a > 0 && b > 0)) throw new RangeError(`a beta needs two positive counts, not ${a} and ${b}`)
  if (p <= 0) return 0
  if (p >= 1) return 1
  return jStat.beta.inv(p, a, b)
}

/** Probability that the rate is at most x. */
export function betaCdf(x: number, { a, b }: Beta): number {
  if (!(a > 0 && b > 0)) throw new RangeError(`a beta needs two positive counts, not ${a} and ${b}`)
  if (x <= 0) return 0
  if (x >= 1) return 1
  return jStat.beta.cdf(x, a, b)
}

export const betaMean = ({ a, b }: Beta): number => a / (a + b)

/** Central interval of the given coverage, .8 unless told. */
export function betaInterval(beta: Beta, coverage = 0.8): Range {
  const tail = (1 - coverage) / 2
  return { low: betaQuantile(tail, beta), high: betaQuantile(1 - tail, beta) }
}

/** A prior of this mean (a share) worth so many rows. */
export const betaOf = (mean: number, worth: number): Beta => ({ a: mean * worth, b: (1 - mean) * worth })

/** The posterior after k of n more rows; both may be weighted and need not be whole. */
export const betaAfter = ({ a, b }: Beta, k: number, n: number): Beta => ({ a: a + k, b: b + n - k })

export const logit = (p: number): number => Math.log(p / (1 - p))

/** The share whose logit is x. */
export const logistic = (x: number): number => 1 / (1 + Math.exp(-x))

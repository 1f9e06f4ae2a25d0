import { lnGamma } from './beta'
import { claim } from './evidence'

/**
 * Least k of n that is claimed *usually* against one half, or null when not even n of n is.
 * RECORD.md section 4 lists 4/5, 6/8, 8/10, 10/15, 13/20 and 19/30.
 */
export function leastUsual(n: number): number | null {
  if (claim(n, n) !== 'usually') return null
  let fails = Math.floor(n / 2)
  let passes = n
  while (passes - fails > 1) {
    const middle = Math.floor((fails + passes) / 2)
    if (claim(middle, n) === 'usually') passes = middle
    else fails = middle
  }
  return passes
}

/** Probability of k or more of n at a true rate of one half: the exact binomial tail. */
export function tailAtHalf(k: number, n: number): number {
  let term = Math.exp(lnGamma(n + 1) - lnGamma(k + 1) - lnGamma(n - k + 1) - n * Math.LN2)
  let sum = 0
  for (let at = k; at <= n && term > 0; at += 1) {
    sum += term
    term *= (n - at) / (at + 1)
  }
  return Math.min(1, sum)
}

/** Probability that n rows at a true rate of one half are claimed *usually*; 4 of 5 makes it 19 in 100. */
export function usualByChance(n: number): number {
  const least = leastUsual(n)
  return least === null ? 0 : tailAtHalf(least, n)
}

/**
 * How many claims chance alone would give among cells of these n, were every true rate one half: each may
 * come out *usually* or, by the mirror image, *rarely*. Cells that may not be claimed are to be left out.
 */
export function claimsByChance(ns: readonly number[]): number {
  const known = new Map<number, number>()
  let sum = 0
  for (const n of ns) {
    const chance = known.get(n) ?? 2 * usualByChance(n)
    known.set(n, chance)
    sum += chance
  }
  return sum
}

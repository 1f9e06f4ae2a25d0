import { normalQuantile } from './normal'

/** Both ends as shares, 0 to 1. */
export interface Range {
  low: number
  high: number
}

/** Central coverage of the interval that is shown, and of the one that a claim must pass. */
export type Level = 0.95 | 0.8

const z: Record<Level, number> = { 0.95: normalQuantile(0.975), 0.8: normalQuantile(0.9) }

/**
 * Wilson score interval of k of n, without continuity correction (RECORD.md section 4; Newcombe 1998,
 * method 3). `null` when nothing was counted. 0 of n starts at exactly 0 and n of n ends at exactly 1.
 * Throws a RangeError when k is not within 0 to n.
 */
export function wilson(k: number, n: number, level: Level = 0.95): Range | null {
  if (!(k >= 0 && k <= n && Number.isFinite(n))) throw new RangeError(`${k} of ${n} is no count`)
  if (n === 0) return null
  const quantile = z[level]
  const square = quantile * quantile
  const rate = k / n
  const centre = (k + square / 2) / (n + square)
  const half = (quantile * Math.sqrt(n * rate * (1 - rate) + square / 4)) / (n + square)
  return {
    low: k === 0 ? 0 : Math.min(rate, Math.max(0, centre - half)),
    high: k === n ? 1 : Math.max(rate, Math.min(1, centre + half)),
  }
}

const SQRT_TWO_PI = Math.sqrt(2 * Math.PI)

/** Density of the standard normal at x. */
function normalDensity(x: number): number {
  return Math.exp(-0.5 * x * x) / SQRT_TWO_PI
}

/**
 * Share of a standard normal below x, by the series x + x^3/3 + x^5/15 + ... times the density.
 * Accurate to 1e-14 for |x| under 7; beyond that the answer is 0 or 1 to the same accuracy.
 */
export function normalCdf(x: number): number {
  if (x < -8) return 0
  if (x > 8) return 1
  let term = x
  let sum = x
  for (let odd = 3; Math.abs(term) > 1e-17; odd += 2) {
    term *= (x * x) / odd
    sum += term
  }
  return 0.5 + sum * normalDensity(x)
}

/**
 * The x below which a share p of a standard normal lies.
 * Newton's method from 0: above one half the share is concave in x, so that the steps approach from one
 * side and cannot overshoot. Throws a RangeError unless 0 < p < 1.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a share between 0 and 1 is needed, not ${p}`)
  if (p < 0.5) return -normalQuantile(1 - p)
  let x = 0
  for (let step = 0; step < 60; step += 1) {
    const change = (p - normalCdf(x)) / normalDensity(x)
    x += change
    if (Math.abs(change) < 1e-13) break
  }
  return x
}

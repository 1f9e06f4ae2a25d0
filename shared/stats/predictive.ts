import { lnBeta, lnGamma, type Beta } from './beta'

const lnChoose = (n: number, k: number): number => lnGamma(n + 1) - lnGamma(k + 1) - lnGamma(n - k + 1)

function checkTrips(n: number): void {
  if (!Number.isInteger(n) || n < 0) throw new RangeError(`${n} is no number of trips`)
}

/**
 * How likely each number of successes, 0 to n, is in n new trips when the rate itself is only known as a beta: the
 * beta-binomial distribution, C(n, k) B(a + k, b + n - k) / B(a, b). Its n + 1 values sum to 1.
 * Throws a RangeError when n is no whole number from 0.
 */
export function predictive(beta: Beta, n: number): number[] {
  checkTrips(n)
  const base = lnBeta(beta.a, beta.b)
  return Array.from({ length: n + 1 }, (_, k) =>
    Math.exp(lnChoose(n, k) + lnBeta(beta.a + k, beta.b + n - k) - base),
  )
}

/**
 * The central range of successes to expect in n new trips, both ends whole and included; it holds at least the
 * coverage, .8 unless told. Wider than the interval of the rate, for one game is a few trips only.
 */
export function predictiveRange(beta: Beta, n: number, coverage = 0.8): { low: number; high: number } {
  const masses = predictive(beta, n)
  const tail = (1 - coverage) / 2
  const reached = (share: number): number => {
    let below = 0
    // A hair of tolerance, so that a share that is met exactly is not passed over by rounding.
    const at = masses.findIndex((mass) => (below += mass) >= share - 1e-12)
    return at === -1 ? n : at
  }
  return { low: reached(tail), high: reached(1 - tail) }
}

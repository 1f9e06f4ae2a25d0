import jStat from 'jstat'
import { describe, expect, it } from 'vitest'
import { betaInterval, type Beta } from '@shared/stats/beta'
import { predictive, predictiveRange } from '@shared/stats/predictive'

/** Exact for whole a and b: C(n,k) (a+k-1)! (b+n-k-1)! (a+b-1)! / ((a-1)! (b-1)! (a+b+n-1)!), in whole numbers. */
function exact({ a, b }: Beta, n: number, k: number): number {
  const factorial = (m: number): bigint => (m <= 1 ? 1n : BigInt(m) * factorial(m - 1))
  const top = factorial(n) * factorial(a + k - 1) * factorial(b + n - k - 1) * factorial(a + b - 1)
  const bottom =
    factorial(k) * factorial(n - k) * factorial(a - 1) * factorial(b - 1) * factorial(a + b + n - 1)
  return Number((top * 10n ** 15n) / bottom) / 1e15
}

const { binomial } = jStat as unknown as { binomial: { pdf(k: number, n: number, p: number): number } }

describe('predictive', () => {
  it.each([
    [{ a: 2, b: 3 }, 5],
    [{ a: 15, b: 5 }, 9],
    [{ a: 7, b: 3 }, 20],
  ])('is the beta-binomial of %j over %d trips, exactly', (beta, n) => {
    const masses = predictive(beta, n)
    expect(masses).toHaveLength(n + 1)
    masses.forEach((mass, k) => expect(mass).toBeCloseTo(exact(beta, n, k), 10))
    expect(masses.reduce((sum, mass) => sum + mass, 0)).toBeCloseTo(1, 10)
  })

  it('is flat when nothing is known of the rate', () => {
    for (const mass of predictive({ a: 1, b: 1 }, 9)) expect(mass).toBeCloseTo(0.1, 12)
  })

  it('becomes the binomial where the rate is all but certain', () => {
    predictive({ a: 7e7, b: 3e7 }, 10).forEach((mass, k) =>
      expect(mass).toBeCloseTo(binomial.pdf(k, 10, 0.7), 5),
    )
  })

  it('of no trip is no success, and refuses part of a trip', () => {
    expect(predictive({ a: 3, b: 2 }, 0)).toEqual([1])
    expect(() => predictive({ a: 3, b: 2 }, 1.5)).toThrow(RangeError)
    expect(() => predictive({ a: 3, b: 2 }, -1)).toThrow(RangeError)
  })
})

describe('predictiveRange', () => {
  it('holds at least the coverage, and one success less at either end would leave too much out', () => {
    const beta = { a: 15, b: 5 }
    const masses = predictive(beta, 9)
    const { low, high } = predictiveRange(beta, 9)
    const sum = (from: number, to: number) => masses.slice(from, to).reduce((all, mass) => all + mass, 0)
    expect(sum(low, high + 1)).toBeGreaterThanOrEqual(0.8)
    expect(sum(0, low)).toBeLessThan(0.1)
    expect(sum(high + 1, 10)).toBeLessThanOrEqual(0.1)
  })

  it.each([
    [{ a: 15, b: 5 }, 9],
    [{ a: 40, b: 20 }, 12],
    [{ a: 6, b: 2 }, 6],
  ])('is wider than the interval of the rate: %j over %d trips', (beta, n) => {
    const rate = betaInterval(beta)
    const { low, high } = predictiveRange(beta, n)
    expect((high - low) / n).toBeGreaterThan(rate.high - rate.low)
  })

  it('of no trip is nothing to nothing', () => {
    expect(predictiveRange({ a: 3, b: 2 }, 0)).toEqual({ low: 0, high: 0 })
  })
})

import { describe, it, expect } from 'vitest'
import { betaCdf, betaQuantile } from '@shared/stats/beta'

describe('Beta(728, 584) quantiles: computed with scipy and jstat, no published figure', () => {
  it.each([
    [0.025, 0.527922],
    [0.5, 0.554906],
    [0.975, 0.581676],
  ])('the %f quantile is %f', (p, expected) => {
    expect(Math.abs(betaQuantile(p, { a: 728, b: 584 }) - expected)).toBeLessThan(1e-6)
  })
})

describe('Jeffreys 95 % as beta quantiles: computed with R and jstat, no published figure', () => {
  it.each([
    [81, 263, 0.254522, 0.365647],
    [15, 148, 0.060449, 0.157643],
    [1, 29, 0.003746, 0.150078],
    [0, 20, 2.42e-5, 0.116639],
  ])('%i of %i is %f to %f', (k, n, low, high) => {
    const posterior = { a: k + 0.5, b: n - k + 0.5 }
    expect(Math.abs(betaQuantile(0.025, posterior) - low)).toBeLessThan(1e-6)
    expect(Math.abs(betaQuantile(0.975, posterior) - high)).toBeLessThan(1e-6)
  })
})

describe('probability past a threshold: the binomial sum that a beta with whole counts equals', () => {
  it('P(rate > .5) under Beta(8, 4) is P(fewer than 8 of 11 heads)', () => {
    // (C(11,0) + ... + C(11,7)) / 2^11 = 1816 / 2048
    expect(1 - betaCdf(0.5, { a: 8, b: 4 })).toBeCloseTo(1816 / 2048, 6)
  })
})

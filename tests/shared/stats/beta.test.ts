import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import {
  betaAfter,
  betaCdf,
  betaInterval,
  betaMean,
  betaOf,
  betaQuantile,
  logistic,
  logit,
} from '@shared/stats/beta'

const side = fc.double({ min: 0.5, max: 400, noNaN: true })
const share = fc.double({ min: 0.01, max: 0.99, noNaN: true })

describe('beta', () => {
  it('has a quantile below which its share lies', () => {
    fc.assert(
      fc.property(side, side, share, (a, b, p) => {
        expect(betaCdf(betaQuantile(p, { a, b }), { a, b })).toBeCloseTo(p, 5)
      }),
    )
  })

  it('mirrors when successes and failures change places', () => {
    fc.assert(
      fc.property(side, side, share, (a, b, x) => {
        expect(betaCdf(x, { a, b })).toBeCloseTo(1 - betaCdf(1 - x, { a: b, b: a }), 6)
      }),
    )
  })

  it('takes rows in one by one as it does all at once', () => {
    const prior = betaOf(0.7, 10)
    expect(prior.a).toBeCloseTo(7, 12)
    const stepwise = betaAfter(betaAfter(prior, 1, 1), 0, 1)
    const atOnce = betaAfter(prior, 1, 2)
    expect(stepwise.a).toBeCloseTo(atOnce.a, 12)
    expect(betaMean(atOnce)).toBeCloseTo(8 / 12, 12)
  })

  it('covers what it says', () => {
    const beta = { a: 12, b: 5 }
    const { low, high } = betaInterval(beta, 0.8)
    expect(betaCdf(high, beta) - betaCdf(low, beta)).toBeCloseTo(0.8, 5)
  })

  it('is certain outside 0 to 1 and refuses counts that are not above 0', () => {
    expect(betaCdf(0, { a: 2, b: 2 })).toBe(0)
    expect(betaCdf(1, { a: 2, b: 2 })).toBe(1)
    expect(() => betaCdf(0.5, { a: 0, b: 2 })).toThrow(RangeError)
    expect(() => betaQuantile(0.5, { a: 2, b: -1 })).toThrow(RangeError)
  })

  it('goes to the logit and back', () => {
    fc.assert(
      fc.property(share, (p) => {
        expect(logistic(logit(p))).toBeCloseTo(p, 12)
      }),
    )
  })
})

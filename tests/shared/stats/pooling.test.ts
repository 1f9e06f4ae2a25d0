import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { betaMean } from '@shared/stats/beta'
import {
  POOL,
  betaBinomialPool,
  overallRate,
  poolLikelihood,
  poolStrength,
  pooled,
  type PoolCell,
} from '@shared/stats/pooling'

const cell = fc
  .integer({ min: 1, max: 40 })
  .chain((n) => fc.record({ k: fc.integer({ min: 0, max: n }), n: fc.constant(n), rows: fc.constant(n) }))
const cells = fc.array(cell, { minLength: 1, maxLength: 5 })

const meanOf = (one: PoolCell, mean: number, strength: number) => betaMean(pooled(one, mean, strength))

describe('pooled', () => {
  it('is the raw rate at strength 0 and the overall rate at a very large one', () => {
    fc.assert(
      fc.property(cells, (list) => {
        const mean = overallRate(list) ?? 0
        for (const one of list) {
          expect(meanOf(one, mean, 0)).toBeCloseTo(one.k / one.n, 12)
          expect(meanOf(one, mean, 1e9)).toBeCloseTo(mean, 6)
        }
      }),
    )
  })

  it('lies between its own rate and the overall one', () => {
    fc.assert(
      fc.property(cells, fc.double({ min: 0.1, max: 100, noNaN: true }), (list, strength) => {
        const mean = overallRate(list) ?? 0
        for (const one of list) {
          const at = meanOf(one, mean, strength)
          expect(at).toBeGreaterThanOrEqual(Math.min(mean, one.k / one.n) - 1e-12)
          expect(at).toBeLessThanOrEqual(Math.max(mean, one.k / one.n) + 1e-12)
        }
      }),
    )
  })

  it('moves less the more rows a situation has', () => {
    const small = Math.abs(meanOf({ k: 4, n: 5, rows: 5 }, 0.4, 8) - 0.8)
    const large = Math.abs(meanOf({ k: 32, n: 40, rows: 40 }, 0.4, 8) - 0.8)
    expect(large).toBeLessThan(small)
  })
})

describe('overallRate', () => {
  it('is k of n over all cells, and half a row away from the ends', () => {
    expect(
      overallRate([
        { k: 3, n: 4 },
        { k: 1, n: 6 },
      ]),
    ).toBeCloseTo(0.4, 12)
    expect(overallRate([{ k: 0, n: 9 }])).toBeCloseTo(0.05, 12)
    expect(overallRate([{ k: 9, n: 9 }])).toBeCloseTo(0.95, 12)
    expect(overallRate([])).toBeNull()
  })
})

describe('poolStrength', () => {
  it('is at least as likely as any strength on a fine grid', () => {
    fc.assert(
      fc.property(fc.array(cell, { minLength: 3, maxLength: 5 }), (list) => {
        const mean = overallRate(list) ?? 0.5
        const found = poolStrength(list, mean, POOL)
        expect(found).toBeGreaterThanOrEqual(POOL.least - 1e-9)
        expect(found).toBeLessThanOrEqual(POOL.most + 1e-9)
        const best = poolLikelihood(list, mean, found)
        for (let strength = POOL.least; strength <= POOL.most; strength += 0.25)
          expect(best).toBeGreaterThanOrEqual(poolLikelihood(list, mean, strength) - 1e-5)
      }),
      { numRuns: 50 },
    )
  })

  it('pools alike situations to the upper bound and unlike ones to the lower', () => {
    const alike = [
      { k: 10, n: 20 },
      { k: 15, n: 30 },
      { k: 8, n: 16 },
    ]
    const unlike = [
      { k: 20, n: 20 },
      { k: 0, n: 30 },
      { k: 16, n: 16 },
    ]
    expect(poolStrength(alike, 0.5, POOL)).toBeCloseTo(POOL.most, 6)
    expect(poolStrength(unlike, 0.5, POOL)).toBeCloseTo(POOL.least, 6)
  })
})

describe('betaBinomialPool', () => {
  it('uses strength 8 where fewer than three situations have five rows', () => {
    const two = [
      { k: 4, n: 8, rows: 8 },
      { k: 8, n: 8, rows: 8 },
      { k: 1, n: 4, rows: 4 },
    ]
    expect(betaBinomialPool(two)?.strength).toBe(8)
    const three = [...two.slice(0, 2), { k: 1, n: 5, rows: 5 }]
    expect(betaBinomialPool(three)?.strength).not.toBe(8)
  })

  it('gives each situation its posterior in the order given, and nothing for nothing', () => {
    const pool = betaBinomialPool([
      { k: 1, n: 2, rows: 2 },
      { k: 5, n: 8, rows: 8 },
    ])
    // mean .6, strength 8: Beta(4.8 + k, 3.2 + n - k)
    expect(pool?.posteriors[0]?.a).toBeCloseTo(5.8, 12)
    expect(pool?.posteriors[0]?.b).toBeCloseTo(4.2, 12)
    expect(pool?.posteriors[1]?.a).toBeCloseTo(9.8, 12)
    expect(betaBinomialPool([])).toBeNull()
  })
})

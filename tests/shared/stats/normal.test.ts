import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { normalCdf, normalQuantile } from '@shared/stats/normal'

describe('normal distribution', () => {
  it('gives the quantiles that the intervals use', () => {
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 12)
    expect(normalQuantile(0.9)).toBeCloseTo(1.2815515655446004, 12)
    expect(normalQuantile(0.5)).toBe(0)
  })

  it('turns a share into a place and back', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true }), (p) => {
        expect(normalCdf(normalQuantile(p))).toBeCloseTo(p, 11)
      }),
    )
  })

  it('is symmetric and never falls', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -9, max: 9, noNaN: true }),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (x, step) => {
          expect(normalCdf(-x)).toBeCloseTo(1 - normalCdf(x), 12)
          expect(normalCdf(x + step)).toBeGreaterThanOrEqual(normalCdf(x) - 1e-14)
        },
      ),
    )
  })

  it.each([0, 1, -0.1, Number.NaN])('refuses the share %s', (p) => {
    expect(() => normalQuantile(p)).toThrow(RangeError)
  })
})

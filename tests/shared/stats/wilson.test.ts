import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { wilson, type Level } from '@shared/stats/wilson'

const count = fc
  .integer({ min: 1, max: 2000 })
  .chain((n) => fc.record({ k: fc.integer({ min: 0, max: n }), n: fc.constant(n) }))
const level = fc.constantFrom<Level>(0.95, 0.8)

const range = (k: number, n: number, at: Level) => {
  const found = wilson(k, n, at)
  if (found === null) throw new Error('a range was expected')
  return found
}

describe('wilson', () => {
  it('has no answer when nothing was counted', () => {
    expect(wilson(0, 0)).toBeNull()
    expect(wilson(0, 0, 0.8)).toBeNull()
  })

  it('stays within 0 to 1 and holds k / n', () => {
    fc.assert(
      fc.property(count, level, ({ k, n }, at) => {
        const { low, high } = range(k, n, at)
        expect(low).toBeGreaterThanOrEqual(0)
        expect(high).toBeLessThanOrEqual(1)
        expect(low).toBeLessThanOrEqual(k / n)
        expect(high).toBeGreaterThanOrEqual(k / n)
        expect(high).toBeGreaterThan(low)
      }),
    )
  })

  it('ends exactly at 0 for none and at 1 for all', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 5000 }), level, (n, at) => {
        expect(range(0, n, at).low).toBe(0)
        expect(range(n, n, at).high).toBe(1)
      }),
    )
  })

  it('moves up with every success', () => {
    fc.assert(
      fc.property(count, level, ({ k, n }, at) => {
        fc.pre(k < n)
        expect(range(k + 1, n, at).low).toBeGreaterThan(range(k, n, at).low)
        expect(range(k + 1, n, at).high).toBeGreaterThan(range(k, n, at).high)
      }),
    )
  })

  it('is the mirror image of its failures', () => {
    fc.assert(
      fc.property(count, level, ({ k, n }, at) => {
        expect(range(n - k, n, at).low).toBeCloseTo(1 - range(k, n, at).high, 12)
        expect(range(n - k, n, at).high).toBeCloseTo(1 - range(k, n, at).low, 12)
      }),
    )
  })

  it('holds the 80 range inside the 95 range', () => {
    fc.assert(
      fc.property(count, ({ k, n }) => {
        expect(range(k, n, 0.8).low).toBeGreaterThanOrEqual(range(k, n, 0.95).low)
        expect(range(k, n, 0.8).high).toBeLessThanOrEqual(range(k, n, 0.95).high)
      }),
    )
  })

  it.each([
    [-1, 5],
    [6, 5],
    [Number.NaN, 5],
    [1, Number.POSITIVE_INFINITY],
  ])('refuses %s of %s', (k, n) => {
    expect(() => wilson(k, n)).toThrow(RangeError)
  })
})

import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { claim } from '@shared/stats/evidence'
import { claimsByChance, leastUsual, tailAtHalf, usualByChance } from '@shared/stats/luck'

/** Every one of the 2^n equally likely runs, counted one by one. */
function shareOfRuns(n: number, passes: (k: number) => boolean): number {
  let passed = 0
  for (let run = 0; run < 2 ** n; run += 1) {
    const k = run.toString(2).replaceAll('0', '').length
    if (passes(k)) passed += 1
  }
  return passed / 2 ** n
}

describe('luck', () => {
  it('is the share of all equally likely runs that are claimed', () => {
    for (let n = 1; n <= 14; n += 1) {
      expect(usualByChance(n)).toBeCloseTo(
        shareOfRuns(n, (k) => claim(k, n) === 'usually'),
        10,
      )
      expect(claimsByChance([n])).toBeCloseTo(
        shareOfRuns(n, (k) => claim(k, n) !== 'unclear'),
        10,
      )
    }
  })

  it('adds over cells and is nothing for none', () => {
    expect(claimsByChance([])).toBe(0)
    expect(claimsByChance([0, 0])).toBe(0)
    expect(claimsByChance([5, 5, 20])).toBeCloseTo(2 * claimsByChance([5]) + claimsByChance([20]), 12)
  })

  it('finds the least k that is claimed', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 3000 }), (n) => {
        const least = leastUsual(n)
        if (least === null) expect(claim(n, n)).toBe('unclear')
        else {
          expect(claim(least, n)).toBe('usually')
          expect(claim(least - 1, n)).not.toBe('usually')
        }
      }),
    )
  })

  it('keeps tails between 0 and 1 and whole at k 0', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 800 }), fc.integer({ min: 0, max: 800 }), (n, k) => {
        const tail = tailAtHalf(k, n)
        expect(tail).toBeGreaterThanOrEqual(0)
        expect(tail).toBeLessThanOrEqual(1)
        expect(tailAtHalf(0, n)).toBeCloseTo(1, 8)
      }),
    )
  })
})

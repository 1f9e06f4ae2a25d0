import { describe, it, expect } from 'vitest'
import { claim } from '@shared/stats/evidence'
import { leastUsual, usualByChance } from '@shared/stats/luck'
import { wilson } from '@shared/stats/wilson'

describe('Wilson 95 %, no continuity correction: Newcombe 1998, Stat Med 17:857, Table I method 3', () => {
  it.each([
    [81, 263, 0.2553, 0.3662],
    [15, 148, 0.0624, 0.1605],
    [0, 20, 0, 0.1611],
    [1, 29, 0.0061, 0.1718],
  ])('%i of %i is %f to %f', (k, n, low, high) => {
    const range = wilson(k, n)
    expect(range?.low).toBeCloseTo(low, 4)
    expect(range?.high).toBeCloseTo(high, 4)
  })
})

describe('RECORD.md section 4, computed for this project', () => {
  it('0 of 10 still allows 28 in 100 and 0 of 20 allows 16 in 100', () => {
    expect(Math.round((wilson(0, 10)?.high ?? 0) * 100)).toBe(28)
    expect(Math.round((wilson(0, 20)?.high ?? 0) * 100)).toBe(16)
  })

  it.each([
    [4, 5],
    [6, 8],
    [8, 10],
    [10, 15],
    [13, 20],
    [19, 30],
  ])('%i of %i is the least that is claimed', (k, n) => {
    expect(claim(k, n)).toBe('usually')
    expect(claim(k - 1, n)).toBe('unclear')
    expect(leastUsual(n)).toBe(k)
  })

  it('4 of 5 comes up 19 times in 100 at a true rate of one half', () => {
    expect(usualByChance(5)).toBeCloseTo(6 / 32, 10)
    expect(Math.round(usualByChance(5) * 100)).toBe(19)
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fanned, fannedWithin } from '@shared/court/fan'
import { gameMinute, periodLabel } from '@shared/court/gameTime'
import { penOf, weightFactor } from '@shared/court/pen'
import { rulePack } from '@shared/court/rulePacks'

describe('fanned ticks', () => {
  it('stand apart, keep their order and leave none out', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 28, noNaN: true }), { maxLength: 10 }), (xs) => {
        const result = fanned(xs, 0.5)
        expect(result).toHaveLength(xs.length)
        const order = xs.map((x, i) => ({ x, at: result[i] ?? NaN })).sort((a, b) => a.x - b.x || a.at - b.at)
        order
          .slice(1)
          .forEach(({ at }, i) => expect(at - (order[i]?.at ?? 0)).toBeGreaterThanOrEqual(0.5 - 1e-9))
      }),
    )
  })
  it('stay between their bounds, and the last go without where those leave no room', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 14, noNaN: true }), { maxLength: 10 }),
        fc.double({ min: -1, max: 14, noNaN: true }),
        (xs, to) => {
          const result = fannedWithin(xs, 0.5, 0, to)
          const named = result.filter((at) => at !== null)
          expect(named).toHaveLength(Math.min(xs.length, to < 0 ? 0 : Math.floor(to / 0.5 + 1e-9) + 1))
          for (const at of named) {
            expect(at).toBeGreaterThanOrEqual(-1e-9)
            expect(at).toBeLessThanOrEqual(to + 1e-6)
          }
          const sorted = [...named].sort((a, b) => a - b)
          sorted.slice(1).forEach((at, i) => expect(at - sorted[i]!).toBeGreaterThanOrEqual(0.5 - 1e-6))
        },
      ),
    )
    expect(fannedWithin([1, 1, 1], 0.5, 0, 0.6)).toEqual([expect.any(Number), expect.any(Number), null])
  })
  it('stay where they are when there is room', () => {
    expect(fanned([1, 5, 9], 0.5)).toEqual([1, 5, 9])
  })
})

describe('game minutes', () => {
  it('count up from tip-off, with overtime after the last period', () => {
    const fiba = rulePack('fiba')
    expect(gameMinute(fiba, 1, 6000)).toBe(0)
    expect(gameMinute(fiba, 3, 3200)).toBeCloseTo(20 + 10 - 320 / 60, 9)
    expect(gameMinute(fiba, 5, 3000)).toBe(40)
    expect(gameMinute(fiba, 6, 0)).toBe(50)
    expect(gameMinute(fiba, 2, null)).toBe(15)
  })
  it('name the period as its book plays it', () => {
    expect(periodLabel(rulePack('fiba'), 3)).toBe('Q3')
    expect(periodLabel(rulePack('ncaa'), 2)).toBe('H2')
    expect(periodLabel(rulePack('nba'), 5)).toBe('OT1')
  })
})

describe('the pen', () => {
  it('has the weights of the design at the scales it names', () => {
    expect([6, 14, 26, 35].map(weightFactor)).toEqual([0.7, 0.92, 1, 1])
    expect(weightFactor(10)).toBeCloseTo(0.81, 9)
  })
  it('draws at a sound scale whatever it is given', () => {
    for (const scale of [0, -3, NaN, Infinity]) expect(penOf(scale).px(26)).toBeCloseTo(1, 9)
  })
})

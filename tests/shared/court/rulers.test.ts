import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fanned } from '@shared/court/fan'
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

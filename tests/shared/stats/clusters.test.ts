import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { clusterDeflate, designEffect, intraclass, recencyWeight } from '@shared/stats/clusters'

const game = fc
  .integer({ min: 1, max: 40 })
  .chain((n) => fc.record({ k: fc.integer({ min: 0, max: n }), n: fc.constant(n) }))

describe('recencyWeight', () => {
  it('halves every four games', () => {
    expect(recencyWeight(0, 4)).toBe(1)
    expect(recencyWeight(4, 4)).toBe(0.5)
    expect(recencyWeight(8, 4)).toBe(0.25)
  })
})

describe('designEffect', () => {
  it('is 1 + (mean rows a game - 1) x ICC', () => {
    expect(designEffect([10, 20, 30], 0.05)).toBeCloseTo(1.95, 12)
    expect(clusterDeflate(60, [10, 20, 30], 0.05)).toBeCloseTo(60 / 1.95, 12)
  })

  it('leaves one row a game and unlike rows alone', () => {
    expect(designEffect([1, 1, 1], 0.4)).toBe(1)
    expect(designEffect([30, 30], 0)).toBe(1)
    expect(designEffect([], 0.05)).toBe(1)
  })

  it('leaves at most as many rows as there are, and at least one a game', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 60 }), { minLength: 1, maxLength: 12 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (rows, icc) => {
          const n = rows.reduce((sum, value) => sum + value, 0)
          const left = clusterDeflate(n, rows, icc)
          expect(left).toBeLessThanOrEqual(n + 1e-9)
          expect(left).toBeGreaterThanOrEqual(rows.length - 1e-9)
        },
      ),
    )
  })
})

describe('intraclass', () => {
  it('is 1 when every game is of one kind and 0 when all games are alike', () => {
    expect(
      intraclass([
        { k: 6, n: 6 },
        { k: 0, n: 6 },
        { k: 6, n: 6 },
        { k: 0, n: 6 },
      ]),
    ).toBe(1)
    expect(intraclass(Array.from({ length: 8 }, () => ({ k: 3, n: 6 })))).toBe(0)
  })

  it('follows the analysis of variance of a small table worked by hand', () => {
    // 3 of 4 and 1 of 4: between .5 on 1 degree, within 1.5 / 6 = .25; (.5 - .25) / (.5 + 3 x .25) = .2
    expect(
      intraclass([
        { k: 3, n: 4 },
        { k: 1, n: 4 },
      ]),
    ).toBeCloseTo(0.2, 12)
  })

  it('stays within 0 to 1', () => {
    fc.assert(
      fc.property(fc.array(game, { maxLength: 14 }), (games) => {
        const icc = intraclass(games)
        expect(icc).toBeGreaterThanOrEqual(0)
        expect(icc).toBeLessThanOrEqual(1)
      }),
    )
  })

  it('cannot be told from one game or from one row a game', () => {
    expect(intraclass([{ k: 3, n: 9 }])).toBe(0)
    expect(
      intraclass([
        { k: 1, n: 1 },
        { k: 0, n: 1 },
      ]),
    ).toBe(0)
  })
})

import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { betaQuantile } from '@shared/stats/beta'
import { baseOf, estimate, rank, weightedRecord, type Contender } from '@server/engine/ranking'
import { ENGINE_DEFAULTS } from '@server/engine/settings'

const trips = { priorTrips: ENGINE_DEFAULTS.priorTrips }

describe('base', () => {
  it('is 7 of 10 before anything was counted and moves with our own trips', () => {
    expect(baseOf({ k: 0, n: 0 }, ENGINE_DEFAULTS)).toEqual({ k: 0, n: 0, mean: expect.closeTo(0.7, 12) })
    expect(baseOf({ k: 9, n: 30 }, ENGINE_DEFAULTS).mean).toBeCloseTo(16 / 40, 12)
  })
})

describe('weightedRecord', () => {
  it('counts trips against their shape whole, other shapes and practice a quarter', () => {
    const counter = {
      record: [
        { shape: '2-2-1', k: 5, n: 6 },
        { shape: 'person', k: 4, n: 8 },
      ],
      practice: { k: 12, n: 20 },
    }
    expect(weightedRecord(counter, '2-2-1', ENGINE_DEFAULTS.recordWeights)).toEqual({ k: 9, n: 13 })
    expect(weightedRecord(counter, null, ENGINE_DEFAULTS.recordWeights)).toEqual({ k: 5.25, n: 8.5 })
  })
})

describe('estimate', () => {
  const none = { k: 0, n: 0 }

  it('is the base when no reason speaks and nothing was tried', () => {
    const found = estimate({ base: 0.7, weights: [], squadTerm: 0, record: none }, trips)
    expect(found.prior).toBeCloseTo(0.7, 12)
    expect(found.expected.mean).toBeCloseTo(0.7, 12)
    expect(found.recordShare).toBe(0)
    expect(found.expected.interval.low).toBeCloseTo(betaQuantile(0.1, { a: 5.6, b: 2.4 }), 10)
    expect(found.expected.interval.high).toBeCloseTo(betaQuantile(0.9, { a: 5.6, b: 2.4 }), 10)
  })

  it('adds weights and the squad term on the logit scale', () => {
    // logit .5 is 0; .7 - .4 - .5 = -.2
    const found = estimate({ base: 0.5, weights: [0.7, -0.4], squadTerm: -0.5, record: none }, trips)
    expect(found.prior).toBeCloseTo(1 / (1 + Math.exp(0.2)), 12)
  })

  it('takes our record in beside eight trips of reasons', () => {
    const found = estimate({ base: 0.5, weights: [], squadTerm: 0, record: { k: 9, n: 12 } }, trips)
    expect(found.expected.mean).toBeCloseTo(13 / 20, 12)
    expect(found.recordShare).toBeCloseTo(12 / 20, 12)
    expect(found.prior).toBeCloseTo(0.5, 12)
  })

  it('never falls with a success of our own, nor rises with a failure', () => {
    const input = fc.record({
      base: fc.double({ min: 0.05, max: 0.95, noNaN: true }),
      weights: fc.array(fc.double({ min: -0.7, max: 0.7, noNaN: true }), { maxLength: 8 }),
      squadTerm: fc.double({ min: -1, max: 0, noNaN: true }),
      record: fc
        .integer({ min: 0, max: 60 })
        .chain((n) => fc.record({ k: fc.integer({ min: 0, max: n }), n: fc.constant(n) })),
    })
    fc.assert(
      fc.property(input, fc.constantFrom(0.25, 1), (before, weight) => {
        const { k, n } = before.record
        const mean = (record: { k: number; n: number }) =>
          estimate({ ...before, record }, trips).expected.mean
        expect(mean({ k: k + weight, n: n + weight })).toBeGreaterThan(mean({ k, n }))
        expect(mean({ k, n: n + weight })).toBeLessThan(mean({ k, n }))
      }),
    )
  })
})

const contender = (
  id: string,
  mean: number | null,
  changes: Partial<Omit<Contender, 'choice'>> &
    Partial<Pick<Contender['choice'], 'gameReady' | 'squadTerm'>> = {},
): Contender => {
  const { gameReady = true, squadTerm = 0, ...rest } = changes
  return {
    newActions: 0,
    universal: false,
    name: id,
    ...rest,
    choice: {
      counterId: id,
      expected: mean === null ? null : { mean, interval: { low: 0, high: 1 } },
      record: { k: 0, n: 0 },
      recordShare: 0,
      prior: mean,
      reasons: [],
      warnings: [],
      squadTerm,
      roles: [],
      gameReady,
    },
  }
}
const order = (list: Contender[], unknown = false) =>
  rank(list, unknown, 0.02).map((choice) => choice.counterId)

describe('rank', () => {
  it('goes by expected success, numbered from 1', () => {
    const ranked = rank([contender('low', 0.5), contender('high', 0.8), contender('mid', 0.6)], false, 0.02)
    expect(ranked.map((choice) => [choice.counterId, choice.rank])).toEqual([
      ['high', 1],
      ['mid', 2],
      ['low', 3],
    ])
  })

  it('breaks ties within .02 by the fewest new actions', () => {
    expect(order([contender('a', 0.72, { newActions: 3 }), contender('b', 0.7, { newActions: 1 })])).toEqual([
      'b',
      'a',
    ])
    expect(order([contender('a', 0.721, { newActions: 3 }), contender('b', 0.7, { newActions: 1 })])).toEqual(
      ['a', 'b'],
    )
  })

  it('does not hand nearness on from pair to pair', () => {
    const list = [
      contender('a', 0.72, { newActions: 5 }),
      contender('b', 0.705, { newActions: 3 }),
      contender('c', 0.69, { newActions: 0 }),
    ]
    expect(order(list)).toEqual(['b', 'a', 'c'])
  })

  it('puts what is not game-ready last, whatever it promises', () => {
    expect(
      order([contender('raw', 0.9, { gameReady: false }), contender('b', 0.4), contender('c', 0.5)]),
    ).toEqual(['c', 'b', 'raw'])
  })

  it('without knowledge puts the answer to any press first, then the best filled', () => {
    const list = [
      contender('b', null, { squadTerm: -0.4 }),
      contender('any', null, { squadTerm: -0.6, universal: true }),
      contender('c', null, { squadTerm: 0, newActions: 2 }),
      contender('d', null, { squadTerm: 0, newActions: 1 }),
    ]
    expect(order(list, true)).toEqual(['any', 'd', 'c', 'b'])
  })

  it('gives the same order however the list came', () => {
    const list = fc.array(
      fc.record({
        mean: fc.double({ min: 0.5, max: 0.6, noNaN: true }),
        newActions: fc.integer({ min: 0, max: 3 }),
        gameReady: fc.boolean(),
      }),
      { minLength: 1, maxLength: 7 },
    )
    fc.assert(
      fc.property(list, fc.boolean(), (some, unknown) => {
        const made = some.map((one, index) => contender(`c${index}`, one.mean, one))
        const there = order(made, unknown)
        expect(order([...made].reverse(), unknown)).toEqual(there)
        expect([...there].sort()).toEqual(made.map((one) => one.choice.counterId).sort())
      }),
    )
  })
})

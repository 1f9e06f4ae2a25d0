import { describe, expect, it } from 'vitest'
import { logistic, logit } from '@shared/stats/beta'
import {
  isThinEstimate,
  likelyWords,
  movedBy,
  partsWords,
  recordSentence,
  repsWords,
  tenWords,
  tripsWords,
} from '@/views/choices/choiceWords'

const choice = {
  counterId: '0b8d3d59-8f0e-4a3e-9f44-6a6f2f1d2a11',
  rank: 1,
  expected: { mean: 0.78, interval: { low: 0.68, high: 0.87 } },
  record: { k: 13, n: 18 },
  recordShare: 0.7,
  prior: 0.8,
  reasons: [],
  warnings: [],
  squadTerm: 0,
  roles: [],
  gameReady: true,
}
const choices = {
  base: { k: 34, n: 48, mean: 0.7 },
  mostly: { shape: '1-2-1-1', k: 12, n: 26 },
}

describe('words of an expected success', () => {
  it('rounds to tenths', () => {
    expect(tenWords(0.78)).toBe('8 in 10')
    expect(likelyWords({ low: 0.68, high: 0.87 })).toBe('Likely 7 to 9 in 10')
  })

  it('says one figure when both ends are the same tenth', () => {
    expect(likelyWords({ low: 0.78, high: 0.84 })).toBe('Likely about 8 in 10')
  })

  it('looks thin on a sighting of our own record and on a wide range', () => {
    expect(isThinEstimate(choice)).toBe(false)
    expect(isThinEstimate({ ...choice, record: { k: 4, n: 4 } })).toBe(true)
    expect(isThinEstimate({ ...choice, expected: { mean: 0.5, interval: { low: 0.1, high: 0.8 } } })).toBe(
      true,
    )
    expect(isThinEstimate({ ...choice, expected: null })).toBe(true)
  })
})

describe('what moved an estimate', () => {
  it('splits the prior into reasons and squad exactly', () => {
    const base = 0.7
    const squadTerm = -0.5
    const reasons = 0.8
    const prior = logistic(logit(base) + reasons + squadTerm)
    const moved = movedBy({ prior, recordShare: 0.25, squadTerm }, base)
    // Nothing but the record's share of the estimate is left: all moves add up to it.
    expect(moved.reasons + moved.squad).toBeCloseTo(0.75 * 10 * (prior - base), 10)
    expect(moved.squad).toBeLessThan(0)
    expect(moved.reasons).toBeGreaterThan(0)
  })

  it('is nothing while nothing is known', () => {
    expect(movedBy({ prior: null, recordShare: 0, squadTerm: -1 }, 0.7)).toEqual({ reasons: 0, squad: 0 })
  })

  it('counts trips to the nearest half', () => {
    expect(tripsWords(0.2)).toBe('')
    expect(tripsWords(0.3)).toBe('half a trip')
    expect(tripsWords(-1.1)).toBe('one trip')
    expect(tripsWords(1.5)).toBe('one and a half trips')
    expect(tripsWords(-2)).toBe('two trips')
  })
})

describe('the record sentence', () => {
  it('says the count, the shape and what the reasons add', () => {
    const prior = logistic(logit(0.7) + 0.9)
    expect(recordSentence({ ...choice, prior, recordShare: 0.7 }, choices)).toBe(
      'Record 13 of 18 against a 1-2-1-1, the reasons add half a trip in ten.',
    )
  })

  it('says what they take, and what the five take', () => {
    const prior = logistic(logit(0.7) - 1 - 1)
    expect(recordSentence({ ...choice, prior, recordShare: 0, squadTerm: -1 }, choices)).toBe(
      'Record 13 of 18 against a 1-2-1-1, the reasons take two trips in ten, the five take two and a half trips in ten.',
    )
  })

  it('says that it was not tried', () => {
    const prior = logistic(logit(0.7))
    expect(recordSentence({ ...choice, prior, record: { k: 0, n: 0 }, recordShare: 0.4 }, choices)).toBe(
      'Not tried against a 1-2-1-1, the reasons change next to nothing.',
    )
  })

  it('gives no move where nothing is known', () => {
    expect(
      recordSentence({ ...choice, expected: null, prior: null }, { base: choices.base, mostly: null }),
    ).toBe('Record 13 of 18.')
  })
})

describe('parts and repetitions', () => {
  it('says how much is record', () => {
    expect(partsWords(0.6)).toBe('Six parts of ten are record, four are reasons.')
    expect(partsWords(0.1)).toBe('One part of ten is record, nine are reasons.')
    expect(partsWords(0.9)).toBe('Nine parts of ten are record, one is reasons.')
    expect(partsWords(0)).toBe('All of this is reasons.')
    expect(partsWords(1)).toBe('All of this is record.')
  })

  it('keeps one repetition singular', () => {
    expect(repsWords(1)).toBe('1 live rep')
    expect(repsWords(31)).toBe('31 live reps')
  })
})

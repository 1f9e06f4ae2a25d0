import { describe, it, expect } from 'vitest'
import { copyOf, paperOf, placeOf, queryOf } from '@/views/sheets/sheetAddress'

describe('where a player is', () => {
  it('reads tab and step, counted from 1', () => {
    expect(placeOf({}, 5)).toEqual({ tab: 'press', step: 0 })
    expect(placeOf({ tab: 'way', step: '3' }, 5)).toEqual({ tab: 'way', step: 2 })
    expect(placeOf({ tab: 'job', step: '3' }, 5)).toEqual({ tab: 'job', step: 0 })
  })

  it('never goes past what the counter has, whatever the address says', () => {
    expect(placeOf({ tab: 'way', step: '99' }, 5).step).toBe(5)
    expect(placeOf({ tab: 'way', step: '-4' }, 5).step).toBe(0)
    expect(placeOf({ tab: 'way', step: 'two' }, 5).step).toBe(0)
    expect(placeOf({ tab: ['check'], step: null }, 5)).toEqual({ tab: 'press', step: 0 })
  })

  it('writes what it reads', () => {
    for (const place of [
      { tab: 'press', step: 0 },
      { tab: 'way', step: 0 },
      { tab: 'way', step: 4 },
      { tab: 'job', step: 0 },
    ] as const)
      expect(placeOf(queryOf(place) as Record<string, string>, 5)).toEqual(place)
  })
})

describe('paper and copy', () => {
  it('takes the paper that is common where the rules are played, unless asked otherwise', () => {
    expect(paperOf({}, 'fiba')).toBe('a4')
    expect(paperOf({}, 'nfhs84')).toBe('letter')
    expect(paperOf({ paper: 'letter' }, 'fiba')).toBe('letter')
    expect(paperOf({ paper: 'a3' }, 'fiba')).toBe('a4')
  })

  it('is everybody’s for a player who is not on the sheet', () => {
    const players = [{ squadPlayerId: 'nell' }]
    expect(copyOf({ player: 'nell' }, players)).toBe('nell')
    expect(copyOf({ player: 'ada' }, players)).toBeNull()
  })
})

import { describe, it, expect } from 'vitest'
import { expiryFault, latestDay, seasonEnd } from '@shared/stills/expiry'

describe('the season’s end', () => {
  it.each([
    ['2026-27', '2026-12-01', '2027-06-30'],
    ['2026/27', '2026-12-01', '2027-06-30'],
    ['2026–2027', '2026-12-01', '2027-06-30'],
    ['Season 26/27', '2026-12-01', '2027-06-30'],
    ['1999-00', '1999-12-01', '2000-06-30'],
    ['2027', '2026-12-01', '2027-06-30'],
    ['2026-27', '2027-06-30', '2027-06-30'],
  ])('of %s, seen on %s, is %s', (season, today, end) => expect(seasonEnd(season, today)).toBe(end))

  it.each([
    ['a season that is over', '2024-25', '2026-12-01', '2027-06-30'],
    ['words without a year', 'Winter', '2027-02-01', '2027-06-30'],
    ['years that do not follow', '2026-31', '2027-02-01', '2027-06-30'],
    ['an age group beside nothing', 'U17', '2027-07-01', '2028-06-30'],
  ])('of %s is the next 30 June', (_case, season, today, end) => expect(seasonEnd(season, today)).toBe(end))
})

describe('who may keep a still how long', () => {
  const bounds = { season: '2027-06-30', present: '2027-03-01', today: '2026-12-01' }
  it('staff shorten it and go back to the season’s end; the head coach a year past it', () => {
    expect(expiryFault('assistant-coach', '2026-12-01', bounds)).toBeNull()
    expect(expiryFault('assistant-coach', '2027-06-30', bounds)).toBeNull()
    expect(expiryFault('assistant-coach', '2027-07-01', bounds)).toContain('Only the head coach')
    expect(expiryFault('head-coach', '2028-06-30', bounds)).toBeNull()
    expect(expiryFault('head-coach', '2028-07-01', bounds)).toContain('Choose 2028-06-30 or an earlier day')
  })

  it('nobody chooses a day that is over', () => {
    for (const role of ['assistant-coach', 'head-coach'] as const)
      expect(expiryFault(role, '2026-11-30', bounds)).toContain('This day is over')
  })

  it('what the head coach has lengthened an assistant need not shorten', () => {
    expect(latestDay('assistant-coach', { ...bounds, present: '2028-01-15' })).toBe('2028-01-15')
    expect(latestDay('assistant-coach', { ...bounds, present: null })).toBe('2027-06-30')
  })
})

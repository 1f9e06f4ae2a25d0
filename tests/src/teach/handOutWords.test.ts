import { describe, expect, it } from 'vitest'
import type { CopyRow, OpeningRow } from '@shared/sheets/handOut'
import { copyWords, hasOf, letterWords, nextPlace, olderWords, paperWords } from '@/views/teach/handOutWords'

const id = (at: number) => `00000000-0000-4000-8000-00000000000${at}`
const copy = (more: Partial<CopyRow>): CopyRow => ({
  id: id(9),
  version: 1,
  createdAt: '2026-03-18T20:00:00Z',
  updatedAt: '2026-03-18T20:00:00Z',
  sheetId: id(8),
  number: 1,
  way: 'paper',
  squadPlayerId: null,
  name: null,
  jersey: null,
  place: 'bag',
  outAt: null,
  backAt: null,
  letter: null,
  ...more,
})
const opened = (squadPlayerId: string | null): OpeningRow => ({
  personId: id(7),
  name: 'Test',
  role: 'player',
  squadPlayerId,
  firstAt: '2026-03-18T20:00:00Z',
  lastAt: '2026-03-18T20:00:00Z',
})

describe('who has what', () => {
  it('is this version, an older one, or none, and says who still sees the older one', () => {
    const readers = [1, 2, 3].map((at) => ({ squadPlayerId: id(at), firstName: `P${at}`, jersey: at }))
    const has = hasOf(readers, [opened(id(1)), opened(null)], [opened(id(1)), opened(id(2))])
    expect(has.map(({ has: state }) => state)).toEqual(['this', 'older', 'none'])
    expect(olderWords(has, 1)).toBe('P2 still sees version 1.')
    expect(olderWords([], 1)).toBe('')
  })
})

describe('papers', () => {
  it('are counted in words', () => {
    expect(paperWords([])).toBe('No paper yet.')
    const places = ['out', 'out', 'bag', 'back'] as const
    expect(paperWords(places.map((place) => copy({ place })))).toBe('2 given out, 1 in the bag, 1 back.')
    expect(paperWords([copy({})])).toBe('None given out, 1 in the bag, none back yet.')
  })

  it('say whose they are and what a press does', () => {
    expect(copyWords(copy({ number: 3, name: 'Imara', place: 'out' }))).toBe('Number 3, Imara’s, given out')
    expect(copyWords(copy({ number: 8 }))).toBe('Number 8, for anybody, in the bag')
    expect([nextPlace('bag').to, nextPlace('out').to, nextPlace('back').to]).toEqual(['out', 'back', 'bag'])
  })
})

describe('letters', () => {
  it('say to whom they go and how they fare', () => {
    const letter = (way: CopyRow['way'], state: 'sent' | 'kept' | 'failed') =>
      copy({ way, number: null, place: null, letter: { state, trouble: null, sentAt: null } })
    expect(letterWords([])).toEqual(['Nothing sent yet.'])
    expect(
      letterWords([letter('mail', 'sent'), letter('mail', 'failed'), letter('guardian', 'kept')]),
    ).toEqual([
      'To 2 own addresses and 1 guardian: guardians get numbers, not names.',
      '1 sent, 1 kept here, no mail server is set, 1 could not be delivered.',
    ])
  })
})

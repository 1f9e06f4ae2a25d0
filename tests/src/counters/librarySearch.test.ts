import { describe, expect, it } from 'vitest'
import type { CounterRow } from '@shared/counters/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import { ASK_ALL, askOf, queryOfAsk, searched, type LibraryAsk } from '@/views/counters/librarySearch'
import { recordCells, untriedWords } from '@/views/counters/recordCells'

const row = (name: string, more: Partial<CounterRow> = {}) =>
  ({
    name,
    call: '',
    alignment: '',
    family: 'box',
    record: [],
    roles: [],
    walkedAt: null,
    liveReps: 0,
    ...more,
  }) as unknown as CounterRow
const role = (number: string, level: number) => ({
  role: number,
  title: '',
  needs: [{ skill: 'handle', level }],
})
const player = (id: string, handle: number, available = true) =>
  ({ id, available, skills: { handle } }) as unknown as SquadPlayerRow
const names = (rows: CounterRow[]) => rows.map(({ name }) => name)
const ask = (more: Partial<LibraryAsk>): LibraryAsk => ({ ...ASK_ALL, ...more })

describe('the library’s address', () => {
  it('holds all that is asked, and nothing of the whole book', () => {
    const wanted = ask({
      find: 'box',
      family: 'stack',
      beats: '2-2-1',
      atHand: true,
      sort: 'walked',
      show: 'archived',
    })
    expect(askOf(queryOfAsk(wanted))).toEqual(wanted)
    expect(queryOfAsk(ASK_ALL)).toEqual({})
  })

  it('takes what it cannot mean as not asked', () => {
    expect(askOf({ beats: 'dropped-back', sort: 'colour', show: 'all', athand: 'yes' })).toEqual(ASK_ALL)
  })
})

describe('what fits', () => {
  const rows = [
    row('Even', { record: [{ shape: '2-2-1', k: 4, n: 8 }] }),
    row('Sure', {
      record: [{ shape: '2-2-1', k: 18, n: 20 }],
      liveReps: 4,
      walkedAt: '2026-03-02T10:00:00Z',
    }),
    row('Lucky', { record: [{ shape: '2-2-1', k: 1, n: 1 }], walkedAt: '2026-03-09T10:00:00Z' }),
    row('Elsewhere', { record: [{ shape: 'person', k: 9, n: 9 }], liveReps: 30 }),
  ]

  it('got us through that press more often than not, the surest first', () => {
    expect(names(searched(rows, ask({ beats: '2-2-1' }), null))).toEqual(['Sure', 'Lucky'])
    expect(names(searched(rows, ask({ beats: '1-3-1' }), null))).toEqual([])
  })

  it('comes in the order asked for', () => {
    expect(names(searched(rows, ask({ sort: 'name' }), null))).toEqual(['Elsewhere', 'Even', 'Lucky', 'Sure'])
    expect(names(searched(rows, ask({ sort: 'walked' }), null)).slice(0, 2)).toEqual(['Lucky', 'Sure'])
    expect(names(searched(rows, ask({ sort: 'reps' }), null))[0]).toBe('Elsewhere')
  })

  it('has somebody for every role among those who are available', () => {
    const needs = (...levels: number[]) =>
      levels.map((level, index) => role(String(index + 1), level)) as CounterRow['roles']
    const asked = [row('Two handlers', { roles: needs(3, 3) }), row('One handler', { roles: needs(3, 0) })]
    const find = (squad: SquadPlayerRow[] | null) => names(searched(asked, ask({ atHand: true }), squad))
    expect(find([player('a', 3), player('b', 3)])).toEqual(['One handler', 'Two handlers'])
    expect(find([player('a', 3), player('b', 3, false), player('c', 0)])).toEqual(['One handler'])
    expect(find([player('a', 3)])).toEqual([])
    expect(find(null)).toHaveLength(2)
  })
})

describe('what was not tried', () => {
  it('is said once, in one sentence', () => {
    const cells = (...shapes: string[]) => recordCells(shapes.map((shape) => ({ shape, k: 1, n: 2 })))
    expect(untriedWords(cells())).toBe('Not tried in a game yet.')
    expect(untriedWords(cells('1-2-1-1', '2-2-1'))).toBe(
      'Not tried against 1-3-1, other zone or person to person.',
    )
    expect(untriedWords(cells('1-2-1-1', '2-2-1', '1-3-1', 'other-zone'))).toBe(
      'Not tried against person to person.',
    )
    expect(untriedWords(cells('1-2-1-1', '2-2-1', '1-3-1', 'other-zone', 'person'))).toBe('')
  })
})

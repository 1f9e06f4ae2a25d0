import { describe, it, expect } from 'vitest'
import { budgetOf, sheetWords } from '@shared/sheets/budget'
import { sheetContent } from '@shared/sheets/content'
import { readBy } from '@shared/sheets/reader'
import { FIVE, frozenCounter, frozenPlan, sheetView } from '../../support/sheetFixture'

const nell = FIVE[0].squadPlayerId
const wordsFor = (view = sheetView(), reader: string | null = nell) =>
  sheetWords(sheetContent(readBy(view, reader)))

describe('words of a sheet', () => {
  it('counts every text, in drawings too', () => {
    const page = sheetContent(readBy(sheetView(), nell), { copy: 1, copies: 10 })
    // Name of theirs 3, when 6, three lines with letters and counts 9 + 10 + 9, heading 5, disc and "you are 1." 4,
    // jobs 7 + 7 + 6 + 2, change-up 10, keys 9, foot 6 + 1 + 3.
    const written = 3 + 6 + 28 + 5 + 4 + 22 + 10 + 9 + 10
    // Ruler 5 and letters 5, thrower 1; five tokens.
    expect(page.drawn.join(' ').split(' ')).toHaveLength(11 + 5)
    expect(sheetWords(page)).toBe(written + 16)
  })

  it('leaves the names of our players out', () => {
    const renamed = sheetView(frozenPlan(), {
      players: FIVE.map(({ squadPlayerId, jersey }) => ({
        squadPlayerId,
        jersey,
        firstName: 'Anna Maria Sofia',
      })),
    })
    expect(wordsFor(renamed)).toBe(wordsFor())
    expect(wordsFor(renamed, null)).toBe(wordsFor(sheetView(), null))
  })

  it('counts what is added, word by word', () => {
    const more = sheetView(
      frozenPlan({ keys: ['Don’t catch in the corner.', 'Don’t dribble into two.', 'Talk, all five.'] }),
    )
    expect(wordsFor(more)).toBe(wordsFor() + 3)
  })

  it('does not count signs that are no words', () => {
    const dashed = sheetView(frozenPlan({ opponentName: 'Port – Selby – Gulls' }))
    expect(wordsFor(dashed)).toBe(wordsFor())
  })
})

describe('the budget of a plan', () => {
  it('holds for the demo plan: general and personal sheets alike', () => {
    const view = sheetView()
    const budget = budgetOf(view)
    expect(budget.limit).toBe(120)
    expect(budget.over).toBe(false)
    const all = [null, ...FIVE.map(({ squadPlayerId }) => squadPlayerId)].map((reader) =>
      sheetWords(sheetContent(readBy(view, reader), { copy: 10, copies: 10 })),
    )
    expect(budget.words).toBe(Math.max(...all))
  })

  it('is decided by the fullest page, whoever asks', () => {
    const firstCall = frozenCounter(
      'one-four',
      FIVE.map(({ squadPlayerId }) => squadPlayerId),
    )
    const wordy = 'Say it loud every time and say it twice so that all hear you say it.'
    const roles = firstCall.roles.map((role) =>
      role.role === '3' ? { ...role, jobs: [wordy, wordy, wordy] } : role,
    )
    const view = sheetView(frozenPlan({ firstCall: { ...firstCall, roles } }))
    const budget = budgetOf(view)
    expect(budget.words).toBeGreaterThan(120)
    expect(budget.over).toBe(true)
    expect(budgetOf(readBy(view, nell))).toEqual(budget)
  })

  it('is met exactly at the limit', () => {
    const room = 120 - budgetOf(sheetView()).words
    const keys = (extra: number) => [
      ...frozenPlan().keys,
      ...(extra > 0 ? [Array(extra).fill('run').join(' ')] : []),
    ]
    expect(budgetOf(sheetView(frozenPlan({ keys: keys(room) }))).over).toBe(false)
    expect(budgetOf(sheetView(frozenPlan({ keys: keys(room + 1) })))).toMatchObject({
      words: 121,
      over: true,
    })
  })
})

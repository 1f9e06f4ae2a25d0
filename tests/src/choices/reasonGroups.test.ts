import { describe, expect, it } from 'vitest'
import type { Reason } from '@shared/choices/schemas'
import { heaviestOf, reasonGroups } from '@/views/choices/reasonGroups'

const reason = (over: Partial<Reason>): Reason => ({
  ruleId: 'e9a0a5d6-6d6f-4a7b-8a4e-1f1b2c3d4e5f',
  ruleNumber: 14,
  title: '2-2-1: fill the middle',
  habitKey: 'shape:2-2-1',
  because: 'Between their two lines the middle is open.',
  k: 18,
  n: 26,
  games: 3,
  facts: [{ habitKey: 'shape:2-2-1', k: 18, n: 26, games: 3, thin: false }],
  asked: 'wants middle entry',
  sign: 1,
  strength: 'strong',
  credence: 1,
  weight: 0.7,
  thin: false,
  ...over,
})

describe('reasons in groups', () => {
  const other = 'a9a0a5d6-6d6f-4a7b-8a4e-1f1b2c3d4e5f'
  const reasons = [
    reason({}),
    reason({
      ruleId: other,
      habitKey: null,
      k: null,
      n: null,
      games: null,
      facts: [],
      title: 'One handler',
      asked: 'avoids clear-out',
      sign: -1,
      weight: -0.35,
    }),
    reason({ asked: 'wants far diagonal', sign: -1, weight: -0.4, thin: true }),
  ]
  const groups = reasonGroups(reasons, heaviestOf([{ reasons }]))

  it('says a rule once, with a bar for each thing it asks', () => {
    expect(groups.map((group) => group.what)).toEqual(['Press in a 2-2-1', 'One handler'])
    expect(groups[0]?.lines).toEqual([
      { words: 'Has middle entry', length: 1, thin: false },
      { words: 'No far diagonal', length: expect.closeTo(-0.4 / 0.7, 10), thin: true },
    ])
  })

  it('keeps the count of a habit and none where our own squad is the reason', () => {
    expect(groups[0]?.count).toEqual({ k: 18, n: 26, games: 3 })
    expect(groups[1]?.count).toBeNull()
    expect(groups[1]?.lines[0]).toEqual({ words: 'Has clear-out, unwanted here', length: -0.5, thin: false })
  })

  it('tells the other habits that a rule rests on', () => {
    const facts = [
      { habitKey: 'shape:2-2-1', k: 18, n: 26, games: 3, thin: false },
      { habitKey: 'mirror', k: 22, n: 30, games: 3, thin: false },
    ]
    expect(reasonGroups([reason({ facts })], 1)[0]?.also).toEqual([
      { habitKey: 'mirror', what: 'Mirror the thrower', k: 22, n: 30 },
    ])
    expect(groups[0]?.also).toEqual([])
  })

  it('wears our ink where the habit is room they leave', () => {
    expect(reasonGroups([reason({ habitKey: 'leave-open:middle' })], 1)[0]?.ink).toBe('our')
    expect(groups[0]?.ink).toBe('their')
  })

  it('has no bars and no fault without reasons', () => {
    expect(heaviestOf([{ reasons: [] }])).toBe(0)
    expect(reasonGroups([reason({ weight: 0 })], 0)[0]?.lines[0]?.length).toBe(0)
  })
})

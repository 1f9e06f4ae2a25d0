import { describe, expect, it } from 'vitest'
import {
  allSightings,
  groupedHabits,
  importantHabits,
  sidesOf,
  uncounted,
} from '@/views/tendencies/habitOrder'
import { tally } from './tally'

const keys = (rows: { habit: { key: string } }[]) => rows.map(({ habit }) => habit.key)

describe('the habits to know first', () => {
  it('puts what is claimed on firm counts before hints, open ones, rare ones and sightings', () => {
    const rows = importantHabits([
      tally('sag', 3, 4),
      tally('fake', 1, 20),
      tally('press', 12, 24),
      tally('deny:pass-back', 7, 7, 1),
      tally('pickup:full', 18, 22),
    ])
    expect(keys(rows)).toEqual(['pickup:full', 'deny:pass-back', 'press', 'fake', 'sag'])
  })

  it('takes one answer to a question: the shape, lane and safety counted most', () => {
    const rows = importantHabits([
      tally('shape:person', 5, 30),
      tally('shape:1-2-1-1', 25, 30),
      tally('leave-open:long', 3, 18),
      tally('leave-open:middle', 14, 18),
      tally('safety-home', 20, 22),
      tally('safety-leaves-early', 2, 22),
    ])
    expect(keys(rows).sort()).toEqual(['leave-open:middle', 'safety-home', 'shape:1-2-1-1'])
  })

  it('tells one side of a spot under the spot, leaves out what was never seen and what the situation asks for', () => {
    const tendencies = [
      tally('trap-at:coffin-corner:any', 17, 30),
      tally('trap-at:coffin-corner:left', 5, 30),
      tally('trap-at:coffin-corner:right', 12, 30),
      tally('trap-at:front-corner:any', 0, 30),
      tally('press', 30, 30),
    ]
    expect(keys(importantHabits(tendencies, ['press']))).toEqual(['trap-at:coffin-corner:any'])
    expect(sidesOf('trap-at:coffin-corner:any', tendencies)).toBe('right 12, left 5')
    expect(sidesOf('press', tendencies)).toBe('')
  })

  it('stops at the length of the short list', () => {
    const all = ['press', 'pickup:full', 'trap', 'fake'].map((key) => tally(key, 10, 20))
    expect(importantHabits(all, [], 3)).toHaveLength(3)
  })
})

describe('all habits', () => {
  it('groups them, and says of never how much it still allows', () => {
    const groups = groupedHabits([
      tally('press', 20, 30),
      tally('fake', 0, 10),
      tally('disguise', 0, 10),
      tally('trap', 0, 0),
    ])
    expect(groups.map(({ title }) => title)).toEqual(['How often and how far up'])
    expect(keys(groups[0]!.rows)).toEqual(['press'])
    // RECORD.md section 4: 0 of 10 still allows 28 in 100.
    expect(groups[0]!.never).toEqual([
      { n: 10, upTo: 28, labels: ['Show a press and leave', 'Show one shape and play another'] },
    ])
  })

  it('names what nothing was logged for, and knows when all are sightings', () => {
    const tendencies = [tally('press', 2, 4), tally('trap', 0, 0)]
    expect(uncounted(tendencies).map(({ key }) => key)).toEqual(['trap'])
    expect(allSightings(tendencies)).toBe(true)
    expect(allSightings([...tendencies, tally('sag', 1, 5)])).toBe(false)
  })

  it('does not trip over a habit that is no longer counted', () => {
    expect(importantHabits([tally('gone', 5, 5)])).toEqual([])
  })
})

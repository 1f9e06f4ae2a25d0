import { describe, expect, it } from 'vitest'
import { courtNotes } from '@/views/tendencies/courtNotes'
import { marksOf } from '@/views/tendencies/pressFromRead'
import { readOf, tally } from './tally'

const spot = (name: string, side: string, k: number, n: number, order = 'first') =>
  ({ spot: name, side, k, n, order }) as ReturnType<typeof readOf>['spots'][number]

describe('the marks on the court', () => {
  const read = readOf(
    [
      tally('trap', 28, 34),
      tally('trap-again', 10, 16),
      tally('deny:near', 3, 20),
      tally('deny:pass-back', 14, 20),
      tally('leave-open:long', 3, 18),
      tally('leave-open:middle', 13, 18),
      tally('shape:1-2-1-1', 27, 34),
    ],
    {
      pickup: { value: 'full', k: 26, n: 34, thin: false },
      spots: [
        spot('coffin-corner', 'left', 6, 34),
        spot('coffin-corner', 'right', 12, 34),
        spot('just-over-half', 'right', 1, 34),
        spot('just-over-half', 'right', 6, 16, 'later'),
        spot('middle-lane', 'middle', 1, 34),
        spot('other', 'middle', 5, 34),
        spot('front-wing', 'left', 9, 4, 'later'),
      ],
    },
  )

  it('draw a spot once, most trapped first, and say whether it was the first or a second trap', () => {
    const { zones, rest } = marksOf(read, null)
    expect(zones.map(({ spot: name, side, k, n }) => [name, side, k, n])).toEqual([
      ['coffin-corner', 'right', 12, 34],
      ['coffin-corner', 'left', 6, 34],
      ['just-over-half', 'right', 6, 16],
    ])
    expect(zones[2]?.note).toBe('second trap, right side')
    expect(rest).toEqual(['middle lane 1 of 34'])
  })

  it('lead from each part to its habit and mark the one in hand', () => {
    const { habitOf, zones } = marksOf(read, 'trap-at:coffin-corner:any')
    expect(habitOf.get('trap-zone-coffin-corner-left')).toBe('trap-at:coffin-corner:left')
    expect(habitOf.get('pickup-front')).toBe('pickup:full')
    expect(habitOf.get('denied-pass-back')).toBe('deny:pass-back')
    expect(habitOf.get('room')).toBe('leave-open:middle')
    expect(zones.map(({ selected }) => selected)).toEqual([true, true, false])
  })

  it('deny only lanes denied half the time, and give the room left most', () => {
    const { denied, room, defenders } = marksOf(read, null)
    expect(denied.map(({ lane, k }) => [lane, k])).toEqual([['pass-back', 14]])
    expect(room).toMatchObject({ lane: 'middle', k: 13, n: 18, thin: false })
    expect(defenders).toHaveLength(5)
  })

  it('stand nobody where no shape is theirs, and no zone dashed less than it should be', () => {
    const { defenders, zones } = marksOf(
      readOf([tally('trap', 4, 6, 1), tally('shape:2-2-1', 3, 8)], {
        spots: [spot('coffin-corner', 'left', 4, 6)],
      }),
      null,
    )
    expect(defenders).toEqual([])
    expect(zones[0]?.thin).toBe(true)
  })

  it('tell under the court what each different n counts', () => {
    const notes = courtNotes(read, marksOf(read, null)).join(' ')
    expect(notes).toContain('first traps, 34 pressed, traps logged')
    expect(notes).toContain('second traps, 16 where the first trap got out of')
    expect(notes).toContain('left open, 18 trapped, open lanes logged')
    expect(notes).toContain('1-2-1-1, 27 of 34 pressed')
  })
})

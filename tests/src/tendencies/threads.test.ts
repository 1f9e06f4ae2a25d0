import { describe, expect, it } from 'vitest'
import { rulePack } from '@shared/court/rulePacks'
import { lastSecond, stretchOf, threadOf, threadsOf } from '@/views/tendencies/threads'
import { possession } from './tally'

const fiba = rulePack('fiba')
const trap = {
  x: 0.1,
  y: 0.9,
  t: 2,
  cue: null,
  trappers: null,
  result: null,
  spot: 'coffin-corner',
  side: 'right',
} as const

describe('threads', () => {
  it('follow the track from the first touch on, with traps and the crossing put in by time', () => {
    const thread = threadOf(
      possession({
        track: [
          { t: -2, x: -0.02, y: 0.6, kind: 'throw-in' },
          { t: 0, x: 0.1, y: 0.9, kind: 'catch' },
          { t: 6.6, x: 0.6, y: 0.9, kind: 'dribble' },
        ],
        traps: [trap],
        crossedAt: 5.7,
        outcome: 'lost-live',
      }),
      true,
      1,
      fiba,
    )
    expect(thread.line.map(({ t }) => t)).toEqual([0, 2, 5.7, 6.6])
    expect(thread.line[2]?.x).toBe(14)
    expect(thread.traps).toHaveLength(1)
    expect(thread.end).toEqual({ at: thread.line[3], mark: 'lost' })
  })

  it('run on to the count that was called, on the spot', () => {
    const thread = threadOf(
      possession({ traps: [trap], outcome: 'count', outcomePlace: 'backcourt' }),
      true,
      1,
      fiba,
    )
    expect(thread.line.at(-1)).toEqual({ x: thread.line[0]?.x, t: 8 })
    expect(thread.end?.mark).toBe('count')
  })

  it('put a throw-in count at the line, before the clock starts', () => {
    const thread = threadOf(possession({ outcome: 'count', outcomePlace: 'entry' }), true, 1, fiba)
    expect(thread.end).toEqual({ at: { x: 0, t: 0 }, mark: 'count' })
  })

  it('leave out rows without any time and keep the numbers of the list', () => {
    const rows = [
      { possession: possession(), counted: false, gameLabel: '' },
      { possession: possession({ crossedAt: 4 }), counted: true, gameLabel: '' },
    ]
    expect(threadsOf(rows, fiba).map(({ number, counted }) => [number, counted])).toEqual([[2, true]])
  })

  it('show the whole count and a little more, in even seconds', () => {
    expect(lastSecond([], fiba)).toBe(10)
    const late = threadOf(possession({ crossedAt: 11.4 }), true, 1, fiba)
    expect(lastSecond([late], fiba)).toBe(12)
  })

  it('know the stretch of the court that a trap habit is about', () => {
    expect(stretchOf('trap-at:just-over-half:any', fiba)?.from).toBe(14)
    expect(stretchOf('trap-at:middle-lane:middle', fiba)).not.toBeNull()
    expect(stretchOf('press', fiba)).toBeNull()
  })
})

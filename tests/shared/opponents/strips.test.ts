import { describe, expect, it } from 'vitest'
import { stripOf } from '@shared/opponents/strips'

type Read = Parameters<typeof stripOf>[0]
const spot = (place: string, side: string, k: number, n: number, order: 'first' | 'later' = 'first') =>
  ({ spot: place, side, k, n, order }) as Read['spots'][number]
const habit = (key: string, k: number, n: number, games = 3) => ({ key, k, n, games, thin: n < 5 })
const read = (more: Partial<Read>): Read => ({
  spots: [],
  pickup: null,
  tendencies: [habit('trap', 30, 35), habit('trap-again', 9, 20)],
  ...more,
})

describe('the strip of a read', () => {
  it('has one zone per place, the one counted more, most first, and at most four', () => {
    const { zones } = stripOf(
      read({
        spots: [
          spot('coffin-corner', 'left', 6, 35),
          spot('just-over-half', 'right', 3, 35),
          spot('just-over-half', 'right', 7, 20, 'later'),
          spot('coffin-corner', 'right', 12, 35),
          spot('middle-lane', 'middle', 4, 35),
          spot('short-of-half', 'left', 2, 35),
          spot('other', 'middle', 9, 35),
        ],
      }),
    )
    expect(zones.map((zone) => [zone.spot, zone.side, zone.k, zone.n])).toEqual([
      ['coffin-corner', 'right', 12, 35],
      ['just-over-half', 'right', 7, 20],
      ['coffin-corner', 'left', 6, 35],
      ['middle-lane', 'middle', 4, 35],
    ])
  })

  it('leaves out what was seen once beside what came back, but not where nothing did', () => {
    const once = spot('coffin-corner', 'left', 1, 3)
    expect(stripOf(read({ spots: [once, spot('coffin-corner', 'right', 2, 3)] })).zones).toHaveLength(1)
    expect(stripOf(read({ spots: [once] })).zones).toMatchObject([{ k: 1, n: 3, thin: true }])
  })

  it('is thin after one game, however much was counted in it', () => {
    const tendencies = [habit('trap', 30, 35, 1)]
    expect(stripOf(read({ spots: [spot('coffin-corner', 'left', 20, 35)], tendencies })).zones[0]?.thin).toBe(
      true,
    )
  })

  it('leaves the lane open that they leave most often of those that were looked at', () => {
    const tendencies = [habit('leave-open:middle', 13, 18), habit('leave-open:long', 3, 18)]
    expect(stripOf(read({ tendencies })).room).toEqual({ lane: 'middle', k: 13, n: 18, thin: false })
    expect(stripOf(read({ tendencies: [habit('leave-open:middle', 0, 18)] })).room).toBeNull()
  })
})

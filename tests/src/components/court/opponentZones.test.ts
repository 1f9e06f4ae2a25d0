import { describe, expect, it } from 'vitest'
import type { TendencyRead } from '@shared/tendencies/schemas'
import { opponentZones } from '@/components/court/opponentZones'

type Spot = TendencyRead['spots'][number]
const spot = (name: Spot['spot'], side: Spot['side'], k: number, order: Spot['order'] = 'first'): Spot => ({
  spot: name,
  side,
  k,
  n: 24,
  order,
})
const games = Array.from({ length: 3 }, (_, index) => ({
  id: String(index),
  kind: 'scouted' as const,
  label: '',
  playedOn: '',
  rows: 8,
}))

describe('where an opponent traps, under our drawing', () => {
  it('keeps one zone per place, the more frequent count of it', () => {
    const zones = opponentZones({
      games,
      spots: [
        spot('coffin-corner', 'left', 2, 'later'),
        spot('coffin-corner', 'left', 9),
        spot('just-over-half', 'right', 5, 'later'),
      ],
    })
    expect(zones.map(({ spot: name, side, k }) => [name, side, k])).toEqual([
      ['coffin-corner', 'left', 9],
      ['just-over-half', 'right', 5],
    ])
  })

  it('leaves out what has no outline or no trap, and draws four at most', () => {
    const many = (['coffin-corner', 'early-sideline', 'short-of-half'] as const).flatMap((name) => [
      spot(name, 'left', 3),
      spot(name, 'right', 2),
    ])
    const zones = opponentZones({
      games,
      spots: [...many, spot('other', 'middle', 20), spot('front-wing', 'left', 0)],
    })
    expect(zones).toHaveLength(4)
    expect(zones.some((zone) => zone.spot === 'other')).toBe(false)
  })

  it('is thin when all of it comes from one game', () => {
    const one = opponentZones({ games: games.slice(0, 1), spots: [spot('coffin-corner', 'left', 9)] })
    const three = opponentZones({ games, spots: [spot('coffin-corner', 'left', 9)] })
    expect([one[0]?.thin, three[0]?.thin]).toEqual([true, false])
  })
})

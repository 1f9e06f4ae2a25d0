import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { HABITS } from '@shared/tendencies/habits'
import { luckOf, tendencies, type HabitCell, type TendencyOptions } from '@server/engine/tendencies'
import { spread } from './builders'

const of = (key: string, cells: HabitCell[], options?: TendencyOptions) => {
  const found = tendencies(cells, options).find((tendency) => tendency.key === key)
  if (!found) throw new Error(`${key} is missing`)
  return found
}
const cell = (changes: Partial<HabitCell>): HabitCell => ({
  habitKey: 'trap',
  gameId: 'a',
  gameAge: 0,
  trigger: 'made-basket',
  k: 0,
  n: 0,
  ...changes,
})

describe('tendencies as counted', () => {
  it('lists every habit, and says nothing about what was not counted', () => {
    const list = tendencies([])
    expect(list.map((tendency) => tendency.key)).toEqual(HABITS.map((habit) => habit.key))
    expect(list[0]).toEqual({
      key: 'press',
      k: 0,
      n: 0,
      games: 0,
      rate: null,
      interval: null,
      grade: 'none',
      claim: 'unclear',
      thin: true,
      adjusted: null,
      posterior: null,
    })
  })

  it('adds rows over games and triggers and counts the games behind n', () => {
    const trap = of('trap', [
      cell({ gameId: 'a', k: 3, n: 4 }),
      cell({ gameId: 'a', trigger: 'live', k: 1, n: 2 }),
      cell({ gameId: 'b', gameAge: 1, k: 4, n: 5 }),
      cell({ gameId: 'c', gameAge: 2, k: 0, n: 0 }),
    ])
    expect(trap).toMatchObject({ k: 8, n: 11, games: 2, grade: 'lean', thin: false })
    expect(trap.rate).toBeCloseTo(8 / 11, 12)
  })

  it('counts only the triggers in view', () => {
    const cells = [...spread('trap', 8, 10, 2, 'made-basket'), ...spread('trap', 1, 10, 2, 'live')]
    expect(of('trap', cells, { triggers: ['live'] })).toMatchObject({ k: 1, n: 10 })
    expect(of('trap', cells)).toMatchObject({ k: 9, n: 20 })
  })

  it('claims nothing of a situation under lean', () => {
    const cells = spread('trap', 8, 9)
    expect(of('trap', cells).claim).toBe('usually')
    expect(of('trap', cells, { situation: true }).claim).toBe('unclear')
    expect(of('trap', spread('trap', 9, 10), { situation: true }).claim).toBe('usually')
  })
})

describe('tendencies as adjusted', () => {
  it('weighs a game four games old half as much', () => {
    const trap = of('trap', [
      cell({ gameId: 'a', k: 1, n: 1 }),
      cell({ gameId: 'b', gameAge: 4, k: 0, n: 1 }),
    ])
    // one row a game: no design effect. Jeffreys .5 + 1 and .5 + .5
    expect(trap.posterior?.a).toBeCloseTo(1.5, 12)
    expect(trap.posterior?.b).toBeCloseTo(1, 12)
  })

  it('leans to the recent of two opposite games, and back when they change places', () => {
    const early = of('trap', [cell({ k: 8, n: 8 }), cell({ gameId: 'b', gameAge: 3, k: 0, n: 8 })])
    const late = of('trap', [cell({ k: 0, n: 8 }), cell({ gameId: 'b', gameAge: 3, k: 8, n: 8 })])
    expect(early.adjusted?.mean).toBeGreaterThan(0.55)
    expect(late.adjusted?.mean).toBeCloseTo(1 - (early.adjusted?.mean ?? 0), 12)
    expect(early.rate).toBe(0.5)
  })

  it('divides n by the design effect with ICC .05 under eight games', () => {
    const trap = of('trap', [cell({ k: 5, n: 11 })])
    expect((trap.posterior?.a ?? 0) + (trap.posterior?.b ?? 0)).toBeCloseTo(1 + 11 / 1.5, 12)
  })

  it('estimates the ICC from eight games', () => {
    const alike = Array.from({ length: 8 }, (_, game) => cell({ gameId: `g${game}`, k: 3, n: 6 }))
    const unlike = alike.map((one, game) => ({ ...one, k: game % 2 === 0 ? 6 : 0 }))
    const worth = (cells: HabitCell[]) => {
      const { posterior } = of('trap', cells)
      return (posterior?.a ?? 0) + (posterior?.b ?? 0) - 1
    }
    expect(worth(alike)).toBeCloseTo(48, 10)
    expect(worth(unlike)).toBeCloseTo(8, 10)
    expect(worth(alike.slice(0, 7))).toBeCloseTo(42 / 1.25, 10)
  })

  it('pools a habit given pressed towards all triggers, and never the press rate', () => {
    const cells = (key: string) => [
      ...spread(key, 18, 20, 2, 'made-basket'),
      ...spread(key, 9, 10, 2, 'dead-ball'),
      cell({ habitKey: key, trigger: 'live', k: 0, n: 2 }),
    ]
    const live = { triggers: ['live'] }
    const alone = [cell({ trigger: 'live', k: 0, n: 2 })]
    expect(of('trap', cells('trap'), live).adjusted?.mean).toBeGreaterThan(0.5)
    expect(of('trap', alone, live).adjusted?.mean).toBeLessThan(0.25)
    const press = of('press', cells('press'), live).adjusted
    expect(press).toEqual(
      of(
        'press',
        alone.map((one) => ({ ...one, habitKey: 'press' })),
        live,
      ).adjusted,
    )
  })

  it('takes strength 8 where too few situations can tell it', () => {
    const cells = [cell({ k: 8, n: 10 }), cell({ trigger: 'live', k: 0, n: 2 })]
    const settings = { icc: 0 }
    const { posterior } = of('trap', cells, { triggers: ['live'], settings })
    expect(posterior?.a).toBeCloseTo((8 * 8) / 12, 10)
    expect(posterior?.b).toBeCloseTo((8 * 4) / 12 + 2, 10)
  })

  it('gains with every success, everything else the same', () => {
    fc.assert(
      fc.property(
        fc
          .integer({ min: 1, max: 60 })
          .chain((n) => fc.tuple(fc.integer({ min: 0, max: n - 1 }), fc.constant(n))),
        ([k, n]) => {
          const before = of('trap', [cell({ k, n })]).adjusted?.mean ?? 0
          const after = of('trap', [cell({ k: k + 1, n })]).adjusted?.mean ?? 0
          expect(after).toBeGreaterThan(before)
        },
      ),
    )
  })
})

describe('a sighting', () => {
  it('is not claimed, though all of it went one way', () => {
    expect(of('trap', spread('trap', 4, 4, 2)).claim).toBe('unclear')
    expect(of('trap', spread('trap', 0, 4, 2)).claim).toBe('unclear')
    expect(of('trap', spread('trap', 5, 5, 1)).claim).toBe('usually')
  })
})

describe('luckOf', () => {
  it('says how many are counted, claimed, and would be by chance', () => {
    const list = tendencies([
      ...spread('press', 9, 10),
      ...spread('trap', 4, 5, 1),
      ...spread('sag', 1, 2, 1),
    ])
    const luck = luckOf(list)
    expect(luck).toMatchObject({ inView: 3, claimed: 2 })
    // 5 rows: .1875 each way; 10 rows: 56 of 1,024 each way; 2 rows are a sighting and never claimed
    expect(luck.byChance).toBeCloseTo(2 * (0.1875 + 56 / 1024), 10)
  })

  it('leaves cells under lean out of a situation', () => {
    const cells = [...spread('press', 9, 10), ...spread('trap', 4, 5, 1)]
    const luck = luckOf(tendencies(cells, { situation: true }), true)
    expect(luck.claimed).toBe(1)
    expect(luck.byChance).toBeCloseTo(2 * (56 / 1024), 10)
  })
})

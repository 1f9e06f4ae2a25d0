import fc from 'fast-check'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { COVERED } from '@server/database/counting/expressions'
import { gameMinute } from '@shared/court/gameTime'
import { RULE_PACKS, RulePackKey } from '@shared/court/rulePacks'
import type { PossessionInput } from '@shared/possessions/schemas'
import type { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import type { TendencyRead } from '@shared/tendencies/schemas'
import { teamUrl } from '../../support/fixture'
import { created, newGame, newOpponent, newPossession, newScoutedGame } from '../../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../../support/testApp'

let test: TestApp
let scout: Agent
let opponent: string

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
})
afterAll(() => test.stop())
beforeEach(async () => {
  opponent = await newOpponent(scout)
})

const read = async (query = '', of = opponent): Promise<TendencyRead> =>
  (await scout.get(teamUrl(`/opponents/${of}/tendencies?${query}`))).body as TendencyRead
const habit = async (key: string, query = '', of = opponent) => {
  const { k, n } = (await read(query, of)).tendencies.find((one) => one.key === key) ?? { k: 0, n: 0 }
  return [k, n]
}
const log = async (coverage: ScoutedGameBody['coverage'], rows: Partial<PossessionInput>[], more = {}) => {
  const game = await newScoutedGame(scout, opponent, { coverage, ...more })
  for (const [index, row] of rows.entries()) await newPossession(scout, game, { number: index + 1, ...row })
  return game
}
const ALL = { kind: 'all' } as const

describe('what the scout set out to cover', () => {
  it('throw-ins only: live balls are told, but enter no rate', async () => {
    await log({ kind: 'throw-ins' }, [
      { trigger: 'made-basket' },
      { trigger: 'break', shape: 'dropped-back', pickup: null, traps: [] },
      { trigger: 'live' },
      { trigger: 'live', shape: 'dropped-back', pickup: null, traps: [] },
    ])
    const found = await read()
    expect([found.counted, found.notCovered]).toEqual([2, 2])
    expect(await habit('press')).toEqual([1, 2])
    expect(found.situations.find(({ trigger }) => trigger === 'live')).toEqual({
      trigger: 'live',
      n: 0,
      pressed: 0,
    })
    const row = (await scout.get(teamUrl(`/opponents/${opponent}`))).body.counts
    expect(row).toMatchObject({ possessions: 4, pressed: 1, pressable: 2 })
  })

  it('from minute to minute: the start is in, the end is out, a missing clock is the period’s middle', async () => {
    await log({ kind: 'minutes', from: 5, to: 15 }, [
      { period: 1, clock: 3001, note: 'minute 4.998' },
      { period: 1, clock: 3000, note: 'minute 5' },
      { period: 1, clock: null, note: 'minute 5' },
      { period: 2, clock: 3001, note: 'minute 14.998' },
      { period: 2, clock: 3000, note: 'minute 15' },
      { period: 2, clock: null, note: 'minute 15' },
      { period: 3, clock: null },
      { period: null, clock: 3000, note: 'no period, so nobody knows' },
    ])
    expect(await habit('press')).toEqual([3, 3])
    expect((await read()).notCovered).toBe(5)
  })

  it('in overtime the minutes run on, five to a period by these rules', async () => {
    await log({ kind: 'minutes', from: 41, to: 46 }, [
      { period: 4, clock: 1, note: 'minute 39.998' },
      { period: 5, clock: 2401, note: 'minute 40.998' },
      { period: 5, clock: 2400, note: 'minute 41' },
      { period: 5, clock: null, note: 'minute 42.5' },
      { period: 6, clock: 2500, note: 'minute 45.8' },
      { period: 6, clock: 2400, note: 'minute 46' },
    ])
    expect(await habit('press')).toEqual([3, 3])
  })

  it('by the game’s own rules: the first of two halves is twenty minutes', async () => {
    const rows = [
      { period: 1, clock: 6001 },
      { period: 1, clock: 6000 },
      { period: 2, clock: null },
    ]
    await log({ kind: 'minutes', from: 10, to: 80 }, rows, { rulePack: 'ncaa' })
    expect(await habit('press')).toEqual([2, 2])
  })

  it('is the same minute in SQL as on the court’s clock, for every rule set', async () => {
    const whole = (min: number, max: number) => fc.integer({ min, max })
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...RulePackKey.options),
        whole(1, 10),
        fc.oneof(fc.constant(null), whole(0, 12_000)),
        whole(0, 79),
        whole(1, 30),
        async (pack, period, clock, from, long) => {
          const [row] = await test.context.db.query(
            `SELECT ${COVERED} AS covered
               FROM (SELECT ? AS rulePack, 'minutes' AS coverageKind, ? AS coverageFrom, ? AS coverageTo) s,
                    (SELECT 'live' AS "trigger", ? AS period, ? AS clock) p`,
            [pack, from, from + long, period, clock],
          )
          const minute = gameMinute(RULE_PACKS[pack], period, clock)
          expect(row.covered === 1).toBe(minute >= from && minute < from + long)
        },
      ),
      { numRuns: 300 },
    )
  })
})

describe('the situation', () => {
  it('margin bands: six is ahead or behind, five is level, not logged is none', async () => {
    await log(
      ALL,
      [-99, -6, -5, 0, 5, 6, 99, null].map((margin) => ({ margin })),
    )
    expect(await habit('press', 'margin=behind')).toEqual([2, 2])
    expect(await habit('press', 'margin=level')).toEqual([3, 3])
    expect(await habit('press', 'margin=ahead')).toEqual([2, 2])
    expect(await habit('press', 'margin=behind,ahead')).toEqual([4, 4])
    expect(await habit('press')).toEqual([8, 8])
  })

  it('trigger, period, pick-up, shape and game each narrow, and narrow together', async () => {
    const first = await log(ALL, [
      { trigger: 'made-basket', period: 1, pickup: 'full', shape: '2-2-1', traps: [] },
      { trigger: 'made-free-throw', period: 1, pickup: 'half', shape: '2-2-1' },
      { trigger: 'made-basket', period: 2, pickup: 'full', shape: 'person' },
    ])
    const second = await log(ALL, [{ trigger: 'made-basket', period: 1, pickup: 'full', shape: '2-2-1' }])
    expect(await habit('trap', 'trigger=made-basket')).toEqual([2, 3])
    expect(await habit('trap', 'trigger=made-basket,made-free-throw')).toEqual([3, 4])
    expect(await habit('trap', 'period=2')).toEqual([1, 1])
    expect(await habit('trap', 'pickup=half')).toEqual([1, 1])
    expect(await habit('trap', 'shape=2-2-1')).toEqual([2, 3])
    expect(await habit('trap', `game=${first}`)).toEqual([2, 3])
    expect(await habit('trap', `game=${first}&trigger=made-basket&period=1&shape=2-2-1`)).toEqual([0, 1])
    expect(await habit('trap', `game=${second}&period=2`)).toEqual([0, 0])
    const found = await read(`game=${second.toUpperCase()}`)
    expect(found.games).toMatchObject([{ id: second, kind: 'scouted', label: 'v Tarn Valley', rows: 1 }])
  })

  it('says for every trigger what it would hold, whatever trigger is chosen', async () => {
    await log(ALL, [
      { trigger: 'made-basket', period: 1 },
      { trigger: 'live', period: 1, shape: 'fake', pickup: null, traps: null },
      { trigger: 'live', period: 2 },
    ])
    const { situations } = await read('trigger=made-basket&period=1')
    expect(situations).toEqual([
      { trigger: 'all', n: 2, pressed: 1 },
      { trigger: 'made-basket', n: 1, pressed: 1 },
      { trigger: 'made-free-throw', n: 0, pressed: 0 },
      { trigger: 'dead-ball', n: 0, pressed: 0 },
      { trigger: 'break', n: 0, pressed: 0 },
      { trigger: 'live', n: 1, pressed: 0 },
    ])
  })

  it('an empty filter is none at all, whichever it is', async () => {
    await log(ALL, [{ margin: 0 }])
    const whole = await read()
    for (const name of ['trigger', 'period', 'margin', 'pickup', 'shape', 'game'])
      expect(await read(`${name}=`), name).toEqual(whole)
  })

  it('evidence follows the same situation, page by page, and keeps saying how many there are', async () => {
    const rows = Array.from({ length: 7 }, (_, index) => ({ trigger: index < 5 ? 'live' : 'break' }) as const)
    await log(ALL, rows)
    const page = async (query: string) => {
      const url = teamUrl(`/opponents/${opponent}/evidence?habit=press&trigger=live&${query}`)
      const { rows: found, total } = (await scout.get(url)).body
      return [found.map((row: { possession: { number: number } }) => row.possession.number), total]
    }
    expect(await page('limit=2')).toEqual([[1, 2], 5])
    expect(await page('limit=2&offset=4')).toEqual([[5], 5])
    expect(await page('limit=2&offset=6')).toEqual([[], 5])
  })

  it('an opponent nobody has watched has counts of nought and no rate', async () => {
    const found = await read()
    expect([found.counted, found.games, found.spots, found.pickup]).toEqual([0, [], [], null])
    expect(
      found.tendencies.every(({ n, rate, interval }) => n === 0 && rate === null && interval === null),
    ).toBe(true)
  })
})

describe('whose rows', () => {
  it('rows of our own games count for the opponent, but not as others getting through', async () => {
    await log(ALL, [{ outcome: 'through' }, { outcome: 'lost-live' }])
    const game = await newGame(scout, opponent)
    const ours = {
      number: 1,
      trigger: 'made-basket',
      shape: '2-2-1',
      outcome: 'through',
      gameId: game,
    } as const
    await created(scout, 'possessions', ours)
    expect(await habit('press')).toEqual([3, 3])
    expect(await habit('shape:2-2-1')).toEqual([1, 3])
    expect(await habit('others-through')).toEqual([1, 2])
    const { games } = await read()
    expect(games.map(({ kind, label, rows }) => [kind, label, rows])).toEqual([
      ['ours', 'against us', 1],
      ['scouted', 'v Tarn Valley', 2],
    ])
  })

  it('deleted rows do not count', async () => {
    const game = await log(ALL, [{}, {}])
    const [first] = (await scout.get(teamUrl(`/scouted-games/${game}/possessions`))).body.rows
    await scout.delete(teamUrl(`/possessions/${first.id}`))
    expect(await habit('press')).toEqual([1, 1])
    expect(await habit('trap-at:coffin-corner:right')).toEqual([1, 1])
    expect((await read()).spots).toMatchObject([{ spot: 'coffin-corner', side: 'right', k: 1, n: 1 }])
  })

  it('another opponent’s and another team’s rows never do, not even by name or by a filter', async () => {
    await log(ALL, [{}])
    const second = await newOpponent(scout)
    await newPossession(scout, await newScoutedGame(scout, second))
    const both = await test.as('both')
    const theirs = await newScoutedGame(
      both,
      await newOpponent(both, 'Port Selby Gulls', OTHER_TEAM),
      {},
      OTHER_TEAM,
    )
    for (const number of [1, 2, 3]) await newPossession(both, theirs, { number }, OTHER_TEAM)
    expect(await habit('press')).toEqual([1, 1])
    expect(await habit('press', `game=${theirs}`)).toEqual([0, 0])
    const own = (await scout.get(teamUrl('/opponents'))).body.rows
    expect(own.find((row: { id: string }) => row.id === opponent).counts.possessions).toBe(1)
  })
})

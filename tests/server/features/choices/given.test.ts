import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { countOwnThrowInCounts } from '@server/database/counting/records'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { givenFacts } from '@server/features/choices/choices.service'
import type { OpponentRead } from '@server/features/tendencies/readOpponent'
import { CounterBody } from '@shared/counters/schemas'
import { newGame, newOpponent, newPossession, newScoutedGame, created } from '../../../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type TestApp } from '../../../support/testApp'

const situations: OpponentRead['situations'] = [
  { trigger: 'all', pressed: 16, n: 40 },
  { trigger: 'made-basket', pressed: 9, n: 20 },
  { trigger: 'made-free-throw', pressed: 4, n: 5 },
  { trigger: 'dead-ball', pressed: 2, n: 10 },
  { trigger: 'break', pressed: 1, n: 5 },
]
const game = (day: string) => ({ id: day, kind: 'scouted' as const, foe: '', day, age: 0, rows: 4 })

describe('facts that the read and the book give the rules', () => {
  it('count presses after each trigger, a score being a basket or a free throw', () => {
    expect(givenFacts({ situations, games: [] }, [], '2026-03-20')).toMatchObject({
      pressedAfterScore: 13,
      pressedAfterFreeThrow: 4,
      pressedAfterDeadBall: 2,
      pressedAfterBreak: 1,
    })
  })

  it('are days from their newest game to ours, whatever the order; no answer without a game', () => {
    const games = [game('2026-02-20'), game('2026-02-27'), game('2026-01-30')]
    expect(givenFacts({ situations, games }, [], '2026-03-20').filmDays).toBe(21)
    expect(givenFacts({ situations, games: [] }, [], '2026-03-20').filmDays).toBeNull()
  })

  it('count counters with a screen from behind, not the screens', () => {
    const counters = DEMO_COUNTERS.map(({ key: _key, ...body }) => CounterBody.parse(body))
    const blind = counters.filter(({ diagram }) => JSON.stringify(diagram).includes('"blind":true'))
    expect(blind.length).toBeGreaterThan(0)
    expect(blind.length).toBeLessThan(counters.length)
    const given = (list: typeof counters) => givenFacts({ situations, games: [] }, list, '2026-03-20')
    expect(given(counters).blindScreens).toBe(blind.length)
    expect(given(counters.filter((one) => !blind.includes(one))).blindScreens).toBe(0)
  })
})

describe('the count on our own throw-ins', () => {
  let test: TestApp
  beforeAll(async () => {
    test = await startTestApp()
  })
  afterAll(() => test.stop())

  it('is that of our own games, on the throw-in, and of this team', async () => {
    const head = await test.as('head')
    const opponent = await newOpponent(head)
    const [scouted, ours] = [await newScoutedGame(head, opponent), await newGame(head, opponent)]
    const count = { outcome: 'count', outcomePlace: 'entry' } as const
    await newPossession(head, scouted, count)
    const row = (number: number, more: object) =>
      created(head, 'possessions', { gameId: ours, number, trigger: 'dead-ball', shape: 'person', ...more })
    await row(1, { ...count, outcomePlace: 'backcourt' })
    await row(2, { outcome: 'lost-dead', outcomePlace: 'entry' })
    const { manager } = test.context.db
    expect(await countOwnThrowInCounts(manager, TEAM)).toBe(0)
    const gone = await row(3, count)
    await row(4, count)
    expect(await countOwnThrowInCounts(manager, TEAM)).toBe(2)
    await head.delete(`/api/teams/${TEAM}/possessions/${gone}`).set('If-Match', '"1"')
    expect(await countOwnThrowInCounts(manager, TEAM)).toBe(1)
    expect(await countOwnThrowInCounts(manager, OTHER_TEAM)).toBe(0)
  })
})

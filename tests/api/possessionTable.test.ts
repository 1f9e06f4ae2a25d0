import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { TABLE_SORTS, type PossessionTable } from '@shared/possessions/table'
import { gameBody, teamUrl } from '../support/fixture'
import { created, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let opponent: string
let early: string
let late: string
let ours: string
const ids: Record<number, string> = {}

const trap = (x: number, y: number, more: object = {}) => ({ x, y, t: 2, cue: null, result: null, ...more })
const CORNER = trap(0.08, 0.9, { t: 2.1, cue: 'on-catch', trappers: [12, 5] })
const SIDELINE = trap(0.25, 0.1, { t: 3.4, cue: 'first-dribble' })

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
  late = await newScoutedGame(scout, opponent, { foe: 'Tarn Valley', playedOn: '2026-03-14' })
  early = await newScoutedGame(scout, opponent, { foe: 'Lowmoor', playedOn: '2026-02-28' })
  ours = await created(scout, 'games', { ...gameBody(opponent), tipOff: '2026-03-07T19:15:00.000Z' })
  const add = async (game: string, number: number, more: object) => {
    ids[number] = await newPossession(scout, game, { number, traps: null, ...more })
  }
  await add(early, 1, { traps: [CORNER], handler: 'weak', note: 'Their 100% captain limps', thief: 12 })
  await add(early, 2, { trigger: 'live', shape: 'dropped-back', pickup: null, margin: 8, outcome: null })
  await add(late, 5, {
    traps: [SIDELINE, CORNER],
    tookAway: ['pass-back', 'long'],
    period: 4,
    clock: 100,
    margin: -9,
    outcome: 'lost-live',
    onFloor: [4, 5, 9, 11, 12],
  })
  await add(late, 6, { traps: [], shape: '2-2-1', pickup: 'three-quarter', handler: 'not-visible' })
  await add(late, 7, { shape: null, pickup: null, traps: 'not-visible', period: null, clock: null })
  ids[3] = await created(scout, 'possessions', {
    gameId: ours,
    number: 3,
    trigger: 'dead-ball',
    shape: '1-2-1-1',
    outcome: 'through',
  })
  const other = await newOpponent(scout, 'Lowmoor')
  await newPossession(scout, await newScoutedGame(scout, other), { number: 40 })
}, 60_000)
afterAll(() => test.stop())

const table = async (query = ''): Promise<PossessionTable> => {
  const answer = await scout.get(teamUrl(`/opponents/${opponent}/possessions?${query}`))
  expect([answer.status, answer.status === 200 ? null : answer.body]).toEqual([200, null])
  return answer.body as PossessionTable
}
const numbers = async (query = '') => (await table(query)).rows.map(({ possession }) => possession.number)

describe('possessions as a table', () => {
  it('lie in the order they were played, over watched games and ours, each with its game', async () => {
    const { rows, total, of } = await table()
    expect(rows.map(({ possession }) => possession.number)).toEqual([1, 2, 3, 5, 6, 7])
    expect([total, of]).toEqual([6, 6])
    expect(rows.map(({ game }) => [game.label, game.playedOn])).toEqual([
      ['v Lowmoor', '2026-02-28'],
      ['v Lowmoor', '2026-02-28'],
      ['against us', '2026-03-07'],
      ['v Tarn Valley', '2026-03-14'],
      ['v Tarn Valley', '2026-03-14'],
      ['v Tarn Valley', '2026-03-14'],
    ])
    expect(rows[2]?.game).toMatchObject({ id: ours, kind: 'ours' })
  })

  it.each([
    ['game', () => `game=${early},${ours}`, [1, 2, 3]],
    ['trigger', () => 'trigger=live,dead-ball', [2, 3]],
    ['period', () => 'period=4', [5]],
    ['margin', () => 'margin=behind', [5]],
    ['margin ahead', () => 'margin=ahead', [2]],
    ['pick-up', () => 'pickup=three-quarter', [6]],
    ['shape', () => 'shape=2-2-1,dropped-back', [2, 6]],
    ['pressed', () => 'pressed=yes', [1, 3, 5, 6]],
    ['not pressed', () => 'pressed=no', [2, 7]],
    ['outcome', () => 'outcome=lost-live', [5]],
    ['trap in the corner, first or later', () => 'trap=coffin-corner', [1, 5]],
    ['trap on the sideline', () => 'trap=early-sideline', [5]],
    ['no trap, where it was looked for', () => 'trap=none', [6]],
    ['cue of the first trap', () => 'cue=on-catch', [1]],
    ['handler; not visible is nobody', () => 'handler=weak', [1]],
    ['what they took away', () => 'tookAway=long,middle', [5]],
    ['a number on the floor, at a trap or with the ball', () => 'jersey=12', [1, 5]],
    ['a number that only trapped', () => 'jersey=9', [5]],
    ['words in the note, whatever their case', () => 'text=CAPTAIN', [1]],
    ['a sign that is a wildcard elsewhere', () => 'text=100%25', [1]],
    ['two filters at once', () => 'pressed=yes&trigger=dead-ball', [3]],
    ['nothing that fits', () => 'text=__', []],
  ])('filters by %s', async (_name, query, expected) => {
    const filtered = await table(query())
    expect(filtered.rows.map(({ possession }) => possession.number)).toEqual(expected)
    expect([filtered.total, filtered.of]).toEqual([expected.length, 6])
  })

  it('orders by a column both ways, empty cells last', async () => {
    expect(await numbers('sort=firstTrap')).toEqual([1, 5, 2, 3, 6, 7])
    expect(await numbers('sort=firstTrap&direction=desc')).toEqual([5, 1, 2, 3, 6, 7])
    expect(await numbers('sort=margin&direction=desc')).toEqual([2, 1, 6, 7, 5, 3])
    expect((await numbers('sort=clock')).slice(-3)).toEqual([5, 3, 7])
    expect((await numbers('sort=outcome')).slice(-2)).toEqual([5, 2])
    expect(await numbers('direction=desc')).toEqual([7, 6, 5, 3, 2, 1])
  })

  it.each(TABLE_SORTS)('can be ordered by %s', async (sort) => {
    expect((await numbers(`sort=${sort}`)).sort()).toEqual([1, 2, 3, 5, 6, 7])
  })

  it('comes page by page, and a page past the end still says how many there are', async () => {
    expect(await numbers('limit=2&offset=2')).toEqual([3, 5])
    // A row's own page, whatever the offset says, in the order and the filter that are asked for.
    const onPageOf = async (query: string) => {
      const answer = await table(`limit=2&${query}`)
      return [answer.offset, ...answer.rows.map(({ possession }) => possession.number)]
    }
    expect(await onPageOf(`row=${ids[5]}`)).toEqual([2, 3, 5])
    expect(await onPageOf(`row=${ids[1]}&direction=desc`)).toEqual([4, 2, 1])
    expect(await onPageOf(`row=${ids[2]}&offset=2&pressed=yes`)).toEqual(
      await onPageOf('offset=2&pressed=yes'),
    )
    expect(await onPageOf(`row=${opponent}&offset=2`)).toEqual([2, 3, 5])
    const past = await table('limit=2&offset=20&pressed=yes')
    expect([past.rows.length, past.total, past.of]).toEqual([0, 4, 6])
  })

  it('has every row as a bar, in the filter or not', async () => {
    const { bars } = await table('game=' + late)
    expect(bars?.games).toEqual([
      { id: early, kind: 'scouted', label: 'v Lowmoor', playedOn: '2026-02-28', rows: 2 },
      { id: ours, kind: 'ours', label: 'against us', playedOn: '2026-03-07', rows: 1 },
      { id: late, kind: 'scouted', label: 'v Tarn Valley', playedOn: '2026-03-14', rows: 3 },
    ])
    expect(bars?.ids).toEqual([1, 2, 3, 5, 6, 7].map((number) => ids[number]))
    expect(bars?.numbers).toEqual([1, 2, 3, 5, 6, 7])
    expect(bars?.pressed).toEqual([1, 0, 1, 1, 1, 0])
    expect(bars?.shown).toEqual([0, 0, 0, 1, 1, 1])
    expect((await table('bars=no')).bars).toBeNull()
  })

  it('carries what a field was before its last change', async () => {
    const id = ids[6] ?? ''
    const head = await test.as('head')
    const patch = (version: number, body: object) =>
      head
        .patch(teamUrl(`/possessions/${id}`))
        .set('If-Match', `"${version}"`)
        .send(body)
    await patch(1, { goalie: 'home' })
    await patch(2, { goalie: 'left-early', passes: 3 })
    const row = (await table()).rows.find(({ possession }) => possession.id === id)
    expect(row?.fixes).toMatchObject([
      { field: 'goalie', from: 'home', initials: 'TH' },
      { field: 'passes', from: null, initials: 'TH' },
    ])
  })

  it('does not exist for another team’s opponent, and names a filter that is not one', async () => {
    const foreign = await newOpponent(await test.as('otherHead'), 'Theirs', OTHER_TEAM)
    expect((await scout.get(teamUrl(`/opponents/${foreign}/possessions`))).status).toBe(404)
    const bad = await scout.get(teamUrl(`/opponents/${opponent}/possessions?trap=bench&limit=201`))
    expect(bad.status).toBe(400)
    expect(bad.body.errors.map(({ field }: { field: string }) => field).sort()).toEqual(['limit', 'trap.0'])
  })
})

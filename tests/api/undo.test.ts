import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Change } from '@server/database/entities/Change'
import { purgeDeleted } from '@server/features/deletion/purge.service'
import type { ChangeRow } from '@shared/history/schemas'
import { makeFixture, possessionBody, teamUrl, type Fixture } from '../support/fixture'
import { created, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
const later = (minutes: number, seconds = 0) => new Date(START.getTime() + minutes * 60_000 + seconds * 1000)

let test: TestApp
let head: Agent
let own: Fixture
/** One of our trips in the game. */
let trip: string

beforeEach(async () => {
  test = await startTestApp({ now: START })
  head = await test.as('head')
  own = await makeFixture(test)
  trip = await created(head, 'possessions', {
    gameId: own.game,
    number: 1,
    trigger: 'dead-ball',
    shape: '1-2-1-1',
    outcome: 'through',
    counterId: own.counters[1],
  })
})
afterEach(() => test.stop())

const get = (path: string) => head.get(teamUrl(path))
const remove = (path: string) => head.delete(teamUrl(path))
const restore = (path: string) => head.post(teamUrl(`${path}/restore`))
const statuses = (paths: string[]) => Promise.all(paths.map(async (path) => (await get(path)).status))
const purge = (now: Date) => purgeDeleted(test.context.db, test.context.stillFiles, now)
const actions = async (row: string) =>
  ((await get(`/history?row=${row}`)).body.rows as ChangeRow[]).map(({ action }) => action)

const KINDS = [
  ['opponents', () => own.opponent],
  ['scouted-games', () => own.scoutedGame],
  ['games', () => own.game],
  ['counters', () => own.counters[1] ?? ''],
  ['opponent-players', () => own.opponentPlayer],
] as const

describe.each(KINDS)('deleting one of %s', (collection, id) => {
  const path = () => `/${collection}/${id()}`

  it('twice is once, and putting it back makes it as it was, as a new version, with both in its history', async () => {
    const list = collection === 'scouted-games' || collection === 'opponent-players'
    const listPath = list
      ? `/opponents/${own.opponent}/${collection === 'scouted-games' ? collection : 'players'}`
      : `/${collection}`
    const rows = async () => (await get(listPath)).body.rows as { id: string; version: number }[]
    const before = await rows()
    expect(before.map((row) => row.id)).toContain(id())
    expect((await remove(path())).status).toBe(204)
    expect((await rows()).map((row) => row.id)).not.toContain(id())
    test.setNow(later(8))
    expect((await remove(path())).status).toBe(204)
    test.setNow(later(9, 59))
    expect(await purge(later(9, 59))).toBe(0)
    const back = await restore(path())
    expect([back.status, back.headers.etag]).toEqual([200, `"${back.body.version}"`])
    const stamped = { version: expect.any(Number) as number, updatedAt: expect.any(String) as string }
    expect((await rows()).map((row) => ({ ...row, ...stamped }))).toEqual(
      before.map((row) => ({ ...row, ...stamped })),
    )
    expect(back.body.version).toBe((before.find((row) => row.id === id())?.version ?? 0) + 2)
    expect((await actions(id())).slice(-2)).toEqual(['deleted', 'restored'])
    expect((await restore(path())).body.version).toBe(back.body.version)
  })

  it('is refused on a stale If-Match, with the present row', async () => {
    const stale = await remove(path()).set('If-Match', '"7"')
    expect(stale.status).toBe(412)
    expect(stale.body.current.id).toBe(id())
    expect((await remove(path()).set('If-Match', `"${stale.body.current.version}"`)).status).toBe(204)
  })

  it('cannot be undone when ten minutes are over, before and after the purge', async () => {
    await remove(path())
    test.setNow(later(10))
    expect((await restore(path())).status).toBe(404)
    expect(await purge(later(10))).toBeGreaterThan(0)
    expect((await restore(path())).status).toBe(404)
    expect((await remove(path())).status).toBe(404)
    expect(await test.context.db.manager.countBy(Change, { rowId: id() })).toBe(0)
  })

  it('of another team does not exist, neither to delete nor to put back', async () => {
    const theirs = await makeFixture(test, OTHER_TEAM)
    const foreign = {
      opponents: theirs.opponent,
      'scouted-games': theirs.scoutedGame,
      games: theirs.game,
      counters: theirs.counters[1],
      'opponent-players': theirs.opponentPlayer,
    }[collection]
    expect((await remove(`/${collection}/${foreign}`)).status).toBe(404)
    expect((await restore(`/${collection}/${foreign}`)).status).toBe(404)
    const stranger = await test.as('otherHead')
    expect((await stranger.delete(teamUrl(path()))).status).toBe(404)
    expect((await (await test.as('player')).delete(teamUrl(path()))).status).toBe(403)
  })
})

describe('what hangs on a deleted row', () => {
  const everything = () => [
    `/opponents/${own.opponent}`,
    `/opponents/${own.opponent}/players`,
    `/opponents/${own.opponent}/tendencies`,
    `/opponents/${own.opponent}/possessions`,
    `/scouted-games/${own.scoutedGame}`,
    `/possessions/${own.possession}`,
    `/possessions/${trip}`,
    `/stills/${own.still}`,
    `/games/${own.game}`,
    `/games/${own.game}/plan`,
    `/games/${own.game}/choices`,
    `/sheets/${own.sheet}`,
    `/sheets/${own.sheet}/copies`,
    `/sheets/${own.sheet}/openings`,
  ]

  it('goes and comes back with an opponent: games, rows, stills, players, plans and sheets', async () => {
    await remove(`/opponents/${own.opponent}`)
    expect(new Set(await statuses(everything()))).toEqual(new Set([404]))
    expect((await get('/sheets')).body.rows).toEqual([])
    expect((await get('/games')).body.rows).toEqual([])
    const player = await test.as('player')
    expect((await player.get(teamUrl(`/sheets/${own.sheet}.pdf`))).status).toBe(404)
    await restore(`/opponents/${own.opponent}`)
    expect(new Set(await statuses(everything()))).toEqual(new Set([200]))
  })

  it('is out of every count while its game is deleted', async () => {
    const second = await newScoutedGame(head, own.opponent)
    await newPossession(head, second)
    await remove(`/scouted-games/${own.scoutedGame}`)
    const { counts } = (await get(`/opponents/${own.opponent}`)).body
    expect(counts).toMatchObject({ scoutedGames: 1, possessions: 2, pressed: 2 })
    expect((await get(`/opponents/${own.opponent}/tendencies`)).body.counted).toBe(2)
    expect((await get(`/opponents/${own.opponent}/evidence?habit=press`)).body.total).toBe(2)
    const table = (await get(`/opponents/${own.opponent}/possessions`)).body
    expect([table.of, table.bars.ids.length]).toEqual([2, 2])
    await remove(`/games/${own.game}`)
    expect((await get(`/opponents/${own.opponent}`)).body).toMatchObject({
      nextGame: null,
      counts: { possessions: 1 },
    })
    const record = (await get(`/counters/${own.counters[1]}`)).body.record as unknown[]
    expect(record).toEqual([])
    await restore(`/games/${own.game}`)
    expect((await get(`/counters/${own.counters[1]}`)).body.record).toEqual([
      { shape: '1-2-1-1', k: 1, n: 1 },
    ])
  })

  it('that was deleted before does not come back with it, also when both went at the same instant', async () => {
    const kept = await newPossession(head, own.scoutedGame, { number: 2 })
    await remove(`/possessions/${own.possession}`)
    await remove(`/scouted-games/${own.scoutedGame}`)
    await restore(`/scouted-games/${own.scoutedGame}`)
    expect(await statuses([`/possessions/${own.possession}`, `/possessions/${kept}`])).toEqual([404, 200])
    expect((await restore(`/possessions/${own.possession}`)).status).toBe(200)
  })

  it('cannot be put back alone; the answer says what to put back first', async () => {
    await remove(`/scouted-games/${own.scoutedGame}`)
    const answer = await restore(`/possessions/${own.possession}`)
    expect(answer.status).toBe(409)
    expect(answer.body.detail).toBe(
      'The scouted game of this possession was deleted too. Put the scouted game back first.',
    )
  })

  it('takes nothing new', async () => {
    await remove(`/scouted-games/${own.scoutedGame}`)
    const body = possessionBody(own.scoutedGame, { number: 9 })
    expect((await head.put(teamUrl(`/possessions/${randomUUID()}`)).send(body)).status).toBe(404)
    await remove(`/opponents/${own.opponent}`)
    const player = { opponentId: own.opponent, jersey: 5 }
    expect((await head.put(teamUrl(`/opponent-players/${randomUUID()}`)).send(player)).status).toBe(404)
  })
})

describe('a counter', () => {
  const plan = (body: object) =>
    head.put(teamUrl(`/games/${own.game}/plan`)).send({ id: randomUUID(), ...body })

  it('that only a signed plan names goes, and the sheet stays as it was', async () => {
    const before = (await get(`/sheets/${own.sheet}`)).body
    expect((await remove(`/counters/${own.counters[0]}`)).status).toBe(204)
    await purge(later(10))
    expect((await get(`/sheets/${own.sheet}`)).body).toEqual(before)
  })

  it.each([
    ['the first call', (id: string) => ({ firstCallId: id })],
    ['the change-up', (id: string) => ({ changeUpId: id })],
    ['left out of this game', (id: string) => ({ notThisGame: [id] })],
  ])('that is %s of an open plan stays, and the answer says what to do', async (_name, body) => {
    const id = own.counters[2] ?? ''
    expect((await plan(body(id))).status).toBe(201)
    const answer = await remove(`/counters/${id}`)
    expect(answer.status).toBe(409)
    expect(answer.body.detail).toContain('is in the open plan against Port Selby Gulls. Take it out')
    expect((await get(`/counters/${id}`)).status).toBe(200)
    await remove(`/games/${own.game}`)
    expect((await remove(`/counters/${id}`)).status).toBe(204)
  })

  it('that is deleted stays on the trips it was called on, and can be called on no other', async () => {
    await remove(`/counters/${own.counters[1]}`)
    const patch = (body: object) =>
      head
        .patch(teamUrl(`/possessions/${trip}`))
        .set('If-Match', '"1"')
        .send(body)
    expect((await patch({ counterId: own.counters[1], rightCall: true })).status).toBe(200)
    await remove(`/counters/${own.counters[2]}`)
    const other = { gameId: own.game, number: 2, trigger: 'live', counterId: own.counters[2] }
    expect((await head.put(teamUrl(`/possessions/${randomUUID()}`)).send(other)).status).toBe(404)
    await purge(later(10))
    expect((await get(`/possessions/${trip}`)).body).toMatchObject({ counterId: null, rightCall: true })
  })

  it('that is deleted cannot be picked', async () => {
    await remove(`/counters/${own.counters[2]}`)
    expect((await plan({ firstCallId: own.counters[2] })).status).toBe(404)
  })
})

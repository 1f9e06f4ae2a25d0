import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Person } from '@server/database/entities/Person'
import { Change } from '@server/database/entities/Change'
import type { ChangeRow, NewsRow } from '@shared/history/schemas'
import { gameBody, opponentBody, possessionBody, teamUrl } from '../support/fixture'
import { newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
const later = (minutes: number) => new Date(START.getTime() + minutes * 60_000)

let test: TestApp
let scout: Agent
let head: Agent
let opponent: string
let scoutedGame: string

beforeEach(async () => {
  test = await startTestApp({ now: START })
  scout = await test.as('assistant')
  head = await test.as('head')
  opponent = await newOpponent(scout)
  scoutedGame = await newScoutedGame(scout, opponent)
})
afterEach(() => test.stop())

const history = async (row: string): Promise<ChangeRow[]> => {
  const answer = await head.get(teamUrl(`/history?row=${row}`))
  expect(answer.status).toBe(200)
  return answer.body.rows as ChangeRow[]
}
const news = async (query = ''): Promise<{ rows: NewsRow[]; total: number }> =>
  (await head.get(teamUrl(`/changes${query}`))).body as { rows: NewsRow[]; total: number }

describe('the history of a row', () => {
  it('says who made and changed what, from what to what, oldest first', async () => {
    const id = await newPossession(scout, scoutedGame, { number: 8, outcome: 'through' })
    test.setNow(later(5))
    const patch = { tookAway: ['pass-back'], outcome: 'lost-dead' }
    await head
      .patch(teamUrl(`/possessions/${id}`))
      .set('If-Match', '"1"')
      .send(patch)
    const [made, changed, ...more] = await history(id)
    expect(more).toEqual([])
    expect(made).toMatchObject({ action: 'made', kind: 'possessions', rowId: id, fields: [] })
    expect(made?.who).toMatchObject({ name: 'Test assistant', initials: 'TA' })
    expect(made?.at).toBe(START.toISOString())
    expect(changed?.who?.name).toBe('Test head')
    expect(changed?.at).toBe(later(5).toISOString())
    expect(changed?.fields).toEqual([
      { field: 'outcome', from: 'through', to: 'lost-dead' },
      { field: 'tookAway', from: null, to: ['pass-back'] },
    ])
  })

  it('has nothing new after the same body again', async () => {
    const id = await newPossession(scout, scoutedGame)
    await scout.put(teamUrl(`/possessions/${id}`)).send(possessionBody(scoutedGame))
    expect(await history(id)).toHaveLength(1)
  })

  it('keeps what was done when whoever did it is gone', async () => {
    const id = await newPossession(scout, scoutedGame)
    await test.context.db.manager.delete(Person, { email: 'assistant@club.example' })
    expect((await history(id))[0]).toMatchObject({ action: 'made', who: null })
  })

  it('of another team’s row, and of no row, does not exist', async () => {
    const foreign = await newOpponent(await test.as('otherHead'), 'Theirs', OTHER_TEAM)
    for (const id of [foreign, randomUUID()])
      expect((await head.get(teamUrl(`/history?row=${id}`))).status).toBe(404)
  })

  it('is not for players, and asks for an id', async () => {
    const player = await test.as('player')
    expect((await player.get(teamUrl(`/history?row=${opponent}`))).status).toBe(403)
    expect((await head.get(teamUrl('/history'))).status).toBe(400)
  })
})

describe('what happened in the team', () => {
  it('names each row and the way to it, newest first', async () => {
    test.setNow(later(1))
    const game = await newGame(scout, opponent)
    test.setNow(later(2))
    const id = await newPossession(scout, scoutedGame, { number: 8 })
    const { rows, total } = await news()
    expect(total).toBe(4)
    expect(rows.map(({ kind }) => kind).slice(0, 2)).toEqual(['possessions', 'games'])
    expect(rows[0]).toMatchObject({
      rowId: id,
      label: 'No. 8, Port Selby Gulls v Tarn Valley',
      rows: 1,
      open: true,
      opponentId: opponent,
      scoutedGameId: scoutedGame,
      gameId: null,
    })
    expect(rows[1]).toMatchObject({ rowId: game, label: 'Port Selby Gulls', gameId: game })
  })

  it('tells the rows that one person logged in one game as one line', async () => {
    for (const number of [1, 2, 3]) await newPossession(scout, scoutedGame, { number })
    await newPossession(head, scoutedGame, { number: 4 })
    const logged = (await news()).rows.filter(({ kind }) => kind === 'possessions')
    expect(logged.map(({ who, rows }) => [who?.name, rows]).sort()).toEqual([
      ['Test assistant', 3],
      ['Test head', 1],
    ])
  })

  it('begins at the instant asked for and stops at the limit, and says how many lines there are', async () => {
    test.setNow(later(60))
    await head.put(teamUrl(`/games/${randomUUID()}`)).send(gameBody(opponent))
    await head.put(teamUrl(`/opponents/${randomUUID()}`)).send(opponentBody('Tarn Valley'))
    expect((await news(`?since=${later(30).toISOString()}`)).total).toBe(2)
    const first = await news('?limit=1')
    expect([first.rows.length, first.total]).toEqual([1, 4])
    test.setNow(new Date(START.getTime() + 8 * 86_400_000))
    expect((await news()).total).toBe(0)
  })

  it('has nothing of another team', async () => {
    await newOpponent(await test.as('otherHead'), 'Theirs', OTHER_TEAM)
    expect((await news()).rows.map(({ label }) => label)).not.toContain('Theirs')
  })

  it('never tells the name of a player who was deleted', async () => {
    const id = randomUUID()
    const skills = { handle: 1, 'throw-in': 1, 'long-arm': 1, decide: 1, sprint: 1, screen: 1 }
    await head.put(teamUrl(`/squad/${id}`)).send({ jersey: 44, firstName: 'Wren', skills })
    const label = async () => (await news()).rows.find(({ rowId }) => rowId === id)?.label
    expect(await label()).toBe('Wren')
    await test.context.db.query('UPDATE squad_players SET deletedAt = ? WHERE id = ?', ['2026-03-17', id])
    expect(await label()).toBe('')
    await test.context.db.query('DELETE FROM squad_players WHERE id = ?', [id])
    expect(await label()).toBe('')
    expect(await test.context.db.manager.countBy(Change, { rowId: id })).toBe(1)
  })
})

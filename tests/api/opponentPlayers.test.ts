import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { gameBody, teamUrl } from '../support/fixture'
import { created, faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let opponent: string
let game: string

beforeEach(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
  game = await newScoutedGame(scout, opponent)
})
afterEach(() => test.stop())

const body = (jersey: number, more: object = {}) => ({ opponentId: opponent, jersey, ...more })
const add = (jersey: number, more: object = {}) => created(scout, 'opponent-players', body(jersey, more))
const put = (id: string, sent: object) => scout.put(teamUrl(`/opponent-players/${id}`)).send(sent)
const list = async () => (await scout.get(teamUrl(`/opponents/${opponent}/players`))).body

describe('players of theirs', () => {
  it('are listed by number with what was counted of each in watched games and ours', async () => {
    const trap = (trappers: number[] | null) => ({ x: 0.08, y: 0.9, trappers })
    await newPossession(scout, game, {
      number: 1,
      onFloor: [4, 5, 9, 11, 12],
      traps: [trap([12, 5]), trap([12])],
      thief: 12,
    })
    await newPossession(scout, game, { number: 2, onFloor: [12], traps: [trap(null)], thief: 'not-visible' })
    const ours = await created(scout, 'games', gameBody(opponent))
    const trip = { gameId: ours, number: 1, trigger: 'live', onFloor: [5, 12], thief: 5 }
    await created(scout, 'possessions', trip)
    const gone = await newPossession(scout, game, { number: 3, onFloor: [12], thief: 12 })
    await scout.delete(teamUrl(`/possessions/${gone}`))
    const other = await newScoutedGame(scout, await newOpponent(scout, 'Lowmoor'))
    await newPossession(scout, other, { onFloor: [12], thief: 12 })

    await add(12, { does: ['trapper', 'mirror', 'trapper'], note: 'Long arms' })
    await add(5)
    await add(44)
    const { rows, total } = await list()
    expect(total).toBe(3)
    expect(rows.map((row: { jersey: number; counts: object }) => [row.jersey, row.counts])).toEqual([
      [5, { onFloor: 2, traps: 1, steals: 1 }],
      [12, { onFloor: 3, traps: 2, steals: 1 }],
      [44, { onFloor: 0, traps: 0, steals: 0 }],
    ])
    expect(rows[1]).toMatchObject({ does: ['mirror', 'trapper'], note: 'Long arms', version: 1 })
  })

  it('are made once, changed with their version, and refused without it or with an old one', async () => {
    const id = await add(12)
    expect((await put(id, body(12))).status).toBe(200)
    expect((await put(id, body(12, { note: 'x' }))).status).toBe(409)
    const changed = await put(id, body(12, { note: 'x' })).set('If-Match', '"1"')
    expect([changed.status, changed.headers.etag]).toEqual([200, '"2"'])
    const stale = await put(id, body(12, { note: 'y' })).set('If-Match', '"1"')
    expect(stale.status).toBe(412)
    expect(stale.body.current).toMatchObject({ id, note: 'x', counts: { onFloor: 0 } })
  })

  it('have one number each; the number of a deleted one is free, and then she cannot come back', async () => {
    const id = await add(12)
    const taken = await put(randomUUID(), body(12))
    expect(taken.status).toBe(409)
    expect(taken.body.detail).toContain('Number 12 of theirs is there already.')
    await scout.delete(teamUrl(`/opponent-players/${id}`))
    await add(12)
    expect((await scout.post(teamUrl(`/opponent-players/${id}/restore`))).status).toBe(409)
    expect((await list()).total).toBe(1)
    const elsewhere = await newOpponent(scout, 'Lowmoor')
    expect((await put(randomUUID(), { opponentId: elsewhere, jersey: 12 })).status).toBe(201)
  })

  it('belong to one team, and what cannot be taken is named', async () => {
    const theirs = await test.as('otherHead')
    const foreign = await newOpponent(theirs, 'Theirs', OTHER_TEAM)
    expect((await put(randomUUID(), { opponentId: foreign, jersey: 3 })).status).toBe(404)
    const row = await created(
      theirs,
      'opponent-players',
      { opponentId: foreign, jersey: 3, note: 'z' },
      OTHER_TEAM,
    )
    expect((await put(row, body(3))).status).toBe(404)
    expect((await scout.get(teamUrl(`/opponents/${foreign}/players`))).status).toBe(404)
    const bad = await put(randomUUID(), { opponentId: opponent, jersey: 100, does: ['juggles'] })
    expect(Object.keys(faultsIn(bad.body)).sort()).toEqual(['does.0', 'jersey'])
  })
})

import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { gameBody, teamUrl } from '../support/fixture'
import { created, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let gulls: string

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  gulls = await newOpponent(scout, 'Port Selby Gulls')
  const otters = await newOpponent(scout, 'Ashby Otters')
  await newOpponent(scout, 'Lowmoor')
  const tip = (opponent: string, tipOff: string) => created(scout, 'games', { ...gameBody(opponent), tipOff })
  await tip(otters, '2026-03-27T19:15:00.000Z')
  await tip(gulls, '2026-03-20T19:15:00.000Z')
  const older = await newScoutedGame(scout, gulls, { foe: 'Tarn Valley', playedOn: '2026-02-01' })
  await newScoutedGame(scout, gulls, { foe: 'Élan', playedOn: '2026-03-01' })
  await newPossession(scout, older, { number: 1 })
  await newPossession(scout, older, { number: 2, shape: 'fake', pickup: null, traps: [] })
}, 60_000)
afterAll(() => test.stop())

const asked = async (path: string, field: string) => {
  const { rows, total } = (await scout.get(teamUrl(path))).body
  return { names: rows.map((row: Record<string, string>) => row[field]) as string[], total: total as number }
}

describe.each([
  ['', ['Port Selby Gulls', 'Ashby Otters', 'Lowmoor'], 3],
  ['?q=GULL', ['Port Selby Gulls'], 1],
  ['?sort=name', ['Ashby Otters', 'Lowmoor', 'Port Selby Gulls'], 3],
  ['?sort=meeting&direction=desc', ['Ashby Otters', 'Port Selby Gulls', 'Lowmoor'], 3],
  ['?sort=possessions&direction=desc&limit=1', ['Port Selby Gulls'], 3],
  ['?limit=1&offset=1', ['Ashby Otters'], 3],
  ['?offset=9', [], 3],
])('opponents%s', (query, names, total) => {
  it('come as asked', async () => {
    expect(await asked(`/opponents${query}`, 'name')).toEqual({ names, total })
  })
})

describe('games and scouted games', () => {
  it('come in their own order unless asked, and are searched, ordered and paged', async () => {
    const games = (query: string) => asked(`/games${query}`, 'opponentName')
    expect((await games('')).names).toEqual(['Port Selby Gulls', 'Ashby Otters'])
    expect((await games('?sort=opponent')).names).toEqual(['Ashby Otters', 'Port Selby Gulls'])
    expect(await games('?q=otters')).toEqual({ names: ['Ashby Otters'], total: 1 })
    const watched = (query: string) => asked(`/opponents/${gulls}/scouted-games${query}`, 'foe')
    expect((await watched('')).names).toEqual(['Élan', 'Tarn Valley'])
    expect((await watched('?sort=playedOn')).names).toEqual(['Tarn Valley', 'Élan'])
    expect((await watched('?sort=foe')).names).toEqual(['Élan', 'Tarn Valley'])
    expect((await watched('?q=ÉLAN')).names).toEqual(['Élan'])
    expect(await watched('?sort=pressed&direction=desc&limit=1')).toEqual({
      names: ['Tarn Valley'],
      total: 2,
    })
  })

  it('refuse an order and a page that are none', async () => {
    for (const path of [
      '/opponents?sort=luck',
      '/games?limit=0',
      `/opponents/${gulls}/scouted-games?offset=-1`,
    ])
      expect((await scout.get(teamUrl(path))).status).toBe(400)
  })
})

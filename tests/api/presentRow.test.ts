import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Team } from '@server/database/entities/Team'
import { gameBody, opponentBody, scoutedGameBody, teamUrl } from '../support/fixture'
import { newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let opponent: string
let scoutedGame: string
let game: string

/** Where the team is it is the 18th already. */
const NOW = new Date('2026-03-17T20:00:00Z')

beforeAll(async () => {
  test = await startTestApp({ now: NOW })
  await test.context.db.manager.update(Team, { id: TEAM }, { timeZone: 'Pacific/Auckland' })
  head = await test.as('head')
  opponent = await newOpponent(head)
  scoutedGame = await newScoutedGame(head, opponent)
  await newPossession(head, scoutedGame)
  game = await newGame(head, opponent)
})
afterAll(() => test.stop())

const skills = { handle: 1, 'throw-in': 1, 'long-arm': 1, decide: 1, sprint: 1, screen: 1 }
const player = { jersey: 4, firstName: 'Nell', lastName: 'Tavish', skills, outUntil: '2026-03-17' }

describe('the present row of a 409 and a 412 is the row as it is read', () => {
  it.each<[string, () => string, () => object]>([
    ['an opponent, with its counts', () => `/opponents/${opponent}`, () => opponentBody('Other Gulls')],
    [
      'a scouted game, with its scout and counts',
      () => `/scouted-games/${scoutedGame}`,
      () => ({ ...scoutedGameBody(opponent), foe: 'Lowmoor' }),
    ],
    ['a game', () => `/games/${game}`, () => ({ ...gameBody(opponent), place: 'away' })],
    [
      'a player, out or not where the team is',
      () => `/squad/${PLAYER}`,
      () => ({ ...player, lastName: 'Other' }),
    ],
  ])('%s', async (_what, path, other) => {
    if (path().startsWith('/squad')) {
      const back = await head.put(teamUrl(path())).set('If-Match', '"1"').send(player)
      expect(back.body).toMatchObject({ available: true, version: 2 })
    }
    const { body } = await head.get(teamUrl(path()))
    const put = () => head.put(teamUrl(path()))
    const conflict = await put().send(other())
    expect([conflict.status, conflict.body.current]).toEqual([409, body])
    const stale = await put().set('If-Match', '"9"').send(other())
    expect([stale.status, stale.body.current]).toEqual([412, body])
  })
})

import { afterAll, beforeAll, expect, it } from 'vitest'
import { Team } from '@server/database/entities/Team'
import { gameBody, teamUrl } from '../../support/fixture'
import { created, newOpponent, newPossession, newScoutedGame } from '../../support/scouted'
import { startTestApp, TEAM, type Agent, type TestApp } from '../../support/testApp'

let test: TestApp
let scout: Agent

beforeAll(async () => {
  test = await startTestApp()
  await test.context.db.manager.update(Team, { id: TEAM }, { timeZone: 'America/Los_Angeles' })
  scout = await test.as('assistant')
})
afterAll(() => test.stop())

it('a game of ours is on the day that it was where the team is, in the read and beside its possessions', async () => {
  const opponent = await newOpponent(scout)
  // A quarter past seven in the evening of the 20th.
  const game = await created(scout, 'games', { ...gameBody(opponent), tipOff: '2026-03-21T02:15:00.000Z' })
  await created(scout, 'possessions', { gameId: game, number: 1, trigger: 'made-basket', shape: '2-2-1' })
  await newPossession(scout, await newScoutedGame(scout, opponent, { playedOn: '2026-03-19' }))

  const { games } = (await scout.get(teamUrl(`/opponents/${opponent}/tendencies`))).body
  expect(games.map(({ kind, playedOn }: { kind: string; playedOn: string }) => [kind, playedOn])).toEqual([
    ['ours', '2026-03-20'],
    ['scouted', '2026-03-19'],
  ])
  const evidence = (await scout.get(teamUrl(`/opponents/${opponent}/evidence?habit=press`))).body
  expect(evidence.rows.map(({ gameLabel }: { gameLabel: string }) => gameLabel)).toEqual([
    'against us, 2026-03-20',
    'v Tarn Valley, 2026-03-19',
  ])
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Counter } from '@server/database/entities/Counter'
import { HandOn } from '@server/database/entities/HandOn'
import { Membership } from '@server/database/entities/Membership'
import { ScoutedGame } from '@server/database/entities/ScoutedGame'
import { purgeDeleted } from '@server/features/deletion/purge.service'
import { makeFixture, practiceBody, teamUrl, type Fixture } from '../support/fixture'
import { newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let assistant: Agent
let own: Fixture
let theirs: Fixture
beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  assistant = await test.as('assistant')
  own = await makeFixture(test)
  theirs = await makeFixture(test, OTHER_TEAM)
}, 60_000)
afterAll(() => test.stop())

const personOf = async (role: 'head-coach' | 'assistant-coach') =>
  (await test.context.db.manager.findOneByOrFail(Membership, { teamId: TEAM, role })).personId

/** A game at Read, with the ball at the assistant, who watched the opponent. */
async function gameWithAssistant(): Promise<string> {
  const opponent = await newOpponent(head)
  const scouted = await newScoutedGame(assistant, opponent)
  for (let number = 1; number <= 10; number += 1) await newPossession(assistant, scouted, { number })
  const { manager } = test.context.db
  const { scoutId } = await manager.findOneByOrFail(ScoutedGame, { id: scouted })
  const game = await newGame(head, opponent)
  await head.post(teamUrl(`/games/${game}/hand-on`)).send({ toId: scoutId, note: '' })
  return game
}

describe('an answer that got lost on its way', () => {
  it('does not turn a hand-on that was done into a refusal, nor hand on twice', async () => {
    const game = await gameWithAssistant()
    const body = { toId: await personOf('head-coach'), note: 'Look at no. 14.' }
    const handOn = () => assistant.post(teamUrl(`/games/${game}/hand-on`)).send(body)
    expect((await handOn()).status).toBe(200)
    expect((await handOn()).status).toBe(200)
    const { manager } = test.context.db
    expect(await manager.countBy(HandOn, { gameId: game, toId: body.toId })).toBe(1)
  })

  it('does not turn a read that was signed off into a refusal', async () => {
    const game = await gameWithAssistant()
    const sign = () => assistant.post(teamUrl(`/games/${game}/read-sign-off`))
    expect((await sign()).status).toBe(200)
    expect((await sign()).status).toBe(200)
  })
})

describe('what another team has', () => {
  it('is not there under its id for a new paper', async () => {
    const answer = await head
      .post(teamUrl(`/sheets/${own.sheet}/copies`))
      .send({ copies: [{ id: theirs.copy, squadPlayerId: null }] })
    expect(answer.status).toBe(404)
  })
})

describe('a practice', () => {
  it('can still be changed when a counter that was run in it is gone for good', async () => {
    const counterId = own.counters.at(-1) ?? ''
    const kept = own.counters.at(-2) ?? ''
    const reps = [counterId, kept].map((id) => ({ counterId: id, shape: null, kind: 'live', n: 4, k: 3 }))
    const id = randomUUID()
    const body = { ...practiceBody(own.game), reps }
    await head
      .put(teamUrl(`/practices/${id}`))
      .send(body)
      .expect(201)
    await head.delete(teamUrl(`/counters/${counterId}`)).expect(204)
    const later = new Date(test.context.clock().getTime() + 11 * 60_000)
    await purgeDeleted(test.context.db, test.context.stillFiles, later)
    expect(await test.context.db.manager.existsBy(Counter, { id: counterId })).toBe(false)
    const changed = { ...body, startsAt: '2026-03-19T18:00:00.000Z' }
    const answer = await head
      .put(teamUrl(`/practices/${id}`))
      .set('If-Match', '"1"')
      .send(changed)
    expect(answer.status).toBe(200)
    const foreign = { ...body, reps: [{ ...reps[0], counterId: theirs.counters[0] }] }
    const refused = await head
      .put(teamUrl(`/practices/${id}`))
      .set('If-Match', '"2"')
      .send(foreign)
    expect(refused.status).toBe(404)
  })
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Change } from '@server/database/entities/Change'
import { Person } from '@server/database/entities/Person'
import type { GameRow } from '@shared/games/schemas'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let assistant: Agent
let game: string
let scouted: string

beforeAll(async () => {
  test = await startTestApp()
  ;[head, assistant] = [await test.as('head'), await test.as('assistant')]
  await seedSquad(head)
})
afterAll(() => test.stop())
beforeEach(async () => {
  test.setNow(new Date('2026-03-17T09:42:00Z'))
  const opponent = await newOpponent(head)
  game = await newGame(head, opponent)
  scouted = await newScoutedGame(assistant, opponent)
})

const url = (path = '/read-sign-off') => teamUrl(`/games/${game}${path}`)
const row = async (agent = head) => (await agent.get(url(''))).body as GameRow
const log = async (from: number, to: number) => {
  for (let number = from; number <= to; number++) await newPossession(assistant, scouted, { number })
}

describe('where the work stands', () => {
  it('is Scout under ten possessions, Read until the read is signed off, then Choose', async () => {
    await log(1, 9)
    expect((await row()).station).toBe('scout')
    await log(10, 10)
    expect((await row()).station).toBe('read')
    expect((await head.post(url())).body).toMatchObject({
      station: 'choose',
      read: { at: '2026-03-17T09:42:00.000Z', by: { name: 'Test head', initials: 'TH' } },
    })
  })

  it('is past the read once picks are begun, though nobody signed the read off', async () => {
    const { counters } = await seedBook(test)
    await log(1, 10)
    const id = randomUUID()
    await head.put(url('/plan')).send({ id, firstCallId: counters[0] })
    expect(await row()).toMatchObject({ station: 'choose', read: null })
    const sign = head.post(url('/plan/sign-off')).set('If-Match', '"1"')
    await sign.send({ planId: id, sheetId: randomUUID() })
    expect(await row()).toMatchObject({ station: 'teach', read: null, holder: { name: 'Test head' } })
  })
})

describe('signing the read off', () => {
  it('is for the head coach and whoever has the ball', async () => {
    const both = await test.as('both')
    expect((await both.post(url())).status).toBe(403)
    expect((await assistant.post(url())).status).toBe(200)
    expect((await row()).read?.by?.name).toBe('Test assistant')
  })

  it('twice keeps the first time, and is written into the history once', async () => {
    const first = await head.post(url())
    test.setNow(new Date('2026-03-17T12:00:00Z'))
    expect((await head.post(url())).body.read).toEqual(first.body.read)
    const changes = await test.context.db.manager.findBy(Change, { rowId: game, action: 'changed' })
    expect(changes.map(({ fields }) => fields)).toEqual([
      [{ field: 'readAt', from: null, to: '2026-03-17T09:42:00.000Z' }],
    ])
  })

  it('can be taken back by whoever signed it, and by the head coach, but by nobody else', async () => {
    await log(1, 10)
    await assistant.post(url())
    expect((await row()).holder?.name).toBe('Test head')
    expect((await (await test.as('both')).delete(url())).status).toBe(403)
    expect((await assistant.delete(url())).body).toMatchObject({ station: 'read', read: null })
    await assistant.post(url())
    expect((await head.delete(url())).body).toMatchObject({ station: 'read', read: null })
    expect((await head.delete(url())).status).toBe(200)
  })

  it('outlives the person who did it', async () => {
    await assistant.post(url())
    const { manager } = test.context.db
    const person = await manager.findOneByOrFail(Person, { name: 'Test assistant' })
    await manager.delete(Person, { id: person.id })
    expect((await row()).read).toEqual({ at: '2026-03-17T09:42:00.000Z', by: null })
  })
})

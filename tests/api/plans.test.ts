import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Sheet } from '@server/database/entities/Sheet'
import type { PlanInput } from '@shared/plans/schemas'
import type { SheetView } from '@shared/sheets/schemas'
import { gameBody, possessionBody, seedBook, seedSquad, teamUrl } from '../support/fixture'
import { created, faultsIn, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_PLAYER, OTHER_TEAM, PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let counters: string[]
let opponent: string
let game: string
let id: string

const START = new Date('2026-03-17T09:42:00Z')

beforeAll(async () => {
  test = await startTestApp({ now: START })
  head = await test.as('head')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
})
afterAll(() => test.stop())
beforeEach(async () => {
  test.setNow(START)
  opponent = await newOpponent(head)
  game = await newGame(head, opponent)
  id = randomUUID()
})

const url = (path = '', of = game) => teamUrl(`/games/${of}/plan${path}`)
const body = (more: Partial<PlanInput> = {}): PlanInput => ({
  id,
  firstCallId: counters[0],
  changeUpId: counters[1],
  keys: ['Look middle first.'],
  ...more,
})
const put = (more: Partial<PlanInput> = {}, ifMatch?: string) => {
  const sent = head.put(url())
  return (ifMatch ? sent.set('If-Match', ifMatch) : sent).send(body(more))
}
const signOff = (sheetId: string, ifMatch?: string, planId = id) => {
  const sent = head.post(url('/sign-off'))
  return (ifMatch ? sent.set('If-Match', ifMatch) : sent).send({ planId, sheetId })
}
const state = async () => (await head.get(url())).body

describe('the picks', () => {
  it('are none before the first', async () => {
    expect(await state()).toEqual({ plan: null, versions: [] })
  })

  it('written twice are there once: 201, then 200 with the same', async () => {
    const [first, again] = [await put(), await put()]
    expect([first.status, again.status]).toEqual([201, 200])
    expect(again.body).toEqual(first.body)
    expect(first.body).toMatchObject({
      number: 1,
      version: 1,
      firstCallId: counters[0],
      changeUpId: counters[1],
      notThisGame: [],
      roles: [],
      reason: '',
      signedAt: null,
      signedBy: null,
    })
    expect((await state()).versions).toEqual([{ id, number: 1, signedAt: null }])
  })

  it('change with If-Match only; a stale one is shown the present picks', async () => {
    const first = await put()
    const conflict = await put({ keys: [] })
    expect([conflict.status, conflict.body.current]).toEqual([409, first.body])
    const changed = await put({ keys: [], reason: 'They saw it last time.' }, '"1"')
    expect([changed.status, changed.headers.etag]).toEqual([200, '"2"'])
    expect(changed.body).toMatchObject({ version: 2, number: 1, keys: [], reason: 'They saw it last time.' })
    const stale = await put({ keys: ['Other.'] }, '"1"')
    expect([stale.status, stale.headers.etag]).toEqual([412, '"2"'])
    expect(stale.body.current).toEqual(changed.body)
  })

  it('have one open version: a second is refused and shown the first', async () => {
    const first = await put()
    const second = await put({ id: randomUUID() })
    expect([second.status, second.body.current]).toEqual([409, first.body])
    expect(second.body.detail).toBe('Version 1 is not signed off yet. Change that one.')
  })

  it('opened ten times at once are opened once', async () => {
    const answers = await Promise.all(Array.from({ length: 10 }, () => put({ id: randomUUID() })))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, ...Array(9).fill(409)])
    expect((await state()).versions).toHaveLength(1)
  })

  it('name only counters and players of this team, and an id that no other game’s plan has', async () => {
    const theirs = await seedBook(test, OTHER_TEAM)
    const role = { counterId: String(counters[0]), role: '1' as const, squadPlayerId: OTHER_PLAYER }
    for (const foreign of [
      { firstCallId: theirs.counters[0] },
      { notThisGame: [String(theirs.counters[2])] },
      { roles: [role] },
      { firstCallId: randomUUID() },
    ])
      expect((await put(foreign)).status).toBe(404)
    await put()
    const elsewhere = await newGame(head, opponent)
    expect((await head.put(url('', elsewhere)).send(body())).status).toBe(404)
    expect((await state()).versions).toHaveLength(1)
  })

  it('must fit each other, each fault at its field', async () => {
    const seat = (role: '1' | '2', squadPlayerId: string) => ({
      counterId: String(counters[0]),
      role,
      squadPlayerId,
    })
    const faults = async (more: Partial<PlanInput>) => faultsIn((await put(more)).body)
    expect(await faults({ changeUpId: counters[0] })).toEqual({
      changeUpId: 'The change-up must be another counter than the first call.',
    })
    expect(await faults({ notThisGame: [String(counters[1])] })).toEqual({
      notThisGame: 'A picked counter cannot also be left out. Take it off one of the two.',
    })
    expect(await faults({ roles: [seat('1', PLAYER), seat('2', PLAYER)] })).toEqual({
      'roles.1.squadPlayerId': 'This player has two roles in one counter. Give one of them to somebody else.',
    })
    expect(await faults({ roles: [seat('1', PLAYER), seat('1', randomUUID())] })).toEqual({
      'roles.1.role': 'This role is given twice. Keep one player for it.',
    })
    expect(await faults({ keys: ['a', 'b', 'c', 'd'] })).toEqual({ keys: 'Give at most 3.' })
    expect(await faults({ keys: ['  '] })).toEqual({ 'keys.0': 'This is empty. Fill it in.' })
  })
})

describe('signing off', () => {
  it('without a first call is 400 and names it; nothing is frozen', async () => {
    await put({ firstCallId: null, changeUpId: null })
    const answer = await signOff(randomUUID(), '"1"')
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual({ firstCallId: 'Pick a first call before you sign off.' })
    expect((await state()).plan).toMatchObject({ version: 1, signedAt: null })
  })

  it('needs the version that was seen: 428 without, 412 with an old one, 404 for another plan', async () => {
    await put()
    await put({ keys: [] }, '"1"')
    expect((await signOff(randomUUID())).status).toBe(428)
    const stale = await signOff(randomUUID(), '"1"')
    expect(stale.status).toBe(412)
    expect(stale.body.current).toMatchObject({ id, version: 2 })
    expect((await signOff(randomUUID(), '"2"', randomUUID())).status).toBe(404)
  })

  it('twice is once: same answer, one sheet', async () => {
    await put()
    const sheetId = randomUUID()
    const first = await signOff(sheetId, '"1"')
    test.setNow(new Date('2026-03-17T10:00:00Z'))
    const again = await signOff(sheetId, '"1"')
    expect([first.status, again.status]).toEqual([200, 200])
    expect(again.body).toEqual(first.body)
    expect(first.body.plan).toMatchObject({
      version: 2,
      signedAt: START.toISOString(),
      signedBy: 'Test head',
    })
    expect(await test.context.db.manager.countBy(Sheet, { planId: id })).toBe(1)
    expect((await signOff(randomUUID(), '"2"')).status).toBe(409)
  })

  it('ten times at once with ten sheets makes one sheet', async () => {
    await put()
    const answers = await Promise.all(Array.from({ length: 10 }, () => signOff(randomUUID(), '"1"')))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array(9).fill(409)])
    expect(await test.context.db.manager.countBy(Sheet, { planId: id })).toBe(1)
  })

  it('is final for its version: no change, with or without If-Match, but the same again is fine', async () => {
    await put()
    await signOff(randomUUID(), '"1"')
    for (const ifMatch of [undefined, '"2"']) {
      const change = await put({ keys: ['Something else.'] }, ifMatch)
      expect(change.status).toBe(409)
      expect(change.body.detail).toBe('Version 1 is signed off. Start a new version to change it.')
    }
    const again = await put()
    expect([again.status, again.body]).toEqual([200, (await state()).plan])
    expect(again.body).toMatchObject({ version: 2, keys: ['Look middle first.'], signedBy: 'Test head' })
  })

  it('opens the way for version 2; version 1 stays, and its picks and sign-off may still be repeated', async () => {
    await put()
    const sheetId = randomUUID()
    await signOff(sheetId, '"1"')
    const next = randomUUID()
    const second = await put({ id: next, keys: ['Run it early.'] })
    expect(second.status).toBe(201)
    expect(second.body).toMatchObject({ number: 2, version: 1, signedAt: null })
    expect((await state()).versions).toEqual([
      { id, number: 1, signedAt: START.toISOString() },
      { id: next, number: 2, signedAt: null },
    ])
    expect((await put({ keys: [] }, '"2"')).status).toBe(409)
    expect([(await put()).status, (await state()).plan.id]).toEqual([200, next])
    const repeated = await signOff(sheetId, '"1"')
    expect(repeated.status).toBe(200)
    expect(repeated.body.versions).toHaveLength(2)
    expect((await signOff(randomUUID(), '"1"', next)).status).toBe(200)
    expect((await head.get(teamUrl(`/games/${game}/sheets`))).body.total).toBe(2)
  })

  it('cannot take the id of a sheet that is there', async () => {
    await put()
    const sheetId = randomUUID()
    await signOff(sheetId, '"1"')
    const next = randomUUID()
    await put({ id: next })
    expect((await signOff(sheetId, '"1"', next)).status).toBe(409)
    expect((await state()).plan.signedAt).toBeNull()
  })

  it('is told nothing of a sheet of another team', async () => {
    await put()
    const sheetId = randomUUID()
    const theirs = await test.as('otherHead')
    const theirGame = await newGame(theirs, await newOpponent(theirs, 'Lowmoor', OTHER_TEAM), OTHER_TEAM)
    const theirPlan = { id: randomUUID(), firstCallId: (await seedBook(test, OTHER_TEAM)).counters[0] }
    const at = teamUrl(`/games/${theirGame}/plan`, OTHER_TEAM)
    expect((await theirs.put(at).send(theirPlan)).status).toBe(201)
    const signed = theirs.post(`${at}/sign-off`).set('If-Match', '"1"')
    expect((await signed.send({ planId: theirPlan.id, sheetId })).status).toBe(200)
    expect((await signOff(sheetId, '"1"')).status).toBe(404)
    expect((await state()).plan.signedAt).toBeNull()
  })

  it('counts a second trap where it is said to be, also where the first was not got out of', async () => {
    const trap = (x: number, y: number, result: 'passed-out' | null = null) => ({
      x,
      y,
      t: null,
      cue: null,
      result,
    })
    const scouted = await newScoutedGame(head, opponent)
    const rows = [
      [trap(0.08, 0.9, 'passed-out'), trap(0.55, 0.9)],
      [trap(0.08, 0.9, 'passed-out'), trap(0.55, 0.9)],
      [trap(0.08, 0.9, 'passed-out'), trap(0.3, 0.5)],
      [trap(0.08, 0.9), trap(0.55, 0.9)],
    ]
    for (const [index, traps] of rows.entries())
      await newPossession(head, scouted, { number: index + 1, traps })
    await put()
    const sheetId = randomUUID()
    expect((await signOff(sheetId, '"1"')).status).toBe(200)
    const { content } = (await head.get(teamUrl(`/sheets/${sheetId}`))).body as SheetView
    expect(content.press.lines.map(({ text, k, n }) => [text, k, n])).toEqual(
      expect.arrayContaining([
        ['They trap in the corner.', 4, 4],
        ['They trap again just past half.', 2, 3],
      ]),
    )
  })
})

describe('where a game stands', () => {
  it('goes from Scout to Read to Choose to Teach to Review by what is there and what the time is', async () => {
    const station = async () => (await head.get(teamUrl(`/games/${game}`))).body.station as string
    const scouted = await newScoutedGame(head, opponent)
    for (let number = 1; number < 10; number++) await newPossession(head, scouted, { number })
    expect(await station()).toBe('scout')
    await created(head, 'possessions', possessionBody(scouted, { number: 10 }))
    expect(await station()).toBe('read')
    await put()
    expect(await station()).toBe('choose')
    await signOff(randomUUID(), '"1"')
    expect(await station()).toBe('teach')
    const tipOff = new Date(gameBody(opponent).tipOff).getTime()
    test.setNow(new Date(tipOff - 1))
    expect(await station()).toBe('teach')
    test.setNow(new Date(tipOff))
    expect(await station()).toBe('review')
    const row = (await head.get(teamUrl(`/games/${game}`))).body
    expect(row).toMatchObject({ counts: { possessions: 10, scoutedGames: 1 }, plan: { id, number: 1 } })
  })

  it('is back at Choose while a newer version is open', async () => {
    const scouted = await newScoutedGame(head, opponent)
    for (let number = 1; number <= 10; number++) await newPossession(head, scouted, { number })
    await put()
    await signOff(randomUUID(), '"1"')
    await put({ id: randomUUID() })
    expect((await head.get(teamUrl(`/games/${game}`))).body.station).toBe('choose')
  })
})

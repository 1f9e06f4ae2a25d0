import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { COPIES, type CopyRow } from '@shared/sheets/handOut'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { asBytes, freshSheet, papers } from '../support/handOut'
import { OTHER_PLAYER, PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'
import { readPdf } from '../server/pdf/readPdf'

let test: TestApp
let head: Agent
let assistant: Agent
let counters: string[]

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  assistant = await test.as('assistant')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
}, 60_000)
afterAll(() => test.stop())

const move = (copy: CopyRow, place: string, version = copy.version, agent = assistant) =>
  agent
    .patch(teamUrl(`/copies/${copy.id}`))
    .set('If-Match', `"${version}"`)
    .send({ place })

describe('to whom a paper goes', () => {
  it('is said when it is given out and stays with it', async () => {
    const sheet = await freshSheet(head, counters)
    const [copy] = await papers(assistant, sheet, [{}])
    const url = teamUrl(`/copies/${copy?.id}`)
    const given = await assistant
      .patch(url)
      .set('If-Match', '"1"')
      .send({ place: 'out', squadPlayerId: PLAYER })
    expect(given.body).toMatchObject({ place: 'out', squadPlayerId: PLAYER, name: 'Nell', version: 2 })
    const back = await assistant.patch(url).set('If-Match', '"2"').send({ place: 'back' })
    expect(back.body).toMatchObject({ place: 'back', squadPlayerId: PLAYER, outAt: given.body.outAt })
  })

  it('cannot be a player of another team, and then nothing moved', async () => {
    const sheet = await freshSheet(head, counters)
    const [copy] = await papers(assistant, sheet, [{}])
    const refused = await assistant
      .patch(teamUrl(`/copies/${copy?.id}`))
      .set('If-Match', '"1"')
      .send({ place: 'out', squadPlayerId: OTHER_PLAYER })
    expect(refused.status).toBe(404)
    const { body } = await head.get(teamUrl(`/sheets/${sheet}/copies`))
    expect(body.rows[0]).toMatchObject({ place: 'bag', version: 1 })
  })
})

describe('numbers', () => {
  it('go up from 1 within a sheet and a repeat makes nothing new', async () => {
    const sheet = await freshSheet(head, counters)
    const id = randomUUID()
    expect(
      (await papers(assistant, sheet, [{ id, squadPlayerId: PLAYER }, {}])).map((row) => row.number),
    ).toEqual([1, 2])
    const again = await papers(assistant, sheet, [{ id, squadPlayerId: PLAYER }])
    expect(again).toHaveLength(2)
    expect((await papers(head, sheet, [{}])).map((row) => row.number)).toEqual([1, 2, 3])
    expect(again[0]).toMatchObject({ name: 'Nell', jersey: 4, place: 'bag', way: 'paper', letter: null })
    expect(again[1]).toMatchObject({ name: null, squadPlayerId: null })
    const other = await freshSheet(head, counters)
    expect((await papers(head, other, [{}])).map((row) => row.number)).toEqual([1])
  })

  it('are never the same twice, also when many are made at once', async () => {
    const sheet = await freshSheet(head, counters)
    await Promise.all(Array.from({ length: 6 }, () => papers(head, sheet, [{}, {}])))
    const { body } = await head.get(teamUrl(`/sheets/${sheet}/copies`))
    expect(body.rows.map((row: CopyRow) => row.number)).toEqual(Array.from({ length: 12 }, (_, at) => at + 1))
  })

  it('end with the most that a sheet has', async () => {
    const sheet = await freshSheet(head, counters)
    for (const count of [40, 40, 19])
      await papers(
        head,
        sheet,
        Array.from({ length: count }, () => ({})),
      )
    const more = await head.post(teamUrl(`/sheets/${sheet}/copies`)).send({ copies: [{ id: randomUUID() }] })
    expect([more.status, more.body.detail]).toEqual([409, expect.stringContaining(String(COPIES.ofASheet))])
  })

  it('of an id that is another copy’s is 409; another team’s player is 404; the same id twice is 400', async () => {
    const [one, two] = [await freshSheet(head, counters), await freshSheet(head, counters)]
    const id = randomUUID()
    await papers(head, one, [{ id }])
    const post = (sheet: string, copies: object[]) =>
      head.post(teamUrl(`/sheets/${sheet}/copies`)).send({ copies })
    expect((await post(two, [{ id }])).status).toBe(409)
    expect((await post(one, [{ id, squadPlayerId: PLAYER }])).status).toBe(409)
    expect((await post(one, [{ id: randomUUID(), squadPlayerId: OTHER_PLAYER }])).status).toBe(404)
    expect((await post(one, [{ id }, { id }])).status).toBe(400)
    expect((await post(one, [])).body.errors[0].field).toBe('copies')
  })
})

describe('a paper', () => {
  it('goes out, comes back, and is history', async () => {
    const [copy] = await papers(head, await freshSheet(head, counters), [{ squadPlayerId: PLAYER }])
    const out = await move(copy as CopyRow, 'out')
    expect(out.body).toMatchObject({ place: 'out', backAt: null, version: 2 })
    expect(out.body.outAt).not.toBeNull()
    expect((await move(copy as CopyRow, 'back')).status).toBe(412)
    const back = await move(out.body as CopyRow, 'back')
    expect(back.body).toMatchObject({ place: 'back', outAt: out.body.outAt, version: 3 })
    expect((await move(back.body as CopyRow, 'bag')).body).toMatchObject({
      place: 'bag',
      outAt: null,
      backAt: null,
    })
    const history = await head.get(teamUrl(`/history?row=${copy?.id}`))
    expect(JSON.stringify(history.body)).toContain('"to":"back"')
  })

  it('needs its version, a known place, and a person of the team', async () => {
    const [copy] = await papers(head, await freshSheet(head, counters), [{}])
    const url = teamUrl(`/copies/${copy?.id}`)
    expect((await head.patch(url).send({ place: 'out' })).status).toBe(428)
    expect((await move(copy as CopyRow, 'lost')).body.errors[0].field).toBe('place')
    expect((await move(copy as CopyRow, 'out', 1, await test.as('player'))).status).toBe(403)
    expect((await move(copy as CopyRow, 'out', 1, await test.as('otherHead'))).status).toBe(404)
    expect((await test.anonymous().patch(url).send({ place: 'out' })).status).toBe(401)
  })
})

describe('the file of copies', () => {
  const pdf = (sheet: string, query: string, agent = head) =>
    asBytes(agent.get(teamUrl(`/sheets/${sheet}/copies.pdf?${query}`)))

  it('has a page for each, with its number, reader and how many there are', async () => {
    const sheet = await freshSheet(head, counters)
    const seated = await test.context.db.manager.findOneByOrFail(SquadPlayer, {
      teamId: TEAM,
      firstName: 'P6',
    })
    const rows = await papers(head, sheet, [{ squadPlayerId: seated.id }, {}, {}])
    const { text, info } = readPdf((await pdf(sheet, 'paper=letter')).body as Buffer)
    expect(info.get('Pages')).toBe('3')
    for (const said of ['Sheet 1 of 3, plan 1. P6, 6.', 'Sheet 2 of 3, plan 1.', 'Sheet 3 of 3, plan 1.'])
      expect(text).toContain(said)
    expect(text.match(/Bring it back\./g)).toHaveLength(3)
    expect(text).not.toMatch(/Tavish|Secretname/)
    const one = readPdf((await pdf(sheet, `ids=${rows[1]?.id}`)).body as Buffer)
    expect(one.info.get('Pages')).toBe('1')
    expect(one.text).toContain('Sheet 2 of 3')
  })

  it('needs a copy, and only its own', async () => {
    const [one, two] = [await freshSheet(head, counters), await freshSheet(head, counters)]
    const [copy] = await papers(head, two, [{}])
    expect((await pdf(one, '')).status).toBe(400)
    expect((await pdf(one, `ids=${copy?.id}`)).status).toBe(404)
    expect((await pdf(one, 'ids=first')).status).toBe(400)
    expect((await pdf(two, '', await test.as('player'))).status).toBe(403)
  })
})

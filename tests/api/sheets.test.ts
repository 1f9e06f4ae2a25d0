import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Counter } from '@server/database/entities/Counter'
import { Plan } from '@server/database/entities/Plan'
import { Sheet } from '@server/database/entities/Sheet'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { LIMITS } from '@shared/limits'
import type { FrozenPlan, SheetRow, SheetView } from '@shared/sheets/schemas'
import { opponentBody, seedBook, seedSquad, teamUrl } from '../support/fixture'
import { newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_PLAYER, OTHER_TEAM, PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'
import { readPdf } from '../server/pdf/readPdf'

let test: TestApp
let head: Agent
let player: Agent
let counters: string[]
let opponent: string
let scouted: string
let game: string
let sheet: string

const LAST_NAMES = /Tavish|Secretname/

async function signed(gameId: string, more: object = {}): Promise<string> {
  const plan = randomUUID()
  const sheetId = randomUUID()
  const url = teamUrl(`/games/${gameId}/plan`)
  const body = {
    id: plan,
    firstCallId: counters[0],
    changeUpId: counters[1],
    keys: ['Look middle first.'],
    ...more,
  }
  const put = await head.put(url).send(body)
  const done = await head.post(`${url}/sign-off`).set('If-Match', '"1"').send({ planId: plan, sheetId })
  if (put.status !== 201 || done.status !== 200) throw new Error(JSON.stringify([put.body, done.body]))
  return sheetId
}

const view = async (agent = head, id = sheet): Promise<SheetView> =>
  (await agent.get(teamUrl(`/sheets/${id}`))).body as SheetView
const pdf = (agent: Agent, query = '', id = sheet) =>
  agent
    .get(teamUrl(`/sheets/${id}.pdf?${query}`))
    .buffer(true)
    .parse((answer, done) => {
      const chunks: Buffer[] = []
      answer.on('data', (chunk: Buffer) => chunks.push(chunk))
      answer.on('end', () => done(null, Buffer.concat(chunks)))
    })
const textOf = async (agent: Agent, query = '') => readPdf((await pdf(agent, query)).body as Buffer).text

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  player = await test.as('player')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
  opponent = await newOpponent(head)
  scouted = await newScoutedGame(head, opponent)
  for (let number = 1; number <= 6; number++)
    await newPossession(head, scouted, { number, leftOpen: ['middle'], shownShape: '1-2-1-1' })
  game = await newGame(head, opponent)
  const roles = [{ counterId: counters[0], role: '1', squadPlayerId: PLAYER }]
  sheet = await signed(game, { roles })
}, 60_000)
afterAll(() => test.stop())

describe('a frozen sheet', () => {
  it('says what was counted, picked and given when it was signed', async () => {
    const { content } = await view()
    expect(content).toMatchObject({
      opponentName: 'Port Selby Gulls',
      press: { pressed: 6, pickup: 'full', mostlyShape: '1-2-1-1', room: 'middle' },
      firstCall: { counterId: counters[0] },
      changeUp: { counterId: counters[1] },
      keys: ['Look middle first.'],
    })
    expect(content.press.lines.map(({ text, k, n }) => [text, k, n])).toEqual([
      ['They trap in the corner.', 6, 6],
      ['They pick up full court.', 6, 6],
      ['They leave the middle open.', 6, 6],
    ])
    expect(content.firstCall.roles.find(({ role }) => role === '1')?.squadPlayerId).toBe(PLAYER)
    const seats = content.firstCall.roles.map(({ squadPlayerId }) => squadPlayerId)
    expect(new Set(seats).size).toBe(5)
  })

  it('stays as it is when counter, counts, roles, tip-off and the opponent’s name change', async () => {
    const before = await view()
    const { manager } = test.context.db
    const counter = await manager.findOneByOrFail(Counter, { id: counters[0] })
    const changed = { ...(counter.body as object), name: 'Renamed', call: 'Other' }
    await manager.update(Counter, { id: counter.id }, { name: 'Renamed', body: changed })
    for (let number = 7; number <= 12; number++)
      await newPossession(head, scouted, { number, shape: 'person', pickup: 'half', traps: [] })
    const rename = head.put(teamUrl(`/opponents/${opponent}`)).set('If-Match', '"1"')
    expect((await rename.send(opponentBody('Selby Bay Gulls'))).status).toBe(200)
    const { body: row } = await head.get(teamUrl(`/games/${game}`))
    const later = {
      opponentId: opponent,
      tipOff: '2026-03-21T19:15:00Z',
      place: 'away',
      rulePack: row.rulePack,
    }
    expect(
      (
        await head
          .put(teamUrl(`/games/${game}`))
          .set('If-Match', '"1"')
          .send(later)
      ).status,
    ).toBe(200)
    expect((await head.get(teamUrl(`/counters/${counters[0]}`))).body.name).toBe('Renamed')
    expect(await view()).toEqual(before)
    const text = await textOf(head)
    expect(text).toContain('Port Selby Gulls')
    expect(text).not.toMatch(/Selby Bay|Renamed/)
  })

  it('looks names up as they are now, and an erased player is on it no longer', async () => {
    const names = async () => (await view()).players.map(({ firstName }) => firstName)
    expect(await names()).toContain('Nell')
    const { body: nell } = await head.get(teamUrl(`/squad/${PLAYER}`))
    const changed = { jersey: 4, firstName: 'Nella', lastName: 'Tavish', skills: nell.skills }
    const put = head.put(teamUrl(`/squad/${PLAYER}`)).set('If-Match', '"1"')
    expect((await put.send(changed)).status).toBe(200)
    expect(await names()).toContain('Nella')
    expect(await textOf(head)).toContain('Nella')
    const { manager } = test.context.db
    const erased = await manager.findOneByOrFail(SquadPlayer, { firstName: 'P6' })
    expect(await names()).toContain('P6')
    await manager.delete(SquadPlayer, { id: erased.id })
    expect(await names()).not.toContain('P6')
    expect(await textOf(head)).not.toContain('P6')
  })

  it('has nobody’s last name, on screen or on either paper', async () => {
    for (const agent of [head, player]) {
      expect(JSON.stringify(await view(agent))).not.toMatch(LAST_NAMES)
      for (const paper of ['a4', 'letter'])
        expect(await textOf(agent, `paper=${paper}`)).not.toMatch(LAST_NAMES)
    }
    expect(JSON.stringify((await head.get(teamUrl('/squad'))).body)).toMatch(LAST_NAMES)
  })
})

describe('whose copy', () => {
  it('a player’s own shows her role; staff see the general one', async () => {
    expect((await view(player)).mine).toEqual({
      squadPlayerId: PLAYER,
      firstCallRole: '1',
      changeUpRole: expect.toSatisfy((role) => role === null || /^[1-5]$/.test(role as string)),
    })
    expect((await view(head)).mine).toBeNull()
    const [own, drawnForHer, general] = [
      await textOf(player),
      await textOf(head, `player=${PLAYER}`),
      await textOf(head),
    ]
    expect(drawnForHer).toBe(own)
    expect(general).not.toBe(own)
  })

  it('a player may not draw another’s, staff may draw anybody’s of the team', async () => {
    const { body: squad } = await head.get(teamUrl('/squad'))
    const other = squad.rows.find(({ id }: { id: string }) => id !== PLAYER).id as string
    expect((await pdf(player, `player=${other}`)).status).toBe(403)
    expect((await pdf(player, `player=${PLAYER}`)).status).toBe(200)
    expect((await pdf(head, `player=${other}`)).status).toBe(200)
    expect((await pdf(head, `player=${OTHER_PLAYER}`)).status).toBe(404)
    expect((await pdf(head, `player=${randomUUID()}`)).status).toBe(404)
  })

  it('another team’s people get neither page nor file', async () => {
    for (const who of ['otherHead', 'nobodyYet'] as const) {
      const agent = await test.as(who)
      expect((await agent.get(teamUrl(`/sheets/${sheet}`))).status).toBe(404)
      expect((await pdf(agent)).status).toBe(404)
    }
    const both = await test.as('both')
    expect((await both.get(teamUrl(`/sheets/${sheet}.pdf`, OTHER_TEAM))).status).toBe(404)
  })
})

describe('the file', () => {
  it.each([
    ['a4', '595.276 x 841.89 pts (A4)'],
    ['letter', '612 x 792 pts (letter)'],
  ])('is one page of %s, for the browser to show and nobody to keep', async (paper, size) => {
    const answer = await pdf(head, `paper=${paper}&copy=3`)
    expect(answer.headers).toMatchObject({
      'content-type': 'application/pdf',
      'content-disposition': 'inline; filename="sheet.pdf"',
      'cache-control': 'private, no-store',
      'x-content-type-options': 'nosniff',
    })
    const { info, text } = readPdf(answer.body as Buffer)
    expect([info.get('Pages'), info.get('Page size')]).toEqual(['1', size])
    expect(text).toContain('Look middle first.')
  })

  it.each(['paper=a3', 'copy=0', 'copy=100', 'player=nell'])('with %s is 400', async (query) => {
    expect((await pdf(head, query)).status).toBe(400)
  })

  it('holds the longest names, jobs and keys there may be on one page', async () => {
    const { manager } = test.context.db
    const counter = await manager.findOneByOrFail(Counter, { id: counters[2] })
    const body = structuredClone(counter.body) as { name: string; call: string; roles: { jobs: string[] }[] }
    for (const role of body.roles) role.jobs = Array(4).fill('wordswords '.repeat(7).trim()) as string[]
    const id = randomUUID()
    const longest = { ...body, name: 'W'.repeat(40), call: 'W'.repeat(20) }
    await manager.insert(Counter, { ...counter, id, body: longest } as never)
    const opponentId = await newOpponent(head, 'W '.repeat(LIMITS.name / 2).trim())
    const keys = Array(LIMITS.keys).fill('W'.repeat(LIMITS.key)) as string[]
    const full = await signed(await newGame(head, opponentId), { firstCallId: id, keys })
    const reader = (await view(head, full)).players[0]?.squadPlayerId
    for (const query of ['paper=a4', `player=${reader}&paper=letter`]) {
      const answer = await pdf(head, query, full)
      expect(readPdf(answer.body as Buffer).info.get('Pages')).toBe('1')
    }
  })

  it('that no page can hold is 409 and says to use fewer words', async () => {
    const full = await signed(await newGame(head, opponent))
    const { manager } = test.context.db
    const { planId } = await manager.findOneByOrFail(Sheet, { id: full })
    const plan = await manager.findOneByOrFail(Plan, { id: planId })
    // Longer than any field takes today, as a stored plan of another time might be.
    const frozen = { ...(plan.frozen as FrozenPlan), keys: Array(3).fill('word '.repeat(600)) as string[] }
    await manager.update(Plan, { id: planId }, { frozen })
    const answer = await pdf(head, '', full)
    expect(answer.status).toBe(409)
    const { detail } = JSON.parse(String(answer.body)) as { detail: string }
    expect(detail).toMatch(/^This does not fit on one page.* Use fewer words\.$/)
  })
})

describe('the lists', () => {
  it('hold what was handed out, newest first, of one game or of all, for players too', async () => {
    test.setNow(new Date('2026-03-18T09:00:00Z'))
    const second = await newGame(head, opponent)
    const newer = await signed(second)
    for (const agent of [head, player]) {
      const all = (await agent.get(teamUrl('/sheets'))).body.rows as SheetRow[]
      expect(all[0]?.id).toBe(newer)
      expect(all.map(({ id }) => id)).toContain(sheet)
      const of = (await agent.get(teamUrl(`/games/${game}/sheets`))).body
      expect(of.total).toBe(1)
      expect(of.rows).toMatchObject([
        { id: sheet, gameId: game, planNumber: 1, opponentName: 'Port Selby Gulls' },
      ])
    }
    const theirs = await (await test.as('otherHead')).get(teamUrl('/sheets', OTHER_TEAM))
    expect(theirs.body).toEqual({ rows: [], total: 0 })
  })
})

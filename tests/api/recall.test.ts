import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Mail } from '@server/database/entities/Mail'
import type { CopyRow } from '@shared/sheets/handOut'
import type { SheetRow } from '@shared/sheets/schemas'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { papers, signedSheet } from '../support/handOut'
import { newGame, newOpponent } from '../support/scouted'
import { PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let player: Agent
let counters: string[]
let game: string
let sheet: string

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  player = await test.as('player')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
}, 60_000)
beforeEach(async () => {
  game = await newGame(head, await newOpponent(head))
  sheet = await signedSheet(head, game, counters)
})
afterAll(() => test.stop())

const recall = (agent = head, id = sheet) => agent.post(teamUrl(`/sheets/${id}/recall`))
const out = async (copy: CopyRow) =>
  head
    .patch(teamUrl(`/copies/${copy.id}`))
    .set('If-Match', '"1"')
    .send({ place: 'out' })

describe('a new version', () => {
  it('does not call the old one back, but both say which is newest', async () => {
    const newer = await signedSheet(head, game, counters)
    const { body } = await player.get(teamUrl(`/sheets/${sheet}`))
    expect(body).toMatchObject({ recalledAt: null, newest: { id: newer, planNumber: 2 } })
    expect((await player.get(teamUrl(`/sheets/${newer}`))).body.newest).toBeNull()
    expect((await player.get(teamUrl(`/sheets/${sheet}.pdf`))).status).toBe(200)
  })
})

describe('calling back', () => {
  it('tells readers, stops the file for players, lists what is out and withdraws letters', async () => {
    const copies = await papers(head, sheet, [{ squadPlayerId: PLAYER }, {}])
    await out(copies[0] as CopyRow)
    await head.post(teamUrl(`/sheets/${sheet}/letters`)).send({ players: [PLAYER] })
    const newer = await signedSheet(head, game, counters)
    const { status, body } = await recall()
    expect(status).toBe(200)
    expect(body).toMatchObject({ out: [{ number: 1, name: 'Nell' }], withdrawn: 1 })
    const seen = await player.get(teamUrl(`/sheets/${sheet}`))
    expect(seen.body).toMatchObject({ recalledAt: body.recalledAt, newest: { id: newer, planNumber: 2 } })
    const file = await player.get(teamUrl(`/sheets/${sheet}.pdf`))
    expect([file.status, file.body.detail]).toEqual([
      410,
      'This one is called back. Open the newest one, from plan 2.',
    ])
    expect((await head.get(teamUrl(`/sheets/${sheet}.pdf`))).status).toBe(200)
    const [mail] = await test.context.db.manager.findBy(Mail, { aboutId: sheet, kind: 'sheet' })
    expect(mail?.state).toBe('withdrawn')
    const rows = (await head.get(teamUrl(`/games/${game}/sheets`))).body.rows as SheetRow[]
    expect(rows.map(({ recalledAt }) => recalledAt)).toEqual([null, body.recalledAt])
  })

  it('again changes nothing, and nothing more goes out', async () => {
    const [copy] = await papers(head, sheet, [{}])
    const first = await recall()
    test.setNow(new Date('2026-03-19T09:00:00Z'))
    expect((await recall()).body).toEqual({ ...first.body, withdrawn: 0 })
    expect((await out(copy as CopyRow)).status).toBe(409)
    expect((await head.post(teamUrl(`/sheets/${sheet}/letters`)).send({ players: [PLAYER] })).status).toBe(
      409,
    )
  })

  it('writes to those whose letter had left', async () => {
    await head.post(teamUrl(`/sheets/${sheet}/letters`)).send({ players: [PLAYER] })
    const { manager } = test.context.db
    await manager.update(Mail, { aboutId: sheet }, { state: 'sent' })
    await recall()
    await recall()
    const letters = await manager.findBy(Mail, { aboutId: sheet, kind: 'sheet-recalled' })
    expect(letters.map(({ recipient }) => recipient)).toEqual(['player@club.example'])
  })

  it('is the head coach’s', async () => {
    expect((await recall(await test.as('assistant'))).status).toBe(403)
    expect((await recall(player)).status).toBe(403)
    expect((await recall(await test.as('otherHead'))).status).toBe(404)
  })
})

describe('the fuller page', () => {
  const choose = (body: object, agent = head) => agent.patch(teamUrl(`/sheets/${sheet}`)).send(body)

  it('is chosen after its warning, and taken back', async () => {
    const early = await choose({ fuller: true })
    expect([early.status, early.body.errors[0].field]).toEqual([400, 'seenWarning'])
    expect((await choose({ fuller: true, seenWarning: true })).body.fuller).toBe(true)
    expect((await player.get(teamUrl(`/sheets/${sheet}`))).body.fuller).toBe(true)
    expect((await choose({ fuller: false })).body.fuller).toBe(false)
  })

  it('is the head coach’s', async () => {
    expect((await choose({ fuller: true, seenWarning: true }, await test.as('assistant'))).status).toBe(403)
  })
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { Team } from '@server/database/entities/Team'
import type { Letter } from '@server/adapters/mail/transport'
import { carryMail } from '@server/features/mail/carrier'
import type { CopyRow } from '@shared/sheets/handOut'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { freshSheet } from '../support/handOut'
import { OTHER_PLAYER, PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'
import { readPdf } from '../server/pdf/readPdf'

let test: TestApp
let head: Agent
let counters: string[]
let young: SquadPlayer
let nobody: SquadPlayer
const sent: Letter[] = []

beforeAll(async () => {
  const mail = { send: async (letter: Letter) => void sent.push(letter), close: () => undefined }
  test = await startTestApp({ mail })
  head = await test.as('head')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
  const { manager } = test.context.db
  young = await manager.findOneByOrFail(SquadPlayer, { teamId: TEAM, firstName: 'P6' })
  nobody = await manager.findOneByOrFail(SquadPlayer, { teamId: TEAM, firstName: 'P7' })
  await manager.update(SquadPlayer, { id: young.id }, { guardianEmail: 'guardian@home.example' })
}, 60_000)
afterAll(() => test.stop())

const write = (sheet: string, body: object, agent = head) =>
  agent.post(teamUrl(`/sheets/${sheet}/letters`)).send(body)
const to = async (recipient: string, sheet: string) => {
  await carryMail(test.context)
  const rows = await test.context.db.manager.findBy(Mail, { recipient, aboutId: sheet, kind: 'sheet' })
  return rows
}
const letterTo = (address: string) => sent.filter(({ recipient }) => recipient === address).at(-1)
/** All that is said in a letter, without the drawing's bytes. */
const words = (address: string) => JSON.stringify(letterTo(address)).replace(/base64,[^"]+/, '')

describe('letters of a sheet', () => {
  it('go to her own account, else to the guardian by number, and say for whom there is no address', async () => {
    const sheet = await freshSheet(head, counters)
    const { status, body } = await write(sheet, { players: [PLAYER, young.id, nobody.id] })
    expect(status).toBe(200)
    expect(body.without).toEqual([{ squadPlayerId: nobody.id, jersey: 7 }])
    expect(body.rows.map(({ way, name, jersey, number }: CopyRow) => [way, name, jersey, number])).toEqual(
      expect.arrayContaining([
        ['mail', 'Nell', 4, null],
        ['guardian', null, 6, null],
      ]),
    )
    await to('player@club.example', sheet)
    const own = words('player@club.example')
    expect(own).toContain('Hello Nell.')
    expect(own).toContain(`/t/${TEAM}/sheets/${sheet}`)
    const hers = words('guardian@home.example')
    expect(hers).toContain('For number 6.')
    expect(hers).not.toMatch(/P6|Nell|Secretname/)
    expect(hers).not.toContain(`/sheets/${sheet}`)
    expect(letterTo('guardian@home.example')?.files).toEqual([])
    const { body: after } = await head.get(teamUrl(`/sheets/${sheet}/copies`))
    expect(after.rows.map(({ letter }: CopyRow) => letter?.state)).toEqual(['sent', 'sent'])
  })

  it('go once: a repeat, and one after another at the same moment, bring nothing twice', async () => {
    const sheet = await freshSheet(head, counters)
    await Promise.all([1, 2, 3].map(() => write(sheet, { players: [PLAYER, young.id] })))
    const { body } = await write(sheet, { players: [PLAYER] })
    expect(body.total).toBe(2)
    expect(await to('player@club.example', sheet)).toHaveLength(1)
    expect(await to('guardian@home.example', sheet)).toHaveLength(1)
  })

  it('keep to the guardian when the player wants none', async () => {
    const sheet = await freshSheet(head, counters)
    const { manager } = test.context.db
    await manager.update(Membership, { squadPlayerId: PLAYER }, { mail: false })
    const { body } = await write(sheet, { players: [PLAYER] })
    expect(body).toMatchObject({ rows: [], without: [{ squadPlayerId: PLAYER, jersey: 4 }] })
    await manager.update(Membership, { squadPlayerId: PLAYER }, { mail: true })
  })

  it('bring a guardian the page without names only where the team chose so', async () => {
    const sheet = await freshSheet(head, counters)
    const { manager } = test.context.db
    await manager.update(Team, { id: TEAM }, { settings: { attachSheet: true } })
    await write(sheet, { players: [young.id, PLAYER] })
    await to('guardian@home.example', sheet)
    await manager.update(Team, { id: TEAM }, { settings: null as never })
    const letter = letterTo('guardian@home.example')
    const file = letter?.files[0]?.content
    expect(file).toBeInstanceOf(Buffer)
    expect(readPdf(file as Buffer).text).not.toMatch(/P\d+|Nell|Secretname|Tavish/)
    expect(letterTo('player@club.example')?.files).toEqual([])
  })

  it('go to coaches by name, and to nobody of another team', async () => {
    const sheet = await freshSheet(head, counters)
    const { manager } = test.context.db
    const coach = await manager.findOneByOrFail(Membership, { teamId: TEAM, role: 'head-coach' })
    const { body } = await write(sheet, { members: [coach.id] })
    expect(body.rows).toMatchObject([{ way: 'mail', name: 'Test head', squadPlayerId: null }])
    expect((await write(sheet, { players: [OTHER_PLAYER] })).status).toBe(404)
    expect((await write(sheet, { members: [randomUUID()] })).status).toBe(404)
    expect((await write(sheet, { players: ['nell'] })).body.errors[0].field).toBe('players.0')
    expect((await write(sheet, {}, await test.as('player'))).status).toBe(403)
  })
})

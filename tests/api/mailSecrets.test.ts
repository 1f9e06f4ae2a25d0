import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Mail } from '@server/database/entities/Mail'
import { carryMail } from '@server/features/mail/carrier'
import type { MailRow } from '@shared/mail/schemas'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { freshSheet } from '../support/handOut'
import { PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
beforeEach(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterEach(() => test.stop())

const lettersFor = async (agent: Agent) => (await agent.get(teamUrl('/mails'))).body.rows as MailRow[]
const invite = (role: string) =>
  head
    .put(teamUrl(`/invitations/${randomUUID()}`))
    .send({ role, way: 'mail', email: 'new@club.example', days: 7 })
    .expect(201)

describe('a letter that is kept here for want of a mail server', () => {
  it('tells the link of an invitation only to whoever may ask somebody in: it opens the team with its role', async () => {
    await invite('head-coach')
    await carryMail(test.context)
    const [hers] = await lettersFor(head)
    expect(hers?.text).toMatch(/\/join#[0-9a-f]{64}/)
    const assistant = await test.as('assistant')
    const [seen] = await lettersFor(assistant)
    expect(seen).toMatchObject({ kind: 'invitation', state: 'kept', text: null })
    const again = await assistant.post(teamUrl(`/mails/${hers?.id ?? ''}/withdraw`))
    expect(JSON.stringify(again.body)).not.toMatch(/[0-9a-f]{64}/)
  })
})

describe('letters of a sheet that were stopped', () => {
  const write = async (sheet: string) =>
    (await head.post(teamUrl(`/sheets/${sheet}/letters`)).send({ players: [PLAYER] })).body.rows as {
      letter: { state: string }
    }[]
  const letterOf = (sheet: string) =>
    test.context.db.manager.findOneByOrFail(Mail, { aboutId: sheet, kind: 'sheet' })

  it('are empty once the sheet is called back', async () => {
    const { counters } = await seedBook(test)
    await seedSquad(head)
    const sheet = await freshSheet(head, counters)
    await write(sheet)
    await head.post(teamUrl(`/sheets/${sheet}/recall`)).expect(200)
    expect(await letterOf(sheet)).toMatchObject({ state: 'withdrawn', text: '', html: '' })
  })

  it('can be written again, once: they never left', async () => {
    const { counters } = await seedBook(test)
    await seedSquad(head)
    const sheet = await freshSheet(head, counters)
    await write(sheet)
    await carryMail(test.context)
    const { id } = await letterOf(sheet)
    await head.post(teamUrl(`/mails/${id}/withdraw`)).expect(200)
    const rows = await write(sheet)
    expect(rows).toHaveLength(1)
    await carryMail(test.context)
    const after = await letterOf(sheet)
    expect(after.state).toBe('kept')
    expect(after.text).toContain('Hello Nell.')
    await write(sheet)
    expect(await test.context.db.manager.countBy(Mail, { aboutId: sheet, kind: 'sheet' })).toBe(1)
  })
})

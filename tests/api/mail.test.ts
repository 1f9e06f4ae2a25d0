import { randomUUID } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import sharp from 'sharp'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import type { LetterBody } from '@server/adapters/mail/letter'
import { smtpTransport } from '@server/adapters/mail/smtp'
import { clearCopy, copyDatabase } from '@server/backup/databaseCopy'
import { openDatabase } from '@server/database/dataSource'
import { Mail } from '@server/database/entities/Mail'
import { PasswordReset } from '@server/database/entities/PasswordReset'
import { Person } from '@server/database/entities/Person'
import { drawAttachmentsOf } from '@server/features/mail/attachments'
import { carryMail } from '@server/features/mail/carrier'
import { forgetOldMail } from '@server/features/mail/oldMail'
import { queueMail, withdrawMailAbout, type NewMail } from '@server/features/mail/queueMail'
import { SECRET_PLACE, secretOf } from '@server/features/mail/secretLink'
import { makePasswordLink } from '@server/features/session/passwordReset.service'
import { NotFound } from '@server/http/problem'
import { LIMITS } from '@shared/limits'
import { MailList, type MailRow } from '@shared/mail/schemas'
import { teamUrl } from '../support/fixture'
import { partOf, startMailServer, textOf, type MailServer } from '../support/mailServer'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

/** What happens after the answer, on a machine that has other work too. */
const soon = <T>(look: () => T) => expect.poll(look, { timeout: 10_000 })
const START = new Date('2026-03-17T09:42:00Z')
const FROM = 'Herons staff <staff@herons.example>'

let server: MailServer
let test: TestApp
let head: Agent

beforeEach(async () => {
  server = await startMailServer()
  const mail = smtpTransport({ mailUrl: server.url, mailFrom: FROM }) ?? undefined
  test = await startTestApp({ now: START, mail })
  head = await test.as('head')
})
afterEach(async () => {
  test.context.mail?.close()
  await test.stop()
  await server.stop()
})

const body = (more: LetterBody['blocks'] = []): LetterBody => ({
  blocks: [
    { kind: 'heading', text: 'Zoë & the <corner>' },
    { kind: 'paragraph', text: 'Two minutes.' },
    ...more,
  ],
  why: 'You get this because you coach the Herons.',
})

const queue = (more: Partial<NewMail> = {}) =>
  test.context.db.transaction((manager) =>
    queueMail(manager, {
      teamId: TEAM,
      kind: 'invitation',
      onceKey: randomUUID(),
      aboutId: null,
      recipient: 'zoe@club.example',
      subject: 'Zoë, two minutes',
      body: body(),
      now: test.context.clock(),
      ...more,
    }),
  )
const carry = () => carryMail(test.context)
const row = (id: string) => test.context.db.getRepository(Mail).findOneByOrFail({ id })
const minutes = (count: number) => test.setNow(new Date(test.context.clock().getTime() + count * 60_000))
const list = async (query = ''): Promise<MailRow[]> =>
  MailList.parse((await head.get(teamUrl(`/mails${query}`))).body).rows

describe('a letter that leaves', () => {
  it('arrives with both parts, its subject, its sender, and an id made from its own', async () => {
    const { id } = await queue({ subject: 'Zoë,\r\nBcc: all@club.example' })
    await carry()
    expect(server.arrived).toHaveLength(1)
    const [{ from, to, letter }] = server.arrived as [MailServer['arrived'][number]]
    expect([from, to]).toEqual(['staff@herons.example', ['zoe@club.example']])
    expect(letter.headers.get('from')).toBe(FROM)
    expect(letter.headers.get('to')).toBe('zoe@club.example')
    expect(letter.headers.get('subject')).toBe('Zoë, Bcc: all@club.example')
    expect(letter.headers.has('bcc')).toBe(false)
    expect(letter.headers.get('message-id')).toBe(`<${id}@herons.example>`)
    expect(letter.headers.get('auto-submitted')).toBe('auto-generated')
    expect(textOf(letter)).toBe(
      'Zoë & the <corner>\n\nTwo minutes.\n\nYou get this because you coach the Herons.\n',
    )
    expect(textOf(letter, 'text/html')).toContain('Zoë &amp; the &lt;corner&gt;')
  })

  it('is marked as sent, and its words are gone from the database', async () => {
    const { id } = await queue()
    await carry()
    expect(await row(id)).toMatchObject({
      state: 'sent',
      tries: 1,
      text: '',
      html: '',
      sentAt: START.toISOString(),
      nextTryAt: null,
      trouble: null,
    })
    await carry()
    expect(server.arrived).toHaveLength(1)
  })

  it('brings its drawing as a part of its own, under the words that stand for it', async () => {
    const png = await sharp({ create: { width: 8, height: 4, channels: 3, background: '#0b5566' } })
      .png()
      .toBuffer()
    await queue({ body: body([{ kind: 'drawing', png, alternative: 'They trap both corners.' }]) })
    await carry()
    const letter = server.arrived[0]?.letter
    expect(letter && textOf(letter)).toContain('(They trap both corners.)')
    const html = letter ? textOf(letter, 'text/html') : ''
    expect(html).not.toContain('data:')
    const picture = letter && partOf(letter, 'image/png')
    expect(html).toContain(`src="cid:${picture?.headers.get('content-id')?.slice(1, -1)}"`)
    expect(picture?.content.equals(png)).toBe(true)
  })

  it('gets its secret on the way out only', async () => {
    const aboutId = randomUUID()
    const url = `https://overtop.club.example/join#${SECRET_PLACE}`
    const { id } = await queue({ aboutId, body: body([{ kind: 'button', label: 'Join', url }]) })
    const secret = secretOf(test.context.sessionSecret, 'invitation', aboutId)
    expect((await row(id)).text).not.toContain(secret)
    await carry()
    expect(textOf(server.arrived[0]?.letter as never)).toContain(`/join#${secret}\n`)
  })

  it('is drawn its sheet when it leaves; without the sheet it does not leave', async () => {
    const attachment = { kind: 'sheet', sheetId: randomUUID(), squadPlayerId: null, paper: 'a4' } as const
    drawAttachmentsOf('sheet', (_context, teamId, { sheetId }) =>
      sheetId === attachment.sheetId
        ? Promise.resolve({
            name: 'sheet.pdf',
            contentType: 'application/pdf',
            content: Buffer.from(`%PDF for ${teamId}`),
          })
        : Promise.reject(new NotFound('sheet')),
    )
    await queue({ attachment })
    const gone = await queue({ attachment: { ...attachment, sheetId: randomUUID() } })
    await carry()
    expect(server.arrived).toHaveLength(1)
    const paper = partOf(server.arrived[0]?.letter as never, 'application/pdf')
    expect(paper?.headers.get('content-disposition')).toContain('sheet.pdf')
    expect(paper?.content.toString()).toBe(`%PDF for ${TEAM}`)
    expect(await row(gone.id)).toMatchObject({
      state: 'failed',
      trouble: 'The sheet that goes with it is gone.',
    })
  })
})

describe('nothing twice', () => {
  it('the same key again is the same letter', async () => {
    const first = await queue({ onceKey: 'sheet:7:nell' })
    const second = await queue({ onceKey: 'sheet:7:nell', subject: 'Other words' })
    expect([second.id, second.subject]).toEqual([first.id, first.subject])
    await carry()
    await queue({ onceKey: 'sheet:7:nell' })
    await carry()
    expect(server.arrived).toHaveLength(1)
  })

  it('a letter of a transaction that was taken back never leaves', async () => {
    const fails = test.context.db.transaction(async (manager) => {
      await queueMail(manager, {
        teamId: TEAM,
        kind: 'sheet',
        onceKey: 'never',
        aboutId: null,
        recipient: 'zoe@club.example',
        subject: 'Never',
        body: body(),
        now: START,
      })
      throw new Error('taken back')
    })
    await expect(fails).rejects.toThrow('taken back')
    await carry()
    expect(server.arrived).toEqual([])
  })

  it('two carriers at once share the letters', async () => {
    for (let count = 0; count < 8; count += 1) await queue({ recipient: `n${count}@club.example` })
    await Promise.all([carry(), carry(), carry()])
    expect(server.arrived.map(({ to }) => to[0]).sort()).toEqual(
      Array.from({ length: 8 }, (_, count) => `n${count}@club.example`),
    )
  })

  it('one that was left in the middle is taken up again after a while, under the same Message-ID', async () => {
    const { id } = await queue()
    const until = new Date(START.getTime() + 10 * 60_000).toISOString()
    await test.context.db.getRepository(Mail).update({ id }, { state: 'sending', tries: 1, nextTryAt: until })
    minutes(9)
    await carry()
    expect(server.arrived).toEqual([])
    minutes(2)
    await carry()
    expect(server.arrived[0]?.letter.headers.get('message-id')).toBe(`<${id}@herons.example>`)
    expect(await row(id)).toMatchObject({ state: 'sent', tries: 2 })
  })
})

describe('a letter that does not leave', () => {
  it('is tried again later when the server asks for that, and is delivered once', async () => {
    server.refuse.push(451)
    const { id } = await queue()
    await carry()
    expect(await list()).toMatchObject([
      {
        id,
        state: 'waiting',
        tries: 1,
        trouble: 'The mail server had trouble of its own. It is tried again.',
        nextTryAt: new Date(START.getTime() + 60_000).toISOString(),
        text: null,
      },
    ])
    await carry()
    expect(server.asked()).toBe(1)
    minutes(1)
    await carry()
    minutes(60)
    await carry()
    expect(server.arrived).toHaveLength(1)
    expect(await row(id)).toMatchObject({ state: 'sent', tries: 2, trouble: null })
  })

  it('fails at once when the address is refused for good, and staff see why', async () => {
    server.refuse.push(550)
    await queue()
    const second = await queue({ recipient: 'second@club.example' })
    await carry()
    minutes(600)
    await carry()
    expect(server.asked()).toBe(2)
    const [failed] = await list('?state=failed')
    expect(failed).toMatchObject({
      tries: 1,
      trouble: 'There is no such mailbox, or it does not take mail from us. Check the address.',
      nextTryAt: null,
    })
    expect(JSON.stringify(await list())).not.toContain('Requested action')
    expect((await row(second.id)).state).toBe('sent')
  })

  it('is given up after the last try, with waits that grow', async () => {
    server.refuse.push(...Array.from({ length: LIMITS.mailTries }, () => 450))
    const { id } = await queue()
    const waits: number[] = []
    for (let tries = 1; tries <= LIMITS.mailTries; tries += 1) {
      await carry()
      const { nextTryAt } = await row(id)
      if (nextTryAt === null) break
      waits.push((Date.parse(nextTryAt) - test.context.clock().getTime()) / 60_000)
      test.setNow(new Date(nextTryAt))
    }
    expect(waits).toHaveLength(LIMITS.mailTries - 1)
    expect([...waits].sort((a, b) => a - b)).toEqual(waits)
    expect(await row(id)).toMatchObject({
      state: 'failed',
      tries: LIMITS.mailTries,
      trouble: 'The mailbox is busy or the server makes us wait.',
    })
    expect(server.arrived).toEqual([])
  })

  it('with no server there, one letter asks and the others wait without losing a try', async () => {
    const first = await queue()
    const second = await queue({ now: new Date(START.getTime() + 1) })
    minutes(1)
    await server.stop()
    await carry()
    expect(await row(first.id)).toMatchObject({
      state: 'waiting',
      tries: 1,
      trouble: 'The mail server could not be reached. Check MAIL_URL and whether it is up.',
    })
    expect(await row(second.id)).toMatchObject({ state: 'waiting', tries: 0, trouble: null })
    server = await startMailServer()
  })

  it('says so when name and password are not taken, and does not give the letter up', async () => {
    const strict = await startMailServer({
      authOptional: false,
      allowInsecureAuth: true,
      onAuth: (auth, _session, done) =>
        auth.password === 'press break' ? done(null, { user: 'herons' }) : done(new Error('no')),
    })
    const through = (password: string) =>
      carryMail({
        ...test.context,
        mail: smtpTransport({
          mailUrl: strict.url.replace('//', `//herons:${encodeURIComponent(password)}@`),
          mailFrom: FROM,
        }),
      })
    const { id } = await queue()
    await through('wrong')
    expect(await row(id)).toMatchObject({
      state: 'waiting',
      trouble: 'The mail server does not take our user name and password. Check them in MAIL_URL.',
    })
    minutes(1)
    await through('press break')
    expect(strict.arrived).toHaveLength(1)
    await strict.stop()
  })
})

describe('the staff’s page', () => {
  it('lists the team’s letters newest first, by state and by the page, and no letter that is a person’s own', async () => {
    for (let count = 0; count < 3; count += 1) {
      await queue({ subject: `Letter ${count}` })
      minutes(1)
    }
    await queue({ teamId: OTHER_TEAM, subject: 'Theirs' })
    await queue({ teamId: null, kind: 'new-password', subject: 'Nobody’s' })
    const answer = MailList.parse((await head.get(teamUrl('/mails?limit=2'))).body)
    expect(answer).toMatchObject({ total: 3, server: true })
    expect(answer.rows.map(({ subject }) => subject)).toEqual(['Letter 2', 'Letter 1'])
    expect((await list('?limit=2&offset=2')).map(({ subject }) => subject)).toEqual(['Letter 0'])
    expect(await list('?state=sent')).toEqual([])
  })

  it('has a failed letter tried again, as if for the first time', async () => {
    server.refuse.push(550)
    const { id } = await queue()
    await carry()
    const answer = await head.post(teamUrl(`/mails/${id}/again`))
    expect([answer.status, answer.body.tries]).toEqual([200, 0])
    await soon(async () => (await row(id)).state).toBe('sent')
    expect(server.arrived).toHaveLength(1)
    const twice = await head.post(teamUrl(`/mails/${id}/again`))
    expect([twice.status, twice.body.detail]).toEqual([
      409,
      'This letter has left already. Write it again where it comes from.',
    ])
    expect((await head.post(teamUrl(`/mails/${id}/withdraw`))).status).toBe(409)
  })

  it('stops a letter for good; once stopped it stays so', async () => {
    const { id } = await queue()
    for (const _ of ['once', 'twice'])
      expect((await head.post(teamUrl(`/mails/${id}/withdraw`))).body).toMatchObject({ state: 'withdrawn' })
    expect(await row(id)).toMatchObject({ text: '', html: '' })
    await carry()
    expect(server.arrived).toEqual([])
    expect((await head.post(teamUrl(`/mails/${id}/again`))).status).toBe(409)
  })

  it('letters about a row are stopped with it, and only those', async () => {
    const aboutId = randomUUID()
    const one = await queue({ aboutId })
    const sheet = await queue({ aboutId, kind: 'sheet' })
    await test.context.db.transaction((manager) => withdrawMailAbout(manager, aboutId, 'invitation'))
    expect([(await row(one.id)).state, (await row(sheet.id)).state]).toEqual(['withdrawn', 'waiting'])
  })

  it('letters go after ninety days, but for those that still wait', async () => {
    const sent = await queue()
    await carry()
    const waits = await queue()
    await forgetOldMail(test.context.db, new Date(START.getTime() + 89 * 86_400_000))
    expect(await test.context.db.getRepository(Mail).countBy({ id: sent.id })).toBe(1)
    await forgetOldMail(test.context.db, new Date(START.getTime() + 90 * 86_400_000))
    expect((await test.context.db.getRepository(Mail).find()).map(({ id }) => id)).toEqual([waits.id])
  })
})

describe('a backup', () => {
  it('has no words of letters and no link to a new password; what had not left is a failed letter there', async () => {
    const words = `Secret ${randomUUID()}`
    await queue({ body: body([{ kind: 'paragraph', text: words }]) })
    const person = await test.context.db.getRepository(Person).findOneByOrFail({ name: 'Test head' })
    await test.context.db.transaction((manager) => makePasswordLink(test.context, manager, person.id))
    const copy = join(test.dataDir, 'copy.sqlite')
    await copyDatabase(join(test.dataDir, 'overtop.sqlite'), copy)
    expect((await readFile(copy)).includes(words)).toBe(true)
    clearCopy(copy, START)
    expect((await readFile(copy)).includes(words)).toBe(false)
    const db = await openDatabase(copy)
    expect(await db.getRepository(PasswordReset).count()).toBe(0)
    expect(await db.getRepository(Mail).find()).toMatchObject([
      { state: 'failed', text: '', html: '', nextTryAt: null, recipient: 'zoe@club.example' },
    ])
    await db.destroy()
  })
})

describe('without a mail server', () => {
  it('letters are kept, shown with their words and link, and can leave once there is one', async () => {
    const aboutId = randomUUID()
    const { id } = await queue({
      aboutId,
      body: body([{ kind: 'button', label: 'Join', url: `https://o.example/join#${SECRET_PLACE}` }]),
    })
    const transport = test.context.mail
    test.context.mail = null
    await carry()
    const answer = MailList.parse((await head.get(teamUrl('/mails'))).body)
    expect(answer.server).toBe(false)
    expect(answer.rows[0]).toMatchObject({ id, state: 'kept' })
    const secret = secretOf(test.context.sessionSecret, 'invitation', aboutId)
    expect(answer.rows[0]?.text).toContain(`https://o.example/join#${secret}`)
    const again = await head.post(teamUrl(`/mails/${id}/again`))
    expect([again.status, again.body.detail]).toEqual([
      409,
      'No mail server is set. Copy the words and send them yourself, or set MAIL_URL.',
    ])
    test.context.mail = transport
    await carry()
    expect(server.arrived).toEqual([])
    expect((await head.post(teamUrl(`/mails/${id}/again`))).status).toBe(200)
    await soon(() => server.arrived.length).toBe(1)
    expect(await list()).toMatchObject([{ state: 'sent', text: null }])
  })

  it('a letter that failed while there was one is kept too, with its words to copy', async () => {
    server.refuse.push(550)
    const { id } = await queue()
    await carry()
    expect(await list()).toMatchObject([{ id, state: 'failed', text: null }])
    const transport = test.context.mail
    test.context.mail = null
    await carry()
    const [kept] = await list()
    expect(kept?.state).toBe('kept')
    expect(kept?.text).not.toBe(null)
    test.context.mail = transport
  })
})

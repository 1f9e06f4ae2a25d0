import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import type { Letter } from '@server/adapters/mail/transport'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { PasswordReset } from '@server/database/entities/PasswordReset'
import { Person } from '@server/database/entities/Person'
import { carryMail } from '@server/features/mail/carrier'
import { forgetOldLinks } from '@server/features/session/passwordReset.service'
import { LIMITS } from '@shared/limits'
import { teamUrl } from '../support/fixture'
import { PASSWORD, startTestApp, TEAM, type TestApp, type Who } from '../support/testApp'

/** What happens after the answer, on a machine that has other work too. */
const soon = <T>(look: () => T) => expect.poll(look, { timeout: 10_000 })
const START = new Date('2026-03-17T09:42:00Z')
const NEW = 'another long password'
const HEAD = 'head@club.example'

let test: TestApp
let left: Letter[]

beforeEach(async () => {
  left = []
  const send = (letter: Letter) => Promise.resolve(void left.push(letter))
  test = await startTestApp({ now: START, mail: { send, close: () => undefined } })
})
afterEach(() => test.stop())

const ask = (email: string) => request(test.app).post('/api/password-resets').send({ email })
const use = (token: string, password = NEW) =>
  request(test.app).post('/api/password-resets/use').send({ token, password })
const signIn = (email: string, password: string) =>
  request(test.app).post('/api/session').send({ email, password })
const resets = () => test.context.db.getRepository(PasswordReset)

/** Asks for a link and takes its secret from the letter. */
async function linkFor(email: string): Promise<string> {
  const before = left.length
  await ask(email)
  await soon(() => left.length).toBe(before + 1)
  const [, token = ''] = /\/new-password#(\S+)/.exec(left[before]?.text ?? '') ?? []
  return token
}

const minutes = (count: number) => test.setNow(new Date(START.getTime() + count * 60_000))

describe('asking for a new password', () => {
  it('answers the same whether or not there is an account', async () => {
    const known = await ask(HEAD)
    const unknown = await ask('nobody@club.example')
    expect([known.status, known.body]).toEqual([202, { mail: true }])
    expect([unknown.status, unknown.body]).toEqual([known.status, known.body])
    const named = ({ headers }: request.Response) => Object.keys(headers).sort()
    expect(named(unknown)).toEqual(named(known))
    await soon(() => left.length).toBe(1)
    expect(left[0]?.recipient).toBe(HEAD)
    expect(await test.context.db.getRepository(Mail).count()).toBe(1)
  })

  it('answers before anybody is looked up, so that its time tells nothing', async () => {
    let open: () => void = () => undefined
    const gate = new Promise<void>((resolve) => {
      open = resolve
    })
    const { db } = test.context
    const transaction = db.transaction.bind(db) as (...args: unknown[]) => Promise<unknown>
    const whenOpened = async (...args: unknown[]) => {
      await gate
      return transaction(...args)
    }
    Object.assign(db, { transaction: whenOpened })
    expect((await ask(HEAD)).status).toBe(202)
    expect(left).toEqual([])
    open()
    await soon(() => left.length).toBe(1)
  })

  it('is 400 for what is no address, and 429 once asked too often, account or not', async () => {
    const bad = await ask('head')
    expect([bad.status, bad.body.errors[0].field]).toEqual([400, 'email'])
    for (const email of [HEAD, 'nobody@club.example']) {
      const statuses: number[] = []
      for (let count = 0; count < 6; count += 1) statuses.push((await ask(email)).status)
      expect(statuses).toEqual([202, 202, 202, 202, 202, 429])
    }
  })

  it('without a mail server says so, to everybody alike, and stores nothing', async () => {
    test.context.mail = null
    expect((await ask(HEAD)).body).toEqual({ mail: false })
    expect((await ask('nobody@club.example')).body).toEqual({ mail: false })
    await new Promise((resolve) => setTimeout(resolve, 50))
    expect(await resets().count()).toBe(0)
    expect(await test.context.db.getRepository(Mail).count()).toBe(0)
  })

  it('the letter is between the person and the product: no staff sees it', async () => {
    await linkFor('player@club.example')
    const { body } = await (await test.as('head')).get(teamUrl('/mails'))
    expect(body).toMatchObject({ rows: [], total: 0 })
  })
})

describe('a link to a new password', () => {
  it('sets it once, and signs nobody in', async () => {
    const token = await linkFor(HEAD)
    const answer = await use(token)
    expect([answer.status, answer.headers['set-cookie']]).toEqual([204, undefined])
    expect((await signIn(HEAD, PASSWORD)).status).toBe(401)
    expect((await signIn(HEAD, NEW)).status).toBe(201)
    const again = await use(token, 'a third long password')
    expect([again.status, again.body.detail]).toEqual([410, 'This link no longer works. Ask for a new one.'])
    expect((await signIn(HEAD, NEW)).status).toBe(201)
  })

  it('is spent by one of two who use it at once', async () => {
    const token = await linkFor(HEAD)
    const both = await Promise.all([use(token, 'the first of the two'), use(token, 'the second of the two')])
    expect(both.map(({ status }) => status).sort()).toEqual([204, 410])
  })

  it('ends every session of that person and of no other', async () => {
    const [head, player] = [await test.as('head'), await test.as('player')]
    await use(await linkFor(HEAD))
    expect((await head.get('/api/session')).status).toBe(401)
    expect((await player.get('/api/session')).status).toBe(200)
  })

  it('works for an hour and no longer; then it is swept', async () => {
    const token = await linkFor(HEAD)
    minutes(LIMITS.resetMinutes)
    expect((await use(token)).status).toBe(410)
    minutes(LIMITS.resetMinutes - 1)
    expect((await use(token)).status).toBe(204)
    minutes(LIMITS.resetMinutes)
    await forgetOldLinks(test.context)
    expect(await resets().count()).toBe(0)
  })

  it('ends with a newer one, and with a password that was changed otherwise', async () => {
    const first = await linkFor(HEAD)
    const second = await linkFor(HEAD)
    expect(second).not.toBe(first)
    expect((await use(first)).status).toBe(410)
    const head = await test.as('head')
    expect((await head.put('/api/session/password').send({ old: PASSWORD, password: NEW })).status).toBe(204)
    expect((await use(second)).status).toBe(410)
  })

  it('a made-up one and a password that is too short are refused, and the link stays good', async () => {
    const token = await linkFor(HEAD)
    expect((await use('made-up')).status).toBe(410)
    const short = await use(token, 'short')
    expect([short.status, short.body.errors[0].field]).toEqual([400, 'password'])
    expect((await use(token)).status).toBe(204)
  })

  it('stands nowhere in the data folder, before and after its letter has left', async () => {
    const holds = async (token: string) => {
      const names = await readdir(test.dataDir)
      const files = await Promise.all(
        names.filter((name) => name.includes('sqlite')).map((name) => readFile(join(test.dataDir, name))),
      )
      expect(files.length).toBeGreaterThan(0)
      return files.some((file) => file.includes(token))
    }
    let seen = ''
    test.context.mail = {
      send: async ({ text }) => {
        ;[, seen = ''] = /\/new-password#(\S+)/.exec(text) ?? []
        expect(await holds(seen)).toBe(false)
      },
      close: () => undefined,
    }
    await ask(HEAD)
    await expect
      .poll(async () => (await test.context.db.getRepository(Mail).findOneBy({}))?.state)
      .toBe('sent')
    expect(seen.length).toBeGreaterThan(40)
    expect(await holds(seen)).toBe(false)
    expect((await use(seen)).status).toBe(204)
    expect(await holds(seen)).toBe(false)
  })

  it('whose letter could not leave within the hour is not sent any more', async () => {
    test.context.mail = { send: () => Promise.reject(new Error('away')), close: () => undefined }
    await ask(HEAD)
    const state = async () => (await test.context.db.getRepository(Mail).findOneBy({}))?.state
    await soon(state).toBe('waiting')
    await soon(async () => (await test.context.db.getRepository(Mail).findOneBy({}))?.tries).toBe(1)
    minutes(LIMITS.resetMinutes)
    await carryMail(test.context)
    expect(await state()).toBe('withdrawn')
  })
})

describe('a link that the head coach hands on', () => {
  const membership = async (who: Who, teamId = TEAM): Promise<string> => {
    const { id: personId } = await test.context.db
      .getRepository(Person)
      .findOneByOrFail({ name: `Test ${who}` })
    return (await test.context.db.getRepository(Membership).findOneByOrFail({ personId, teamId })).id
  }
  const make = async (who: Who) =>
    (await test.as('head')).post(teamUrl(`/members/${await membership(who)}/password-link`))

  it('is told once and sets that member’s password', async () => {
    const answer = await make('player')
    expect(answer.status).toBe(200)
    expect(answer.body.expiresAt).toBe(new Date(START.getTime() + LIMITS.resetMinutes * 60_000).toISOString())
    const token = new URL(answer.body.url as string).hash.slice(1)
    expect(new URL(answer.body.url as string).pathname).toBe('/new-password')
    expect((await use(token)).status).toBe(204)
    expect((await signIn('player@club.example', NEW)).status).toBe(201)
    expect(left).toEqual([])
  })

  it('is not made for somebody who is also on another coach’s team', async () => {
    const answer = await make('both')
    expect(answer.status).toBe(409)
    expect(answer.body.detail).toContain('also on a team that you do not coach')
    expect(await resets().count()).toBe(0)
  })
})

describe('one’s own account', () => {
  it('shows name, address and teams; sheets by mail are switched per team', async () => {
    const both = await test.as('both')
    const { body } = await both.get('/api/session/account')
    expect(body).toMatchObject({ name: 'Test both', email: 'both@club.example' })
    expect(body.teams.map((team: { name: string; mail: boolean }) => [team.name, team.mail])).toEqual([
      ['Herons', true],
      ['Others', true],
    ])
    const off = await both.put(`/api/session/teams/${TEAM}/mail`).send({ mail: false })
    expect(off.body.teams.map((team: { mail: boolean }) => team.mail)).toEqual([false, true])
    const foreign = await (
      await test.as('otherHead')
    )
      .put(`/api/session/teams/${TEAM}/mail`)
      .send({ mail: false })
    expect(foreign.status).toBe(404)
    expect((await both.put(`/api/session/teams/${TEAM}/mail`).send({ mail: 'no' })).status).toBe(400)
  })

  it('a changed password needs the old one and ends the other sessions, not this one', async () => {
    const here = await test.as('head')
    const there = request.agent(test.app)
    await there.post('/api/session').send({ email: HEAD, password: PASSWORD })
    const wrong = await here.put('/api/session/password').send({ old: 'not this', password: NEW })
    expect([wrong.status, wrong.body.errors]).toEqual([
      400,
      [{ field: 'old', message: 'This is not your password now. Check it.' }],
    ])
    const short = await here.put('/api/session/password').send({ old: PASSWORD, password: 'short' })
    expect(short.status).toBe(400)
    expect((await there.get('/api/session')).status).toBe(200)
    expect((await here.put('/api/session/password').send({ old: PASSWORD, password: NEW })).status).toBe(204)
    expect((await here.get('/api/session')).status).toBe(200)
    expect((await there.get('/api/session')).status).toBe(401)
    expect((await signIn(HEAD, NEW)).status).toBe(201)
  })

  it('guessing the old password is slowed', async () => {
    const head = await test.as('head')
    const statuses: number[] = []
    for (let count = 0; count < 11; count += 1)
      statuses.push((await head.put('/api/session/password').send({ old: 'guess', password: NEW })).status)
    expect(statuses.slice(0, 10)).toEqual(Array.from({ length: 10 }, () => 400))
    expect(statuses[10]).toBe(429)
  })

  it('signing out everywhere ends this session and all others', async () => {
    const here = await test.as('head')
    const there = request.agent(test.app)
    await there.post('/api/session').send({ email: HEAD, password: PASSWORD })
    expect((await here.delete('/api/session/everywhere')).status).toBe(204)
    expect((await here.get('/api/session')).status).toBe(401)
    expect((await there.get('/api/session')).status).toBe(401)
  })

  it('is for people who are signed in', async () => {
    const anyone = request(test.app)
    expect((await anyone.get('/api/session/account')).status).toBe(401)
    expect((await anyone.put('/api/session/password').send({ old: PASSWORD, password: NEW })).status).toBe(
      401,
    )
    expect((await anyone.put(`/api/session/teams/${TEAM}/mail`).send({ mail: true })).status).toBe(401)
    expect((await anyone.delete('/api/session/everywhere')).status).toBe(401)
  })
})

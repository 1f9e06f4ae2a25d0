import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { StoredSession } from '@server/database/entities/StoredSession'
import { SESSION_MS } from '@server/http/passport'
import { SessionStore } from '@server/http/sessionStore'
import { teamUrl } from '../support/fixture'
import { PASSWORD, startTestApp, TEAM, type TestApp } from '../support/testApp'

let test: TestApp

beforeEach(async () => {
  test = await startTestApp()
})
afterEach(() => test.stop())

const signIn = (email = 'head@club.example', password = PASSWORD, cookie = '') =>
  request(test.app).post('/api/session').set('Cookie', cookie).send({ email, password })
const whoAmI = (cookie: string) => request(test.app).get('/api/session').set('Cookie', cookie)
const cookieOf = (answer: { headers: Record<string, unknown> }) =>
  ((answer.headers['set-cookie'] as string[] | undefined)?.[0] ?? '').split(';')[0] ?? ''
const rows = () => test.context.db.manager.find(StoredSession)

describe('signing in', () => {
  it('answers who it is and what they may do, and sets a cookie that no script and no other site gets', async () => {
    const answer = await signIn()
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({
      person: { name: 'Test head', initials: 'TH' },
      teams: [{ id: TEAM, name: 'Herons', role: 'head-coach', squadPlayerId: null }],
    })
    const [header] = answer.headers['set-cookie'] as unknown as string[]
    expect(header).toMatch(/^overtop=[^;]+; Path=\/; Expires=[^;]+; HttpOnly; SameSite=Lax$/)
    expect((await whoAmI(cookieOf(answer))).body).toEqual(answer.body)
  })

  it('tells nothing that is kept of a person but the name', async () => {
    const answer = await signIn()
    const text = JSON.stringify(answer.body)
    expect(text).not.toMatch(/argon2|password|club\.example/)
    expect(Object.keys(answer.body.person).sort()).toEqual(['id', 'initials', 'name'])
  })

  it('takes the address in any case and with blanks around it', async () => {
    expect((await signIn(' HEAD@Club.Example ')).status).toBe(201)
  })

  it('makes a new session id each time, and the one before is dead', async () => {
    const first = cookieOf(await signIn())
    const second = cookieOf(await signIn('head@club.example', PASSWORD, first))
    expect(second).not.toBe(first)
    expect((await whoAmI(first)).status).toBe(401)
    expect((await whoAmI(second)).status).toBe(200)
    expect(await rows()).toHaveLength(1)
  })

  it('a made-up session id is not taken over', async () => {
    const answer = await signIn('head@club.example', PASSWORD, 'overtop=s%3Achosen.by-somebody-else')
    expect(cookieOf(answer)).not.toContain('chosen')
    expect((await rows()).map(({ id }) => id)).not.toContain('chosen')
  })

  it('keeps its session in the product’s own database', async () => {
    expect(await rows()).toHaveLength(0)
    const cookie = decodeURIComponent(cookieOf(await signIn()))
    const [row] = await rows()
    expect(cookie.startsWith(`overtop=s:${row?.id}.`)).toBe(true)
    await test.context.db.query('PRAGMA wal_checkpoint(TRUNCATE)')
    expect((await readFile(join(test.dataDir, 'overtop.sqlite'))).includes(String(row?.id))).toBe(true)
  })

  it('nobody has a session before, and a wrong password makes none', async () => {
    const looked = await request(test.app).get('/api/session')
    expect([looked.status, looked.headers['set-cookie']]).toEqual([401, undefined])
    expect((await signIn('head@club.example', 'not this one')).headers['set-cookie']).toBeUndefined()
    expect(await rows()).toHaveLength(0)
  })

  it('over https the cookie is for https alone', async () => {
    const secure = await startTestApp({ publicUrl: 'https://overtop.club.example' })
    const answer = await request(secure.app)
      .post('/api/session')
      .set('X-Forwarded-Proto', 'https')
      .set('Origin', 'https://overtop.club.example')
      .send({ email: 'head@club.example', password: PASSWORD })
    await secure.stop()
    expect(answer.status).toBe(201)
    expect((answer.headers['set-cookie'] as unknown as string[])[0]).toContain('; Secure')
  })
})

describe('a session', () => {
  it('ends with signing out: the cookie is dead and the row is gone', async () => {
    const cookie = cookieOf(await signIn())
    const out = await request(test.app).delete('/api/session').set('Cookie', cookie)
    expect(out.status).toBe(204)
    expect((out.headers['set-cookie'] as unknown as string[])[0]).toMatch(/^overtop=; .*1970/)
    expect(await rows()).toHaveLength(0)
    expect((await whoAmI(cookie)).status).toBe(401)
    expect((await request(test.app).get(teamUrl('/squad')).set('Cookie', cookie)).status).toBe(401)
  })

  it('ends two weeks after its last use, and is swept then', async () => {
    const start = test.context.clock().getTime()
    const day = 24 * 60 * 60 * 1000
    const cookie = cookieOf(await signIn())
    test.setNow(new Date(start + 13 * day))
    expect((await whoAmI(cookie)).status).toBe(200)
    test.setNow(new Date(start + 26 * day))
    expect((await whoAmI(cookie)).status).toBe(200)
    test.setNow(new Date(start + 41 * day))
    expect((await whoAmI(cookie)).status).toBe(401)
    const store = new SessionStore(test.context.db, test.context.clock, SESSION_MS)
    await store.sweep()
    expect(await rows()).toHaveLength(0)
  })

  it('with a changed signature is none', async () => {
    const cookie = cookieOf(await signIn())
    expect((await whoAmI(`${cookie.slice(0, -2)}xx`)).status).toBe(401)
  })

  it('of a person who is on no team says so and opens none', async () => {
    const answer = await signIn('nobodyyet@club.example')
    expect(answer.body.teams).toEqual([])
    const squad = request(test.app).get(teamUrl('/squad')).set('Cookie', cookieOf(answer))
    expect((await squad).status).toBe(404)
  })
})

describe('a wrong password', () => {
  it('is answered in the same words as an address that nobody has', async () => {
    const wrong = await signIn('head@club.example', 'not this one')
    const unknown = await signIn('stranger@club.example', 'not this one')
    expect([wrong.status, unknown.status]).toEqual([401, 401])
    expect(wrong.type).toBe('application/problem+json')
    expect(unknown.body).toEqual(wrong.body)
    expect(wrong.body.detail).toBe('Mail address and password do not fit. Check both.')
  })

  it('ten times locks the account for a quarter of an hour, the right one too, and no other account', async () => {
    for (let tries = 0; tries < 10; tries++)
      expect((await signIn('head@club.example', `wrong ${tries}`)).status).toBe(401)
    const refused = await signIn('HEAD@club.example')
    expect(refused.status).toBe(429)
    expect(refused.type).toBe('application/problem+json')
    expect(refused.body).toMatchObject({
      type: '/problems/too-many',
      status: 429,
      detail: 'Too many tries with a wrong password. Wait a quarter of an hour, then try again.',
    })
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0)
    expect(Number(refused.headers['retry-after'])).toBeLessThanOrEqual(15 * 60)
    expect((await signIn('assistant@club.example')).status).toBe(201)
  })

  it('a right password does not count towards it', async () => {
    for (let tries = 0; tries < 12; tries++) expect((await signIn()).status).toBe(201)
    for (let tries = 0; tries < 9; tries++)
      expect((await signIn('head@club.example', `wrong ${tries}`)).status).toBe(401)
    expect((await signIn()).status).toBe(201)
  })

  it('on many accounts from one address is stopped at forty', async () => {
    for (let tries = 0; tries < 40; tries++)
      expect((await signIn(`somebody${tries}@club.example`, 'a guess')).status).toBe(401)
    expect((await signIn('assistant@club.example', 'a guess')).status).toBe(429)
  })
})

describe('what is no sign-in', () => {
  it.each([
    ['no body', undefined, ['email', 'password']],
    ['no mail address', { email: 'maren', password: 'x' }, ['email']],
    ['a long part before the @', { email: `${'a'.repeat(65)}@club.example`, password: 'x' }, ['email']],
    ['an empty password', { email: 'head@club.example', password: '' }, ['password']],
    ['lists', { email: ['head@club.example'], password: { $ne: '' } }, ['email', 'password']],
  ])('%s names the field', async (_case, body, fields) => {
    const answer = await request(test.app).post('/api/session').send(body)
    expect(answer.status).toBe(400)
    const errors = answer.body.errors as { field: string; message: string }[]
    expect(errors.map(({ field }) => field)).toEqual(fields)
  })
})

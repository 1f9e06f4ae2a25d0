import { randomUUID } from 'node:crypto'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Invitation } from '@server/database/entities/Invitation'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { clearCopy, copyDatabase, countRows } from '@server/backup/databaseCopy'
import { teamUrl } from '../support/fixture'
import {
  OTHER_TEAM,
  PASSWORD,
  PLAYER,
  startTestApp,
  TEAM,
  type Agent,
  type TestApp,
} from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
const DAY_MS = 86_400_000
const STAFF = { role: 'assistant-coach', way: 'link' }

let test: TestApp
let head: Agent
beforeEach(async () => {
  test = await startTestApp({ now: START })
  head = await test.as('head')
})
afterEach(() => test.stop())

const manager = () => test.context.db.manager
async function invite(body: object = STAFF, id = randomUUID()) {
  const answer = await head.put(teamUrl(`/invitations/${id}`)).send(body)
  return { id, answer, secret: String(answer.body.link ?? '').split('#')[1] ?? '' }
}
const look = (secret: string) => test.anonymous().post('/api/invitations/look').send({ secret })
const account = (secret: string, more: object = {}) => ({
  secret,
  name: 'Jo Abara',
  email: 'jo@club.example',
  password: 'nine tall otters',
  ...more,
})
const accept = (body: object) => test.anonymous().post('/api/invitations/accept').send(body)

describe('an invitation by link', () => {
  it('tells its secret once, in the part of the address that no server sees, and stores none of it', async () => {
    const { answer, secret, id } = await invite()
    expect(answer.status).toBe(201)
    expect(answer.body.link).toMatch(/\/join#[0-9a-f]{64}$/)
    expect(answer.body).toMatchObject({ state: 'out', email: null, invitedBy: 'Test head' })
    const row = await manager().findOneByOrFail(Invitation, { id })
    expect(JSON.stringify(row)).not.toContain(secret)
    const people = (await head.get(teamUrl('/people'))).body
    expect(JSON.stringify(people)).not.toContain(secret)
    expect(people.invitations).toMatchObject([{ id, state: 'out', role: 'assistant-coach' }])
  })

  it('is the same when it is sent twice, and never changes', async () => {
    const { id, secret } = await invite()
    const again = await invite(STAFF, id)
    expect([again.answer.status, again.secret]).toEqual([200, secret])
    expect((await invite({ ...STAFF, role: 'head-coach' }, id)).answer.status).toBe(409)
    expect(await manager().countBy(Invitation, { teamId: TEAM })).toBe(1)
  })

  it('brings in a new account, signed in, once; then it is used and stays in sight', async () => {
    const { id, secret } = await invite()
    expect((await look(secret)).body).toEqual({
      team: 'Herons',
      squadName: 'U17 girls',
      invitedBy: 'Test head',
      role: 'assistant-coach',
      playerName: null,
      expiresAt: '2026-03-24T09:42:00.000Z',
    })
    const newcomer = request.agent(test.app)
    const joined = await newcomer.post('/api/invitations/accept').send(account(secret))
    expect([joined.status, joined.body]).toEqual([201, { teamId: TEAM }])
    const session = (await newcomer.get('/api/session')).body
    expect(session.teams).toMatchObject([{ id: TEAM, role: 'assistant-coach' }])
    for (const answer of [await look(secret), await accept(account(secret, { email: 'b@club.example' }))]) {
      expect(answer.status).toBe(410)
      expect(answer.body.detail).toMatch(/used already/)
    }
    const people = (await head.get(teamUrl('/people'))).body
    expect(people.invitations).toMatchObject([{ id, state: 'used', usedBy: 'Jo Abara' }])
  })

  it('of two at once lets one in, and makes no account for the other', async () => {
    const { secret } = await invite()
    const both = await Promise.all([
      accept(account(secret)),
      accept(account(secret, { email: 'second@club.example' })),
    ])
    expect(both.map(({ status }) => status).sort()).toEqual([201, 410])
    expect(await manager().countBy(Person, { name: 'Jo Abara' })).toBe(1)
  })

  it('joins the account that is signed in, without a second one', async () => {
    const { secret } = await invite()
    const other = await test.as('otherHead')
    const before = await manager().count(Person)
    expect((await other.post('/api/invitations/accept').send({ secret })).status).toBe(201)
    expect(await manager().count(Person)).toBe(before)
    const teams = (await other.get('/api/session')).body.teams as { id: string; role: string }[]
    expect(teams.map(({ id, role }) => [id, role])).toEqual([
      [TEAM, 'assistant-coach'],
      [OTHER_TEAM, 'head-coach'],
    ])
  })

  it('is left as it is by somebody who is in the team, and by an address that has an account', async () => {
    const { secret } = await invite()
    const assistant = await test.as('assistant')
    expect((await assistant.post('/api/invitations/accept').send({ secret })).status).toBe(409)
    const known = await accept(account(secret, { email: 'OtherHead@club.example' }))
    expect(known.status).toBe(409)
    expect(known.body.detail).toMatch(/Sign in/)
    expect((await look(secret)).status).toBe(200)
  })

  it('ends on its day, and runs again once it is sent again', async () => {
    const { id, secret } = await invite({ ...STAFF, days: 1 })
    test.setNow(new Date(START.getTime() + DAY_MS))
    expect((await look(secret)).body.detail).toMatch(/past its day/)
    const again = await head.post(teamUrl(`/invitations/${id}/resend`)).send({ days: 3 })
    expect(again.body).toMatchObject({ state: 'out', expiresAt: '2026-03-21T09:42:00.000Z', version: 2 })
    expect(again.body.link).toContain(secret)
    expect((await look(secret)).status).toBe(200)
  })

  it('opens nothing once it is taken back; a used one is not taken back', async () => {
    const { id, secret } = await invite()
    expect((await head.delete(teamUrl(`/invitations/${id}`)).set('If-Match', '"4"')).status).toBe(412)
    expect((await head.delete(teamUrl(`/invitations/${id}`))).status).toBe(204)
    expect((await head.delete(teamUrl(`/invitations/${id}`))).status).toBe(204)
    expect((await accept(account(secret))).body.detail).toMatch(/taken back/)
    expect((await head.post(teamUrl(`/invitations/${id}/resend`)).send({})).status).toBe(409)
    const used = await invite()
    await accept(account(used.secret))
    expect((await head.delete(teamUrl(`/invitations/${used.id}`))).status).toBe(409)
  })

  it('names what is wrong with what was typed, and says that a made-up link opens nothing', async () => {
    const { secret } = await invite()
    const bad = await accept(account(secret, { name: '', email: 'jo', password: 'short' }))
    expect(bad.status).toBe(400)
    expect((bad.body.errors as { field: string }[]).map(({ field }) => field)).toEqual([
      'name',
      'email',
      'password',
    ])
    expect((await look('a'.repeat(43))).status).toBe(404)
    expect((await look('short')).status).toBe(400)
  })

  it('cannot be guessed at for long', async () => {
    for (let tries = 0; tries < 30; tries++)
      expect((await look(`${'b'.repeat(40)}${tries + 10}`)).status).toBe(404)
    const refused = await look('c'.repeat(43))
    expect([refused.status, refused.type]).toEqual([429, 'application/problem+json'])
  })
})

describe('a player', () => {
  const place = { role: 'player', squadPlayerId: '' }
  beforeEach(async () => {
    await manager().delete(Membership, { squadPlayerId: PLAYER })
    place.squadPlayerId = PLAYER
  })

  it('is asked in at her guardian’s address when it is known, by her first name only', async () => {
    expect((await invite({ ...place, way: 'mail' })).answer.body.errors).toMatchObject([{ field: 'email' }])
    await manager().update(SquadPlayer, { id: PLAYER }, { guardianEmail: 'ewa@post.example' })
    const { answer, id } = await invite({ ...place, way: 'mail' })
    expect(answer.body).toMatchObject({ email: 'ewa@post.example', playerName: 'Nell', link: null })
    const letter = await manager().findOneByOrFail(Mail, { aboutId: id })
    expect(letter).toMatchObject({ recipient: 'ewa@post.example', kind: 'invitation' })
    expect(letter.subject).toContain('Nell')
    expect(letter.text + letter.html).not.toContain('Tavish')
  })

  it('gets her own place in the squad, and nobody else gets it after her', async () => {
    const first = await invite({ ...place, way: 'link' })
    const second = await invite({ ...place, way: 'link' })
    expect((await look(first.secret)).body).toMatchObject({ role: 'player', playerName: 'Nell' })
    expect(JSON.stringify((await look(first.secret)).body)).not.toContain('Tavish')
    const nell = request.agent(test.app)
    await nell.post('/api/invitations/accept').send(account(first.secret))
    expect((await nell.get('/api/session')).body.teams).toMatchObject([{ squadPlayerId: PLAYER }])
    const late = await accept(account(second.secret, { email: 'late@club.example' }))
    expect([late.status, late.body.detail]).toEqual([409, 'Nell has an account already.'])
    expect((await invite({ ...place, way: 'link' })).answer.status).toBe(409)
  })

  it('needs somebody in the squad of this team; staff is nobody in the squad', async () => {
    expect((await invite({ role: 'player', way: 'link' })).answer.status).toBe(400)
    expect((await invite({ ...STAFF, squadPlayerId: PLAYER })).answer.status).toBe(400)
    const other = '44444444-4444-4444-8444-444444444444'
    expect((await invite({ ...place, squadPlayerId: other, way: 'link' })).answer.status).toBe(404)
  })
})

describe('an invitation by letter', () => {
  const body = { role: 'assistant-coach', way: 'mail', email: 'Jo@Club.Example' }

  it('puts the secret into no row, and tells the head coach no link', async () => {
    const { id, answer } = await invite(body)
    expect(answer.body).toMatchObject({ email: 'jo@club.example', link: null, letter: 'waiting' })
    const letter = await manager().findOneByOrFail(Mail, { aboutId: id })
    expect(letter.text).toMatch(/\/join#SECRET/)
  })

  it('that is sent again is one more letter, and one that has not left stays here', async () => {
    const { id } = await invite(body)
    await head.post(teamUrl(`/invitations/${id}/resend`)).send({})
    const letters = await manager().find(Mail, { where: { aboutId: id }, order: { onceKey: 'ASC' } })
    expect(letters.map(({ onceKey }) => onceKey)).toEqual([`invitation:${id}:1`, `invitation:${id}:2`])
    expect(letters[0]).toMatchObject({ state: 'withdrawn', text: '', html: '' })
  })
})

it('a copy of the database keeps no invitation that still opens something', async () => {
  const open = await invite()
  const used = await invite()
  await accept(account(used.secret))
  const copy = `${test.dataDir}/copy.sqlite`
  await copyDatabase(`${test.dataDir}/overtop.sqlite`, copy)
  clearCopy(copy, START)
  expect(countRows(copy)['invitations']).toBe(1)
  expect((await look(open.secret)).status).toBe(200)
})

it('the password of a new account is stored as a digest only, and signs in', async () => {
  const { secret } = await invite()
  await accept(account(secret, { password: PASSWORD }))
  const person = await manager().findOneByOrFail(Person, { email: 'jo@club.example' })
  expect(person.passwordHash).toMatch(/^\$argon2id\$/)
  const again = await test
    .anonymous()
    .post('/api/session')
    .send({ email: 'jo@club.example', password: PASSWORD })
  expect(again.status).toBe(201)
})

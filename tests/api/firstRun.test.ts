import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { createApp } from '@server/app'
import { Person } from '@server/database/entities/Person'
import { Team } from '@server/database/entities/Team'
import { firstRunToken } from '@server/features/people/firstCoach.service'
import { startTestApp, type TestApp } from '../support/testApp'

const COACH = {
  name: 'Edda Winslade',
  email: 'Edda@Club.Example',
  team: 'Saltmarsh Otters',
  squad: 'U17 girls',
  zone: 'Europe/Oslo',
  rules: 'fiba',
  password: 'nine tall otters',
}
let test: TestApp
let token: string
let app: ReturnType<typeof createApp>
beforeEach(async () => {
  test = await startTestApp({ empty: true })
  token = (await firstRunToken(test.context.db)) ?? ''
  app = createApp({ ...test.context, firstRunToken: token })
})
afterEach(() => test.stop())

const send = (body: object) => request.agent(app).post('/api/first-coach').send(body)
const counts = async () => [
  await test.context.db.manager.count(Team),
  await test.context.db.manager.count(Person),
]

describe('the first run', () => {
  it('makes the first head coach with the printed token, signed in, once', async () => {
    const agent = request.agent(app)
    expect((await agent.post('/api/first-coach').send({ ...COACH, token })).status).toBe(201)
    expect((await agent.get('/api/session')).body).toMatchObject({
      person: { name: 'Edda Winslade' },
      teams: [{ name: 'Saltmarsh Otters', squadName: 'U17 girls', role: 'head-coach' }],
    })
    const again = await send({ ...COACH, email: 'b@club.example', token })
    expect([again.status, again.body.detail]).toEqual([
      409,
      'There is a team already, so nobody was added. Sign in as its head coach.',
    ])
    expect(await counts()).toEqual([1, 1])
    expect(await firstRunToken(test.context.db)).toBeNull()
  })

  it('of two at once makes one team', async () => {
    const both = await Promise.all([
      send({ ...COACH, token }),
      send({ ...COACH, email: 'b@club.example', token }),
    ])
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409])
    expect(await counts()).toEqual([1, 1])
  })

  it('takes no other token, and none at all where none was printed', async () => {
    expect((await send({ ...COACH, token: `${token.slice(0, -1)}x` })).status).toBe(403)
    expect((await send({ ...COACH, token: '' })).body.errors).toMatchObject([{ field: 'token' }])
    const unprinted = await request(test.app)
      .post('/api/first-coach')
      .send({ ...COACH, token })
    expect(unprinted.status).toBe(403)
    expect(await counts()).toEqual([0, 0])
  })

  it('names every field at fault, and lets nobody guess for long', async () => {
    const bad = await send({ token, name: '', email: 'edda', rules: 'beach', zone: 'here', password: 'x' })
    expect((bad.body.errors as { field: string }[]).map(({ field }) => field)).toEqual([
      'name',
      'email',
      'team',
      'squad',
      'zone',
      'rules',
      'password',
    ])
    for (let tries = 0; tries < 29; tries++) await send({ ...COACH, token: `guess${tries}` })
    expect((await send({ ...COACH, token })).status).toBe(429)
  })
})

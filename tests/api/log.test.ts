import { Writable } from 'node:stream'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createLog } from '@server/adapters/log'
import { createApp } from '@server/app'
import { Person } from '@server/database/entities/Person'
import { startTestApp, teamCookie, type TestApp } from '../support/testApp'

let test: TestApp
let written = ''
const log = createLog(
  'debug',
  new Writable({
    write(chunk: Buffer, _encoding, done) {
      written += chunk.toString()
      done()
    },
  }),
)

beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.stop())

describe('the log', () => {
  it('names a request that failed, and never the cookie that it brought', async () => {
    const cookie = await teamCookie(test, 'head')
    const broken = { ...test.context, log, clock: () => new Date(Number.NaN) }
    const answer = await request(createApp(broken))
      .get('/api/teams/11111111-1111-4111-8111-111111111111/squad')
      .set('Cookie', cookie)
    expect(answer.status).toBeGreaterThanOrEqual(400)
    await request(createApp({ ...test.context, log }))
      .post('/api/session')
      .send({ email: 'head@club.example', password: 'a wrong one' })
    expect(written).toContain('/squad')
    expect(written).not.toContain(cookie.split('=')[1] ?? 'no cookie')
    expect(written).not.toMatch(/set-cookie|"cookie"|a wrong one/i)
  })

  it('says which query failed, and nothing of what it carried', async () => {
    written = ''
    const person = { id: 'one', email: 'wren@club.example', name: 'Wren Castell', passwordHash: 'hashed' }
    const twice = { ...person, createdAt: '2026-03-17T09:42:00.000Z' }
    await test.context.db.manager.insert(Person, twice)
    const failed = await test.context.db.manager.insert(Person, twice).catch((error: unknown) => error)
    log.error({ err: failed }, 'request failed')
    expect(written).toContain('UNIQUE constraint failed')
    expect(written).not.toMatch(/Wren|wren@|hashed/)
  })
})

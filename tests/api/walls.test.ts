import { randomUUID } from 'node:crypto'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Problem } from '@shared/http/common'
import { LIMITS } from '@shared/limits'
import { opponentBody, teamUrl } from '../support/fixture'
import { PASSWORD, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterAll(() => test.stop())

const put = () => head.put(teamUrl(`/opponents/${randomUUID()}`))

describe('writes from another site', () => {
  it.each([
    ['Sec-Fetch-Site', 'cross-site'],
    ['Sec-Fetch-Site', 'same-site'],
    ['Origin', 'https://elsewhere.example'],
    ['Origin', 'null'],
    ['Origin', 'https://127.0.0.1'],
  ])('with %s: %s are refused and change nothing', async (header, value) => {
    const name = `Forged ${randomUUID().slice(0, 8)}`
    const answer = await put().set(header, value).send(opponentBody(name))
    expect(answer.status).toBe(403)
    expect(answer.type).toBe('application/problem+json')
    expect(answer.body.type).toBe('/problems/other-site')
    const { rows } = (await head.get(teamUrl('/opponents'))).body
    expect(rows.map((row: { name: string }) => row.name)).not.toContain(name)
  })

  it('are refused at sign-in and sign-out too', async () => {
    const credentials = { email: 'head@club.example', password: PASSWORD }
    const post = request(test.app).post('/api/session').set('Sec-Fetch-Site', 'cross-site')
    expect((await post.send(credentials)).status).toBe(403)
    expect((await head.delete('/api/session').set('Origin', 'https://elsewhere.example')).status).toBe(403)
    expect((await head.get('/api/session')).status).toBe(200)
  })

  it('our own pages and programs without a browser write, and reading is for every page’s link', async () => {
    expect((await put().set('Sec-Fetch-Site', 'same-origin').send(opponentBody('A'))).status).toBe(201)
    expect((await put().send(opponentBody('B'))).status).toBe(201)
    const host = 'overtop.test'
    const own = put().set('Host', host).set('Origin', `http://${host}`)
    expect((await own.send(opponentBody('C'))).status).toBe(201)
    expect((await head.get(teamUrl('/squad')).set('Sec-Fetch-Site', 'cross-site')).status).toBe(200)
  })

  it('behind a proxy the public address is our own, whatever the host says', async () => {
    const proxied = await startTestApp({ publicUrl: 'https://overtop.club.example/' })
    const post = (origin: string) =>
      request(proxied.app)
        .post('/api/session')
        .set('Host', 'evil.example')
        .set('X-Forwarded-Proto', 'https')
        .set('Origin', origin)
        .send({ email: 'head@club.example', password: PASSWORD })
    expect((await post('https://overtop.club.example')).status).toBe(201)
    expect((await post('https://evil.example')).status).toBe(403)
    await proxied.stop()
  })
})

describe('a body that is nested too deep', () => {
  const rule = (depth: number) =>
    `{"number":null,"title":"Deep","because":"It is.","then":[{"effect":"warn","text":"Deep."}],"when":${'{"all":['.repeat(depth)}{"fact":"handlers","is":"at-most","value":1}${']}'.repeat(depth)}}`
  const sent = (depth: number) =>
    head
      .put(teamUrl(`/rules/${randomUUID()}`))
      .set('Content-Type', 'application/json')
      .send(rule(depth))

  it('is 400 and says so, however deep; one that a coach could mean is taken', async () => {
    expect((await sent(8)).status).toBe(201)
    for (const depth of [40, 1000, 20_000]) {
      const { status, body } = await sent(depth)
      expect([status, body.errors]).toEqual([
        400,
        [{ field: 'body', message: 'This is nested too deep. Make it simpler.' }],
      ])
    }
  })
})

describe('headers', () => {
  const policyOf = (header: string) =>
    Object.fromEntries(
      header.split(';').map((part) => {
        const [name = '', ...values] = part.trim().split(' ')
        return [name, values.join(' ')]
      }),
    )

  it('allow scripts, styles and connections from our own origin only', async () => {
    const answer = await head.get('/api/session')
    const policy = policyOf(String(answer.headers['content-security-policy']))
    expect(policy).toEqual({
      'default-src': "'self'",
      'script-src': "'self'",
      'style-src': "'self'",
      // Element Plus sets style attributes.
      'style-src-attr': "'unsafe-inline'",
      'img-src': "'self' data: blob:",
      'font-src': "'self'",
      'connect-src': "'self'",
      'object-src': "'none'",
      'base-uri': "'self'",
      'form-action': "'self'",
      'frame-ancestors': "'none'",
    })
    expect(answer.headers).not.toHaveProperty('x-powered-by')
    expect(answer.headers).not.toHaveProperty('strict-transport-security')
    expect(answer.headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'x-frame-options': 'SAMEORIGIN',
      'referrer-policy': 'same-origin',
      'cache-control': 'private, no-store',
    })
  })

  it('stand on faults, health and unknown addresses too', async () => {
    for (const path of ['/healthz', '/api/nothing', '/api/session']) {
      const answer = await test.anonymous().get(path)
      expect(answer.headers['content-security-policy'], path).toContain("script-src 'self'")
      expect(answer.headers, path).not.toHaveProperty('x-powered-by')
    }
  })

  it('over https also ask for https', async () => {
    const secure = await startTestApp({ publicUrl: 'https://overtop.club.example', empty: true })
    const answer = await request(secure.app).get('/healthz')
    await secure.stop()
    expect(answer.headers['content-security-policy']).toContain('upgrade-insecure-requests')
    expect(answer.headers['strict-transport-security']).toMatch(/^max-age=31536000/)
  })
})

describe('problems', () => {
  const raw = (text: string, type = 'application/json') => put().set('Content-Type', type).send(text)
  const large = { ...opponentBody(), padding: 'x'.repeat(LIMITS.jsonBytes) }

  it.each<[string, () => PromiseLike<request.Response>, number, string]>([
    ['half a JSON', () => raw('{"name":'), 400, 'What was sent could not be read. Send well-formed JSON.'],
    [
      'a JSON that is no object',
      () => raw('"name"'),
      400,
      'What was sent could not be read. Send well-formed JSON.',
    ],
    [
      'another character set',
      () => raw('{}', 'application/json; charset=klingon'),
      415,
      'Send JSON with Content-Type application/json.',
    ],
    ['too large a body', () => put().send(large), 413, 'What was sent is too large. Send less at once.'],
    [
      'a broken address',
      () => head.get('/api/teams/%E0%A4%A/squad'),
      400,
      'What was sent could not be read. Send well-formed JSON.',
    ],
    [
      'no address of ours',
      () => head.get('/api/nothing/here'),
      404,
      'There is nothing at GET /nothing/here.',
    ],
    [
      'an address with another method',
      () => head.post('/api/session/extra'),
      404,
      'There is nothing at POST /session/extra.',
    ],
    ['a team that is none', () => head.get('/api/teams/herons/squad'), 404, 'There is no such team.'],
  ])('%s is told in our words, with nothing of how we are built', async (_case, ask, status, detail) => {
    const answer = await ask()
    expect(answer.status).toBe(status)
    expect(answer.type).toBe('application/problem+json')
    const problem = Problem.strict().parse(JSON.parse(answer.text))
    expect(problem).toMatchObject({ status, detail })
    expect(problem.type).toMatch(/^\/problems\/[a-z-]+$/)
    expect(answer.text).not.toMatch(/ at .+:\d+|node_modules|\.ts|Error|Unexpected|token|zod|SQLITE/)
  })

  it('what goes wrong with us is 500 without the reason', async () => {
    const broken = await startTestApp()
    const coach = await broken.as('head')
    await broken.context.db.query('DROP TABLE stills')
    await broken.context.db.query('DROP TABLE traps')
    const answer = await coach.get(teamUrl(`/possessions/${randomUUID()}`))
    expect(answer.status).toBe(404)
    await broken.context.db.query('DROP TABLE possessions')
    const failed = await coach.get(teamUrl(`/possessions/${randomUUID()}`))
    await broken.stop()
    expect(failed.status).toBe(500)
    expect(failed.body).toEqual({
      type: '/problems/failed',
      title: 'Did not work',
      status: 500,
      detail: 'This did not work and nothing was changed. Try again in a moment.',
      instance: failed.body.instance,
    })
    expect(failed.text).not.toMatch(/SQLITE|no such table|possessions WHERE/)
  })
})

describe('/healthz', () => {
  it('is 200 while the database answers and 503 when it does not', async () => {
    const other = await startTestApp({ empty: true })
    const well = await other.anonymous().get('/healthz')
    expect([well.status, well.body]).toEqual([200, { status: 'ok' }])
    await other.context.db.destroy()
    const ill = await other.anonymous().get('/healthz')
    expect([ill.status, ill.body]).toEqual([503, { status: 'no database' }])
  })
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startTestApp, TEAM, type Agent, type TestApp, type Who } from '../support/testApp'

/**
 * Every address of the API outside a team, with what a caller without a session and a signed-in one get. They stand
 * outside the endpoint table, so who may is written out here, one by one.
 */
type Method = 'get' | 'put' | 'post' | 'delete'
interface Row {
  body?: object
  anonymous: number
  signedIn: number
  /** A body that cannot be taken, the field that must be named, and who is let as far as that. */
  bad?: { body: object; field: string; by: 'anonymous' | 'signedIn' }
  /** It ends the session, so it is asked by somebody of its own. */
  who?: Who
}

const SECRET = 'x'.repeat(43)
const WRONG = { email: 'head@club.example', password: 'not this one at all' }
const team = {
  name: 'Otters',
  squadName: 'U13 boys',
  timeZone: 'Europe/London',
  season: '2026/27',
  rulePack: 'fiba',
}
const coach = {
  token: SECRET,
  name: 'Ada Fennimore',
  email: 'ada@club.example',
  team: 'Otters',
  squad: 'U13 boys',
  zone: 'Europe/London',
  rules: 'fiba',
  password: 'nine tall otters',
}

const ROWS: Record<string, Row> = {
  'get /session': { anonymous: 401, signedIn: 200 },
  'post /session': {
    body: WRONG,
    anonymous: 401,
    signedIn: 401,
    bad: { body: { email: 'head' }, field: 'email', by: 'anonymous' },
  },
  'get /session/account': { anonymous: 401, signedIn: 200 },
  'put /session/password': {
    // The old password does not fit: a field is at fault, and nothing is changed.
    body: { old: 'not this one at all', password: 'nine tall otters' },
    anonymous: 401,
    signedIn: 400,
    bad: { body: { old: 'not this one', password: 'short' }, field: 'password', by: 'signedIn' },
  },
  'put /session/teams/{team}/mail': {
    body: { mail: true },
    anonymous: 401,
    signedIn: 200,
    bad: { body: { mail: 'perhaps' }, field: 'mail', by: 'signedIn' },
  },
  'post /password-resets': {
    body: { email: 'nobody@club.example' },
    anonymous: 202,
    signedIn: 202,
    bad: { body: { email: 'nobody' }, field: 'email', by: 'anonymous' },
  },
  'post /password-resets/use': {
    body: { token: SECRET, password: 'nine tall otters' },
    anonymous: 410,
    signedIn: 410,
    bad: { body: { token: SECRET, password: 'short' }, field: 'password', by: 'anonymous' },
  },
  'post /invitations/look': {
    body: { secret: SECRET },
    anonymous: 404,
    signedIn: 404,
    bad: { body: { secret: 'half' }, field: 'secret', by: 'anonymous' },
  },
  'post /invitations/accept': {
    body: { secret: SECRET, name: 'Ada', email: 'ada@club.example', password: 'nine tall otters' },
    anonymous: 404,
    signedIn: 404,
    bad: { body: { secret: SECRET, name: '' }, field: 'name', by: 'anonymous' },
  },
  'post /teams': {
    body: team,
    anonymous: 401,
    signedIn: 201,
    bad: { body: { ...team, timeZone: 'Mars' }, field: 'timeZone', by: 'signedIn' },
  },
  'post /first-coach': {
    body: coach,
    anonymous: 403,
    signedIn: 403,
    bad: { body: { ...coach, zone: 'Mars' }, field: 'zone', by: 'anonymous' },
  },
  'delete /session': { anonymous: 204, signedIn: 204, who: 'both' },
  'delete /session/everywhere': { anonymous: 401, signedIn: 204, who: 'assistant' },
}

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.stop())

function ask(agent: Pick<Agent, Method>, key: string, body?: object) {
  const [method = 'get', path = ''] = key.split(' ')
  const sent = agent[method as Method](`/api${path.replace('{team}', TEAM)}`)
  return body ? sent.send(body) : sent
}

describe('outside the teams', () => {
  it('every described address has a row, and no other', async () => {
    const { body } = await test.anonymous().get('/api/openapi.json')
    const described = Object.entries(body.paths as Record<string, Record<string, { 'x-action'?: string }>>)
      .filter(([path]) => !path.startsWith('/teams/{team}'))
      .flatMap(([path, methods]) =>
        Object.entries(methods).map(([method, { 'x-action': action }]) => [`${method} ${path}`, action]),
      )
    expect(described.map(([key]) => key).sort()).toEqual(Object.keys(ROWS).sort())
    expect(described.every(([, action]) => action === undefined)).toBe(true)
  })

  it('says nothing to an address that does not exist but that', async () => {
    for (const path of ['/api/people', '/api/teams', `/api/teams/${randomUUID()}/people`])
      expect((await (await test.as('head')).get(path)).status).toBe(404)
  })

  it.each(Object.entries(ROWS))('%s', async (key, row) => {
    const head = await test.as('head')
    if (row.bad) {
      const agent = row.bad.by === 'anonymous' ? test.anonymous() : head
      const answer = await ask(agent, key, row.bad.body)
      const errors = (answer.body.errors ?? []) as { field: string }[]
      expect([answer.status, errors.map(({ field }) => field)]).toEqual([
        400,
        expect.arrayContaining([row.bad.field]),
      ])
    }
    const anonymous = await ask(test.anonymous(), key, row.body)
    expect([anonymous.status, anonymous.body.detail]).toEqual([row.anonymous, anonymous.body.detail])
    if (row.anonymous >= 400) expect(anonymous.type).toBe('application/problem+json')
    const signedIn = await ask(row.who ? await test.as(row.who) : head, key, row.body)
    expect([signedIn.status, signedIn.body.detail]).toEqual([row.signedIn, signedIn.body.detail])
    if (row.who) expect((await (await test.as(row.who)).get('/api/session')).status).toBe(401)
  })
})

import { afterAll, describe, expect, it } from 'vitest'
import type { Action } from '@shared/session/schemas'
import type { TeamRole } from '@shared/vocabulary'
import { jpeg } from '../support/fixture'
import { BOOK_ROWS } from '../support/matrix/bookRows'
import { GAME_ROWS } from '../support/matrix/gameRows'
import { PEOPLE_ROWS } from '../support/matrix/peopleRows'
import { badId, type Row } from '../support/matrix/row'
import { SCOUT_ROWS } from '../support/matrix/scoutRows'
import { makeWorld } from '../support/matrix/world'
import { OTHER_PLAYER, OTHER_TEAM, startTestApp, TEAM, type Agent } from '../support/testApp'
import { WHO_MAY } from '../support/whoMay'

/**
 * Every endpoint of the API's own description, asked by every role in its own team, in another one and without a
 * session. Who may is worked out from the action that the description names and a table of actions of the tests'
 * own; the rows say only what the description cannot. A route without a row fails, and so does a row without a route.
 */
const ROWS: Record<string, Row> = { ...SCOUT_ROWS, ...BOOK_ROWS, ...GAME_ROWS, ...PEOPLE_ROWS }

/** Rows that change what later rows need go last, and in this order. */
const LAST = [
  'post /possessions/batch',
  'post /possessions/batch/{batch}/undo',
  'post /games/{id}/hand-on',
  'delete /invitations/{id}',
  'delete /practices/{id}',
  'post /practices/{id}/restore',
  'post /sheets/{id}/recall',
  'put /games/{id}/plan',
  'delete /possessions/{id}/stills/{still}',
  'delete /possessions/{id}',
  'post /possessions/{id}/restore',
  'delete /opponent-players/{id}',
  'post /opponent-players/{id}/restore',
  'delete /counters/{id}',
  'post /counters/{id}/restore',
  'delete /scouted-games/{id}',
  'post /scouted-games/{id}/restore',
  'delete /games/{id}',
  'post /games/{id}/restore',
  'delete /opponents/{id}',
  'post /opponents/{id}/restore',
  'delete /members/{id}',
  'delete /membership',
]

type Method = 'get' | 'put' | 'post' | 'patch' | 'delete'
interface Route {
  key: string
  action: Action
}

const ROLES = [
  ['player', 'player'],
  ['assistant-coach', 'assistant'],
  ['head-coach', 'head'],
] as const

const test = await startTestApp({ mail: { send: () => Promise.resolve(), close: () => undefined } })
afterAll(() => test.stop())
const own = await makeWorld(test)
const other = await makeWorld(test, OTHER_TEAM)

const BASE = '/teams/{team}'
const { body: description } = await test.anonymous().get('/api/openapi.json')
const routes: Route[] = Object.entries(
  description.paths as Record<string, Record<string, { 'x-action'?: Action }>>,
)
  .filter(([path]) => path.startsWith(BASE))
  .flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, { 'x-action': action }]) => {
      const key = `${method} ${path.slice(BASE.length)}`
      if (!action) throw new Error(`${key} names no action`)
      return { key, action }
    }),
  )
  .sort((one, two) => LAST.indexOf(one.key) - LAST.indexOf(two.key))

const fill = (path: string, values: Record<string, string>): string =>
  path.replace(/\{(\w+)\}/g, (_, name: string) => values[name] ?? '')

interface Asked {
  values: Record<string, string>
  team?: string
  body?: object
  query?: string
  ifMatch?: string
  picture?: Buffer | null
}

async function send(agent: Pick<Agent, Method>, key: string, row: Row, asked: Asked) {
  const [method = 'get', path = ''] = key.split(' ')
  const query = asked.query ? `?${asked.query}` : ''
  const sent = agent[method as Method](`/api/teams/${asked.team ?? TEAM}${fill(path, asked.values)}${query}`)
  if (asked.ifMatch) void sent.set('If-Match', asked.ifMatch)
  if (row.still)
    return asked.picture
      ? sent.attach('still', asked.picture, 'a.jpg')
      : sent.attach('wrong', Buffer.from('x'), 'a.jpg')
  return asked.body ? sent.send(asked.body) : sent
}

const picture = await jpeg()
const good = (row: Row, role: TeamRole = 'head-coach', world = own) => ({
  values: row.at(world),
  body: row.body?.(world),
  query: typeof row.query === 'function' ? row.query(world, role) : row.query,
  ifMatch: row.ifMatch,
  picture,
})

/** A deletion that can be taken back is taken back, so that the next role finds the row again. */
async function takeBack({ key }: Route, row: Row): Promise<void> {
  const back = `post ${key.split(' ')[1] ?? ''}/restore`
  if (!key.startsWith('delete ') || !ROWS[back]) return
  const answer = await send(await test.as('head'), back, ROWS[back], { values: row.at(own), body: {} })
  expect(answer.status).toBe(200)
}

it('has a row for every route of the description, and no other', () => {
  expect(Object.keys(ROWS).sort()).toEqual(routes.map(({ key }) => key).sort())
})

describe.each(routes.filter(({ key }) => key in ROWS))('$key', (route) => {
  const { key, action } = route
  const row = ROWS[key] as Row
  const mayAt = WHO_MAY[action]
  const [least] = mayAt

  it('401 without a session, whosever the team', async () => {
    for (const team of [TEAM, OTHER_TEAM]) {
      const answer = await send(test.anonymous(), key, row, { ...good(row), team })
      expect([team, answer.status]).toEqual([team, 401])
      expect(answer.type).toBe('application/problem+json')
    }
  })

  it.each(ROLES)('404 for a %s in another team', async (role, who) => {
    const asked = { ...good(row, role, other), team: OTHER_TEAM }
    expect((await send(await test.as(who), key, row, asked)).status).toBe(404)
  })

  it.each(ROLES.filter(([role]) => !mayAt.includes(role)))('403 for a %s', async (role, who) => {
    expect((await send(await test.as(who), key, row, good(row, role))).status).toBe(403)
  })

  it('400 names the field', async () => {
    const agent = await test.as('head')
    // Nothing but the team can be wrong here.
    if (row.bad.field === '')
      return expect((await send(agent, key, row, { values: {}, team: 'herons' })).status).toBe(404)
    const bad =
      row.bad === badId
        ? { values: { ...row.at(own), id: 'first' }, body: row.body?.(own) }
        : { values: row.at(own), body: row.bad.body, query: row.bad.query, ifMatch: row.ifMatch }
    const answer = await send(agent, key, row, { ...bad, picture: null })
    expect(answer.status).toBe(400)
    const fields = (answer.body.errors as { field: string; message: string }[]).map((error) => error.field)
    expect(fields).toContain(row.bad.field)
  })

  if ('id' in row.at(own))
    it('404 for a row of another team, in the same words as for none', async () => {
      const agent = await test.as('head')
      const foreign = row.at(other)
      if (foreign['id'] === row.at(own)['id']) foreign['id'] = OTHER_PLAYER
      const smuggled = await send(agent, key, row, { ...good(row, 'head-coach', other), values: foreign })
      expect(smuggled.status).toBe(404)
      expect(smuggled.body.detail).not.toMatch(/other|another|foreign/i)
    })

  const asking = ROLES.filter(([role]) => (row.once === undefined ? mayAt.includes(role) : role === least))
  it(`${row.success} for ${asking.map(([role]) => role).join(' and ')}`, async () => {
    let { ifMatch } = row
    for (const [index, [role, who]] of asking.entries()) {
      if (index > 0) await takeBack(route, row)
      const answer = await send(await test.as(who), key, row, { ...good(row, role), ifMatch })
      expect([role, answer.status, answer.status >= 400 ? answer.body : null]).toEqual([
        role,
        row.success,
        null,
      ])
      if (row.ifMatch) ifMatch = answer.headers['etag'] ?? ifMatch
    }
  })
})

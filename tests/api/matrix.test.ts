import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  gameBody,
  jpeg,
  makeFixture,
  opponentBody,
  possessionBody,
  practiceBody,
  scoutedGameBody,
  type Fixture,
} from '../support/fixture'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { OTHER_TEAM, PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_RULES } from '@server/database/demo/rules'

/**
 * Every endpoint of the API's own description, with 401, 403, 400, another team's 404 and success. A
 * route without a row here fails the test.
 */
interface Row {
  /** Fills the path's parameters with rows of a team. */
  at: (rows: Fixture) => Record<string, string>
  /** Whether a player may. Staff always may unless `headOnly`. */
  player?: boolean
  headOnly?: boolean
  success: number
  body?: (rows: Fixture) => object
  still?: boolean
  ifMatch?: string
  query?: string | ((rows: Fixture) => string)
  /** A body or query that cannot be taken, and the field that must be named. */
  bad: { body?: object; query?: string; field: string }
}

const badId = { field: 'id' }
const rowsOf = {
  opponent: (rows: Fixture) => ({ id: rows.opponent }),
  scoutedGame: (rows: Fixture) => ({ id: rows.scoutedGame }),
  possession: (rows: Fixture) => ({ id: rows.possession }),
  game: (rows: Fixture) => ({ id: rows.game }),
  still: (rows: Fixture) => ({ id: rows.possession, still: rows.still }),
  counter: (rows: Fixture) => ({ id: rows.counters[0] ?? '' }),
}
const { key: _counter, ...counterBody } = DEMO_COUNTERS[0] ?? { key: '' }
const { key: _key, ...ruleBody } = DEMO_RULES[0] ?? { key: '' }
const player = {
  jersey: 44,
  firstName: 'Wren',
  skills: { handle: 1, 'throw-in': 1, 'long-arm': 1, decide: 1, sprint: 1, screen: 1 },
}

/** A change of many rows that its undo finds: the same in both tests. */
const BATCH = '55555555-5555-4555-8555-555555555555'
const batchBody = (id: string) => ({
  batchId: BATCH,
  rows: [{ id, version: 1 }],
  field: 'handler',
  from: null,
  to: 'weak',
})

const invitation = { role: 'assistant-coach', way: 'link' }

const teamBody = {
  name: 'Herons',
  squadName: 'U17 girls',
  timeZone: 'Europe/London',
  season: '2026-27',
  rulePack: 'fiba',
  settings: {},
}

const TABLE: Record<string, Row> = {
  'get /opponents': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /strips': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /opponents/{id}': { at: rowsOf.opponent, success: 200, bad: badId },
  'put /opponents/{id}': {
    at: rowsOf.opponent,
    success: 200,
    body: () => opponentBody(),
    bad: { body: { name: '', shortName: 'x' }, field: 'name' },
  },
  'get /opponents/{id}/scouted-games': { at: rowsOf.opponent, success: 200, bad: badId },
  'get /opponents/{id}/tendencies': {
    at: rowsOf.opponent,
    success: 200,
    bad: { query: 'trigger=sometimes', field: 'trigger.0' },
  },
  'get /opponents/{id}/evidence': {
    at: rowsOf.opponent,
    success: 200,
    query: 'habit=press',
    bad: { query: 'habit=whistling', field: 'habit' },
  },
  'get /scouted-games/{id}': { at: rowsOf.scoutedGame, success: 200, bad: badId },
  'put /scouted-games/{id}': {
    at: rowsOf.scoutedGame,
    success: 200,
    body: (rows) => scoutedGameBody(rows.opponent),
    bad: { body: { playedOn: 'yesterday' }, field: 'playedOn' },
  },
  'get /scouted-games/{id}/possessions': { at: rowsOf.scoutedGame, success: 200, bad: badId },
  'get /games/{id}/possessions': { at: rowsOf.game, success: 200, bad: badId },
  'get /possessions/{id}': { at: rowsOf.possession, success: 200, bad: badId },
  'put /possessions/{id}': {
    at: rowsOf.possession,
    success: 200,
    body: (rows) => possessionBody(rows.scoutedGame),
    bad: { body: { trigger: 'sometimes', number: 1 }, field: 'trigger' },
  },
  'patch /possessions/{id}': {
    at: rowsOf.possession,
    success: 200,
    body: () => ({ outcome: 'through' }),
    ifMatch: '"1"',
    bad: { body: { outcome: 'victory' }, field: 'outcome' },
  },
  'post /possessions/{id}/restore': { at: rowsOf.possession, success: 200, body: () => ({}), bad: badId },
  'put /possessions/{id}/stills/{still}': {
    at: rowsOf.still,
    success: 200,
    still: true,
    bad: { field: 'still' },
  },
  'get /stills/{id}': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    bad: { query: 'size=huge', field: 'size' },
  },
  'get /stills/{id}/row': { at: (rows) => ({ id: rows.still }), success: 200, bad: badId },
  'patch /stills/{id}': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    // Nothing new, so that the version stays what the blur below names.
    body: () => ({ caption: '' }),
    ifMatch: '"1"',
    bad: { body: { caption: 'one two three four five six seven eight nine' }, field: 'caption' },
  },
  'post /stills/{id}/blur': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    body: () => ({ regions: [{ x: 0.1, y: 0.1, w: 0.1, h: 0.1 }] }),
    ifMatch: '"1"',
    bad: { body: { regions: [] }, field: 'regions' },
  },
  'get /opponents/{id}/stills': {
    at: rowsOf.opponent,
    success: 200,
    query: 'report=1',
    bad: { query: 'limit=0', field: 'limit' },
  },
  'delete /possessions/{id}/stills/{still}': { at: rowsOf.still, success: 204, bad: badId },
  'get /counters': { at: () => ({}), success: 200, bad: { query: 'show=mine', field: 'show' } },
  'get /book.pdf': {
    at: () => ({}),
    success: 200,
    query: (rows) => `counters=${rows.counters[0] ?? ''}`,
    bad: { query: 'paper=a3', field: 'paper' },
  },
  'get /counters/{id}': { at: rowsOf.counter, success: 200, bad: badId },
  'put /counters/{id}': {
    at: rowsOf.counter,
    success: 200,
    body: () => counterBody,
    bad: { body: { ...counterBody, name: '' }, field: 'name' },
  },
  'post /counters/preview': {
    at: () => ({}),
    success: 200,
    body: () => counterBody,
    bad: { body: { name: 'no drawing' }, field: 'diagram' },
  },
  'get /counters/{id}/export.json': { at: rowsOf.counter, success: 200, bad: badId },
  'post /counters/{id}/walked': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'post /counters/{id}/archive': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'post /counters/{id}/unarchive': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'get /rules': { at: () => ({}), success: 200, bad: { field: '' } },
  'put /rules/{id}': {
    at: (rows) => ({ id: rows.rule }),
    headOnly: true,
    success: 200,
    body: () => ruleBody,
    bad: { body: { ...ruleBody, because: '' }, field: 'because' },
  },
  'get /settings': { at: () => ({}), success: 200, bad: { field: '' } },
  'put /settings': {
    at: () => ({}),
    headOnly: true,
    success: 200,
    body: () => teamBody,
    ifMatch: '"1"',
    bad: { body: { ...teamBody, season: 'this one' }, field: 'season' },
  },
  'get /squad': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /squad/{id}': { at: () => ({ id: PLAYER }), success: 200, bad: badId },
  'put /squad/{id}': {
    at: () => ({ id: PLAYER }),
    headOnly: true,
    success: 200,
    body: () => player,
    ifMatch: '"1"',
    bad: { body: { ...player, jersey: 140 }, field: 'jersey' },
  },
  'get /games': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /games/{id}': { at: rowsOf.game, success: 200, bad: badId },
  'put /games/{id}': {
    at: rowsOf.game,
    success: 200,
    body: (rows) => gameBody(rows.opponent),
    bad: { body: { tipOff: '20.3.2026' }, field: 'tipOff' },
  },
  'get /week': { at: () => ({}), success: 200, bad: { query: 'on=monday', field: 'on' } },
  'post /games/{id}/hand-on': {
    at: rowsOf.game,
    headOnly: true,
    success: 200,
    body: () => ({ toId: headId }),
    bad: { body: { toId: 'maren' }, field: 'toId' },
  },
  'post /games/{id}/read-sign-off': { at: rowsOf.game, headOnly: true, success: 200, bad: badId },
  'delete /games/{id}/read-sign-off': { at: rowsOf.game, headOnly: true, success: 200, bad: badId },
  'get /games/{id}/choices': { at: rowsOf.game, success: 200, bad: badId },
  'get /games/{id}/turns': { at: rowsOf.game, success: 200, bad: badId },
  'post /games/{id}/choices/preview': {
    at: rowsOf.game,
    headOnly: true,
    success: 200,
    body: (rows) => ({ id: rows.rule, rule: ruleBody }),
    bad: { body: { id: 'first', rule: ruleBody }, field: 'id' },
  },
  'get /games/{id}/plan': { at: rowsOf.game, success: 200, bad: badId },
  'put /games/{id}/plan': {
    at: rowsOf.game,
    headOnly: true,
    success: 201,
    body: () => ({ id: randomUUID() }),
    bad: { body: { id: randomUUID(), keys: ['a', 'b', 'c', 'd'] }, field: 'keys' },
  },
  'get /games/{id}/plan/grounds': {
    at: rowsOf.game,
    success: 200,
    bad: { query: 'plan=first', field: 'plan' },
  },
  'post /games/{id}/plan/sign-off': {
    at: rowsOf.game,
    headOnly: true,
    success: 200,
    body: (rows) => ({ planId: rows.plan, sheetId: rows.sheet }),
    bad: { body: { planId: 'one', sheetId: randomUUID() }, field: 'planId' },
  },
  'get /games/{id}/sheets': { at: rowsOf.game, player: true, success: 200, bad: badId },
  'get /sheets': { at: () => ({}), player: true, success: 200, bad: { field: '' } },
  'get /sheets/{id}': { at: (rows) => ({ id: rows.sheet }), player: true, success: 200, bad: badId },
  'patch /sheets/{id}': {
    at: (rows) => ({ id: rows.sheet }),
    headOnly: true,
    success: 200,
    body: () => ({ fuller: true, seenWarning: true }),
    bad: { body: { fuller: 'yes' }, field: 'fuller' },
  },
  'get /sheets/{id}/copies': { at: (rows) => ({ id: rows.sheet }), success: 200, bad: badId },
  'post /sheets/{id}/copies': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    body: (rows) => ({ copies: [{ id: rows.copy }] }),
    bad: { body: { copies: [] }, field: 'copies' },
  },
  'get /sheets/{id}/copies.pdf': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    bad: { query: 'paper=napkin', field: 'paper' },
  },
  'patch /copies/{id}': {
    at: (rows) => ({ id: rows.copy }),
    success: 200,
    ifMatch: '"1"',
    body: () => ({ place: 'out' }),
    bad: { body: { place: 'lost' }, field: 'place' },
  },
  'post /sheets/{id}/letters': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    body: () => ({ players: [] }),
    bad: { body: { players: ['nell'] }, field: 'players.0' },
  },
  'get /sheets/{id}/openings': { at: (rows) => ({ id: rows.sheet }), success: 200, bad: badId },
  'post /sheets/{id}/recall': {
    at: (rows) => ({ id: rows.sheet }),
    headOnly: true,
    success: 200,
    bad: badId,
  },
  'get /practices': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /games/{id}/practices': { at: rowsOf.game, success: 200, bad: badId },
  'get /games/{id}/script': {
    at: rowsOf.game,
    success: 200,
    bad: { query: 'minutes=many', field: 'minutes' },
  },
  'get /practices/{id}': { at: (rows) => ({ id: rows.practice }), success: 200, bad: badId },
  'put /practices/{id}': {
    at: (rows) => ({ id: rows.practice }),
    success: 200,
    body: (rows) => practiceBody(rows.game),
    bad: { body: { startsAt: 'Thursday' }, field: 'startsAt' },
  },
  'delete /practices/{id}': { at: (rows) => ({ id: rows.practice }), success: 204, bad: badId },
  'post /practices/{id}/restore': { at: (rows) => ({ id: rows.practice }), success: 200, bad: badId },
  'get /sheets/{id}.pdf': {
    at: (rows) => ({ id: rows.sheet }),
    player: true,
    success: 200,
    bad: { query: 'paper=napkin', field: 'paper' },
  },
  'get /history': {
    at: () => ({}),
    success: 200,
    query: (rows) => `row=${rows.possession}`,
    bad: { query: 'row=first', field: 'row' },
  },
  'get /changes': { at: () => ({}), success: 200, bad: { query: 'since=yesterday', field: 'since' } },
  'get /opponents/{id}/possessions': {
    at: rowsOf.opponent,
    success: 200,
    bad: { query: 'sort=luck', field: 'sort' },
  },
  'post /possessions/{id}/put-back': {
    at: rowsOf.possession,
    success: 200,
    body: (rows) => ({ changeId: rows.change, field: 'outcome' }),
    ifMatch: '"1"',
    bad: { body: { changeId: 'first', field: 'outcome' }, field: 'changeId' },
  },
  'post /possessions/batch': {
    at: () => ({}),
    success: 200,
    body: (rows) => batchBody(rows.possession),
    bad: { body: { ...batchBody(randomUUID()), field: 'id' }, field: 'field' },
  },
  'post /possessions/batch/{batch}/undo': {
    at: () => ({ batch: BATCH }),
    success: 200,
    body: () => ({}),
    bad: { field: '' },
  },
  'get /opponents/{id}/players': { at: rowsOf.opponent, success: 200, bad: badId },
  'put /opponent-players/{id}': {
    at: (rows) => ({ id: rows.opponentPlayer }),
    success: 200,
    body: (rows) => ({ opponentId: rows.opponent, jersey: 12, does: ['thief'] }),
    bad: { body: { jersey: 120 }, field: 'jersey' },
  },
  'delete /opponent-players/{id}': { at: (rows) => ({ id: rows.opponentPlayer }), success: 204, bad: badId },
  'post /opponent-players/{id}/restore': {
    at: (rows) => ({ id: rows.opponentPlayer }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
  'delete /counters/{id}': { at: (rows) => ({ id: rows.counters[1] ?? '' }), success: 204, bad: badId },
  'post /counters/{id}/restore': {
    at: (rows) => ({ id: rows.counters[1] ?? '' }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
  'delete /scouted-games/{id}': { at: rowsOf.scoutedGame, success: 204, bad: badId },
  'post /scouted-games/{id}/restore': { at: rowsOf.scoutedGame, success: 200, body: () => ({}), bad: badId },
  'delete /games/{id}': { at: rowsOf.game, success: 204, bad: badId },
  'post /games/{id}/restore': { at: rowsOf.game, success: 200, body: () => ({}), bad: badId },
  'delete /opponents/{id}': { at: rowsOf.opponent, success: 204, bad: badId },
  'post /opponents/{id}/restore': { at: rowsOf.opponent, success: 200, body: () => ({}), bad: badId },
  'delete /possessions/{id}': { at: rowsOf.possession, success: 204, bad: badId },
  'get /mails': { at: () => ({}), success: 200, bad: { query: 'state=lost', field: 'state' } },
  'post /mails/{id}/again': { at: (rows) => ({ id: placesOf(rows).again }), success: 200, bad: badId },
  'post /mails/{id}/withdraw': { at: (rows) => ({ id: placesOf(rows).withdraw }), success: 200, bad: badId },
  'post /members/{id}/password-link': {
    at: (rows) => ({ id: placesOf(rows).member }),
    headOnly: true,
    success: 200,
    bad: badId,
  },
  'get /people': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /people/export': {
    at: () => ({}),
    player: true,
    success: 200,
    query: `kind=squad-player&id=${PLAYER}`,
    bad: { query: `kind=nobody&id=${PLAYER}`, field: 'kind' },
  },
  'patch /members/{id}': {
    at: (rows) => ({ id: placesOf(rows).member }),
    headOnly: true,
    success: 200,
    ifMatch: '"1"',
    body: () => ({ role: 'assistant-coach' }),
    bad: { body: { role: 'owner' }, field: 'role' },
  },
  'delete /members/{id}': {
    at: (rows) => ({ id: placesOf(rows).leaver }),
    headOnly: true,
    success: 204,
    bad: badId,
  },
  'put /invitations/{id}': {
    at: (rows) => ({ id: placesOf(rows).invitation }),
    headOnly: true,
    success: 200,
    body: () => invitation,
    bad: { body: { ...invitation, role: 'owner' }, field: 'role' },
  },
  'post /invitations/{id}/resend': {
    at: (rows) => ({ id: placesOf(rows).invitation }),
    headOnly: true,
    success: 200,
    body: () => ({ days: 3 }),
    bad: { body: { days: 400 }, field: 'days' },
  },
  'delete /invitations/{id}': {
    at: (rows) => ({ id: placesOf(rows).invitation }),
    headOnly: true,
    success: 204,
    bad: badId,
  },
  'get /erasures/preview': {
    at: () => ({}),
    headOnly: true,
    success: 200,
    query: `kind=squad-player&subjectId=${PLAYER}`,
    bad: { query: `kind=nobody&subjectId=${PLAYER}`, field: 'kind' },
  },
  'put /erasures/{id}': {
    at: (rows) => ({ id: placesOf(rows).erasure }),
    headOnly: true,
    success: 200,
    body: (rows) => ({ kind: 'squad-player', subjectId: placesOf(rows).leaving }),
    bad: { body: { kind: 'squad-player', subjectId: 'she' }, field: 'subjectId' },
  },
  'post /erasures/{id}/stop': {
    at: (rows) => ({ id: placesOf(rows).erasure }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
  'delete /membership': { at: () => ({}), player: true, success: 204, bad: { field: '' } },
}

/** Rows that change what later rows need go last, and in this order. */
const LAST = [
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

let test: TestApp
let own: Fixture
let other: Fixture
let headId = ''

/** Of each team: two letters that wait, somebody's membership and another's, and who is asked in and to be erased. */
interface Places {
  again: string
  withdraw: string
  member: string
  leaver: string
  invitation: string
  erasure: string
  /** Whom the erasure is about. */
  leaving: string
}
const NO_PLACES: Places = {
  again: '',
  withdraw: '',
  member: '',
  leaver: '',
  invitation: '',
  erasure: '',
  leaving: '',
}
const places = new Map<string, Places>()
const placesOf = ({ game }: Fixture) => places.get(game) ?? NO_PLACES

async function addPlaces({ game }: Fixture, teamId: string, name: string): Promise<void> {
  const { manager } = test.context.db
  const ids = { again: randomUUID(), withdraw: randomUUID() }
  for (const id of Object.values(ids))
    await manager.insert(Mail, {
      id,
      teamId,
      kind: 'invitation',
      onceKey: id,
      recipient: 'someone@club.example',
      subject: 'Join us',
      text: 'Join us',
      html: '<p>Join us</p>',
      state: 'failed',
      createdAt: test.context.clock().toISOString(),
    })
  const { id: personId } = await manager.findOneByOrFail(Person, { name })
  const { id: member } = await manager.findOneByOrFail(Membership, { personId, teamId })
  const both = await manager.findOneByOrFail(Person, { name: 'Test both' })
  const { id: leaver } = await manager.findOneByOrFail(Membership, { personId: both.id, teamId })
  const { id: leaving } = await manager.findOneByOrFail(SquadPlayer, { teamId, jersey: 10 })
  const head = await test.as(teamId === TEAM ? 'head' : 'otherHead')
  const made = { invitation: randomUUID(), erasure: randomUUID() }
  await head.put(`/api/teams/${teamId}/invitations/${made.invitation}`).send(invitation).expect(201)
  await head
    .put(`/api/teams/${teamId}/erasures/${made.erasure}`)
    .send({ kind: 'squad-player', subjectId: leaving })
    .expect(201)
  places.set(game, { ...ids, member, leaver, leaving, ...made })
}

beforeAll(async () => {
  test = await startTestApp({ mail: { send: () => Promise.resolve(), close: () => undefined } })
  own = await makeFixture(test)
  other = await makeFixture(test, OTHER_TEAM)
  await addPlaces(own, TEAM, 'Test assistant')
  await addPlaces(other, OTHER_TEAM, 'Test otherHead')
  headId = (await test.context.db.manager.findOneByOrFail(Person, { name: 'Test head' })).id
}, 60_000)
afterAll(() => test.stop())

type Method = 'get' | 'put' | 'post' | 'patch' | 'delete'

function fill(path: string, values: Record<string, string>): string {
  return path.replace(/\{(\w+)\}/g, (_, name: string) => values[name] ?? '')
}

async function send(
  agent: Pick<Agent, Method>,
  key: string,
  row: Row,
  options: {
    team?: string
    values: Record<string, string>
    body?: object
    query?: string
    picture?: Buffer | null
  },
) {
  const [method = 'get', path = ''] = key.split(' ')
  const query = options.query ? `?${options.query}` : ''
  const sent = agent[method as Method](
    `/api/teams/${options.team ?? TEAM}${fill(path, options.values)}${query}`,
  )
  if (row.ifMatch) void sent.set('If-Match', row.ifMatch)
  if (row.still)
    return options.picture
      ? sent.attach('still', options.picture, 'a.jpg')
      : sent.attach('wrong', Buffer.from('x'), 'a.jpg')
  return options.body ? sent.send(options.body) : sent
}

const keys = [...Object.keys(TABLE).filter((key) => !LAST.includes(key)), ...LAST]

describe('the endpoint matrix', () => {
  it('has a row for every route of the description, and no other', async () => {
    const answer = await test.anonymous().get('/api/openapi.json')
    const described = Object.entries(answer.body.paths as Record<string, Record<string, unknown>>)
      .filter(([path]) => path.startsWith('/teams/{team}'))
      .flatMap(([path, methods]) =>
        Object.keys(methods).map((method) => `${method} ${path.slice('/teams/{team}'.length)}`),
      )
    expect(Object.keys(TABLE).sort()).toEqual(described.sort())
  })

  describe.each(keys)('%s', (key) => {
    const row = TABLE[key] as Row
    const good = (rows: Fixture) => ({
      values: row.at(rows),
      body: row.body?.(rows),
      query: typeof row.query === 'function' ? row.query(rows) : row.query,
    })

    it('401 without a session', async () => {
      const answer = await send(test.anonymous(), key, row, { ...good(own), picture: await jpeg() })
      expect(answer.status).toBe(401)
      expect(answer.type).toBe('application/problem+json')
    })

    if (!row.player)
      it('403 for a player', async () => {
        const answer = await send(await test.as('player'), key, row, { ...good(own), picture: await jpeg() })
        expect(answer.status).toBe(403)
      })

    if (row.headOnly)
      it('403 for an assistant coach', async () => {
        expect((await send(await test.as('assistant'), key, row, good(own))).status).toBe(403)
      })

    it('400 names the field', async () => {
      const head = await test.as('head')
      if (row.bad.field === '') {
        // Nothing but the team can be wrong here.
        const answer = await send(head, key, row, { values: {}, team: 'herons' })
        expect(answer.status).toBe(404)
        return
      }
      const bad =
        row.bad === badId
          ? { values: { ...row.at(own), id: 'first' }, body: row.body?.(own) }
          : { values: row.at(own), body: row.bad.body, query: row.bad.query }
      const answer = await send(head, key, row, { ...bad, picture: null })
      expect(answer.status).toBe(400)
      const fields = (answer.body.errors as { field: string; message: string }[]).map((error) => error.field)
      expect(fields).toContain(row.bad.field)
    })

    it('404 for a row of another team, and for another team’s address', async () => {
      const head = await test.as('head')
      const foreign = await send(head, key, row, { ...good(other), team: OTHER_TEAM, picture: await jpeg() })
      expect(foreign.status).toBe(404)
      if (Object.keys(row.at(own)).length === 0 || 'id' in row.at(own) === false) return
      const values =
        row.at(other).id === row.at(own).id ? { id: '44444444-4444-4444-8444-444444444444' } : row.at(other)
      const smuggled = await send(head, key, row, { ...good(other), values, picture: await jpeg() })
      expect(smuggled.status).toBe(404)
      expect(smuggled.body.detail).not.toMatch(/other|another|foreign/i)
    })

    it(`${row.success} for ${row.headOnly ? 'the head coach' : row.player ? 'a player' : 'an assistant coach'}`, async () => {
      const agent = await test.as(row.headOnly ? 'head' : row.player ? 'player' : 'assistant')
      const answer = await send(agent, key, row, { ...good(own), picture: await jpeg() })
      expect([answer.status, answer.status >= 400 ? answer.body : null]).toEqual([row.success, null])
    })
  })
})

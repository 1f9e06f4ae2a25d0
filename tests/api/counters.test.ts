import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { Counter } from '@server/database/entities/Counter'
import { CounterBody } from '@shared/counters/schemas'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let rows: Fixture

const { key: _key, ...demo } = DEMO_COUNTERS[0] ?? { key: '' }
const BODY = CounterBody.parse(demo)
/** The same with a pass by somebody who has not got the ball, on the third step. */
const FAULTY = structuredClone(BODY)
FAULTY.diagram.steps[2]?.moves.push({
  kind: 'pass',
  from: '4',
  to: '3',
  flight: 'straight',
  throwIn: false,
  beat: 5,
})

beforeAll(async () => {
  test = await startTestApp()
  rows = await makeFixture(test)
  scout = await test.as('assistant')
}, 60_000)
afterAll(() => test.stop())

const at = (id: string, more = '') => teamUrl(`/counters/${id}${more}`)
const put = (id: string, body: object, version?: number) => {
  const sent = scout.put(at(id))
  return (version === undefined ? sent : sent.set('If-Match', `"${version}"`)).send(body)
}
const names = async (show = '') =>
  (await scout.get(teamUrl(`/counters${show && `?show=${show}`}`))).body.rows.map(
    (row: { id: string }) => row.id,
  ) as string[]

describe('drawing a counter', () => {
  it('keeps a draft with its faults and without a name, and offers it nowhere', async () => {
    const id = randomUUID()
    const made = await put(id, { ...FAULTY, name: '', looks: [], rulePacks: [], draft: true })
    expect([made.status, made.body.draft, made.headers['etag']]).toEqual([201, true, '"1"'])
    expect((await scout.get(at(id))).body.diagram).toEqual(FAULTY.diagram)
    expect(await names()).not.toContain(id)
    expect(await names('drafts')).toEqual([id])
    expect(await names('all')).toContain(id)
    const { body } = await scout.get(teamUrl(`/games/${rows.game}/choices`))
    const offered = (body.choices as { counterId: string }[]).map((choice) => choice.counterId)
    expect(offered).not.toContain(id)
    expect(offered.length).toBeGreaterThan(0)
  })

  it('takes it into the book without faults only, and says step, move and what to do', async () => {
    const id = randomUUID()
    await put(id, { ...FAULTY, draft: true })
    const refused = await put(id, { ...FAULTY, looks: [], draft: false }, 1)
    expect(refused.status).toBe(400)
    const errors = refused.body.errors as { field: string; message: string }[]
    expect(errors.map(({ field }) => field)).toContain('looks')
    const drawn = errors.find(({ field }) => field.startsWith('diagram.steps.2.moves.'))
    expect(drawn?.message).toMatch(/^Step 3, 4 passes to 3: 4 passes, but 2 has the ball\. \S/)
    const taken = await put(id, { ...BODY, name: 'Across again', draft: false }, 1)
    expect([taken.status, taken.body.draft, taken.body.version]).toEqual([200, false, 2])
    expect(await names()).toContain(id)
  })

  it('judges the counts on every rule set that it names', async () => {
    const slow = structuredClone(BODY)
    const runs = [0.45, 0.05, 0.45, 0.05, 0.45].map((x, beat) => ({
      kind: 'dribble' as const,
      who: '1' as const,
      to: { x, y: 0.7 },
      bend: 0,
      beat,
    }))
    slow.diagram.steps.splice(2, 0, { title: 'Up and down', moves: runs })
    const refused = await put(randomUUID(), { ...slow, rulePacks: ['fiba', 'nfhs84'] })
    expect(refused.status).toBe(400)
    expect(JSON.stringify(refused.body.errors)).toMatch(/\(FIBA\)[^"]*the count is 8/)
  })

  it('hands the present row to whoever changed an older one, and writes the history', async () => {
    const id = randomUUID()
    await put(id, { ...BODY, draft: true })
    await put(id, { ...BODY, call: 'Two', draft: true }, 1)
    const stale = await put(id, { ...BODY, call: 'Three', draft: true }, 1)
    expect([stale.status, stale.body.current.call, stale.body.current.version]).toEqual([412, 'Two', 2])
    expect((await put(id, { ...BODY, call: 'Three', draft: true })).status).toBe(409)
    const { body } = await scout.get(teamUrl(`/history?row=${id}`))
    expect((body.rows as { fields: { field: string }[] }[]).flatMap((line) => line.fields)).toEqual([
      { field: 'call', from: BODY.call, to: 'Two' },
    ])
  })

  it('does not take back a counter from the book by a half-finished edit', async () => {
    const [id = ''] = rows.counters
    const { version } = (await scout.get(at(id))).body
    expect((await put(id, { ...FAULTY, draft: true }, version)).status).toBe(409)
    expect(await names()).toContain(id)
  })
})

describe('archiving a counter', () => {
  it('takes it out of the book and the choices, and puts it back with its record', async () => {
    const id = rows.counters[2] ?? ''
    const before = (await scout.get(at(id))).body
    const archived = await scout.post(at(id, '/archive'))
    expect([archived.status, archived.body.version]).toEqual([200, before.version + 1])
    expect(archived.body.archivedAt).not.toBeNull()
    expect((await scout.post(at(id, '/archive'))).body.version).toBe(before.version + 1)
    expect(await names()).not.toContain(id)
    expect(await names('archived')).toEqual([id])
    const choices = (await scout.get(teamUrl(`/games/${rows.game}/choices`))).body
    expect(JSON.stringify(choices.choices)).not.toContain(id)
    const back = await scout.post(at(id, '/unarchive'))
    expect(back.body).toMatchObject({ archivedAt: null, record: before.record })
    expect(await names()).toContain(id)
  })

  it('refuses an older version', async () => {
    const id = rows.counters[3] ?? ''
    expect((await scout.post(at(id, '/archive')).set('If-Match', '"9"')).status).toBe(412)
  })
})

describe('walking a counter', () => {
  it('notes when, without a new version', async () => {
    const id = rows.counters[4] ?? ''
    const { version } = (await scout.get(at(id))).body
    const walked = await scout.post(at(id, '/walked'))
    expect(walked.body).toMatchObject({ version, walkedAt: test.context.clock().toISOString() })
  })
})

it('reads a stored drawing that a slip of the hand put out of bounds', async () => {
  const id = rows.counters[5] ?? ''
  const body = structuredClone(DEMO_COUNTERS[5]) as unknown as CounterBody
  for (const one of body.diagram.start.ours.slice(0, 1)) one.at.x = -0.3
  await test.context.db.manager.update(Counter, { id }, { body })
  const read = (await scout.get(at(id))).body
  expect(read.diagram.start.ours[0].at.x).toBe(-0.08)
})

import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Choices } from '@shared/choices/schemas'
import type { TeamRow } from '@shared/team/settings'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { newPossession } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let rows: Fixture
let head: Agent
const url = teamUrl('/settings')
const read = async () => (await head.get(url)).body as TeamRow
const body = ({ id: _id, version: _version, ...rest }: TeamRow) => rest
const put = (row: TeamRow, more: object, version = row.version) =>
  head
    .put(url)
    .set('If-Match', `"${version}"`)
    .send({ ...body(row), ...more })

beforeAll(async () => {
  test = await startTestApp()
  rows = await makeFixture(test)
  head = await test.as('head')
  for (let number = 2; number <= 12; number += 1)
    await newPossession(head, rows.scoutedGame, { number, leftOpen: ['middle'] })
}, 60_000)
afterAll(() => test.stop())

describe('what a head coach sets', () => {
  it('starts from the defaults', async () => {
    expect((await read()).settings).toEqual({ attachSheet: false, figures: {}, ownCourt: null })
  })

  it('is kept, counted up, told in the history, and the same again changes nothing', async () => {
    const before = await read()
    const answer = await put(before, { squadName: 'U18 girls', settings: { attachSheet: true } })
    expect([answer.status, answer.headers['etag']]).toEqual([200, `"${before.version + 1}"`])
    expect(await read()).toMatchObject({
      squadName: 'U18 girls',
      settings: { attachSheet: true, figures: {} },
    })
    const again = await put(await read(), {})
    expect(again.body.version).toBe(before.version + 1)
    const history = (await head.get(teamUrl(`/history?row=${before.id}`))).body
    expect(history.rows?.at(-1)?.fields?.map(({ field }: { field: string }) => field)).toEqual([
      'squadName',
      'settings',
    ])
  })

  it('refuses a stale version with the present one, and none at all', async () => {
    const row = await read()
    const stale = await put(row, { name: 'Others' }, row.version - 1)
    expect([stale.status, stale.body.current.version]).toEqual([412, row.version])
    expect((await head.put(url).send(body(row))).status).toBe(428)
  })

  it('names the field that cannot be taken', async () => {
    const row = await read()
    const fields = async (settings: object) =>
      ((await put(row, { settings })).body.errors as { field: string }[]).map(({ field }) => field)
    expect(await fields({ figures: { strong: 9 } })).toEqual(['settings.figures.strong'])
    expect(await fields({ ownCourt: { length: 3 } })).toEqual(['settings.ownCourt.length'])
    expect(await fields({ ownCourt: { laneWidth: 6, width: 7 } })).toEqual(['settings.ownCourt.laneWidth'])
    expect((await put(row, { timeZone: 'Summer' })).body.errors[0].field).toBe('timeZone')
  })

  it('reaches the order: a rule that weighs nothing moves no estimate', async () => {
    const order = async () => (await head.get(teamUrl(`/games/${rows.game}/choices`))).body as Choices
    const weights = (choices: Choices) =>
      choices.choices.flatMap(({ reasons }) => reasons.map(({ weight }) => Math.abs(weight)))
    expect(Math.max(0, ...weights(await order()))).toBeGreaterThan(0)
    await put(await read(), {
      settings: { figures: { light: 0, medium: 0, strong: 0, baseRate: 5, baseTrips: 60 } },
    })
    const flat = await order()
    expect(weights(flat).every((weight) => weight === 0)).toBe(true)
    expect(flat.base.mean).toBeCloseTo(0.5, 5)
  })

  it('stays inside the team', async () => {
    const other = await test.as('otherHead')
    expect((await other.get(teamUrl('/settings', OTHER_TEAM))).body.settings.attachSheet).toBe(false)
    expect((await other.get(url)).status).toBe(404)
  })
})

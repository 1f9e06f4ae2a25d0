import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Change } from '@server/database/entities/Change'
import { Membership } from '@server/database/entities/Membership'
import type { ChangeRow } from '@shared/history/schemas'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let assistant: Agent
let own: Fixture
beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  assistant = await test.as('assistant')
  own = await makeFixture(test)
}, 60_000)
afterAll(() => test.stop())

const history = async (row: string) => {
  const { status, body } = await head.get(teamUrl(`/history?row=${row}`))
  return status === 200
    ? (body.rows as ChangeRow[]).map(({ action, who, fields }) => [action, who?.name, fields])
    : status
}

describe('the history of a still', () => {
  it('says who sent, changed and blurred it', async () => {
    const url = teamUrl(`/stills/${own.still}`)
    const ring = { x: 0.5, y: 0.5, rx: 0.1, ry: 0.1 }
    const marks = { version: 1, ring, shade: null, pass: null }
    const marked = await assistant
      .patch(url)
      .set('If-Match', '"1"')
      .send({ caption: 'Two at the ball', marks })
    expect(marked.status).toBe(200)
    const blurred = await head
      .post(`${url}/blur`)
      .set('If-Match', '"2"')
      .send({ regions: [{ x: 0.1, y: 0.1, w: 0.1, h: 0.1 }], facesLeft: 0 })
    expect(blurred.status).toBe(200)
    expect(await history(own.still)).toEqual([
      ['made', 'Test head', []],
      [
        'changed',
        'Test assistant',
        [
          { field: 'marks', from: { ...marks, ring: null }, to: marks },
          { field: 'caption', from: '', to: 'Two at the ball' },
        ],
      ],
      [
        'changed',
        'Test head',
        [
          { field: 'blurred', from: 0, to: 1 },
          { field: 'facesLeft', from: null, to: 0 },
        ],
      ],
    ])
    const theirs = await (await test.as('otherHead')).get(teamUrl(`/history?row=${own.still}`, OTHER_TEAM))
    expect(theirs.status).toBe(404)
  })

  it('goes with the still at once', async () => {
    await head.delete(teamUrl(`/possessions/${own.possession}/stills/${own.still}`)).expect(204)
    expect(await history(own.still)).toBe(404)
    expect(await test.context.db.manager.countBy(Change, { rowId: own.still })).toBe(0)
  })
})

describe('the history of a member', () => {
  it('says who gave which role, and who took somebody out', async () => {
    const { manager } = test.context.db
    const member = await manager.findOneByOrFail(Membership, { teamId: TEAM, role: 'assistant-coach' })
    await head
      .patch(teamUrl(`/members/${member.id}`))
      .set('If-Match', '"1"')
      .send({ role: 'head-coach', squadPlayerId: null })
      .expect(200)
    expect(await history(member.id)).toEqual([
      ['changed', 'Test head', [{ field: 'role', from: 'assistant-coach', to: 'head-coach' }]],
    ])
    await head.delete(teamUrl(`/members/${member.id}`)).expect(204)
    const lines = await manager.findBy(Change, { rowId: member.id })
    expect(lines.map(({ action, kind }) => [action, kind])).toEqual([
      ['changed', 'memberships'],
      ['deleted', 'memberships'],
    ])
  })
})

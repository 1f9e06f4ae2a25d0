import 'reflect-metadata'
import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { OTHER_TEAM, startTestApp, type TestApp } from '../support/testApp'

let test: TestApp
let rows: Fixture
beforeAll(async () => {
  test = await startTestApp()
  rows = await makeFixture(test)
})
afterAll(() => test.stop())

describe('the printed book', () => {
  it('comes as a PDF that the browser shows, to staff', async () => {
    const answer = await (
      await test.as('assistant')
    ).get(teamUrl(`/book.pdf?paper=letter&counters=${rows.counters[0]}`))
    expect(answer.status).toBe(200)
    expect(answer.type).toBe('application/pdf')
    expect(answer.headers['content-disposition']).toContain('inline')
    expect(
      Buffer.from(answer.body as Uint8Array)
        .subarray(0, 5)
        .toString('latin1'),
    ).toBe('%PDF-')
  })

  it('refuses players, strangers, unknown counters and what is no paper', async () => {
    const head = await test.as('head')
    expect((await (await test.as('player')).get(teamUrl('/book.pdf'))).status).toBe(403)
    expect((await head.get(`/api/teams/${OTHER_TEAM}/book.pdf`)).status).toBe(404)
    expect((await head.get(teamUrl(`/book.pdf?counters=${randomUUID()}`))).status).toBe(404)
    expect((await head.get(teamUrl('/book.pdf?counters=one'))).status).toBe(400)
    expect((await head.get(teamUrl('/book.pdf?paper=a3'))).status).toBe(400)
  })
})

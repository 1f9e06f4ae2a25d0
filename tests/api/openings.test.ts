import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { OpeningRow } from '@shared/sheets/handOut'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { freshSheet } from '../support/handOut'
import { PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let player: Agent
let sheet: string

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  player = await test.as('player')
  const { counters } = await seedBook(test)
  await seedSquad(head)
  sheet = await freshSheet(head, counters)
}, 60_000)
afterAll(() => test.stop())

const openings = async (): Promise<OpeningRow[]> =>
  (await head.get(teamUrl(`/sheets/${sheet}/openings`))).body.rows as OpeningRow[]

describe('openings', () => {
  it('say who, first and last, once a person, by page and by file alike', async () => {
    expect(await openings()).toEqual([])
    test.setNow(new Date('2026-03-18T10:00:00Z'))
    await player.get(teamUrl(`/sheets/${sheet}`))
    test.setNow(new Date('2026-03-18T18:30:00Z'))
    await player.get(teamUrl(`/sheets/${sheet}.pdf`))
    await head.get(teamUrl(`/sheets/${sheet}`))
    expect(await openings()).toMatchObject([
      {
        name: 'Test player',
        role: 'player',
        squadPlayerId: PLAYER,
        firstAt: '2026-03-18T10:00:00.000Z',
        lastAt: '2026-03-18T18:30:00.000Z',
      },
      { name: 'Test head', role: 'head-coach', squadPlayerId: null },
    ])
  })

  it('are for staff alone, and a refused look leaves no trace', async () => {
    const before = await openings()
    expect((await player.get(teamUrl(`/sheets/${sheet}/openings`))).status).toBe(403)
    expect((await (await test.as('otherHead')).get(teamUrl(`/sheets/${sheet}`))).status).toBe(404)
    expect((await player.get(teamUrl(`/sheets/${sheet}.pdf?paper=a3`))).status).toBe(400)
    expect(await openings()).toEqual(before)
  })
})

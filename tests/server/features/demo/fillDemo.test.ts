import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { GameRow } from '@shared/games/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import type { OpponentRow } from '@shared/opponents/schemas'
import { STATIONS } from '@shared/vocabulary'
import { DEMO_PASSWORD } from '@server/database/demo/people'
import { fillDemo } from '@server/features/demo/fillDemo.service'
import { startTestApp, type Agent, type TestApp } from '../../../support/testApp'

let test: TestApp
let maren: Agent
let team: string
let games: GameRow[]
const NOW = new Date('2026-03-17T09:42:00Z')

const signIn = async (name: string) => {
  const agent = request.agent(test.app)
  const answer = await agent
    .post('/api/session')
    .send({ email: `${name}@harrowcreek.example`, password: DEMO_PASSWORD })
  return { agent, team: answer.body.teams[0].id as string }
}
const rows = async <T>(path: string, agent = maren) =>
  (await agent.get(`/api/teams/${team}${path}`)).body.rows as T[]

beforeAll(async () => {
  test = await startTestApp({ now: NOW, empty: true })
  expect(await fillDemo(test.context)).toBe(true)
  ;({ agent: maren, team } = await signIn('maren'))
  games = await rows<GameRow>('/games')
}, 120_000)
afterAll(() => test.stop())

describe('the demo as a staff would find it', () => {
  it('has a game at every station', () => {
    expect(new Set(games.map(({ station }) => station))).toEqual(new Set(STATIONS.map(({ value }) => value)))
  })

  it('has three opponents with evidence, and every one of them a name for its press', async () => {
    const opponents = await rows<OpponentRow>('/opponents')
    const counted = opponents.filter(({ counts }) => counts.possessions >= 20)
    expect(counted.length).toBeGreaterThanOrEqual(3)
    for (const { counts } of counted) expect(counts.mostlyShape).not.toBeNull()
  })

  it('has handed a sheet out: numbered, some out, one back, opened by Nell, letters kept', async () => {
    const teach = games.find(({ station }) => station === 'teach') as GameRow
    const sheets = await rows<{ id: string; planNumber: number }>(`/games/${teach.id}/sheets`)
    expect(sheets.map(({ planNumber }) => planNumber)).toEqual([2, 1])
    const copies = await rows<{ number: number | null; place: string | null }>(
      `/sheets/${sheets[0]?.id}/copies`,
    )
    const papers = copies.filter(({ number }) => number !== null)
    expect(papers.map(({ place }) => place).sort()).toEqual([
      'back',
      'bag',
      'bag',
      'out',
      'out',
      'out',
      'out',
      'out',
    ])
    const openings = await rows<{ name: string }>(`/sheets/${sheets[0]?.id}/openings`)
    expect(openings.map(({ name }) => name)).toEqual(['Nell Tavish'])
    const { agent: nell } = await signIn('nell')
    expect((await rows<{ id: string }>('/sheets', nell)).map(({ id }) => id)).toContain(sheets[0]?.id)
  })

  it('has practised: live reps of the practice are in the book', async () => {
    const counters = await rows<CounterRow>('/counters')
    const first = counters.find(({ name }) => name === '1-4 across')
    expect(first?.practice.n).toBeGreaterThanOrEqual(10)
    expect(first?.liveReps).toBeGreaterThan(44)
  })

  it('is left alone the second time', async () => {
    expect(await fillDemo(test.context)).toBe(false)
  })
})

import { access } from 'node:fs/promises'
import { randomUUID } from 'node:crypto'
import request from 'supertest'
import sharp from 'sharp'
import { Not } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ENTITIES } from '@server/database/entities/all'
import { Counter } from '@server/database/entities/Counter'
import { Game } from '@server/database/entities/Game'
import { Person } from '@server/database/entities/Person'
import { Possession } from '@server/database/entities/Possession'
import { Rule } from '@server/database/entities/Rule'
import { ScoutedGame } from '@server/database/entities/ScoutedGame'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { Still } from '@server/database/entities/Still'
import { Team } from '@server/database/entities/Team'
import { Trap } from '@server/database/entities/Trap'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { loadDemo } from '@server/database/demo/load'
import { DEMO_PASSWORD, DEMO_PEOPLE, DEMO_SIGN_INS, DEMO_TIME_ZONE } from '@server/database/demo/people'
import { DEMO_RULES } from '@server/database/demo/rules'
import { demoScenario } from '@server/database/demo/scenario'
import { DEMO_SQUAD } from '@server/database/demo/squad'
import { DEMO_STILLS } from '@server/database/demo/stills'
import type { Choices } from '@shared/choices/schemas'
import type { GameRow } from '@shared/games/schemas'
import { PossessionRow } from '@shared/possessions/schemas'
import type { Evidence } from '@shared/tendencies/schemas'
import { LIMITS } from '@shared/limits'
import { readPdf } from '../../pdf/readPdf'
import { startTestApp, type Agent, type TestApp } from '../../../support/testApp'

const NOW = new Date('2026-03-17T09:42:00Z')
const scenario = demoScenario(NOW, DEMO_TIME_ZONE)
const trapsInScenario = scenario.possessions.flatMap(({ traps }) => (Array.isArray(traps) ? traps : []))

let test: TestApp
let filled: boolean
let maren: Agent
let team: string
let gulls: GameRow

const counts = async () => {
  const { manager } = test.context.db
  const entries = await Promise.all(
    ENTITIES.map(async (entity) => [(entity as { name: string }).name, await manager.count(entity)] as const),
  )
  return Object.fromEntries(entries.filter(([name]) => name !== 'StoredSession'))
}
const signIn = async (email: string) => {
  const agent = request.agent(test.app)
  const answer = await agent.post('/api/session').send({ email, password: DEMO_PASSWORD })
  return { agent, answer }
}
const url = (path: string) => `/api/teams/${team}${path}`

beforeAll(async () => {
  test = await startTestApp({ now: NOW, empty: true })
  filled = await loadDemo(test.context)
  const { agent, answer } = await signIn('maren@harrowcreek.example')
  maren = agent
  team = answer.body.teams[0].id
  const games = (await maren.get(url('/games'))).body.rows as GameRow[]
  gulls = games.find(({ station }) => station === 'choose') as GameRow
}, 120_000)
afterAll(() => test.stop())

describe('an empty database', () => {
  it('is filled with the whole scenario', async () => {
    expect(filled).toBe(true)
    const { manager } = test.context.db
    expect(await manager.count(Team)).toBe(2)
    expect(await manager.count(Person)).toBe(DEMO_PEOPLE.length)
    expect(await manager.count(SquadPlayer)).toBe(DEMO_SQUAD.length)
    expect(await manager.count(ScoutedGame)).toBe(scenario.scoutedGames.length)
    expect(await manager.count(Game)).toBe(scenario.games.length)
    expect(await manager.count(Possession)).toBe(scenario.possessions.length)
    expect(await manager.count(Trap)).toBe(trapsInScenario.length)
    for (const { id } of await manager.find(Team)) {
      expect(await manager.countBy(Counter, { teamId: id })).toBe(DEMO_COUNTERS.length)
      expect(await manager.countBy(Rule, { teamId: id })).toBe(DEMO_RULES.length)
    }
    const scouted = scenario.possessions.filter(({ scoutedGameKey }) => scoutedGameKey !== null)
    expect(scouted.length).toBeGreaterThanOrEqual(90)
    expect(scenario.scoutedGames.length).toBeGreaterThanOrEqual(4)
  })

  it('has every still as a real picture with its thumbnail', async () => {
    const stills = await test.context.db.manager.find(Still)
    expect(stills).toHaveLength(DEMO_STILLS.length)
    for (const still of stills) {
      const path = (size: 'full' | 'thumbnail') =>
        test.context.stillFiles.pathOf(still.teamId, still.id, size)
      const { width, height, format } = await sharp(path('full')).metadata()
      expect({ width, height, format }).toEqual({ width: still.width, height: still.height, format: 'jpeg' })
      expect(Math.max(width, height)).toBeLessThanOrEqual(LIMITS.stillEdge)
      await access(path('thumbnail'))
    }
  })

  it('takes nothing that the API would not: every row reads back whole', async () => {
    const lists = await Promise.all(
      [...(await test.context.db.manager.find(ScoutedGame))].map(
        async ({ id }) => (await maren.get(url(`/scouted-games/${id}/possessions`))).body.rows as unknown[],
      ),
    )
    for (const row of lists.flat()) expect(PossessionRow.safeParse(row).error?.issues).toBeUndefined()
  })

  it('has no row without its parent', async () => {
    expect(await test.context.db.query('PRAGMA foreign_key_check')).toEqual([])
  })

  it('is left alone the second time, also after somebody changed it', async () => {
    const before = await counts()
    expect(await loadDemo(test.context)).toBe(false)
    expect(await counts()).toEqual(before)
    const [rule] = await test.context.db.manager.find(Rule, { where: { teamId: Not(team) }, take: 1 })
    await test.context.db.manager.delete(Rule, { id: String(rule?.id) })
    const fewer = await counts()
    expect(fewer['Rule']).toBe((before['Rule'] ?? 0) - 1)
    expect(await loadDemo(test.context)).toBe(false)
    expect(await counts()).toEqual(fewer)
  })

  it('lets everybody in who is printed at start', async () => {
    expect(DEMO_SIGN_INS.map(({ email }) => email).sort()).toEqual(
      DEMO_PEOPLE.map(({ email }) => email).sort(),
    )
    for (const { email } of DEMO_SIGN_INS) expect((await signIn(email)).answer.status, email).toBe(201)
    const { answer } = await signIn('priya@harrowcreek.example')
    expect(answer.body.teams.map((one: { role: string }) => one.role)).toEqual([
      'assistant-coach',
      'assistant-coach',
    ])
  })
})

describe('the game at Choose', () => {
  it('has at least three counters in order, with reasons, each with a count behind it', async () => {
    expect(gulls.opponentName).toMatch(/Gulls/)
    const { choices, unknown, mostly, base } = (await maren.get(url(`/games/${gulls.id}/choices`)))
      .body as Choices
    expect(unknown).toBe(false)
    expect(mostly?.n).toBeGreaterThan(9)
    expect(base.n).toBeGreaterThan(0)
    expect(choices.length).toBeGreaterThanOrEqual(3)
    expect(choices.map(({ rank }) => rank)).toEqual(choices.map((_, index) => index + 1))
    const ready = choices.filter(({ gameReady }) => gameReady)
    const means = ready.map(({ expected }) => expected?.mean ?? Number.NaN)
    // Ties within .02 are ordered by what is new to the squad.
    means.slice(1).forEach((mean, index) => expect(mean).toBeLessThanOrEqual((means[index] ?? 0) + 0.02))
    for (const { reasons, expected } of choices.slice(0, 3)) {
      expect(reasons.length).toBeGreaterThan(0)
      expect(expected?.interval.low).toBeLessThan(expected?.mean ?? 0)
      for (const { habitKey, k, n, because } of reasons) {
        expect(because).toMatch(/^[A-Z].*\.$/)
        if (habitKey !== null) {
          const evidence = `/opponents/${gulls.opponentId}/evidence?habit=${habitKey}&limit=200`
          const { rows, total } = (await maren.get(url(evidence))).body as Evidence
          expect([habitKey, rows.filter(({ counted }) => counted).length, total]).toEqual([habitKey, k, n])
        }
      }
    }
  })

  it('puts 1-4 across first against the Gulls', async () => {
    const { choices } = (await maren.get(url(`/games/${gulls.id}/choices`))).body as Choices
    const counters = (await maren.get(url('/counters'))).body.rows as { id: string; name: string }[]
    expect(counters.find(({ id }) => id === choices[0]?.counterId)?.name).toBe('1-4 across')
  })

  it('puts 1-4 across first and keeps Box among the first three, and leaves Middle three out by rule 10', async () => {
    const { choices, leftOut } = (await maren.get(url(`/games/${gulls.id}/choices`))).body as Choices
    const { manager } = test.context.db
    const nameOf = async (id: string) => (await manager.findOneByOrFail(Counter, { id })).name
    const names = await Promise.all(choices.map(({ counterId }) => nameOf(counterId)))
    expect(names[0]).toBe('1-4 across')
    expect(names.slice(0, 3)).toContain('Box, big in the middle')
    expect(names).not.toContain('Middle three')
    const out = await Promise.all(
      leftOut.map(async ({ counterId, ruleId }) => {
        const rule = ruleId === null ? null : await manager.findOneByOrFail(Rule, { id: ruleId })
        return [await nameOf(counterId), rule?.number ?? null]
      }),
    )
    expect(out).toContainEqual(['Middle three', 10])
    // What we have hardly run stands last, whatever speaks for it.
    expect(choices.slice(-3).map(({ gameReady }) => gameReady)).toEqual([false, false, false])
  })

  it('can be signed off as it stands, and both papers are one page without a last name', async () => {
    const { choices } = (await maren.get(url(`/games/${gulls.id}/choices`))).body as Choices
    const [planId, sheetId] = [randomUUID(), randomUUID()]
    const plan = url(`/games/${gulls.id}/plan`)
    const picks = {
      id: planId,
      firstCallId: choices[0]?.counterId,
      changeUpId: choices[1]?.counterId,
      keys: ['Don’t catch in the corner.'],
    }
    expect((await maren.put(plan).send(picks)).status).toBe(201)
    const signed = await maren.post(`${plan}/sign-off`).set('If-Match', '"1"').send({ planId, sheetId })
    expect(signed.status).toBe(200)
    const view = (await maren.get(url(`/sheets/${sheetId}`))).body
    expect(view.content.press.lines).toHaveLength(3)
    expect(view.budget.over).toBe(false)
    const { agent: nell } = await signIn('nell@harrowcreek.example')
    for (const agent of [maren, nell])
      for (const paper of ['a4', 'letter']) {
        const answer = await agent.get(url(`/sheets/${sheetId}.pdf?paper=${paper}`)).buffer(true)
        expect(answer.status).toBe(200)
        const { info, text } = readPdf(answer.body as Buffer)
        expect(info.get('Pages')).toBe('1')
        expect(text).toContain('Don’t catch in the corner.')
        const told = DEMO_SQUAD.filter(({ lastName }) => text.includes(lastName ?? ''))
        expect(told).toEqual([])
      }
    expect((await maren.get(url(`/games/${gulls.id}`))).body.station).toBe('teach')
  }, 60_000)
})

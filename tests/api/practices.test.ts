import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import type { PracticeInput, ScriptProposal } from '@shared/practices/schemas'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { faultsIn, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let assistant: Agent
let counters: string[]
let game: string
let script: ScriptProposal['script']

beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
  assistant = await test.as('assistant')
  counters = (await seedBook(test)).counters
  await seedSquad(head)
  const opponent = await newOpponent(head)
  const scouted = await newScoutedGame(head, opponent)
  const shapes = ['1-2-1-1', '1-2-1-1', '1-2-1-1', '2-2-1', 'dropped-back', 'dropped-back'] as const
  for (const [at, shape] of shapes.entries())
    await newPossession(head, scouted, {
      number: at + 1,
      shape,
      ...(shape === 'dropped-back' ? { pickup: null, traps: [] } : {}),
    })
  game = await newGame(head, opponent)
}, 60_000)
beforeEach(async () => {
  script = (await proposal()).script
})
afterAll(() => test.stop())

const proposal = async (query = ''): Promise<ScriptProposal> =>
  (await assistant.get(teamUrl(`/games/${game}/script?${query}`))).body as ScriptProposal
const body = (reps: PracticeInput['reps'] = []): PracticeInput => ({
  gameId: game,
  startsAt: '2026-03-19T17:30:00.000Z',
  script,
  reps,
})
const put = (id: string, sent: object, version?: number, agent = assistant) => {
  const request = agent.put(teamUrl(`/practices/${id}`))
  if (version !== undefined) void request.set('If-Match', `"${version}"`)
  return request.send(sent)
}
const counter = async (id = counters[0]) => (await head.get(teamUrl(`/counters/${id}`))).body

describe('the script that is proposed', () => {
  it('is shared out by what was counted', async () => {
    const { counted, script: shared } = await proposal('minutes=40')
    expect(counted).toBe(6)
    expect(shared.looks.map(({ shape, k, n }) => [shape, k, n])).toEqual([
      ['1-2-1-1', 3, 6],
      ['dropped-back', 2, 6],
      ['2-2-1', 1, 6],
    ])
    expect(shared.parts.reduce((sum, part) => sum + part.minutes, 0)).toBe(40)
  })

  it('says who is out that day and who is just back', async () => {
    const { manager } = test.context.db
    const until = (firstName: string, outUntil: string | null) =>
      manager.update(SquadPlayer, { teamId: TEAM, firstName }, { outUntil })
    await until('P6', '2026-03-19')
    await until('P7', '2026-03-18')
    const { script: shared } = await proposal('startsAt=2026-03-19T17:30:00Z')
    expect(shared.cautions.map(({ title }) => title)).toEqual(['One is out.', 'Short turns.'])
    expect(JSON.stringify(shared.cautions)).not.toContain('Secretname')
    await until('P6', null)
    await until('P7', null)
  })

  it('takes no minutes that make no practice', async () => {
    const answer = await assistant.get(teamUrl(`/games/${game}/script?minutes=5`))
    expect([answer.status, Object.keys(faultsIn(answer.body))]).toEqual([400, ['minutes']])
  })
})

describe('a practice', () => {
  it('is written, repeated, changed with its version, listed by game, thrown away and put back', async () => {
    const id = randomUUID()
    expect((await put(id, body())).status).toBe(201)
    expect((await put(id, body())).status).toBe(200)
    const reps = [{ counterId: counters[0] ?? '', shape: null, kind: 'live' as const, n: 4, k: 3 }]
    expect((await put(id, body(reps))).status).toBe(409)
    expect((await put(id, body(reps), 1)).body).toMatchObject({ version: 2, reps })
    expect((await put(id, body(), 1)).status).toBe(412)
    const list = async () =>
      (await head.get(teamUrl(`/games/${game}/practices`))).body.rows as { id: string }[]
    expect((await list()).map((row) => row.id)).toContain(id)
    expect((await assistant.delete(teamUrl(`/practices/${id}`))).status).toBe(204)
    expect((await list()).map((row) => row.id)).not.toContain(id)
    expect((await assistant.get(teamUrl(`/practices/${id}`))).status).toBe(404)
    expect((await assistant.post(teamUrl(`/practices/${id}/restore`))).body.reps).toEqual(reps)
    expect((await list()).map((row) => row.id)).toContain(id)
    await assistant.delete(teamUrl(`/practices/${id}`))
  })

  it('names the field that cannot be taken', async () => {
    const of = (reps: object[]) => body(reps as PracticeInput['reps'])
    const line = { counterId: counters[0], shape: null, kind: 'live', n: 4, k: 3 }
    for (const [sent, field] of [
      [of([{ ...line, k: 5 }]), 'reps.0.k'],
      [of([{ ...line, kind: 'walk' }]), 'reps.0.k'],
      [of([line, line]), 'reps.1.kind'],
      [{ ...body(), startsAt: 'Thursday' }, 'startsAt'],
    ] as const)
      expect(Object.keys(faultsIn((await put(randomUUID(), sent)).body))).toContain(field)
    expect((await put(randomUUID(), of([{ ...line, counterId: randomUUID() }]))).status).toBe(404)
  })

  it('is for staff of the team', async () => {
    const id = randomUUID()
    await put(id, body())
    expect((await put(id, body(), 1, await test.as('player'))).status).toBe(403)
    expect((await (await test.as('otherHead')).get(teamUrl(`/practices/${id}`, OTHER_TEAM))).status).toBe(404)
    expect((await test.anonymous().get(teamUrl(`/practices/${id}`))).status).toBe(401)
  })
})

describe('reps that were run', () => {
  it('add to the counter’s live reps and practice record, in library and choices, and go with the practice', async () => {
    const before = await counter()
    const id = randomUUID()
    const line = { counterId: counters[0] ?? '', n: 6 }
    const reps: PracticeInput['reps'] = [
      { ...line, shape: '2-2-1', kind: 'live', k: 4 },
      { ...line, shape: null, kind: 'live', k: null },
      { ...line, shape: null, kind: 'overload', k: 6 },
      { ...line, shape: null, kind: 'walk' },
    ]
    await put(id, body(reps))
    const after = await counter()
    expect(after.liveReps).toBe(before.liveReps + 12)
    expect(after.practice).toEqual({ k: before.practice.k + 4, n: before.practice.n + 6 })
    expect(after.logged).toEqual({ n: 12, counted: 6, k: 4 })
    const again = await put(id, body([{ ...line, shape: null, kind: 'live', n: 2, k: 2 }]), 1)
    expect(again.status).toBe(200)
    expect((await counter()).liveReps).toBe(before.liveReps + 2)
    await assistant.delete(teamUrl(`/practices/${id}`))
    expect(await counter()).toEqual(before)
  })

  it('make a counter ready for a game once ten were run live', async () => {
    const id = randomUUID()
    const ready = async (counterId: string) =>
      (await head.get(teamUrl(`/games/${game}/choices`))).body.choices.find(
        (choice: { counterId: string }) => choice.counterId === counterId,
      )?.gameReady as boolean | undefined
    const rows = (await head.get(teamUrl('/counters'))).body.rows as { id: string; liveReps: number }[]
    const green = rows.find(({ liveReps }) => liveReps < 10)
    if (!green) throw new Error('every counter of the book is ready')
    const was = await ready(green.id)
    await put(id, body([{ counterId: green.id, shape: null, kind: 'live', n: 10, k: 7 }]))
    if (was !== undefined) expect([was, await ready(green.id)]).toEqual([false, true])
    expect((await counter(green.id)).liveReps).toBe(green.liveReps + 10)
  })
})

import { randomUUID } from 'node:crypto'
import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { CounterFile, CounterPreview, readCounter } from '@shared/counters/counterFile'
import { CounterDraft } from '@shared/counters/schemas'
import { Reading } from '@shared/court/edit/reading'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'
import { seedBook, teamUrl } from '../support/fixture'

let test: TestApp
let scout: Agent
let book: string[]

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('both')
  book = (await seedBook(test)).counters
}, 60_000)
afterAll(() => test.stop())

const preview = (body: object, team?: string) => scout.post(teamUrl('/counters/preview', team)).send(body)
const file = async (): Promise<CounterFile> =>
  CounterFile.parse((await scout.get(teamUrl(`/counters/${book[0]}/export.json`))).body)

describe('a counter as a file', () => {
  it('goes out without what only its team has done, and comes in elsewhere the same', async () => {
    const answer = await scout.get(teamUrl(`/counters/${book[0]}/export.json`))
    expect(answer.headers['content-disposition']).toBe('attachment; filename=1-4-across.json')
    expect(Object.keys(answer.body.counter)).not.toContain('liveReps')
    const seen = CounterPreview.parse((await preview(answer.body, OTHER_TEAM)).body)
    expect([seen.mended, seen.faults]).toEqual([[], []])
    expect(seen.counter).toMatchObject(answer.body.counter)
    expect(seen.counter.liveReps).toBe(0)
    const id = randomUUID()
    const kept = await scout.put(teamUrl(`/counters/${id}`, OTHER_TEAM)).send(seen.counter)
    expect(kept.status).toBe(201)
  })

  it('is looked at and not kept', async () => {
    const before = (await scout.get(teamUrl('/counters?show=all'))).body.total
    await preview(await file())
    expect((await scout.get(teamUrl('/counters?show=all'))).body.total).toBe(before)
  })

  it('is mended where that is safe, and says so; its faults stand beside', async () => {
    const raw = structuredClone(await file())
    raw.counter.name = 'N'.repeat(50)
    const [step] = raw.counter.diagram.steps
    if (step) step.title = ''
    for (const one of raw.counter.diagram.start.ours.slice(0, 1)) one.at.y = 1.3
    raw.counter.diagram.start.ball = '1'
    const { body } = await preview(raw)
    expect(body.counter.name).toHaveLength(40)
    expect(body.mended).toHaveLength(3)
    expect(body.mended.join(' ')).toMatch(/cut to 40.*Step 1 had no title|Step 1 had no title.*cut to 40/)
    expect(body.faults.length).toBeGreaterThan(0)
  })

  it.each([
    ['a newer version', (raw: CounterFile) => ({ ...raw, version: 2 }), 'version'],
    ['four of ours', (raw: CounterFile) => (raw.counter.diagram.start.ours.pop(), raw), 'diagram.start.ours'],
    [
      'a move that is none',
      (raw: CounterFile) => {
        const moves: object[] = raw.counter.diagram.steps[1]?.moves ?? []
        moves[0] = { kind: 'jump', who: '1' }
        return raw
      },
      'diagram.steps.1.moves.0',
    ],
  ])('is refused for %s, with the place', async (_what, spoil, field) => {
    const answer = await preview(spoil(structuredClone(await file())))
    expect(answer.status).toBe(400)
    expect(answer.body.errors.map((error: { field: string }) => error.field)).toContain(field)
  })
})

describe('any JSON', () => {
  const taken = (raw: unknown): boolean => {
    const reading = new Reading()
    const counter = readCounter(raw, reading)
    if (!counter) return reading.refused.length > 0
    return CounterDraft.safeParse(counter).success && reading.refused.length === 0
  }

  it('is mended or refused with a reason, never a crash', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (raw) => taken(raw)),
      { numRuns: 300 },
    )
  })

  it('also when it is a counter with any one of its values spoilt', () => {
    const paths: (string | number)[][] = []
    const walk = (value: unknown, path: (string | number)[]) => {
      paths.push(path)
      if (typeof value !== 'object' || value === null) return
      for (const [key, inner] of Object.entries(value))
        walk(inner, [...path, Array.isArray(value) ? Number(key) : key])
    }
    const { key: _key, ...good } = DEMO_COUNTERS[0] ?? { key: '' }
    walk(good, [])
    fc.assert(
      fc.property(fc.constantFrom(...paths.slice(1)), fc.jsonValue(), (path, value) => {
        const raw = structuredClone(good)
        let inside = raw as unknown as Record<string | number, unknown>
        for (const part of path.slice(0, -1)) inside = inside[part] as Record<string | number, unknown>
        inside[path.at(-1) ?? ''] = value
        return taken(raw)
      }),
      { numRuns: 400 },
    )
  })
})

import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Change } from '@server/database/entities/Change'
import type { ChangeRow } from '@shared/history/schemas'
import type { PossessionRow } from '@shared/possessions/schemas'
import { teamUrl } from '../support/fixture'
import { faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
const hoursLater = (hours: number) => new Date(START.getTime() + hours * 3_600_000)

let test: TestApp
let scout: Agent
let ids: string[]

beforeEach(async () => {
  test = await startTestApp({ now: START })
  scout = await test.as('assistant')
  const game = await newScoutedGame(scout, await newOpponent(scout))
  ids = []
  for (const [index, tookAway] of [[], [], ['middle'], []].entries())
    ids.push(await newPossession(scout, game, { number: index + 4, tookAway: tookAway as ['middle'] }))
})
afterEach(() => test.stop())

const rows = (version = 1) => ids.map((id) => ({ id, version }))
const send = (body: object, agent = scout) => agent.post(teamUrl('/possessions/batch')).send(body)
const undo = (batchId: string) => scout.post(teamUrl(`/possessions/batch/${batchId}/undo`))
const change = (more: object = {}) => ({
  batchId: randomUUID(),
  rows: rows(),
  field: 'tookAway',
  from: [],
  to: ['pass-back'],
  ...more,
})
const get = async (id: string | undefined) =>
  (await scout.get(teamUrl(`/possessions/${id}`))).body as PossessionRow
const history = async (id: string | undefined) =>
  (await scout.get(teamUrl(`/history?row=${id}`))).body.rows as ChangeRow[]
const patch = (id: string | undefined, version: number, body: object) =>
  scout
    .patch(teamUrl(`/possessions/${id}`))
    .set('If-Match', `"${version}"`)
    .send(body)

describe('changing many rows', () => {
  it('changes those that hold the old value and tells the others', async () => {
    const body = change()
    const answer = await send(body)
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual({
      batchId: body.batchId,
      changed: [ids[0], ids[1], ids[3]].map((id) => ({ id, version: 2 })),
      already: [],
      leftOut: [{ id: ids[2], number: 6, why: 'other-value' }],
    })
    expect((await get(ids[0])).tookAway).toEqual(['pass-back'])
    expect((await get(ids[2])).tookAway).toEqual(['middle'])
  })

  it('is one line in the history of each row, and one line of what happened', async () => {
    const body = change()
    await send(body)
    const [, line, ...more] = await history(ids[0])
    expect(more).toEqual([])
    expect(line).toMatchObject({
      action: 'changed',
      batchId: body.batchId,
      fields: [{ field: 'tookAway', from: [], to: ['pass-back'] }],
    })
    const news = (await scout.get(teamUrl('/changes'))).body.rows as { batchId: string; rows: number }[]
    expect(news.filter(({ batchId }) => batchId === body.batchId).map((entry) => entry.rows)).toEqual([3])
  })

  it('sent again changes nothing', async () => {
    const body = change()
    await send(body)
    const again = await send(body)
    expect(again.status).toBe(200)
    expect(again.body.changed).toEqual([])
    expect(again.body.already.sort()).toEqual([ids[0], ids[1], ids[3]].sort())
    expect((await get(ids[0])).version).toBe(2)
    expect(await history(ids[0])).toHaveLength(2)
  })

  it('leaves out a row that was changed or deleted since it was read', async () => {
    await patch(ids[0], 1, { passes: 4 })
    await scout.delete(teamUrl(`/possessions/${ids[1]}`))
    const { changed, leftOut } = (await send(change())).body
    expect(changed).toEqual([{ id: ids[3], version: 2 }])
    expect(leftOut).toEqual([
      { id: ids[0], number: 4, why: 'changed-since' },
      { id: ids[1], number: 5, why: 'deleted' },
      { id: ids[2], number: 6, why: 'other-value' },
    ])
  })

  it('names the row and field that would not be sound, and changes none', async () => {
    await patch(ids[3], 1, { shape: '1-2-1-1', shapeVariant: null, traps: null, pickup: null })
    const body = change({
      rows: [...rows().slice(0, 3), { id: ids[3], version: 2 }],
      field: 'shape',
      from: '1-2-1-1',
      to: 'dropped-back',
    })
    const answer = await send(body)
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toMatchObject({
      'rows.0.pickup': 'No. 4: Pick-up is asked only when they press. Take it out.',
      'rows.2.traps': 'No. 6: They did not press here. Take the traps out or change the shape.',
    })
    expect((await get(ids[3])).shape).toBe('1-2-1-1')
    expect(await test.context.db.manager.countBy(Change, { batchId: body.batchId })).toBe(0)
  })

  it('says which of its own fields cannot be taken', async () => {
    const fields = async (more: object) => Object.keys(faultsIn((await send(change(more))).body))
    expect(await fields({ to: ['roof'] })).toEqual(['to.0'])
    expect(await fields({ from: undefined })).toEqual(['from'])
    expect(await fields({ to: [] })).toEqual(['to'])
    expect(await fields({ field: 'number' })).toEqual(['field'])
    expect(await fields({ rows: [] })).toEqual(['rows'])
    expect(await fields({ rows: [...rows(), ...rows().slice(0, 1)] })).toEqual(['rows'])
    const tooMany = Array.from({ length: 201 }, () => ({ id: randomUUID(), version: 1 }))
    expect(await fields({ rows: tooMany })).toEqual(['rows'])
  })

  it('does not reach into another team, by row or by batch', async () => {
    const theirs = await test.as('otherHead')
    const opponent = await newOpponent(theirs, 'Theirs', OTHER_TEAM)
    const game = await newScoutedGame(theirs, opponent, {}, OTHER_TEAM)
    const foreign = await newPossession(theirs, game, { tookAway: [] }, OTHER_TEAM)
    const smuggled = await send(change({ rows: [...rows(), { id: foreign, version: 1 }] }))
    expect(smuggled.status).toBe(404)
    expect((await get(ids[0])).version).toBe(1)
    const body = change()
    await send(body)
    const url = teamUrl(`/possessions/batch/${body.batchId}/undo`, OTHER_TEAM)
    expect((await theirs.post(url)).status).toBe(404)
    expect((await send(change(), await test.as('player'))).status).toBe(403)
  })
})

describe('putting many rows back', () => {
  it('gives each what it held, as a new line of its history; again changes nothing', async () => {
    const body = change()
    await send(body)
    test.setNow(hoursLater(23))
    const back = await undo(body.batchId)
    expect(back.status).toBe(200)
    expect(back.body.changed).toHaveLength(3)
    expect((await get(ids[0])).tookAway).toEqual([])
    expect((await history(ids[0])).map(({ action }) => action)).toEqual(['made', 'changed', 'changed'])
    const again = await undo(body.batchId)
    expect([again.body.changed.length, again.body.already.length]).toEqual([0, 3])
    expect((await get(ids[0])).version).toBe(3)
  })

  it('leaves what was changed since, and tells it', async () => {
    const body = change()
    await send(body)
    await patch(ids[0], 2, { tookAway: ['sideline'] })
    await patch(ids[1], 2, { passes: 2 })
    await scout.delete(teamUrl(`/possessions/${ids[3]}`))
    const { changed, leftOut } = (await undo(body.batchId)).body
    expect(changed).toEqual([{ id: ids[1], version: 4 }])
    expect(leftOut).toEqual([
      { id: ids[0], number: 4, why: 'changed-since' },
      { id: ids[3], number: 7, why: 'deleted' },
    ])
    expect(await get(ids[1])).toMatchObject({ tookAway: [], passes: 2 })
  })

  it('leaves a row that would no longer be sound', async () => {
    const body = change({ field: 'pickup', from: 'full', to: null, rows: rows().slice(0, 1) })
    await send(body)
    await patch(ids[0], 2, { shape: 'dropped-back', traps: [] })
    const { leftOut } = (await undo(body.batchId)).body
    expect(leftOut).toEqual([{ id: ids[0], number: 4, why: 'does-not-fit' }])
  })

  it('is refused after a day, and for a batch that nobody made', async () => {
    const body = change()
    await send(body)
    test.setNow(hoursLater(24.1))
    expect((await undo(body.batchId)).status).toBe(409)
    expect((await undo(randomUUID())).status).toBe(404)
  })
})

describe('putting one line back', () => {
  const putBack = (id: string | undefined, version: number | null, body: object) => {
    const sent = scout.post(teamUrl(`/possessions/${id}/put-back`))
    return version === null ? sent.send(body) : sent.set('If-Match', `"${version}"`).send(body)
  }
  const lineOf = async (id: string | undefined) => (await history(id)).at(-1)?.id

  it('brings the old value back and leaves the rest, also for traps', async () => {
    const { traps } = await get(ids[0])
    await patch(ids[0], 1, { passes: 4, traps: [] })
    const changeId = await lineOf(ids[0])
    const back = await putBack(ids[0], 2, { changeId, field: 'traps' })
    expect(back.status).toBe(200)
    expect(back.headers.etag).toBe('"3"')
    expect(back.body).toMatchObject({ passes: 4, traps, version: 3 })
    const again = await putBack(ids[0], 3, { changeId, field: 'traps' })
    expect([again.status, again.body.version]).toEqual([200, 3])
  })

  it('asks for the version, and refuses a stale one with the present row', async () => {
    await patch(ids[0], 1, { passes: 4 })
    const changeId = await lineOf(ids[0])
    expect((await putBack(ids[0], null, { changeId, field: 'passes' })).status).toBe(428)
    const stale = await putBack(ids[0], 1, { changeId, field: 'passes' })
    expect(stale.status).toBe(412)
    expect(stale.body.current).toMatchObject({ version: 2, passes: 4 })
  })

  it('knows only lines of this row, and fields of this line', async () => {
    await patch(ids[0], 1, { passes: 4 })
    const changeId = await lineOf(ids[0])
    expect((await putBack(ids[1], 1, { changeId, field: 'passes' })).status).toBe(404)
    const other = await putBack(ids[0], 2, { changeId, field: 'points' })
    expect(other.status).toBe(400)
    expect(Object.keys(faultsIn(other.body))).toEqual(['field'])
  })

  it('does not bring back what no longer fits the row', async () => {
    await patch(ids[0], 1, { pickup: null })
    const changeId = await lineOf(ids[0])
    await patch(ids[0], 2, { shape: 'dropped-back', traps: [] })
    const answer = await putBack(ids[0], 3, { changeId, field: 'pickup' })
    expect([answer.status, Object.keys(faultsIn(answer.body))]).toEqual([400, ['pickup']])
  })
})

import { randomUUID } from 'node:crypto'
import { readFile, readdir } from 'node:fs/promises'
import { join } from 'node:path'
import sharp from 'sharp'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Still } from '@server/database/entities/Still'
import { LIMITS } from '@shared/limits'
import { jpeg, teamUrl } from '../support/fixture'
import { newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let scoutedGame: string
let possession: string
let still: string

const address = (id = still, of = possession) => teamUrl(`/possessions/${of}/stills/${id}`)
const send = (bytes: Buffer, id = still, of = possession) =>
  scout.put(address(id, of)).attach('still', bytes, 'a.jpg')
const stillsOf = async (of = possession) =>
  (await scout.get(teamUrl(`/possessions/${of}`))).body.stills as { id: string; position: number }[]

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  scoutedGame = await newScoutedGame(scout, await newOpponent(scout))
})
afterAll(() => test.stop())
beforeEach(async () => {
  possession = await newPossession(scout, scoutedGame)
  still = randomUUID()
})

describe('one id, one picture', () => {
  it('the same still twice is 201, then 200, and one row', async () => {
    const bytes = await jpeg()
    const [first, again] = [await send(bytes), await send(bytes)]
    expect([first.status, again.status]).toEqual([201, 200])
    expect(again.body).toEqual(first.body)
    expect(await stillsOf()).toHaveLength(1)
  })

  it('another picture, caption, time or possession under the same id is 409', async () => {
    const bytes = await jpeg()
    await send(bytes)
    expect((await send(await jpeg(641, 360))).status).toBe(409)
    const captioned = scout.put(address()).field('caption', 'new').attach('still', bytes, 'a.jpg')
    expect((await captioned).status).toBe(409)
    expect((await scout.put(address()).field('t', '2').attach('still', bytes, 'a.jpg')).status).toBe(409)
    expect((await send(bytes, still, await newPossession(scout, scoutedGame))).status).toBe(409)
    const kept = await scout.get(teamUrl(`/stills/${still}`)).buffer(true)
    expect((await sharp(kept.body as Buffer).metadata()).width).toBe(640)
  })

  it('an id of another team’s still is 404 and stays theirs', async () => {
    const both = await test.as('both')
    const theirs = await newPossession(
      both,
      await newScoutedGame(both, await newOpponent(both, 'Lowmoor', OTHER_TEAM), {}, OTHER_TEAM),
      {},
      OTHER_TEAM,
    )
    const url = teamUrl(`/possessions/${theirs}/stills/${still}`, OTHER_TEAM)
    expect((await both.put(url).attach('still', await jpeg(), 'a.jpg')).status).toBe(201)
    expect((await send(await jpeg())).status).toBe(404)
    expect(await test.context.db.manager.countBy(Still, { id: still, teamId: OTHER_TEAM })).toBe(1)
  })

  it('the same still sent eight times at once is created once', async () => {
    const bytes = await jpeg()
    const answers = await Promise.all(Array.from({ length: 8 }, () => send(bytes)))
    expect(answers.map(({ status }) => status).sort()).toEqual([...Array(7).fill(200), 201])
    expect(await stillsOf()).toMatchObject([{ id: still, position: 1 }])
  })

  it('of eight pictures sent at once under one id, one is kept, and its file is its own', async () => {
    const widths = [100, 110, 120, 130, 140, 150, 160, 170]
    const pictures = await Promise.all(widths.map((width) => jpeg(width, 90)))
    const answers = await Promise.all(pictures.map((bytes) => send(bytes)))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, ...Array(7).fill(409)])
    const won = answers.find(({ status }) => status === 201)
    const path = test.context.stillFiles.pathOf(TEAM, still, 'full')
    expect((await sharp(await readFile(path)).metadata()).width).toBe(won?.body.width)
  })
})

describe('how many', () => {
  const fill = async (count: number) => {
    const bytes = await jpeg(40, 30)
    for (let index = 0; index < count; index++) await send(bytes, randomUUID())
  }

  it('the 25th is 409 and leaves no file; after one is deleted there is room again', async () => {
    await fill(LIMITS.stillsAPossession)
    const before = await readdir(join(test.dataDir, 'stills', TEAM))
    const refused = await send(await jpeg())
    expect(refused.status).toBe(409)
    expect(refused.body.detail).toBe('A possession holds 24 stills and these are there. Delete one first.')
    expect(await readdir(join(test.dataDir, 'stills', TEAM))).toEqual(before)
    const [first] = await stillsOf()
    await scout.delete(address(first?.id))
    expect((await send(await jpeg())).body.position).toBe(25)
  })

  it('four at once for the last place: one gets it', async () => {
    await fill(LIMITS.stillsAPossession - 1)
    const bytes = await jpeg(50, 40)
    const ids = Array.from({ length: 4 }, () => randomUUID())
    const answers = await Promise.all(ids.map((id) => send(bytes, id)))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409])
    expect(await stillsOf()).toHaveLength(LIMITS.stillsAPossession)
    const names = (await readdir(join(test.dataDir, 'stills', TEAM))).filter((name) =>
      ids.some((id) => name.startsWith(id)),
    )
    expect(names).toHaveLength(2)
  })
})

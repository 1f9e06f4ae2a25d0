import { access, readdir, readFile } from 'node:fs/promises'
import { randomUUID } from 'node:crypto'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Still } from '@server/database/entities/Still'
import { Trap } from '@server/database/entities/Trap'
import { purgeDeleted } from '@server/features/deletion/purge.service'
import { deleteStill } from '@server/features/stills/stills.service'
import { jpeg, possessionBody, teamUrl } from '../support/fixture'
import { listed, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

const NOTE = 'Their captain limps on the left ankle zq7'
const CAPTION = 'number 12 down by the bench zq8'
const START = new Date('2026-03-17T09:42:00Z')
const later = (minutes: number, seconds = 0) => new Date(START.getTime() + minutes * 60_000 + seconds * 1000)

let test: TestApp
let scout: Agent
let opponent: string
let scoutedGame: string
let id: string
let still: string

const address = () => teamUrl(`/possessions/${id}`)
const get = (path: string) => scout.get(teamUrl(path))

beforeEach(async () => {
  test = await startTestApp({ now: START })
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
  scoutedGame = await newScoutedGame(scout, opponent)
  await newPossession(scout, scoutedGame, { number: 1, shape: '2-2-1' })
  id = await newPossession(scout, scoutedGame, { number: 2, note: NOTE, pickup: null })
  still = randomUUID()
  await scout
    .put(`${address()}/stills/${still}`)
    .field('caption', CAPTION)
    .attach('still', await jpeg(), 'a.jpg')
})
afterEach(() => test.stop())

const purge = (now: Date) => purgeDeleted(test.context.db, test.context.stillFiles, now)

describe('a deleted possession', () => {
  it('is out of every list and count', async () => {
    const game = await newGame(scout, opponent)
    expect((await scout.delete(address())).status).toBe(204)
    expect((await scout.get(address())).status).toBe(404)
    expect((await listed(scout, scoutedGame)).map(({ number }) => number)).toEqual([1])
    const scouted = (await get(`/scouted-games/${scoutedGame}`)).body
    expect(scouted.counts).toEqual({ possessions: 1, pressed: 1, stills: 0 })
    const { counts } = (await get(`/opponents/${opponent}`)).body
    expect(counts).toMatchObject({
      possessions: 1,
      pressed: 1,
      pressable: 1,
      mostlyShape: { shape: '2-2-1' },
    })
    expect((await get(`/games/${game}`)).body.counts.possessions).toBe(1)
    const read = (await get(`/opponents/${opponent}/tendencies`)).body
    expect(read.counted).toBe(1)
    const evidence = (await get(`/opponents/${opponent}/evidence?habit=press`)).body
    expect(evidence.total).toBe(1)
  })

  it('takes no edit and no still, and its id is not free', async () => {
    await scout.delete(address())
    const body = possessionBody(scoutedGame, { number: 2, note: 'other' })
    expect((await scout.put(address()).send(body)).status).toBe(409)
    expect((await scout.patch(address()).set('If-Match', '"2"').send({ note: '' })).status).toBe(404)
    const upload = scout.put(`${address()}/stills/${randomUUID()}`).attach('still', await jpeg(), 'b.jpg')
    expect((await upload).status).toBe(404)
  })

  it('deleted twice is deleted once: the ten minutes run from the first time', async () => {
    await scout.delete(address())
    test.setNow(later(8))
    expect((await scout.delete(address())).status).toBe(204)
    expect(await purge(later(10))).toBe(1)
  })

  it('is not deleted on a stale If-Match', async () => {
    await scout.patch(address()).set('If-Match', '"1"').send({ outcome: 'count' })
    const stale = await scout.delete(address()).set('If-Match', '"1"')
    expect(stale.status).toBe(412)
    expect(stale.body.current).toMatchObject({ id, version: 2, outcome: 'count' })
    expect((await scout.get(address())).status).toBe(200)
  })
})

describe('putting it back', () => {
  it('works until just before the ten minutes are over, with stills and traps, as a new version', async () => {
    const before = (await scout.get(address())).body
    await scout.delete(address())
    test.setNow(later(9, 59))
    expect(await purge(later(9, 59))).toBe(0)
    const back = await scout.post(`${address()}/restore`)
    expect(back.status).toBe(200)
    expect(back.headers.etag).toBe('"3"')
    expect(back.body).toEqual({ ...before, version: 3, updatedAt: later(9, 59).toISOString() })
    expect(await listed(scout, scoutedGame)).toHaveLength(2)
    expect((await get(`/stills/${still}`)).status).toBe(200)
    expect(await purge(later(60))).toBe(0)
  })

  it('of a row that was not deleted changes nothing', async () => {
    expect((await scout.post(`${address()}/restore`)).body.version).toBe(1)
  })

  it('is refused when the ten minutes are over, though nothing has been purged yet', async () => {
    await scout.delete(address())
    test.setNow(later(10))
    expect((await scout.post(`${address()}/restore`)).status).toBe(404)
  })
})

describe('after ten minutes', () => {
  const bytesOnDisk = async () => {
    const names = (await readdir(test.dataDir)).filter((name) => name.startsWith('overtop.sqlite'))
    expect(names).toContain('overtop.sqlite')
    return Buffer.concat(await Promise.all(names.map((name) => readFile(join(test.dataDir, name)))))
  }

  it('row, traps and stills are gone, and not one byte of note or caption stays in the file or its log', async () => {
    expect((await bytesOnDisk()).includes(NOTE)).toBe(true)
    expect((await bytesOnDisk()).includes(CAPTION)).toBe(true)
    await scout.delete(address())
    expect(await purge(later(10))).toBe(1)
    const { manager } = test.context.db
    expect(await manager.countBy(Trap, { possessionId: id })).toBe(0)
    expect(await manager.countBy(Still, { possessionId: id })).toBe(0)
    const bytes = await bytesOnDisk()
    expect([NOTE, CAPTION, id, still].filter((text) => bytes.includes(text))).toEqual([])
    test.setNow(later(10))
    expect((await scout.post(`${address()}/restore`)).status).toBe(404)
  })

  it('the pictures are gone from the disk, and only those', async () => {
    const [kept] = await listed(scout, scoutedGame)
    const other = randomUUID()
    await scout
      .put(teamUrl(`/possessions/${kept?.id}/stills/${other}`))
      .attach('still', await jpeg(), 'a.jpg')
    await scout.delete(address())
    await purge(later(11))
    expect((await readdir(join(test.dataDir, 'stills', TEAM))).sort()).toEqual(
      [`${other}.jpg`, `${other}.thumb.jpg`].sort(),
    )
    expect((await get(`/stills/${still}`)).status).toBe(404)
  })

  it('a picture that could not be removed is tried again with the next purge', async () => {
    await scout.delete(address())
    const { stillFiles } = test.context
    const busy = { ...stillFiles, remove: () => Promise.reject(new Error('the disk is busy')) }
    await expect(purgeDeleted(test.context.db, busy, later(10))).rejects.toThrow('the disk is busy')
    expect(await purge(later(11))).toBe(1)
    expect(await readdir(join(test.dataDir, 'stills', TEAM))).toEqual([])
  })

  it('its id may be used for a new row', async () => {
    await scout.delete(address())
    await purge(later(10))
    expect((await scout.put(address()).send(possessionBody(scoutedGame))).status).toBe(201)
  })
})

describe('a deleted still', () => {
  it('whose picture could not be removed is still there, to be deleted again', async () => {
    const busy = { ...test.context.stillFiles, remove: () => Promise.reject(new Error('the disk is busy')) }
    const which = { teamId: TEAM, possessionId: id, stillId: still }
    await expect(deleteStill(test.context.db, busy, which)).rejects.toThrow('the disk is busy')
    expect((await scout.get(address())).body.stills).toHaveLength(1)
    expect((await scout.delete(`${address()}/stills/${still}`)).status).toBe(204)
    expect(await readdir(join(test.dataDir, 'stills', TEAM))).toEqual([])
  })

  it('is gone at once, picture and thumbnail, and its caption with the next purge', async () => {
    const path = test.context.stillFiles.pathOf(TEAM, still, 'full')
    await access(path)
    expect((await scout.delete(`${address()}/stills/${still}`)).status).toBe(204)
    expect(await readdir(join(test.dataDir, 'stills', TEAM))).toEqual([])
    expect((await scout.get(address())).body.stills).toEqual([])
    expect((await get(`/stills/${still}`)).status).toBe(404)
    await purge(later(1))
    const names = (await readdir(test.dataDir)).filter((name) => name.startsWith('overtop.sqlite'))
    const bytes = await Promise.all(names.map((name) => readFile(join(test.dataDir, name))))
    expect(bytes.some((part) => part.includes(CAPTION))).toBe(false)
  })

  it('of another possession’s address is 404 and stays', async () => {
    const [kept] = await listed(scout, scoutedGame)
    expect((await scout.delete(teamUrl(`/possessions/${kept?.id}/stills/${still}`))).status).toBe(404)
    expect((await get(`/stills/${still}`)).status).toBe(200)
  })
})

import { randomUUID } from 'node:crypto'
import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import sharp from 'sharp'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { makeBackup } from '@server/backup/makeBackup'
import { mosaic } from '@server/adapters/mosaic'
import { teamUrl } from '../support/fixture'
import { faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let possession: string
let still: string

const SIZE = { width: 960, height: 540 }
/** The part that is burned: a quarter of the picture across, in the middle. */
const FACE = { x: 0.4, y: 0.3, w: 0.25, h: 0.4 }

/** Stripes of 10 px, black and white: what a mosaic of coarse blocks cannot keep. */
const striped = () => {
  const data = Buffer.alloc(SIZE.width * SIZE.height)
  for (let y = 0; y < SIZE.height; y++)
    for (let x = 0; x < SIZE.width; x++) data[y * SIZE.width + x] = Math.floor(x / 10) % 2 === 0 ? 255 : 0
  return sharp(data, { raw: { ...SIZE, channels: 1 } })
    .jpeg({ quality: 95 })
    .toBuffer()
}

/** How much a part of a picture varies; stripes by some 120, one colour by none. */
async function contrast(bytes: Buffer, part: typeof FACE): Promise<number> {
  const { width = 0, height = 0 } = await sharp(bytes).metadata()
  const cut = await sharp(bytes)
    .greyscale()
    .extract({
      left: Math.ceil(part.x * width) + 2,
      top: Math.ceil(part.y * height) + 2,
      width: Math.floor(part.w * width) - 4,
      height: Math.floor(part.h * height) - 4,
    })
    .toBuffer()
  return (await sharp(cut).stats()).channels[0]?.stdev ?? 0
}

/** Every file below a folder whose name holds the still's id. */
async function filesUnder(folder: string): Promise<string[]> {
  const names = await readdir(folder, { recursive: true })
  return names.filter((name) => name.includes(still)).map((name) => join(folder, name))
}

const blur = (body: object, version: number | null = 1, agent = scout) => {
  const sent = agent.post(teamUrl(`/stills/${still}/blur`)).send(body)
  return version === null ? sent : sent.set('If-Match', `"${version}"`)
}
const row = async () => (await scout.get(teamUrl(`/stills/${still}/row`))).body

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  possession = await newPossession(scout, await newScoutedGame(scout, await newOpponent(scout)))
})
afterAll(() => test.stop())
beforeEach(async () => {
  still = randomUUID()
  const sent = scout.put(teamUrl(`/possessions/${possession}/stills/${still}`))
  expect((await sent.attach('still', await striped(), 'a.jpg')).status).toBe(201)
})

describe('a blur', () => {
  it('burns the part away in every file of the still, and in a backup made after it; the rest stays', async () => {
    for (const file of await filesUnder(test.dataDir))
      expect(await contrast(await readFile(file), FACE), file).toBeGreaterThan(60)
    const { url, thumbnailUrl } = await row()
    const answer = await blur({ regions: [FACE] })
    expect(answer.status).toBe(200)
    expect(answer.headers['etag']).toBe('"2"')
    expect(answer.body).toMatchObject({ version: 2, blurred: 1, facesLeft: null, ...SIZE })
    expect(answer.body.url).not.toBe(url)
    expect(answer.body.thumbnailUrl).not.toBe(thumbnailUrl)
    await makeBackup(test.dataDir, join(test.dataDir, 'backups'), test.context.clock())
    const files = await filesUnder(test.dataDir)
    expect(files).toHaveLength(4)
    for (const file of files) {
      const bytes = await readFile(file)
      expect(await contrast(bytes, FACE), file).toBeLessThan(25)
      expect(await contrast(bytes, { ...FACE, x: 0.05 }), file).toBeGreaterThan(60)
    }
    const served = await scout.get(answer.body.url).buffer(true)
    expect(await contrast(served.body as Buffer, FACE)).toBeLessThan(25)
    // The address from before the blur shows the picture after it, too.
    const old = await scout.get(url).buffer(true)
    expect(old.body).toEqual(served.body)
  })

  it('counts the faces down, or takes the count that came with it', async () => {
    await scout
      .patch(teamUrl(`/stills/${still}`))
      .set('If-Match', '"1"')
      .send({ facesLeft: 4 })
    const two = [FACE, { ...FACE, x: 0.1, w: 0.1 }]
    expect((await blur({ regions: two }, 2)).body).toMatchObject({ facesLeft: 2, blurred: 2 })
    expect((await blur({ regions: [FACE], facesLeft: 0 }, 3)).body).toMatchObject({
      facesLeft: 0,
      blurred: 3,
    })
  })

  it('the picture that was sent does not come back under its id', async () => {
    await blur({ regions: [FACE] })
    const sent = scout.put(teamUrl(`/possessions/${possession}/stills/${still}`))
    expect((await sent.attach('still', await striped(), 'a.jpg')).status).toBe(200)
    for (const file of await filesUnder(test.dataDir))
      if (file.includes('stills')) expect(await contrast(await readFile(file), FACE)).toBeLessThan(25)
  })

  it('two at once on one version: one is done, the other sees the present row', async () => {
    const answers = await Promise.all([blur({ regions: [FACE] }), blur({ regions: [FACE] })])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412])
    expect((await row()).blurred).toBe(1)
  })

  it('needs a version, parts inside the picture, and a scout', async () => {
    expect((await blur({ regions: [FACE] }, null)).status).toBe(428)
    expect((await blur({ regions: [FACE] }, 7)).status).toBe(412)
    expect(faultsIn((await blur({ regions: [{ ...FACE, x: 0.9 }] })).body)).toEqual({
      'regions.0': 'This reaches past the edge of the picture. Make it smaller.',
    })
    expect(faultsIn((await blur({ regions: [] })).body)).toEqual({ regions: 'Give at least 1.' })
    expect((await blur({ regions: [FACE] }, 1, await test.as('player'))).status).toBe(403)
    const elsewhere = (await test.as('both')).post(teamUrl(`/stills/${still}/blur`, OTHER_TEAM))
    expect((await elsewhere.set('If-Match', '"1"').send({ regions: [FACE] })).status).toBe(404)
    const [file = ''] = await filesUnder(join(test.dataDir, 'stills', TEAM))
    expect(await contrast(await readFile(file), FACE)).toBeGreaterThan(60)
  })
})

describe('the mosaic', () => {
  it('is sixteen blocks of the mean of what was under them, edges outwards', () => {
    const [width, height] = [10, 10]
    const data = Buffer.from(Array.from({ length: 100 }, (_, at) => at))
    mosaic({ data, width, height, channels: 1 }, { x: 0.11, y: 0, w: 0.78, h: 0.4 })
    expect([...data.subarray(0, 10)]).toEqual([0, 2, 2, 4, 4, 6, 6, 8, 8, 9])
    expect(new Set(data.subarray(1, 9)).size).toBe(4)
    expect([...data.subarray(40, 50)]).toEqual([40, 41, 42, 43, 44, 45, 46, 47, 48, 49])
  })
})

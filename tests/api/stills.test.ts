import { randomUUID } from 'node:crypto'
import { access, readdir } from 'node:fs/promises'
import { join } from 'node:path'
import sharp from 'sharp'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { LIMITS } from '@shared/limits'
import { jpeg, teamUrl } from '../support/fixture'
import { bombPng, noise, sidewaysJpeg } from '../support/pictures'
import { faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let scoutedGame: string
let possession: string
let still: string

const address = (id = still, of = possession) => teamUrl(`/possessions/${of}/stills/${id}`)
const send = (bytes: Buffer, name = 'a.jpg', id = still) =>
  scout.put(address(id)).attach('still', bytes, name)
const picture = async (size: string, id = still): Promise<Buffer> =>
  (await scout.get(teamUrl(`/stills/${id}?size=${size}`)).buffer(true)).body as Buffer
const filesOnDisk = async () =>
  (await readdir(join(test.dataDir, 'stills', TEAM)).catch(() => [])).filter((name) => name.includes(still))

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

const NO_PICTURE = 'This is not a picture that can be read. Send a JPEG, PNG or WebP.'

describe('what is not a picture of ours', () => {
  const svg = '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>alert(1)</script></svg>'
  it.each<[string, () => Promise<Buffer> | Buffer]>([
    ['text that calls itself a JPEG', () => Buffer.from('GET / HTTP/1.1\r\n'.repeat(50))],
    ['an SVG', () => Buffer.from(svg)],
    ['half a JPEG', async () => (await jpeg(1200, 900)).subarray(0, 3000)],
    ['the first bytes of a JPEG', async () => (await jpeg()).subarray(0, 12)],
    [
      'a GIF',
      () =>
        sharp({ create: { width: 20, height: 20, channels: 3, background: '#fff' } })
          .gif()
          .toBuffer(),
    ],
    [
      'a TIFF',
      () =>
        sharp({ create: { width: 20, height: 20, channels: 3, background: '#fff' } })
          .tiff()
          .toBuffer(),
    ],
  ])('%s is refused, and nothing is kept', async (_what, make) => {
    const answer = await send(await make())
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual({ still: NO_PICTURE })
    expect(await filesOnDisk()).toEqual([])
    expect((await scout.get(teamUrl(`/possessions/${possession}`))).body.stills).toEqual([])
  })

  it('a small file that unpacks to 900 million pixels is refused before it is unpacked', async () => {
    const bomb = bombPng(30_000, 30_000)
    expect(bomb.length).toBeLessThan(1024 * 1024)
    const before = process.memoryUsage().rss
    const answer = await send(bomb, 'a.png')
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual({
      still: 'This picture has too many pixels to be unpacked. Send a smaller one.',
    })
    expect(process.memoryUsage().rss - before).toBeLessThan(100 * 1024 * 1024)
    expect(await filesOnDisk()).toEqual([])
  })

  it('the same kind of file within the limit is taken, so that the size was the reason', async () => {
    expect((await send(bombPng(3000, 2000), 'a.png')).status).toBe(201)
  })

  it('over 12 MB is 413, just under is looked at', async () => {
    const over = await send(noise(LIMITS.stillBytes + 1))
    expect(over.status).toBe(413)
    expect(over.type).toBe('application/problem+json')
    expect(faultsIn(over.body)).toEqual({ still: 'The picture is over 12 MB. Send a smaller one.' })
    expect((await send(noise(LIMITS.stillBytes))).status).toBe(400)
  })
})

describe('a request of another form', () => {
  const ONE = 'Send one picture in the field still, and nothing else.'
  it('with the wrong field name, or two pictures, says which field and how many', async () => {
    const wrong = await scout.put(address()).attach('picture', await jpeg(), 'a.jpg')
    const two = await scout
      .put(address())
      .attach('still', await jpeg(), 'a.jpg')
      .attach('still', await jpeg(), 'b.jpg')
    for (const answer of [wrong, two]) {
      expect(answer.status).toBe(400)
      expect(faultsIn(answer.body)).toEqual({ still: ONE })
    }
  })

  it('without a picture, without multipart, or cut off in the middle is 400', async () => {
    const none = await scout.put(address()).field('caption', 'nothing')
    const empty = await send(Buffer.alloc(0))
    for (const answer of [none, empty])
      expect(faultsIn(answer.body)).toEqual({ still: 'There is no picture. Add one.' })
    const json = await scout.put(address()).send({ still: 'aGVsbG8=' })
    expect(faultsIn(json.body)).toEqual({ still: 'Send multipart/form-data with the picture in still.' })
    const cut = await scout
      .put(address())
      .set('Content-Type', 'multipart/form-data; boundary=xx')
      .send('--xx\r\nContent-Disposition: form-data; name="still"; filename="a.jpg"\r\n\r\nabc')
    expect(cut.status).toBe(400)
    expect(faultsIn(cut.body)).toEqual({ still: 'The picture did not arrive whole. Send it again.' })
  })

  it.each([
    ['a caption that is too long', { caption: 'x'.repeat(81) }, { caption: 'Use at most 80 characters.' }],
    ['a time that is no number', { t: 'soon' }, { t: 'This must be a number. Change it.' }],
    ['a time before the first touch', { t: '-1' }, { t: 'The least this can be is 0.' }],
  ])('%s is named', async (_case, fields, faults) => {
    const answer = await scout
      .put(address())
      .field(fields as Record<string, string>)
      .attach('still', await jpeg(), 'a.jpg')
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual(faults)
  })

  it('by a player is 403, by nobody 401, and its picture is not read', async () => {
    const player = await test.as('player')
    expect((await player.put(address()).attach('still', await jpeg(), 'a.jpg')).status).toBe(403)
    const nobody = test
      .anonymous()
      .put(address())
      .attach('still', await jpeg(), 'a.jpg')
    expect((await nobody).status).toBe(401)
    expect(await filesOnDisk()).toEqual([])
  })

  it.each(['..%2F..%2Fovertop.sqlite', '..', '%00', 'a.jpg', '....//', `${'1'.repeat(36)}`])(
    'an id of %s leads nowhere',
    async (id) => {
      const put = await scout.put(address(id)).attach('still', await jpeg(), 'a.jpg')
      const get = await scout.get(teamUrl(`/stills/${id}`))
      for (const answer of [put, get]) {
        // A path of dots is folded before it is sent and then is no address of ours.
        expect([400, 404]).toContain(answer.status)
        expect(answer.type).toBe('application/problem+json')
      }
      if (id.includes('%')) expect([put.status, get.status]).toEqual([400, 400])
      await access(join(test.dataDir, 'overtop.sqlite'))
    },
  )
})

describe('what is kept and served', () => {
  it('stands upright, without place, camera or owner, at most 2560 px long, with a thumbnail', async () => {
    const sent = await sidewaysJpeg(4000, 3000)
    const before = await sharp(sent).metadata()
    expect(before).toMatchObject({ orientation: 6, width: 4000, height: 3000 })
    expect(sent.includes('Pocketcam')).toBe(true)
    const answer = await send(sent)
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({ width: 1920, height: 2560, position: 1, caption: '', t: null })
    for (const [size, edge] of [
      ['full', LIMITS.stillEdge],
      ['thumbnail', LIMITS.thumbnailEdge],
    ] as const) {
      const bytes = await picture(size)
      const meta = await sharp(bytes).metadata()
      expect(meta).toMatchObject({ format: 'jpeg', height: edge, width: edge * 0.75 })
      expect([meta.orientation, meta.exif, meta.xmp, meta.iptc, meta.icc]).toEqual(Array(5).fill(undefined))
      expect(['Exif', 'Pocketcam', 'Zelda'].filter((text) => bytes.includes(text))).toEqual([])
      // Turned a quarter right, what lay on the left is on top.
      const { data, info } = await sharp(bytes).raw().toBuffer({ resolveWithObject: true })
      const at = (x: number, y: number) =>
        data.subarray((y * info.width + x) * 3, (y * info.width + x) * 3 + 3)
      const middle = Math.floor(info.width / 2)
      expect(at(middle, 10)[0]).toBeGreaterThan(200)
      expect(at(middle, info.height - 10)[2]).toBeGreaterThan(200)
    }
  })

  it('a small picture is not blown up, and PNG and WebP are taken too', async () => {
    expect((await send(await jpeg(300, 200))).body).toMatchObject({ width: 300, height: 200 })
    const make = sharp({ create: { width: 50, height: 40, channels: 4, background: '#00ff0080' } })
    for (const bytes of [await make.png().toBuffer(), await make.webp().toBuffer()]) {
      const id = randomUUID()
      expect((await send(bytes, 'a.txt', id)).status).toBe(201)
      expect((await sharp(await picture('full', id)).metadata()).format).toBe('jpeg')
    }
  })

  it('goes to staff of the team alone, as a picture that the browser keeps for itself', async () => {
    await send(await jpeg())
    const url = teamUrl(`/stills/${still}`)
    const answer = await scout.get(url)
    expect(answer.status).toBe(200)
    expect(answer.headers).toMatchObject({
      'content-type': 'image/jpeg',
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-cache',
    })
    expect((await (await test.as('player')).get(url)).status).toBe(403)
    expect((await (await test.as('otherHead')).get(url)).status).toBe(404)
    expect((await (await test.as('both')).get(teamUrl(`/stills/${still}`, OTHER_TEAM))).status).toBe(404)
    expect((await test.anonymous().get(url)).status).toBe(401)
  })
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { NO_MARKS } from '@shared/stills/marks'
import { jpeg, teamUrl } from '../support/fixture'
import { faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let opponent: string
let scoutedGame: string
let possession: string
let still: string

const rowUrl = (id = still) => teamUrl(`/stills/${id}/row`)
const put = async (id = randomUUID(), of = possession) => {
  const answer = await scout
    .put(teamUrl(`/possessions/${of}/stills/${id}`))
    .field('t', '2')
    .attach('still', await jpeg(), 'a.jpg')
  expect(answer.status).toBe(201)
  return id
}
const patch = (body: object, version: number | null = 1, id = still, agent = scout) => {
  const sent = agent.patch(teamUrl(`/stills/${id}`)).send(body)
  return version === null ? sent : sent.set('If-Match', `"${version}"`)
}
const stillsOf = async () =>
  (await scout.get(teamUrl(`/possessions/${possession}`))).body.stills as { id: string; position: number }[]

const marks = {
  version: 1,
  ring: { x: 0.26, y: 0.73, rx: 0.085, ry: 0.035 },
  shade: { x: 0.52, y: 0.57, w: 0.35, h: 0.4 },
  pass: { from: { x: 0.25, y: 0.35 }, to: { x: 0.61, y: 0.63 } },
}

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
})
afterAll(() => test.stop())
beforeEach(async () => {
  opponent = await newOpponent(scout)
  scoutedGame = await newScoutedGame(scout, opponent)
  possession = await newPossession(scout, scoutedGame)
  still = await put()
})

describe('the marks and words of a still', () => {
  it('start empty, are kept, and stand in the row of the possession too', async () => {
    const before = await scout.get(rowUrl())
    expect(before.headers['etag']).toBe('"1"')
    expect(before.body).toMatchObject({ marks: NO_MARKS, blurred: 0, facesLeft: null, inReport: false })
    const answer = await patch({ marks, caption: 'Two trap her. The middle is open.', t: 2.04 })
    expect(answer.status).toBe(200)
    expect(answer.headers['etag']).toBe('"2"')
    expect(answer.body).toMatchObject({ marks, caption: 'Two trap her. The middle is open.', t: 2 })
    expect((await scout.get(rowUrl())).body).toEqual(answer.body)
    expect(await stillsOf()).toEqual([answer.body])
  })

  it('the same again changes nothing; its address does not change with its words', async () => {
    const { url } = (await scout.get(rowUrl())).body as { url: string }
    const first = await patch({ caption: 'Trapped' })
    const again = await patch({ caption: 'Trapped' }, 2)
    expect(again.body).toEqual(first.body)
    expect(first.body.url).toBe(url)
  })

  it('without a version 428, with an old one 412 and the present row', async () => {
    expect((await patch({ caption: 'Trapped' }, null)).status).toBe(428)
    const mine = await patch({ caption: 'Trapped' })
    const theirs = await patch({ caption: 'Not trapped' })
    expect(theirs.status).toBe(412)
    expect(theirs.body.current).toEqual(mine.body)
  })

  it.each([
    [{ caption: 'a b c d e f g h i' }, { caption: 'At most 8 words stand on a still. Take one out.' }],
    [
      { marks: { ...marks, ring: { ...marks.ring, x: 1.2 } } },
      { 'marks.ring.x': 'The most this can be is 1.' },
    ],
    [
      { marks: { ...marks, shade: { x: 0.9, y: 0, w: 0.2, h: 0.1 } } },
      { 'marks.shade': 'This reaches past the edge of the picture. Make it smaller.' },
    ],
    [{ facesLeft: -1 }, { facesLeft: 'The least this can be is 0.' }],
    [{ blurred: 4 }, { body: 'Take out blurred: no such field.' }],
  ])('%j is named', async (body, faults) => {
    const answer = await patch(body)
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual(faults)
  })

  it('a still sent again by a scout whose signal was lost is the one that was worked on', async () => {
    await patch({ caption: 'Trapped' })
    const again = await scout
      .put(teamUrl(`/possessions/${possession}/stills/${still}`))
      .field('t', '2')
      .attach('still', await jpeg(), 'a.jpg')
    expect([again.status, again.body.caption]).toEqual([200, 'Trapped'])
  })

  it('are staff’s alone, and none of a deleted possession', async () => {
    const player = await test.as('player')
    expect((await patch({ caption: 'x' }, 1, still, player)).status).toBe(403)
    expect((await player.get(rowUrl())).status).toBe(403)
    expect((await (await test.as('otherHead')).get(rowUrl())).status).toBe(404)
    const both = await test.as('both')
    const elsewhere = both.patch(teamUrl(`/stills/${still}`, OTHER_TEAM)).set('If-Match', '"1"')
    expect((await elsewhere.send({ caption: 'x' })).status).toBe(404)
    await scout.delete(teamUrl(`/possessions/${possession}`))
    expect((await patch({ caption: 'x' })).status).toBe(404)
  })
})

describe('the order within a possession', () => {
  it('takes another place, the others make room, and places stay single', async () => {
    const [b, c] = [await put(), await put()]
    const answer = await patch({ position: 1 }, 1, c)
    expect(answer.body.position).toBe(1)
    expect((await stillsOf()).map(({ id, position }) => [id, position])).toEqual([
      [c, 1],
      [still, 2],
      [b, 3],
    ])
    // Making room is no edit of theirs.
    expect((await patch({ caption: 'Trapped' }, 1, b)).status).toBe(200)
    await patch({ position: 99 }, 1)
    expect((await stillsOf()).map(({ id }) => id)).toEqual([c, b, still])
  })
})

describe('stills in the report', () => {
  const report = async (query = 'report=1') =>
    (await scout.get(teamUrl(`/opponents/${opponent}/stills?${query}`))).body as {
      rows: { id: string; number: number }[]
      total: number
    }

  it('need faces that were counted and none left', async () => {
    const uncounted = await patch({ inReport: true })
    expect(uncounted.status).toBe(409)
    expect(uncounted.body.detail).toContain('Nobody has counted the faces')
    const faces = await patch({ inReport: true, facesLeft: 2 })
    expect(faces.body.detail).toBe(
      '2 faces on this still can be made out. Blur them first, then take it into the report.',
    )
    expect((await scout.get(rowUrl())).body).toMatchObject({ version: 1, facesLeft: null, inReport: false })
    expect((await patch({ inReport: true, facesLeft: 0 })).body.inReport).toBe(true)
    const listed = await report()
    expect(listed.rows).toMatchObject([{ id: still, possessionId: possession, scoutedGameId: scoutedGame }])
  })

  it('a face found later takes it out again', async () => {
    await patch({ inReport: true, facesLeft: 0 })
    expect((await patch({ facesLeft: 1 }, 2)).body.inReport).toBe(false)
    expect((await report()).total).toBe(0)
  })

  it('are listed page by page, only this opponent’s, and none of what was deleted', async () => {
    const second = await newPossession(scout, scoutedGame, { number: 2 })
    await put(randomUUID(), second)
    await put()
    const elsewhere = await newScoutedGame(scout, await newOpponent(scout, 'Lowmoor'))
    await put(randomUUID(), await newPossession(scout, elsewhere))
    const all = await report('limit=2')
    expect([all.total, all.rows.map(({ number }) => number)]).toEqual([3, [1, 1]])
    expect((await report('limit=2&offset=2')).rows.map(({ number }) => number)).toEqual([2])
    await scout.delete(teamUrl(`/possessions/${second}`))
    expect((await report('')).total).toBe(2)
  })
})

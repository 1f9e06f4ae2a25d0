import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Possession } from '@server/database/entities/Possession'
import { Trap } from '@server/database/entities/Trap'
import type { PossessionInput } from '@shared/possessions/schemas'
import { possessionBody, seedBook, teamUrl } from '../support/fixture'
import { faultsIn, listed, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let opponent: string
let scoutedGame: string
let id: string

const address = (of = id) => teamUrl(`/possessions/${of}`)
const body = (more: Partial<PossessionInput> = {}) => possessionBody(scoutedGame, more)

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
})
afterAll(() => test.stop())
beforeEach(async () => {
  scoutedGame = await newScoutedGame(scout, opponent)
  id = randomUUID()
})

describe('PUT of a possession', () => {
  it('creates once: the same again answers 200, changes nothing and leaves one row', async () => {
    const first = await scout.put(address()).send(body())
    test.setNow(new Date('2026-03-17T09:45:00Z'))
    const again = await scout.put(address()).send(body())
    expect([first.status, again.status]).toEqual([201, 200])
    expect(again.body).toEqual(first.body)
    expect(again.body.version).toBe(1)
    expect([first.headers.etag, again.headers.etag]).toEqual(['"1"', '"1"'])
    expect(await listed(scout, scoutedGame)).toHaveLength(1)
    expect(await test.context.db.manager.countBy(Trap, { possessionId: id })).toBe(1)
  })

  it('takes an id in capitals for the same id', async () => {
    await scout.put(address()).send(body())
    expect((await scout.put(address(id.toUpperCase())).send(body())).status).toBe(200)
    expect(await listed(scout, scoutedGame)).toHaveLength(1)
  })

  it('of another body without If-Match is 409 and carries the present row', async () => {
    const first = await scout.put(address()).send(body())
    const other = await scout.put(address()).send(body({ outcome: 'lost-live' }))
    expect(other.status).toBe(409)
    expect(other.body.current).toEqual(first.body)
    expect((await scout.get(address())).body.outcome).toBe('through')
  })

  it('with the right If-Match changes the row: version and ETag go up by one', async () => {
    const first = await scout.put(address()).send(body())
    test.setNow(new Date('2026-03-17T09:50:00Z'))
    const changed = await scout
      .put(address())
      .set('If-Match', '"1"')
      .send(body({ outcome: 'lost-live', traps: [] }))
    expect(changed.status).toBe(200)
    expect(changed.headers.etag).toBe('"2"')
    expect(changed.body).toMatchObject({ version: 2, outcome: 'lost-live', traps: [] })
    expect(changed.body.createdAt).toBe(first.body.createdAt)
    expect(changed.body.updatedAt).toBe('2026-03-17T09:50:00.000Z')
    expect((await scout.get(address())).body).toEqual(changed.body)
    expect(await test.context.db.manager.countBy(Trap, { possessionId: id })).toBe(0)
  })

  it('with a stale If-Match is 412 with the present row and its ETag', async () => {
    await scout.put(address()).send(body())
    const changed = await scout
      .put(address())
      .set('If-Match', '"1"')
      .send(body({ outcome: 'count' }))
    const stale = await scout
      .put(address())
      .set('If-Match', '"1"')
      .send(body({ outcome: 'lost-live' }))
    expect(stale.status).toBe(412)
    expect(stale.headers.etag).toBe('"2"')
    expect(stale.body.current).toEqual(changed.body)
  })

  it('with an If-Match for an id that is not there is 404, and with a weak one 400', async () => {
    expect((await scout.put(address()).set('If-Match', '"1"').send(body())).status).toBe(404)
    const weak = await scout.put(address()).set('If-Match', 'W/"1"').send(body())
    expect(weak.status).toBe(400)
    expect(faultsIn(weak.body)).toHaveProperty('If-Match')
  })

  it('cannot hang a row on another team’s game or counter, nor take another team’s id', async () => {
    const both = await test.as('both')
    const theirs = await newScoutedGame(both, await newOpponent(both, 'Lowmoor', OTHER_TEAM), {}, OTHER_TEAM)
    expect((await scout.put(address()).send(possessionBody(theirs))).status).toBe(404)
    const { counters } = await seedBook(test, OTHER_TEAM)
    const game = await newGame(scout, opponent)
    const borrowed = body({ scoutedGameId: null, gameId: game, counterId: counters[0] })
    expect((await scout.put(address()).send(borrowed)).status).toBe(404)
    const taken = await newPossession(both, theirs, {}, OTHER_TEAM)
    expect((await scout.put(address(taken)).send(body())).status).toBe(404)
    expect(await test.context.db.manager.countBy(Possession, { scoutedGameId: theirs })).toBe(1)
  })
})

describe('PATCH of a possession', () => {
  const patch = (change: object, ifMatch = '"1"') =>
    scout.patch(address()).set('If-Match', ifMatch).send(change)

  beforeEach(async () => {
    await scout.put(address()).send(body({ note: 'two came late' }))
  })

  it('without If-Match is 428', async () => {
    expect((await scout.patch(address()).send({ outcome: 'count' })).status).toBe(428)
  })

  it('changes the fields that were sent and no other', async () => {
    const before = (await scout.get(address())).body
    const after = await patch({ outcome: 'count', denied: ['far', 'near', 'far'] })
    expect(after.status).toBe(200)
    expect(after.headers.etag).toBe('"2"')
    expect(after.body).toEqual({
      ...before,
      version: 2,
      updatedAt: after.body.updatedAt,
      outcome: 'count',
      denied: ['far', 'near'],
    })
  })

  it('checks the whole row again and names the field that no longer fits', async () => {
    const answer = await patch({ shape: 'dropped-back' })
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual({
      pickup: 'Pick-up is asked only when they press. Take it out.',
      traps: 'They did not press here. Take the traps out or change the shape.',
    })
    expect((await patch({ shape: 'dropped-back', pickup: null, traps: [] })).status).toBe(200)
  })

  it('on an old version is 412 with the present row, also when it no longer fits that row', async () => {
    const gone = await patch({ shape: 'dropped-back', pickup: null, traps: null })
    const stale = await patch({ pickup: 'half' })
    expect(stale.status).toBe(412)
    expect(stale.headers.etag).toBe('"2"')
    expect(stale.body.current).toEqual(gone.body)
  })

  it('refuses a field that there is none of', async () => {
    const answer = await patch({ colour: 'red', spot: 'other' })
    expect(faultsIn(answer.body)).toEqual({ body: 'Take out colour, spot: no such field.' })
  })
})

describe('fields that must fit each other', () => {
  it.each<[string, Partial<PossessionInput>, Record<string, string>]>([
    [
      'no game',
      { scoutedGameId: null },
      { scoutedGameId: 'Give either scoutedGameId or gameId, and only one of them.' },
    ],
    [
      'two games',
      { gameId: randomUUID() },
      { scoutedGameId: 'Give either scoutedGameId or gameId, and only one of them.' },
    ],
    [
      'pick-up without a shape',
      { shape: null, traps: null },
      { pickup: 'Pick-up is asked only when they press. Take it out.' },
    ],
    [
      'pick-up on a fake',
      { shape: 'fake', traps: null },
      { pickup: 'Pick-up is asked only when they press. Take it out.' },
    ],
    [
      'a trap without a press',
      { shape: 'fake', pickup: null },
      { traps: 'They did not press here. Take the traps out or change the shape.' },
    ],
    [
      'a variant of another shape',
      { shapeVariant: 'deny' },
      { shapeVariant: 'This refines another shape. Change one of the two.' },
    ],
    [
      'our call on their game',
      { counterId: randomUUID(), rightCall: false, runWell: true },
      {
        counterId: 'Only a row of one of our own games carries this. Take it out.',
        rightCall: 'Only a row of one of our own games carries this. Take it out.',
        runWell: 'Only a row of one of our own games carries this. Take it out.',
      },
    ],
  ])('%s is said in our words at the field', async (_case, more, faults) => {
    const answer = await scout.put(address()).send(body(more))
    expect(answer.status).toBe(400)
    expect(faultsIn(answer.body)).toEqual(faults)
  })
})

describe('what was not logged', () => {
  it('not logged, not visible and none are kept apart, there and back', async () => {
    const kinds: (null | 'not-visible' | [])[] = [null, 'not-visible', []]
    for (const traps of kinds)
      for (const denied of kinds) {
        const row = randomUUID()
        const sent = body({ traps, denied, leftOpen: null, onBall: 'not-visible' })
        const put = await scout.put(address(row)).send(sent)
        expect(put.status).toBe(201)
        const got = (await scout.get(address(row))).body
        expect(got).toMatchObject({ traps, denied, leftOpen: null, onBall: 'not-visible', goalie: null })
        expect((await scout.put(address(row)).send(sent)).status).toBe(200)
      }
  })

  it('seen and not visible of one field make two different bodies', async () => {
    await scout.put(address()).send(body({ leftOpen: null }))
    expect((await scout.put(address()).send(body({ leftOpen: 'not-visible' }))).status).toBe(409)
    expect((await scout.put(address()).send(body({ leftOpen: [] }))).status).toBe(409)
  })
})

describe('what is worked out', () => {
  it('the trap spot follows from the place, in the order of the traps', async () => {
    const at = (x: number, y: number) => ({ x, y })
    const places = [at(0.08, 0.9), at(0.16, 0.219), at(0.5, 0.78), at(0.3, 0.5), at(1, 1)]
    const answer = await scout.put(address()).send(body({ traps: places }))
    expect(
      answer.body.traps.map(({ spot, side }: { spot: string; side: string }) => `${spot} ${side}`),
    ).toEqual([
      'coffin-corner right',
      'early-sideline left',
      'other middle',
      'middle-lane middle',
      'front-corner right',
    ])
  })

  it.each([
    ['1-2-1-1', true],
    ['person', true],
    ['fake', false],
    ['dropped-back', false],
    [null, null],
  ] as const)('a shape of %s is pressed: %s', async (shape, pressed) => {
    const answer = await scout.put(address()).send(body({ shape, pickup: null, traps: null }))
    expect(answer.body.pressed).toBe(pressed)
  })
})

describe('many at once', () => {
  it('200 parallel PUTs of new ids all answer 201 and make 200 whole rows', async () => {
    const answers = await Promise.all(
      Array.from({ length: 200 }, (_, index) =>
        scout.put(address(randomUUID())).send(body({ number: index + 1 })),
      ),
    )
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([201]))
    const rows = await listed(scout, scoutedGame)
    expect(rows.map(({ number }) => number)).toEqual(Array.from({ length: 200 }, (_, index) => index + 1))
    expect(rows.every(({ traps }) => traps?.length === 1)).toBe(true)
  })

  it('of 50 parallel edits of one version exactly one wins', async () => {
    await scout.put(address()).send(body())
    const answers = await Promise.all(
      Array.from({ length: 50 }, (_, index) =>
        scout
          .put(address())
          .set('If-Match', '"1"')
          .send(body({ note: `edit ${index}`, traps: [{ x: 0.3, y: index / 50 }] })),
      ),
    )
    const won = answers.filter(({ status }) => status === 200)
    expect(won).toHaveLength(1)
    expect(answers.filter(({ status }) => status === 412)).toHaveLength(49)
    expect((await scout.get(address())).body).toEqual(won[0]?.body)
  })

  it('of 20 parallel PUTs of the same new row one creates and the others agree', async () => {
    const answers = await Promise.all(Array.from({ length: 20 }, () => scout.put(address()).send(body())))
    expect(answers.map(({ status }) => status).sort()).toEqual([...Array(19).fill(200), 201])
    expect(await listed(scout, scoutedGame)).toHaveLength(1)
  })
})

import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { possessionBody, teamUrl } from '../../support/fixture'
import { faultsIn, newOpponent, newScoutedGame } from '../../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../../support/testApp'

/** Every sentence that a field at fault may be told; all of them are written by us. */
const SENTENCES = [
  /^This is missing\. Fill it in\.$/,
  /^This is empty\. Fill it in\.$/,
  /^This must be (text|a number|a whole number|true or false|a list|a set of fields|a UUID)\. (Change it|Make a new one)\.$/,
  /^Use at (least|most) \d+ characters\.$/,
  /^Give at (least|most) \d+\.$/,
  /^The (least|most) this can be is -?[\d.]+\.$/,
  /^(This is missing\. )?Choose one of: [\w, -]+\.$/,
  /^Take out .+: no such field\.$/,
  /^This fits none of the forms it may have\. Check it against the list of choices\.$/,
  /^Give either scoutedGameId or gameId, and only one of them\.$/,
  /^Pick-up is asked only when they press\. Take it out\.$/,
  /^They did not press here\. Take the traps out or change the shape\.$/,
  /^This refines another shape\. Change one of the two\.$/,
  /^Only a row of one of our own games carries this\. Take it out\.$/,
  /^This is not a (time|day)\. Write it as [\d:.TZ-]+\.$/,
  /^The end must be later than the start\.$/,
]

/** Values of every kind that JSON knows, and some that a field may take by mistake. */
const WRONG: unknown[] = [
  null,
  true,
  0,
  -1,
  1.5,
  1e300,
  -1e300,
  '',
  ' ',
  'something else',
  'x'.repeat(5000),
  '\u0000',
  [],
  [null],
  [[]],
  ['something else'],
  Array(100).fill('middle'),
  Array(100).fill({ x: 0, y: 0 }),
  {},
  { x: 'a' },
  [{ x: 2, y: -1, t: 'now', cue: 'late', result: 7 }],
  [{ t: -11, x: null, y: 9, kind: 'run' }],
]

let test: TestApp
let scout: Agent
let opponent: string
let scoutedGame: string

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
  scoutedGame = await newScoutedGame(scout, opponent)
})
afterAll(() => test.stop())

/** Words of no sentence of ours among the faults of an answer. */
function strangers(body: { errors?: { field: string; message: string }[] }): string[] {
  return (body.errors ?? [])
    .filter(({ message }) => !SENTENCES.some((sentence) => sentence.test(message)))
    .map(({ field, message }) => `${field}: ${message}`)
}

describe('a field at fault', () => {
  const fields = Object.keys({
    ...possessionBody(''),
    gameId: 0,
    tripId: 0,
    shapeVariant: 0,
    outcomePlace: 0,
    throwerGuard: 0,
    denied: 0,
    tookAway: 0,
    leftOpen: 0,
    onBall: 0,
    handler: 0,
    goalie: 0,
    shownShape: 0,
    crossedAt: 0,
    track: 0,
    note: 0,
    counterId: 0,
    rightCall: 0,
    runWell: 0,
  })

  it.each(fields)('%s is told in our words whatever is sent', async (field) => {
    let refused = 0
    for (const value of WRONG) {
      const body = { ...possessionBody(scoutedGame), [field]: value }
      const answer = await scout.put(teamUrl(`/possessions/${randomUUID()}`)).send(body)
      expect([200, 201, 400, 404]).toContain(answer.status)
      if (answer.status !== 400) continue
      refused++
      expect(strangers(answer.body)).toEqual([])
      for (const name of Object.keys(faultsIn(answer.body)))
        // scoutedGameId and gameId answer for each other; shape may answer for pick-up and traps.
        expect([field, 'scoutedGameId', 'pickup', 'traps']).toContain(name.split('.')[0])
    }
    expect(refused).toBeGreaterThan(10)
  })

  it('that is missing is told as missing', async () => {
    const answer = await scout.put(teamUrl(`/possessions/${randomUUID()}`)).send({})
    expect(faultsIn(answer.body)).toEqual({
      number: 'This is missing. Fill it in.',
      trigger: 'This is missing. Choose one of: made-basket, made-free-throw, dead-ball, break, live.',
    })
  })

  it('is named down to the list it stands in', async () => {
    const put = async (traps: unknown) =>
      faultsIn(
        (
          await scout
            .put(teamUrl(`/possessions/${randomUUID()}`))
            .send({ ...possessionBody(scoutedGame), traps })
        ).body,
      )
    expect(await put([{ x: 0.1, y: 0.1 }, { x: 1.5, y: 0.1 }, { x: 0.1 }])).toEqual({
      'traps.1.x': 'The most this can be is 1.',
      'traps.2.y': 'This is missing. Fill it in.',
    })
    expect(await put(Array(7).fill({ x: 0, y: 0 }))).toEqual({ traps: 'Give at most 6.' })
    expect(await put([{ x: 0, y: 0, cue: 'late' }])).toEqual({
      'traps.0.cue': expect.stringMatching(/^Choose one of: on-catch, .*, not-visible\.$/),
    })
    expect(await put(7)).toEqual({
      traps: 'This fits none of the forms it may have. Check it against the list of choices.',
    })
  })

  it('is named inside a list of choices too', async () => {
    const put = (more: object) =>
      scout.put(teamUrl(`/possessions/${randomUUID()}`)).send({ ...possessionBody(scoutedGame), ...more })
    const choices = faultsIn((await put({ throwerGuard: 'behind' })).body)
    expect(choices).toEqual({ throwerGuard: 'Choose one of: none, mirror, off, not-visible.' })
    const lists = faultsIn((await put({ leftOpen: ['middle', 'roof'] })).body)
    expect(lists).toEqual({
      'leftOpen.1': 'Choose one of: middle, sideline, long, pass-back, far-side.',
    })
  })

  it.each([null, [], 'text', 7, true])('a whole body of %o is no row', async (body) => {
    const answer = await scout
      .put(teamUrl(`/possessions/${randomUUID()}`))
      .set('Content-Type', 'application/json')
      .send(JSON.stringify(body))
    expect(answer.status).toBe(400)
    expect(strangers(answer.body)).toEqual([])
  })

  it.each(['playedOn', 'seen', 'rulePack', 'coverage', 'blowout', 'finalScore', 'foe', 'opponentId'])(
    'of a scouted game’s header, %s, is told in our words too',
    async (field) => {
      const header = {
        opponentId: opponent,
        foe: 'Tarn',
        playedOn: '2026-03-14',
        seen: 'film',
        rulePack: 'fiba',
      }
      const wrong = [
        ...WRONG,
        { kind: 'some' },
        { kind: 'minutes', from: 9, to: 3 },
        { theirs: -1, foe: 'many' },
      ]
      for (const value of wrong) {
        const answer = await scout
          .put(teamUrl(`/scouted-games/${randomUUID()}`))
          .send({ ...header, [field]: value })
        expect([201, 400, 404]).toContain(answer.status)
        expect(strangers(answer.body)).toEqual([])
      }
    },
  )
})

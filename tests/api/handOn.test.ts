import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { HandOn } from '@server/database/entities/HandOn'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import type { GameRow } from '@shared/games/schemas'
import { teamUrl } from '../support/fixture'
import { faultsIn, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp, type Who } from '../support/testApp'

let test: TestApp
let head: Agent
let assistant: Agent
let both: Agent
let game: string
let opponent: string
const ids = {} as Record<Who, string>

beforeAll(async () => {
  test = await startTestApp()
  ;[head, assistant, both] = [await test.as('head'), await test.as('assistant'), await test.as('both')]
  for (const { id, name } of await test.context.db.manager.find(Person)) ids[name.split(' ')[1] as Who] = id
})
afterAll(() => test.stop())
beforeEach(async () => {
  test.setNow(new Date('2026-03-17T09:42:00Z'))
  opponent = await newOpponent(head)
  game = await newGame(head, opponent)
})

const url = (path: string) => teamUrl(`/games/${game}${path}`)
const row = async (agent = head) => (await agent.get(url(''))).body as GameRow
const give = (agent: Agent, to: string, note?: string) =>
  agent.post(url('/hand-on')).send({ toId: to, ...(note === undefined ? {} : { note }) })
const count = () => test.context.db.manager.countBy(HandOn, { gameId: game })

describe('whoever has the ball', () => {
  it('is nobody before a game is watched, then the scout of the newest game, at Scout and at Read', async () => {
    expect((await row()).holder).toBeNull()
    await newScoutedGame(both, opponent, { playedOn: '2026-03-01' })
    const newest = await newScoutedGame(assistant, opponent, { playedOn: '2026-03-14' })
    expect((await row()).holder).toEqual({ id: ids.assistant, name: 'Test assistant', initials: 'TA' })
    for (let number = 1; number <= 10; number++) await newPossession(assistant, newest, { number })
    expect(await row()).toMatchObject({ station: 'read', holder: { id: ids.assistant } })
  })

  it('is the head coach at Choose, though the read was handed to somebody else', async () => {
    await give(head, ids.both)
    expect(await row()).toMatchObject({ station: 'scout', holder: { id: ids.both } })
    await head.post(url('/read-sign-off'))
    expect(await row()).toMatchObject({ station: 'choose', holder: { id: ids.head } })
  })

  it('is nobody who has left the staff', async () => {
    await give(head, ids.both)
    const membership = await test.context.db.manager.findOneByOrFail(Membership, {
      personId: ids.both,
      teamId: TEAM,
    })
    await test.context.db.manager.delete(Membership, { id: membership.id })
    expect((await row()).holder).toBeNull()
    await test.context.db.manager.insert(Membership, membership as never)
  })
})

describe('handing on', () => {
  it('the head coach may at any time, and an assistant only while it is with her', async () => {
    expect((await row(assistant)).mayHandOn).toBe(false)
    const refused = await give(assistant, ids.both)
    expect([refused.status, refused.body.detail]).toEqual([
      403,
      'It is with nobody yet. Ask them, or the head coach.',
    ])
    expect((await give(head, ids.assistant)).status).toBe(200)
    expect((await row(assistant)).mayHandOn).toBe(true)
    expect((await give(assistant, ids.both, 'Film is on the drive.')).status).toBe(200)
    expect((await give(assistant, ids.assistant)).body.detail).toMatch(/^It is with Test both/)
    expect(await row()).toMatchObject({
      holder: { id: ids.both },
      handedOn: {
        from: 'Test assistant',
        to: 'Test both',
        note: 'Film is on the drive.',
        at: '2026-03-17T09:42:00.000Z',
      },
    })
  })

  it('the head coach takes it back', async () => {
    await give(head, ids.assistant)
    expect((await give(head, ids.head)).body).toMatchObject({ holder: { id: ids.head } })
    expect((await row(assistant)).mayHandOn).toBe(false)
  })

  it('to whoever has it already changes nothing, and leaves the version that others have open', async () => {
    const before = await row()
    await give(head, ids.assistant)
    await give(head, ids.assistant)
    expect(await count()).toBe(1)
    expect((await row()).version).toBe(before.version)
  })

  it('does not reach a player, a stranger or a coach of another team, nor a game of another team', async () => {
    const player = await give(head, ids.player)
    expect([player.status, Object.keys(faultsIn(player.body))]).toEqual([400, ['toId']])
    expect((await give(head, ids.otherHead)).status).toBe(404)
    expect((await give(head, ids.nobodyYet)).status).toBe(404)
    const theirs = await test.as('otherHead')
    const foreign = theirs.post(teamUrl(`/games/${game}/hand-on`, OTHER_TEAM)).send({ toId: ids.otherHead })
    expect((await foreign).status).toBe(404)
    expect(await count()).toBe(0)
  })

  it('takes a note of 140 letters and no more', async () => {
    expect((await give(head, ids.both, 'x'.repeat(140))).status).toBe(200)
    expect(Object.keys(faultsIn((await give(head, ids.both, 'x'.repeat(141))).body))).toEqual(['note'])
  })
})

describe('notes and due dates of a game', () => {
  it('are kept as they were sent and change with If-Match', async () => {
    const before = await row()
    const due = { scout: '2026-03-17T18:00:00.000Z', read: null, teach: null, review: null }
    const body = {
      opponentId: opponent,
      tipOff: before.tipOff,
      place: before.place,
      rulePack: before.rulePack,
      chooseBy: '2026-03-18T18:00:00+01:00',
      due,
      notes: 'Bus at **four**.',
    }
    const changed = await head.put(url('')).set('If-Match', '"1"').send(body)
    expect(changed.body).toMatchObject({ chooseBy: '2026-03-18T17:00:00.000Z', due, notes: body.notes })
    expect((await head.put(url('')).set('If-Match', '"1"').send(body)).status).toBe(412)
    const long = await head
      .put(url(''))
      .set('If-Match', '"2"')
      .send({ ...body, notes: 'x'.repeat(8001) })
    expect(Object.keys(faultsIn(long.body))).toEqual(['notes'])
  })
})

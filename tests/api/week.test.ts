import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Opening } from '@server/database/entities/Opening'
import { Person } from '@server/database/entities/Person'
import { Practice } from '@server/database/entities/Practice'
import { ENGINE_DEFAULTS } from '@server/engine/settings'
import { expectedBefore, type OwnCell } from '@server/features/week/lastTime'
import { weekOf } from '@server/features/week/days'
import { startOfDay } from '@server/http/zone'
import type { Week, WeekEvent } from '@shared/week/schemas'
import { gameBody, makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { created, faultsIn, newGame, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { OTHER_TEAM, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let own: Fixture

beforeAll(async () => {
  test = await startTestApp({ now: new Date('2026-03-15T12:00:00Z') })
  head = await test.as('head')
  own = await makeFixture(test)
  await makeFixture(test, OTHER_TEAM)
  test.setNow(new Date('2026-03-17T09:42:00Z'))
}, 60_000)
afterAll(() => test.stop())

const week = async (query = '', agent = head) => (await agent.get(teamUrl(`/week${query}`))).body as Week
const said = ({ since }: Week, kind: WeekEvent['kind']) => since.filter((event) => event.kind === kind)

describe('the ruler', () => {
  it('is Monday to Sunday of today, or of the day asked for', async () => {
    const now = await week()
    expect([now.today, now.days[0], now.days[6]]).toEqual(['2026-03-17', '2026-03-16', '2026-03-22'])
    expect((await week('?on=2026-03-23')).days[0]).toBe('2026-03-23')
    expect((await week('?on=2026-03-22')).days[6]).toBe('2026-03-22')
    expect(Object.keys(faultsIn((await head.get(teamUrl('/week?on=friday'))).body))).toEqual(['on'])
  })

  it('has tip-offs, due dates that are open or done, and practices; nothing of another week or team', async () => {
    const due = {
      scout: '2026-03-16T18:00:00.000Z',
      read: null,
      teach: '2026-03-19T17:30:00.000Z',
      review: null,
    }
    const body = { ...gameBody(own.opponent), chooseBy: '2026-03-30T18:00:00.000Z', due }
    await head
      .put(teamUrl(`/games/${own.game}`))
      .set('If-Match', '"1"')
      .send(body)
    await test.context.db.manager.insert(Practice, {
      id: randomUUID(),
      teamId: TEAM,
      gameId: own.game,
      startsAt: '2026-03-17T18:00:00.000Z',
      body: {},
      version: 1,
      createdAt: '2026-03-15T12:00:00.000Z',
      updatedAt: '2026-03-15T12:00:00.000Z',
      deletedAt: null,
    })
    const { marks } = await week()
    expect(marks.map(({ kind, at, station, done }) => [kind, at.slice(0, 10), station, done])).toEqual([
      ['due', '2026-03-16', 'scout', true],
      ['practice', '2026-03-17', null, false],
      ['due', '2026-03-19', 'teach', false],
      // The fixture's own practice; the other team has one at the same hour.
      ['practice', '2026-03-19', null, false],
      ['tip-off', '2026-03-20', null, false],
    ])
    expect(marks[2]?.holder?.name).toBe('Test head')
    expect((await week('?on=2026-03-30')).marks.map(({ station }) => station)).toEqual(['choose'])
  })

  it('counts days in the zone of the team, through a change of clocks', () => {
    expect(startOfDay('2026-03-29', 'Europe/London').toISOString()).toBe('2026-03-29T00:00:00.000Z')
    expect(startOfDay('2026-03-30', 'Europe/London').toISOString()).toBe('2026-03-29T23:00:00.000Z')
    expect(startOfDay('2026-03-30', 'Pacific/Auckland').toISOString()).toBe('2026-03-29T11:00:00.000Z')
    expect(weekOf('2026-01-01')[0]).toBe('2025-12-29')
  })
})

describe('what happened since yesterday', () => {
  it('is counted by person and thing, and begins with yesterday', async () => {
    const before = await week()
    expect(said(before, 'possessions')).toEqual([])
    const assistant = await test.as('assistant')
    const scouted = await newScoutedGame(assistant, own.opponent)
    for (let number = 1; number <= 12; number++) await newPossession(assistant, scouted, { number })
    await newPossession(head, scouted, { number: 13 })
    const lines = said(await week(), 'possessions').map(({ who, action, count, about }) => [
      who?.name,
      action,
      count,
      about,
    ])
    expect(lines).toContainEqual(['Test assistant', 'made', 12, 'Port Selby Gulls against Tarn Valley'])
    expect(lines).toContainEqual(['Test head', 'made', 1, 'Port Selby Gulls against Tarn Valley'])
    test.setNow(new Date('2026-03-19T00:30:00Z'))
    expect(said(await week(), 'possessions')).toEqual([])
    test.setNow(new Date('2026-03-17T09:42:00Z'))
  })

  it('tells of the read, the plan, the ball and how many opened the sheet, but not who', async () => {
    const opponent = await newOpponent(head, 'Lowmoor Rovers')
    const game = await newGame(head, opponent)
    const people = await test.context.db.manager.find(Person)
    const idOf = (name: string) => people.find((person) => person.name === name)?.id ?? ''
    await head.post(teamUrl(`/games/${game}/hand-on`)).send({ toId: idOf('Test assistant') })
    await head.post(teamUrl(`/games/${game}/read-sign-off`))
    const plan = randomUUID()
    await head.put(teamUrl(`/games/${game}/plan`)).send({ id: plan, firstCallId: own.counters[0] })
    const sheetId = randomUUID()
    const sign = head.post(teamUrl(`/games/${game}/plan/sign-off`)).set('If-Match', '"1"')
    await sign.send({ planId: plan, sheetId })
    for (const name of ['Test player', 'Test assistant'])
      await test.context.db.manager.insert(Opening, {
        id: randomUUID(),
        teamId: TEAM,
        sheetId,
        personId: idOf(name),
        firstAt: '2026-03-17T09:42:00.000Z',
        lastAt: '2026-03-17T09:42:00.000Z',
      })
    const now = await week()
    const about = 'Lowmoor Rovers'
    expect(said(now, 'ball')).toMatchObject([{ to: 'Test assistant', about }])
    expect(said(now, 'read')).toMatchObject([{ action: 'signed', who: { name: 'Test head' }, about }])
    expect(said(now, 'plans')).toContainEqual(expect.objectContaining({ action: 'signed', about }))
    expect(said(now, 'sheets')).toMatchObject([{ who: null, action: 'opened', count: 1, of: 1, about }])
    expect(JSON.stringify(said(now, 'sheets'))).not.toContain('Test player')
  })

  it('has nothing of what was deleted meanwhile but that it was, and is empty again without opponents', async () => {
    const name = 'Vanishing Saltmarsh'
    const opponent = await newOpponent(head, name)
    const scouted = await newScoutedGame(head, opponent)
    await newPossession(head, scouted, { number: 1 })
    const game = await newGame(head, opponent)
    const assistant = (await test.context.db.manager.find(Person)).find(
      ({ name: who }) => who === 'Test assistant',
    )
    await head.post(teamUrl(`/games/${game}/hand-on`)).send({ toId: assistant?.id, note: 'Yours.' })
    const about = (now: Week) =>
      now.since
        .filter((event) => event.about?.includes('Saltmarsh'))
        .map(({ kind, action }) => [kind, action])
    expect(about(await week()).length).toBeGreaterThan(2)
    await head.delete(teamUrl(`/opponents/${opponent}`)).expect(204)
    expect(about(await week())).toEqual([['opponents', 'deleted']])
  })

  it('keeps to the team', async () => {
    const theirs = (await (await test.as('otherHead')).get(teamUrl('/week', OTHER_TEAM))).body as Week
    expect(theirs.since).toEqual([])
    expect(theirs.coaches.map(({ name }) => name)).toEqual(['Test otherHead', 'Test both'])
    expect((await (await test.as('otherHead')).get(teamUrl('/week'))).status).toBe(404)
    expect((await (await test.as('player')).get(teamUrl('/week'))).status).toBe(403)
  })
})

describe('last time out', () => {
  it('sets what happened beside what our own record before it let us expect', async () => {
    const opponent = await newOpponent(head, 'Brindle Moor Otters')
    const play = async (tipOff: string, outcomes: string[]) => {
      const game = await created(head, 'games', { ...gameBody(opponent), tipOff })
      for (const [index, outcome] of outcomes.entries())
        await created(head, 'possessions', {
          gameId: game,
          number: index + 1,
          trigger: 'made-basket',
          shape: '1-2-1-1',
          outcome,
          outcomePlace: outcome === 'lost-live' ? 'backcourt' : null,
          counterId: own.counters[0],
        })
      return game
    }
    await play('2026-03-01T18:00:00.000Z', ['through', 'through', 'through', 'lost-live'])
    const last = await play('2026-03-13T18:00:00.000Z', [
      ...Array<string>(7).fill('through'),
      'lost-live',
      'stopped',
    ])
    const now = await week()
    expect(now.last?.id).toBe(last)
    expect(now.lastTime).toMatchObject({
      gameId: last,
      opponentName: 'Brindle Moor Otters',
      shape: '1-2-1-1',
      pressed: { k: 7, n: 8 },
      lost: [{ place: 'backcourt', count: 1 }],
      calls: [{ counterId: own.counters[0], k: 7, n: 8, before: { k: 3, n: 4 } }],
    })
    const [call] = now.lastTime?.calls ?? []
    expect(call?.expected.low).toBeLessThan(call?.expected.high ?? 0)
    expect(
      (await head.get(teamUrl('/games'))).body.rows.find(({ id }: { id: string }) => id === last).station,
    ).toBe('review')
  })

  it('expects more after a good record, counts another shape for a quarter, and never the game itself', () => {
    const cell = (more: Partial<OwnCell>): OwnCell => ({
      gameId: 'before',
      earlier: 1,
      counterId: 'kite',
      shape: '1-2-1-1',
      k: 20,
      n: 20,
      ...more,
    })
    const of = (cells: OwnCell[]) => expectedBefore(cells, 'kite', '1-2-1-1', 10, ENGINE_DEFAULTS)
    const sum = ({ low, high }: { low: number; high: number }) => low + high
    expect(sum(of([cell({})]))).toBeGreaterThan(sum(of([])))
    expect(sum(of([cell({ k: 0 })]))).toBeLessThan(sum(of([cell({ k: 0, shape: '2-2-1' })])))
    expect(of([cell({ earlier: 0, k: 0 })])).toEqual(of([]))
  })

  it('stands on the figures that the team has set', () => {
    const cell: OwnCell = { gameId: 'g', earlier: 1, counterId: 'kite', shape: '1-2-1-1', k: 20, n: 20 }
    const set = { ...ENGINE_DEFAULTS, basePrior: { rate: 0.1, trips: 400 }, priorTrips: 60 }
    const usual = expectedBefore([cell], 'kite', '1-2-1-1', 10, ENGINE_DEFAULTS)
    expect(expectedBefore([cell], 'kite', '1-2-1-1', 10, set).low).toBeLessThan(usual.low)
  })

  it('is nothing where no trip was pressed', async () => {
    const theirs = (await (await test.as('otherHead')).get(teamUrl('/week', OTHER_TEAM))).body as Week
    expect([theirs.last, theirs.lastTime, theirs.empty]).toEqual([null, null, false])
  })
})

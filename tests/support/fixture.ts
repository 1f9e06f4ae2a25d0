import { randomUUID } from 'node:crypto'
import sharp from 'sharp'
import { Change } from '@server/database/entities/Change'
import { Counter } from '@server/database/entities/Counter'
import { Rule } from '@server/database/entities/Rule'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_RULES } from '@server/database/demo/rules'
import { CounterBody } from '@shared/counters/schemas'
import type { PossessionInput } from '@shared/possessions/schemas'
import type { PracticeInput } from '@shared/practices/schemas'
import { RuleBody } from '@shared/rules/schemas'
import { TEAM, type Agent, type TestApp } from './testApp'

/** Ids of one of everything in a team, made through the API where the API can. */
export interface Fixture {
  opponent: string
  opponentPlayer: string
  scoutedGame: string
  possession: string
  /** A line in the history of the possession. */
  change: string
  still: string
  game: string
  counters: string[]
  rule: string
  plan: string
  sheet: string
  practice: string
  /** A numbered paper of the sheet. */
  copy: string
}

export const opponentBody = (name = 'Port Selby Gulls') => ({ name, shortName: name.slice(0, 20) })

export const scoutedGameBody = (opponentId: string) => ({
  opponentId,
  foe: 'Tarn Valley',
  playedOn: '2026-03-14',
  seen: 'film' as const,
  rulePack: 'fiba' as const,
})

export const gameBody = (opponentId: string) => ({
  opponentId,
  tipOff: '2026-03-20T19:15:00.000Z',
  place: 'home' as const,
  rulePack: 'fiba' as const,
})

/** A pressed possession with the quick fields and one trap. */
export const possessionBody = (
  scoutedGameId: string,
  more: Partial<PossessionInput> = {},
): PossessionInput => ({
  scoutedGameId,
  number: 1,
  period: 1,
  clock: 5400,
  margin: 0,
  trigger: 'made-basket',
  shape: '1-2-1-1',
  pickup: 'full',
  traps: [{ x: 0.08, y: 0.9, t: 1.8, cue: 'on-catch', result: 'passed-out' }],
  outcome: 'through',
  ...more,
})

/** A practice of twenty minutes with nothing counted yet. */
export const practiceBody = (gameId: string): PracticeInput => ({
  gameId,
  startsAt: '2026-03-19T17:30:00.000Z',
  script: {
    minutes: 20,
    parts: [{ kind: 'walk', from: 0, minutes: 20, leader: '' }],
    looks: [],
    reps: [],
    cautions: [],
  },
  reps: [],
})

export const jpeg = (width = 640, height = 360): Promise<Buffer> =>
  sharp({ create: { width, height, channels: 3, background: '#806040' } })
    .jpeg()
    .toBuffer()

/** Puts the demo's counters and rules into a team. */
export async function seedBook(
  test: TestApp,
  teamId = TEAM,
): Promise<{ counters: string[]; rules: string[] }> {
  const { manager } = test.context.db
  const stamp = test.context.clock().toISOString()
  const meta = () => ({ id: randomUUID(), teamId, version: 1, createdAt: stamp, updatedAt: stamp })
  const counters = DEMO_COUNTERS.map(({ key: _key, ...counter }) => {
    const body = CounterBody.parse(counter)
    return { ...meta(), name: body.name, family: body.family, body }
  })
  const rules = DEMO_RULES.map(({ key: _key, ...rule }) => {
    const body = RuleBody.parse(rule)
    return { ...meta(), number: body.number, on: body.on, body }
  })
  await manager.insert(Counter, counters)
  await manager.insert(Rule, rules)
  return { counters: counters.map((row) => row.id), rules: rules.map((row) => row.id) }
}

async function expectStatus(answer: PromiseLike<{ status: number; body: unknown }>, status: number) {
  const { status: got, body } = await answer
  if (got !== status) throw new Error(`expected ${status}, got ${got}: ${JSON.stringify(body)}`)
}

export const teamUrl = (path: string, teamId = TEAM) => `/api/teams/${teamId}${path}`

/** Five more players, so that a counter's roles can be filled. */
export async function seedSquad(head: Agent, teamId = TEAM): Promise<void> {
  const skills = { handle: 3, 'throw-in': 3, 'long-arm': 3, decide: 3, sprint: 3, screen: 3 }
  for (const jersey of [6, 7, 8, 9, 10])
    await expectStatus(
      head
        .put(teamUrl(`/squad/${randomUUID()}`, teamId))
        .send({ jersey, firstName: `P${jersey}`, lastName: 'Secretname', skills }),
      201,
    )
}

/** One of everything in a team, up to a signed sheet. */
export async function makeFixture(test: TestApp, teamId = TEAM): Promise<Fixture> {
  const head = await test.as(teamId === TEAM ? 'head' : 'otherHead')
  const { counters, rules } = await seedBook(test, teamId)
  await seedSquad(head, teamId)
  const ids = {
    opponent: randomUUID(),
    opponentPlayer: randomUUID(),
    scoutedGame: randomUUID(),
    possession: randomUUID(),
    change: randomUUID(),
    still: randomUUID(),
    game: randomUUID(),
    plan: randomUUID(),
    sheet: randomUUID(),
    copy: randomUUID(),
    practice: randomUUID(),
  }
  const url = (path: string) => teamUrl(path, teamId)
  await expectStatus(head.put(url(`/opponents/${ids.opponent}`)).send(opponentBody()), 201)
  await expectStatus(
    head
      .put(url(`/opponent-players/${ids.opponentPlayer}`))
      .send({ opponentId: ids.opponent, jersey: 12, does: ['thief'] }),
    201,
  )
  await expectStatus(
    head.put(url(`/scouted-games/${ids.scoutedGame}`)).send(scoutedGameBody(ids.opponent)),
    201,
  )
  await expectStatus(
    head.put(url(`/possessions/${ids.possession}`)).send(possessionBody(ids.scoutedGame)),
    201,
  )
  await test.context.db.manager.insert(Change, {
    id: ids.change,
    teamId,
    kind: 'possessions',
    rowId: ids.possession,
    action: 'changed',
    personId: null,
    at: test.context.clock().toISOString(),
    batchId: null,
    fields: [{ field: 'outcome', from: 'through', to: 'count' }],
  })
  await expectStatus(
    head
      .put(url(`/possessions/${ids.possession}/stills/${ids.still}`))
      .attach('still', await jpeg(), 'trap.jpg'),
    201,
  )
  await expectStatus(head.put(url(`/games/${ids.game}`)).send(gameBody(ids.opponent)), 201)
  const firstCallId = counters[0]
  await expectStatus(
    head
      .put(url(`/games/${ids.game}/plan`))
      .send({ id: ids.plan, firstCallId, keys: ['Look middle first.'] }),
    201,
  )
  await expectStatus(
    head
      .post(url(`/games/${ids.game}/plan/sign-off`))
      .set('If-Match', '"1"')
      .send({ planId: ids.plan, sheetId: ids.sheet }),
    200,
  )
  await expectStatus(head.post(url(`/sheets/${ids.sheet}/copies`)).send({ copies: [{ id: ids.copy }] }), 200)
  await expectStatus(head.put(url(`/practices/${ids.practice}`)).send(practiceBody(ids.game)), 201)
  return { ...ids, counters, rule: rules[0] ?? '' }
}

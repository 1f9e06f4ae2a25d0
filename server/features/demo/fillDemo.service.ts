import { randomUUID } from 'node:crypto'
import type { Context } from '../../context'
import { localInstant } from '../../database/demo/days'
import { loadDemo } from '../../database/demo/load'
import { DEMO_TIME_ZONE } from '../../database/demo/people'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { HandOn } from '../../database/entities/HandOn'
import { Person } from '../../database/entities/Person'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { putPlan } from '../plans/plans.service'
import { signOff } from '../plans/signOff.service'
import { putPractice } from '../practices/practices.service'
import { scriptFor } from '../practices/script.service'
import { listCopies, makeCopies, moveCopy } from '../sheets/copies.service'
import { writeLetters } from '../sheets/letters.service'
import { noteOpening } from '../sheets/openings.service'

/** Rows that the work is done on, found by what they are called. */
interface Cast {
  teamId: string
  /** Ids of people by first name. */
  people: Map<string, string>
  /** Ids of counters by name, and of squad players by first name. */
  counters: Map<string, string>
  squad: Map<string, string>
  /** Our games, the next one against each opponent first. */
  ahead: (opponent: string) => Game
}

const at = (now: Date, days: number, hour: string) => new Date(localInstant(now, DEMO_TIME_ZONE, days, hour))

async function castOf({ db, clock }: Context): Promise<Cast> {
  const { manager } = db
  const people = await manager.find(Person)
  const [maren] = people.filter(({ name }) => name.startsWith('Maren'))
  const games = await manager.find(Game, { relations: { opponent: true }, order: { tipOff: 'ASC' } })
  const [first] = games
  if (!maren || !first) throw new Error('the demo has nobody to do its work')
  const { teamId } = first
  const ids = <T extends { id: string }>(rows: T[], name: (row: T) => string) =>
    new Map(rows.map((row) => [name(row), row.id]))
  const now = clock().toISOString()
  return {
    teamId,
    people: ids(people, ({ name }) => name.split(' ')[0] ?? name),
    counters: ids(await manager.findBy(Counter, { teamId }), ({ name }) => name),
    squad: ids(await manager.findBy(SquadPlayer, { teamId }), ({ firstName }) => firstName),
    ahead: (opponent) => {
      const game = games.find((row) => row.tipOff > now && row.opponent?.name.includes(opponent))
      if (!game) throw new Error(`the demo has no game ahead against ${opponent}`)
      return game
    },
  }
}

const idIn = (ids: Map<string, string>, name: string): string => {
  const id = ids.get(name)
  if (id === undefined) throw new Error(`the demo has no ${name}`)
  return id
}

/** Two versions of the plan against the Otters, both signed off; the sheet of the newer one is handed out. */
async function handOut(context: Context, cast: Cast): Promise<void> {
  const { db, clock } = context
  const { teamId } = cast
  const gameId = cast.ahead('Otters').id
  const maren = idIn(cast.people, 'Maren')
  const firstCallId = idIn(cast.counters, '1-4 across')
  const changeUpId = idIn(cast.counters, 'Box, big in the middle')
  const versions = [
    { keys: ['Fake a pass to make a pass.', 'Middle first, then opposite.'], days: -2 },
    { keys: ['Middle first, then opposite.', 'Keep the dribble alive.', 'Meet the pass.'], days: -1 },
  ]
  let sheetId = ''
  for (const { keys, days } of versions) {
    const now = at(clock(), days, '21:10')
    const planId = randomUUID()
    sheetId = randomUUID()
    const body = { id: planId, firstCallId, changeUpId, notThisGame: [], roles: [], keys, reason: '' }
    const { row } = await putPlan(db, { gameId, teamId, body, ifMatch: null, now, by: maren })
    const body2 = { planId, sheetId }
    await signOff(db, { teamId, gameId, personId: maren, body: body2, ifMatch: row.version, now })
  }
  const names = ['Nell', 'Rosa', 'Ada', 'Imara', 'Hanne', 'Tess', 'Wren', 'Cleo']
  const copies = names.map((name) => ({ id: randomUUID(), squadPlayerId: idIn(cast.squad, name) }))
  const tomas = idIn(cast.people, 'Tomas')
  const given = at(clock(), -1, '21:20')
  await makeCopies(db, { teamId, sheetId, body: { copies }, now: given, by: tomas })
  for (const { id, version } of (await listCopies(db.manager, teamId, sheetId)).slice(0, 6))
    await moveCopy(db, { teamId, id, place: 'out', ifMatch: version, now: given, by: tomas })
  const [back] = await listCopies(db.manager, teamId, sheetId)
  if (back)
    await moveCopy(db, { teamId, id: back.id, place: 'back', ifMatch: back.version, now: clock(), by: tomas })
  await writeLetters(context, {
    teamId,
    sheetId,
    body: { players: [idIn(cast.squad, 'Nell'), idIn(cast.squad, 'Cleo')], members: [] },
    now: given,
  })
  await noteOpening(db.manager, {
    teamId,
    sheetId,
    personId: idIn(cast.people, 'Nell'),
    now: at(clock(), -1, '21:45'),
  })
}

/** One practice behind us with what was run, one ahead with its script. */
async function practise({ db, clock }: Context, cast: Cast): Promise<void> {
  const { teamId } = cast
  const game = cast.ahead('Otters')
  const by = idIn(cast.people, 'Tomas')
  const firstCall = idIn(cast.counters, '1-4 across')
  const changeUp = idIn(cast.counters, 'Box, big in the middle')
  const run = [
    { counterId: firstCall, shape: '1-2-1-1' as const, kind: 'walk' as const, n: 6, k: null },
    { counterId: firstCall, shape: '1-2-1-1' as const, kind: 'overload' as const, n: 8, k: 5 },
    { counterId: firstCall, shape: '1-2-1-1' as const, kind: 'live' as const, n: 10, k: 8 },
    { counterId: changeUp, shape: '1-2-1-1' as const, kind: 'live' as const, n: 6, k: 4 },
  ]
  for (const { days, reps } of [
    { days: -1, reps: run },
    { days: 2, reps: [] },
  ]) {
    const startsAt = at(clock(), days, '17:30').toISOString()
    const { script } = await scriptFor(db.manager, teamId, game.id, { minutes: 40, startsAt })
    const parts = script.parts.map((part, i) => ({ ...part, leader: i === 0 ? 'MO' : 'TR' }))
    const body = { gameId: game.id, startsAt, script: { ...script, parts }, reps }
    const now = days < 0 ? at(clock(), days, '19:00') : clock()
    await putPractice(db, { id: randomUUID(), teamId, body, ifMatch: null, now, by })
  }
}

/** Drawings that were walked on the screen, and how many days ago. */
const WALKED: readonly (readonly [counter: string, days: number])[] = [
  ['1-4 across', -1],
  ['Box, big in the middle', -1],
  ['Middle three', -6],
  ['Back and across', -12],
  ['Stack, go long', -20],
]

async function walkThem({ db, clock }: Context, cast: Cast): Promise<void> {
  for (const [name, days] of WALKED)
    await db.manager.update(
      Counter,
      { id: idIn(cast.counters, name) },
      { walkedAt: at(clock(), days, '20:15').toISOString() },
    )
}

/** The read of the Gulls came to Maren last night. */
async function handOn({ db, clock }: Context, cast: Cast): Promise<void> {
  await db.manager.insert(HandOn, {
    id: randomUUID(),
    teamId: cast.teamId,
    gameId: cast.ahead('Gulls').id,
    station: 'read',
    fromId: idIn(cast.people, 'Tomas'),
    toId: idIn(cast.people, 'Maren'),
    note: 'Look at no. 14 once more before you pick.',
    at: at(clock(), -1, '21:40').toISOString(),
  })
}

/**
 * Fills an empty database with the invented club and does its work of the last days through the services
 * themselves, so that every page has something to show. Returns whether it was filled.
 */
export async function fillDemo(context: Context): Promise<boolean> {
  if (!(await loadDemo(context))) return false
  const cast = await castOf(context)
  await handOut(context, cast)
  await practise(context, cast)
  await handOn(context, cast)
  await walkThem(context, cast)
  return true
}

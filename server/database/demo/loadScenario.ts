import { randomUUID } from 'node:crypto'
import { GameBody } from '@shared/games/schemas'
import { OpponentPlayerBody } from '@shared/opponents/players'
import { OpponentBody } from '@shared/opponents/schemas'
import { PossessionBody } from '@shared/possessions/schemas'
import { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { possessionColumns, scoutedGameColumns, trapColumns } from '../columnsOf'
import { Change } from '../entities/Change'
import { Game } from '../entities/Game'
import { Opponent } from '../entities/Opponent'
import { OpponentPlayer } from '../entities/OpponentPlayer'
import { Possession } from '../entities/Possession'
import { ScoutedGame } from '../entities/ScoutedGame'
import { Trap } from '../entities/Trap'
import { localDay, localInstant } from './days'
import { meta, type Load } from './loading'
import { DEMO_TEAM_KEY } from './people'
import { demoScenario, type DemoScenario } from './scenario'
import { DEMO_OPPONENT_PLAYERS } from './scenario/players'

/** Seconds that a scout takes over a row. */
const A_ROW = 50

/** Rows that were looked at again on film the next morning, and what was filled in then. */
const AGAIN: readonly (readonly [game: string, number: number, field: 'denied' | 'goalie' | 'leftOpen'])[] = [
  ['scout-gulls-3', 2, 'denied'],
  ['scout-gulls-3', 5, 'goalie'],
  ['scout-gulls-3', 9, 'leftOpen'],
  ['scout-gulls-3', 14, 'denied'],
  ['scout-lowmoor-1', 4, 'leftOpen'],
  ['scout-lowmoor-1', 11, 'denied'],
]

/** Opponents with their players, games, scouted games and every possession, with who wrote what and when. */
export async function loadScenario(load: Load, timeZone: string): Promise<void> {
  const { manager, ids, now } = load
  const scenario = demoScenario(now, timeZone)
  for (const { key, ...body } of scenario.opponents)
    await manager.insert(Opponent, { ...OpponentBody.parse(body), ...meta(load, DEMO_TEAM_KEY, key) })
  for (const { opponentKey, ...rest } of DEMO_OPPONENT_PLAYERS) {
    const body = OpponentPlayerBody.parse({ ...rest, opponentId: ids.of(opponentKey) })
    const key = `${opponentKey} no. ${rest.jersey}`
    await manager.insert(OpponentPlayer, { ...body, ...meta(load, DEMO_TEAM_KEY, key) })
  }
  for (const { key, opponentKey, readKey, ...rest } of scenario.games) {
    const body = GameBody.parse({ ...rest, opponentId: ids.of(opponentKey) })
    const read =
      readKey === null ? {} : { readAt: yesterday(now, timeZone, '21:40'), readById: ids.of(readKey) }
    await manager.insert(Game, { ...body, ...read, ...meta(load, DEMO_TEAM_KEY, key) })
  }
  for (const { key, opponentKey, scoutKey, ...rest } of scenario.scoutedGames) {
    const body = ScoutedGameBody.parse({ ...rest, opponentId: ids.of(opponentKey) })
    const row = { ...scoutedGameColumns(body), scoutId: ids.of(scoutKey), ...meta(load, DEMO_TEAM_KEY, key) }
    await manager.insert(ScoutedGame, row)
  }
  await loadPossessions(load, scenario, timeZone)
}

const yesterday = (now: Date, timeZone: string, hour: string) => localInstant(now, timeZone, -1, hour)

/** When a game's rows were logged: the evening after it, the newest one of the Gulls yesterday. */
function loggedFrom(load: Load, scenario: DemoScenario, gameKey: string, timeZone: string): number {
  const scouted = scenario.scoutedGames.find(({ key }) => key === gameKey)
  const game = scenario.games.find(({ key }) => key === gameKey)
  if (gameKey === 'scout-gulls-3') return Date.parse(yesterday(load.now, timeZone, '20:40'))
  const day = scouted?.playedOn ?? game?.tipOff.slice(0, 10) ?? localDay(load.now, timeZone, -1)
  return Date.parse(`${day}T21:00:00Z`)
}

async function loadPossessions(load: Load, scenario: DemoScenario, timeZone: string): Promise<void> {
  const { manager, ids } = load
  for (const { key, scoutedGameKey, gameKey, counterKey, tripKey, ...rest } of scenario.possessions) {
    const body = PossessionBody.parse({
      ...rest,
      scoutedGameId: ids.ofNullable(scoutedGameKey),
      gameId: ids.ofNullable(gameKey),
      counterId: ids.ofNullable(counterKey === null ? null : `counter ${counterKey}`),
      tripId: ids.ofNullable(tripKey === null ? null : `trip ${tripKey}`),
    })
    const playedIn = scoutedGameKey ?? gameKey ?? ''
    const made = new Date(loggedFrom(load, scenario, playedIn, timeZone) + rest.number * A_ROW * 1000)
    const personId = ids.of(scenario.scoutedGames.find((game) => game.key === playedIn)?.scoutKey ?? 'tomas')
    const common = {
      kind: 'possessions',
      teamId: ids.of(DEMO_TEAM_KEY),
      rowId: ids.of(key),
      personId,
      batchId: null,
    }
    const changes: (typeof common & Pick<Change, 'id' | 'action' | 'at'> & { fields: object })[] = [
      { ...common, id: randomUUID(), action: 'made', at: made.toISOString(), fields: [] },
    ]
    const [, , field] = AGAIN.find(([game, number]) => game === playedIn && number === rest.number) ?? []
    if (field !== undefined && body[field] !== null) {
      const at = new Date(made.getTime() + 45 * 60_000).toISOString()
      changes.push({
        ...common,
        id: randomUUID(),
        action: 'changed',
        at,
        fields: [{ field, from: null, to: body[field] }],
      })
    }
    await manager.insert(Possession, {
      ...possessionColumns(body),
      ...meta(load, DEMO_TEAM_KEY, key, made.toISOString()),
      version: changes.length,
      updatedAt: changes.at(-1)?.at ?? made.toISOString(),
    })
    await manager.insert(Change, changes)
    const traps = trapColumns(ids.of(key), body.traps, randomUUID)
    if (traps.length > 0) await manager.insert(Trap, traps)
  }
}

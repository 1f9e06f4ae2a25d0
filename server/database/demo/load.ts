import { randomUUID } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import { GameBody } from '@shared/games/schemas'
import { OpponentBody } from '@shared/opponents/schemas'
import { PossessionBody } from '@shared/possessions/schemas'
import { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { SquadPlayerBody } from '@shared/squad/schemas'
import type { Clock } from '../../adapters/clock'
import { hashPassword } from '../../adapters/passwords'
import type { StillFiles } from '../../adapters/stillFiles'
import type { DataSource } from 'typeorm'
import { possessionColumns, scoutedGameColumns, trapColumns } from '../columnsOf'
import { Game } from '../entities/Game'
import { Membership } from '../entities/Membership'
import { Opponent } from '../entities/Opponent'
import { Person } from '../entities/Person'
import { Possession } from '../entities/Possession'
import { ScoutedGame } from '../entities/ScoutedGame'
import { SquadPlayer } from '../entities/SquadPlayer'
import { Team } from '../entities/Team'
import { Trap } from '../entities/Trap'
import { insertBook, unused } from '../insertBook'
import { DEMO_COUNTERS } from './counters'
import { loadDemoStills } from './loadStills'
import { DEMO_PEOPLE, DEMO_TEAM_KEY, DEMO_TIME_ZONE, demoTeams } from './people'
import { DEMO_RULES } from './rules'
import { demoScenario } from './scenario'
import { demoSquad } from './squad'

/** Ids made for the keys of one kind of demo row. */
class Ids {
  private readonly made = new Map<string, string>()

  /** The id of a key, made on first use. */
  of(key: string): string {
    const id = this.made.get(key) ?? randomUUID()
    this.made.set(key, id)
    return id
  }

  /** Null stays null. */
  ofNullable = (key: string | null): string | null => (key === null ? null : this.of(key))
}

interface Load {
  manager: EntityManager
  now: Date
  ids: Ids
}

const meta = ({ now, ids }: Load, teamKey: string, key: string) => {
  const stamp = now.toISOString()
  return { id: ids.of(key), teamId: ids.of(teamKey), version: 1, createdAt: stamp, updatedAt: stamp }
}

async function loadTeamsAndPeople(load: Load, timeZone: string): Promise<void> {
  const { manager, now, ids } = load
  const createdAt = now.toISOString()
  for (const { key, ...team } of demoTeams(now))
    await manager.insert(Team, { ...team, id: ids.of(key), createdAt })
  for (const { key, ...player } of demoSquad(now, timeZone))
    await manager.insert(SquadPlayer, {
      ...SquadPlayerBody.parse(player),
      ...meta(load, DEMO_TEAM_KEY, `squad ${key}`),
    })
  for (const person of DEMO_PEOPLE) {
    const passwordHash = await hashPassword(person.password)
    await manager.insert(Person, {
      id: ids.of(person.key),
      email: person.email,
      name: person.name,
      passwordHash,
      createdAt,
    })
    for (const { teamKey, role, squadKey } of person.memberships)
      await manager.insert(Membership, {
        id: randomUUID(),
        teamId: ids.of(teamKey),
        personId: ids.of(person.key),
        role,
        squadPlayerId: squadKey === null ? null : ids.of(`squad ${squadKey}`),
      })
  }
}

/** Every demo team gets the counters and the rules; only the scenario's own team has used them. */
async function loadBook({ manager, now, ids }: Load): Promise<void> {
  for (const { key } of demoTeams(now)) {
    const teamId = ids.of(key)
    const ours = key === DEMO_TEAM_KEY
    await insertBook(manager, {
      teamId,
      now,
      counters: ours ? DEMO_COUNTERS : unused(DEMO_COUNTERS),
      rules: DEMO_RULES,
      idOf: (kind, rowKey) => ids.of(ours ? `${kind} ${rowKey}` : `${key} ${kind} ${rowKey}`),
    })
  }
}

async function loadScenario(load: Load, timeZone: string): Promise<void> {
  const { manager, ids, now } = load
  const scenario = demoScenario(now, timeZone)
  for (const { key, ...body } of scenario.opponents)
    await manager.insert(Opponent, { ...OpponentBody.parse(body), ...meta(load, DEMO_TEAM_KEY, key) })
  for (const { key, opponentKey, ...rest } of scenario.games) {
    const body = GameBody.parse({ ...rest, opponentId: ids.of(opponentKey) })
    await manager.insert(Game, { ...body, ...meta(load, DEMO_TEAM_KEY, key) })
  }
  for (const { key, opponentKey, scoutKey, ...rest } of scenario.scoutedGames) {
    const body = ScoutedGameBody.parse({ ...rest, opponentId: ids.of(opponentKey) })
    const row = { ...scoutedGameColumns(body), scoutId: ids.of(scoutKey), ...meta(load, DEMO_TEAM_KEY, key) }
    await manager.insert(ScoutedGame, row)
  }
  for (const { key, scoutedGameKey, gameKey, counterKey, tripKey, ...rest } of scenario.possessions) {
    const body = PossessionBody.parse({
      ...rest,
      scoutedGameId: ids.ofNullable(scoutedGameKey),
      gameId: ids.ofNullable(gameKey),
      counterId: ids.ofNullable(counterKey === null ? null : `counter ${counterKey}`),
      tripId: ids.ofNullable(tripKey === null ? null : `trip ${tripKey}`),
    })
    await manager.insert(Possession, { ...possessionColumns(body), ...meta(load, DEMO_TEAM_KEY, key) })
    const traps = trapColumns(ids.of(key), body.traps, randomUUID)
    if (traps.length > 0) await manager.insert(Trap, traps)
  }
}

/**
 * Fills an empty database with the invented club; a database that holds a team already is left alone.
 * All or nothing. Returns whether it was filled.
 */
export async function loadDemo(target: {
  db: DataSource
  clock: Clock
  stillFiles: StillFiles
}): Promise<boolean> {
  if ((await target.db.getRepository(Team).count()) > 0) return false
  const now = target.clock()
  await target.db.transaction(async (manager) => {
    const load: Load = { manager, now, ids: new Ids() }
    await loadTeamsAndPeople(load, DEMO_TIME_ZONE)
    await loadBook(load)
    await loadScenario(load, DEMO_TIME_ZONE)
    await loadDemoStills(
      manager,
      target.stillFiles,
      now,
      (key) => load.ids.of(key),
      load.ids.of(DEMO_TEAM_KEY),
    )
  })
  return true
}

import { randomUUID } from 'node:crypto'
import { SquadPlayerBody } from '@shared/squad/schemas'
import type { Clock } from '../../adapters/clock'
import { hashPassword } from '../../adapters/passwords'
import type { StillFiles } from '../../adapters/stillFiles'
import type { DataSource } from 'typeorm'
import { Membership } from '../entities/Membership'
import { Person } from '../entities/Person'
import { SquadPlayer } from '../entities/SquadPlayer'
import { Team } from '../entities/Team'
import { insertBook, unused } from '../insertBook'
import { DEMO_COUNTERS } from './counters'
import { Ids, meta, type Load } from './loading'
import { loadScenario } from './loadScenario'
import { localInstant } from './days'
import { loadDemoStills } from './loadStills'
import { DEMO_PEOPLE, DEMO_TEAM_KEY, DEMO_TIME_ZONE, demoTeams } from './people'
import { DEMO_RULES } from './rules'
import { demoSquad } from './squad'

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
        createdAt: localInstant(now, timeZone, role === 'player' ? -44 : -180, '18:30'),
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

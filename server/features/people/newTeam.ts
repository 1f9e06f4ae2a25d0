import { randomUUID } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import type { NewTeam } from '@shared/people/schemas'
import { DEMO_COUNTERS } from '../../database/demo/counters'
import { DEMO_RULES } from '../../database/demo/rules'
import { Membership } from '../../database/entities/Membership'
import { Team } from '../../database/entities/Team'
import { insertBook, unused } from '../../database/insertBook'

/** A team with its head coach, and the counters and rules that every team starts from. Returns its id. */
export async function insertTeam(
  manager: EntityManager,
  team: NewTeam,
  personId: string,
  now: Date,
): Promise<string> {
  const teamId = randomUUID()
  const createdAt = now.toISOString()
  await manager.insert(Team, { id: teamId, ...team, createdAt })
  await manager.insert(Membership, {
    id: randomUUID(),
    teamId,
    personId,
    role: 'head-coach',
    squadPlayerId: null,
    createdAt,
  })
  await insertBook(manager, {
    teamId,
    now,
    counters: unused(DEMO_COUNTERS),
    rules: DEMO_RULES,
    idOf: () => randomUUID(),
  })
  return teamId
}

import { createHash, randomBytes, randomUUID, timingSafeEqual } from 'node:crypto'
import type { DataSource } from 'typeorm'
import type { FirstCoach } from '@shared/session/firstCoach'
import { hashPassword } from '../../adapters/passwords'
import { seasonOf } from '../../database/demo/days'
import { Person } from '../../database/entities/Person'
import { Team } from '../../database/entities/Team'
import { Conflict, NotAllowed } from '../../http/problem'
import { insertTeam } from './newTeam'

/** There is a team already: nobody else is the first. */
export class TeamThere extends Conflict {
  constructor() {
    super('There is a team already, so nobody was added. Sign in as its head coach.')
  }
}

/**
 * The first team of an empty database with its head coach, and the counters and rules it starts from. All or
 * nothing. Returns who signs in now.
 * @throws TeamThere when there is a team or a person already.
 */
export async function addFirstCoach(
  db: DataSource,
  coach: FirstCoach,
  now: Date,
): Promise<{ id: string; name: string }> {
  const passwordHash = await hashPassword(coach.password)
  const person = { id: randomUUID(), name: coach.name }
  await db.transaction(async (manager) => {
    if ((await manager.count(Team)) + (await manager.count(Person)) > 0) throw new TeamThere()
    await manager.insert(Person, {
      ...person,
      email: coach.email,
      passwordHash,
      createdAt: now.toISOString(),
    })
    const team = {
      name: coach.team,
      squadName: coach.squad,
      timeZone: coach.zone,
      season: seasonOf(now, coach.zone),
      rulePack: coach.rules,
    }
    await insertTeam(manager, team, person.id, now)
  })
  return person
}

/** A token for the first-run page while there is neither team nor person; null as soon as there is one. */
export async function firstRunToken(db: DataSource): Promise<string | null> {
  if ((await db.manager.count(Team)) + (await db.manager.count(Person)) > 0) return null
  return randomBytes(24).toString('base64url')
}

const digest = (text: string) => createHash('sha256').update(text).digest()

/** @throws NotAllowed for a token that the server did not print when it started */
export function checkToken(printed: string | null, given: string): void {
  if (printed === null || !timingSafeEqual(digest(printed), digest(given)))
    throw new NotAllowed('This is not the address that the server printed when it started. Copy all of it.')
}

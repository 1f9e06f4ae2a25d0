import type { DataSource } from 'typeorm'
import type { Session } from '@shared/session/schemas'
import { Membership } from '../../database/entities/Membership'
import type { Caller } from '../../http/endpoint'
import { presentSession } from './session.presenter'

/** The session as the client sees it. */
export async function describeSession(
  db: DataSource,
  person: { id: string; name: string },
): Promise<Session> {
  const memberships = await db.getRepository(Membership).find({
    where: { personId: person.id },
    relations: { team: true },
  })
  return presentSession(person, memberships)
}

/** The person as a caller in a team, or null when they are not of it. */
export async function callerIn(
  db: DataSource,
  person: { id: string; name: string },
  teamId: string,
): Promise<Caller | null> {
  const membership = await db
    .getRepository(Membership)
    .createQueryBuilder('membership')
    .where('membership.personId = :personId AND membership.teamId = :teamId', {
      personId: person.id,
      teamId: teamId.toLowerCase(),
    })
    .getOne()
  if (!membership) return null
  return {
    personId: person.id,
    name: person.name,
    teamId: membership.teamId,
    role: membership.role,
    squadPlayerId: membership.squadPlayerId,
  }
}

import { In, type EntityManager } from 'typeorm'
import { Change } from '../../database/entities/Change'
import { Copy } from '../../database/entities/Copy'
import { Game } from '../../database/entities/Game'
import { HandOn } from '../../database/entities/HandOn'
import { Invitation } from '../../database/entities/Invitation'
import { Mail } from '../../database/entities/Mail'
import { Membership } from '../../database/entities/Membership'
import { Opening } from '../../database/entities/Opening'
import { Person } from '../../database/entities/Person'
import { Plan } from '../../database/entities/Plan'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { StoredSession } from '../../database/entities/StoredSession'
import { forgetHistory } from '../../database/history'
import { endSessions } from '../session/endSessions'
import type { Subject } from './people.policy'
import { tracesOf, type Traces } from './traces'

/**
 * Takes somebody out of a team wherever they are written down: the name, addresses, letters, invitations and
 * history go, counts and signed plans stay without them. Call it inside a transaction.
 * @throws NotFound when there is nobody of that id in the team
 */
export async function eraseSubject(manager: EntityManager, teamId: string, subject: Subject): Promise<void> {
  const traces = await tracesOf(manager, teamId, subject, 'also-left')
  const { player, membership, person, letterIds, invitationIds } = traces
  await emptySeats(manager, traces)
  if (letterIds.length > 0) {
    await manager.update(Copy, { teamId, mailId: In(letterIds) }, { mailId: null })
    await manager.delete(Mail, { id: In(letterIds) })
  }
  const gone = [player?.id, membership?.id].filter((id) => id !== undefined)
  await forgetHistory(manager, [...invitationIds, ...gone])
  if (invitationIds.length > 0) await manager.delete(Invitation, { id: In(invitationIds) })
  if (membership) await manager.delete(Membership, { id: membership.id })
  // Memberships, invitations and copies that name her let go of her by their foreign keys.
  if (player) await manager.delete(SquadPlayer, { id: player.id })
  if (person && traces.accountGoes) {
    await endSessions(manager, person.id)
    await manager.delete(Person, { id: person.id })
  } else if (person) await leaveNoName(manager, teamId, person.id)
}

/** In plans that are not signed her roles are free again; signed ones keep a number that leads to nobody. */
async function emptySeats(manager: EntityManager, { player, plans }: Traces): Promise<void> {
  for (const plan of plans) {
    if (player === null || plan.signedAt !== null) continue
    const roles = plan.roles.filter(({ squadPlayerId }) => squadPlayerId !== player.id)
    await manager.update(Plan, { id: plan.id }, { roles, version: plan.version + 1 })
  }
}

/** Where somebody is signed in now. */
export const countSessions = (manager: EntityManager, personId: string): Promise<number> =>
  manager
    .createQueryBuilder(StoredSession, 'session')
    .where("json_extract(session.data, '$.passport.user') = :personId", { personId })
    .getCount()

/** The account lives on in another team; what it did in this one stays without it. */
async function leaveNoName(manager: EntityManager, teamId: string, personId: string): Promise<void> {
  await manager.delete(Opening, { teamId, personId })
  await manager.update(Change, { teamId, personId }, { personId: null })
  await manager.update(ScoutedGame, { teamId, scoutId: personId }, { scoutId: null })
  await manager.update(Game, { teamId, readById: personId }, { readById: null })
  await manager.update(Plan, { teamId, signedById: personId }, { signedById: null })
  await manager.update(HandOn, { teamId, fromId: personId }, { fromId: null })
  await manager.update(HandOn, { teamId, toId: personId }, { toId: null })
  await manager.update(Invitation, { teamId, invitedById: personId }, { invitedById: null })
}

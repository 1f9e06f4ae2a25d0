import { randomUUID } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { InvitationLook, NewAccount } from '@shared/people/schemas'
import { hashPassword } from '../../adapters/passwords'
import { Invitation } from '../../database/entities/Invitation'
import { Membership } from '../../database/entities/Membership'
import { Person } from '../../database/entities/Person'
import { Team } from '../../database/entities/Team'
import { recordChange } from '../../database/history'
import { Conflict, HttpError } from '../../http/problem'
import { digestOf } from '../mail/secretLink'
import { endLinks } from '../session/passwordReset.service'
import { checkPlace } from './members.service'
import { stateOf } from './people.presenter'

/** A link that opened something once. */
class Gone extends HttpError {
  constructor(detail: string) {
    super(410, 'gone', 'No longer opens anything', detail)
  }
}

const GONE = {
  used: 'This invitation was used already, and works once. If that was you, sign in. If not, ask the coach who sent it.',
  expired: 'This invitation is past its day. Ask the coach who sent it to send it again.',
  revoked: 'This invitation was taken back. Ask the coach who sent it.',
}

/** The invitation of a link that still works. @throws HttpError 404 and 410, each with what to do */
async function open(manager: EntityManager, secret: string, now: Date): Promise<Invitation> {
  const row = await manager.findOne(Invitation, {
    where: { tokenHash: digestOf(secret) },
    relations: { squadPlayer: true, invitedBy: true },
  })
  if (!row)
    throw new HttpError(
      404,
      'not-found',
      'Not found',
      'This link opens nothing. Copy all of it from the letter, or ask the coach who sent it.',
    )
  const state = stateOf(row, now)
  if (state !== 'out') throw new Gone(GONE[state])
  return row
}

/** What the holder of a link is told: who asks, which team, which role; of a player the first name only. */
export async function lookAtInvitation(
  { manager }: DataSource,
  secret: string,
  now: Date,
): Promise<InvitationLook> {
  const row = await open(manager, secret, now)
  const team = await manager.findOneByOrFail(Team, { id: row.teamId })
  return {
    team: team.name,
    squadName: team.squadName,
    invitedBy: row.invitedBy?.name ?? null,
    role: row.role,
    playerName: row.squadPlayer?.firstName ?? null,
    expiresAt: row.expiresAt,
  }
}

export interface JoinedPerson {
  person: { id: string; name: string }
  teamId: string
}

async function join(
  manager: EntityManager,
  row: Invitation,
  person: { id: string; name: string },
  now: Date,
): Promise<JoinedPerson> {
  const { teamId, squadPlayerId } = row
  if (await manager.existsBy(Membership, { teamId, personId: person.id }))
    throw new Conflict('You are in this team already, so the invitation was left as it is.')
  if (squadPlayerId !== null) await checkPlace(manager, teamId, squadPlayerId, null)
  // A link that a head coach holds was made for an account of her teams only; it must not open this one.
  await endLinks(manager, person.id, now)
  const stamp = now.toISOString()
  await manager.update(
    Invitation,
    { id: row.id },
    { usedAt: stamp, usedById: person.id, updatedAt: stamp, version: row.version + 1 },
  )
  await manager.insert(Membership, {
    id: randomUUID(),
    teamId,
    personId: person.id,
    role: row.role,
    squadPlayerId,
    createdAt: stamp,
  })
  const fields = [{ field: 'usedAt', from: null, to: stamp }]
  await recordChange(manager, Invitation, {
    teamId,
    rowId: row.id,
    action: 'changed',
    by: person.id,
    now,
    fields,
  })
  return { person, teamId }
}

/** The signed-in account joins. Of two at once one wins. @throws HttpError 404, 410, Conflict */
export const joinAsMe = (
  db: DataSource,
  secret: string,
  person: { id: string; name: string },
  now: Date,
): Promise<JoinedPerson> =>
  db.transaction(async (manager) => join(manager, await open(manager, secret, now), person, now))

/** Makes the account and joins, all or nothing. @throws HttpError 404, 410; Conflict for an address with an account */
export async function joinAsNew(db: DataSource, account: NewAccount, now: Date): Promise<JoinedPerson> {
  await open(db.manager, account.secret, now)
  const passwordHash = await hashPassword(account.password)
  return db.transaction(async (manager) => {
    const row = await open(manager, account.secret, now)
    if (await manager.existsBy(Person, { email: account.email }))
      throw new Conflict('This address has an account. Sign in with it first, then open this link again.')
    const person = { id: randomUUID(), name: account.name }
    await manager.insert(Person, {
      ...person,
      email: account.email,
      passwordHash,
      createdAt: now.toISOString(),
    })
    return join(manager, row, person, now)
  })
}

import { In, type DataSource, type EntityManager } from 'typeorm'
import { NOT_KNOWN } from '@shared/people/erasureWords'
import { Change } from '../../database/entities/Change'
import { Copy } from '../../database/entities/Copy'
import { Game } from '../../database/entities/Game'
import { HandOn } from '../../database/entities/HandOn'
import { Invitation } from '../../database/entities/Invitation'
import { Mail } from '../../database/entities/Mail'
import { Opening } from '../../database/entities/Opening'
import { Plan } from '../../database/entities/Plan'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { Team } from '../../database/entities/Team'
import { countSessions } from './eraseSubject'
import type { Subject } from './people.policy'
import { tracesOf, type Traces } from './traces'

/**
 * Everything that one team keeps on one person, field by field; nobody else's name, address or words are in it.
 * @throws NotFound when there is nobody of that id in the team
 */
export async function exportPerson(
  { manager }: DataSource,
  teamId: string,
  subject: Subject,
  now: Date,
): Promise<Record<string, unknown>> {
  const traces = await tracesOf(manager, teamId, subject)
  const team = await manager.findOneByOrFail(Team, { id: teamId })
  return {
    madeAt: now.toISOString(),
    team: { name: team.name, squadName: team.squadName, season: team.season },
    squadPlayer: traces.player && (await squadPlayer(manager, traces)),
    account: traces.person && (await account(manager, traces)),
    invitations: await invitations(manager, traces),
    letters: await letters(manager, traces),
    notKnown: NOT_KNOWN,
  }
}

async function squadPlayer(manager: EntityManager, { teamId, player, plans }: Traces) {
  if (!player) return null
  const { id, jersey, firstName, lastName, skills, outUntil } = player
  const history = await manager.find(Change, { where: { teamId, rowId: id }, order: { at: 'ASC' } })
  const copies = await manager.findBy(Copy, { teamId, squadPlayerId: id })
  return {
    id,
    jersey,
    firstName,
    lastName,
    skills,
    outUntil,
    guardianEmail: player.guardianEmail,
    pictureConsent: player.pictureConsent,
    sprint20: player.sprint20,
    createdAt: player.createdAt,
    updatedAt: player.updatedAt,
    history: history.map(({ action, at, fields }) => ({ action, at, fields })),
    roles: plans.flatMap((plan) => rolesIn(plan, id)),
    copies: copies.map(({ sheetId, number, way, outAt, backAt }) => ({
      sheetId,
      number,
      way,
      outAt,
      backAt,
    })),
  }
}

interface Place {
  gameId: string
  version: number
  signedAt: string | null
  role: string
  counter: string
}

interface Seats {
  name: string
  roles: { role: string; squadPlayerId: string | null }[]
}

/** Her places in one plan: as it was signed, else as it is drafted. */
function rolesIn(plan: Plan, playerId: string): Place[] {
  const about = { gameId: plan.gameId, version: plan.number, signedAt: plan.signedAt }
  const frozen = plan.frozen as { firstCall?: Seats | null; changeUp?: Seats | null } | null
  const seats = [frozen?.firstCall, frozen?.changeUp].filter((one) => one != null)
  if (plan.signedAt === null)
    return plan.roles
      .filter(({ squadPlayerId }) => squadPlayerId === playerId)
      .map(({ role, counterId }) => ({ ...about, role, counter: counterId }))
  return seats.flatMap(({ name, roles }) =>
    roles
      .filter(({ squadPlayerId }) => squadPlayerId === playerId)
      .map(({ role }) => ({ ...about, role, counter: name })),
  )
}

async function account(manager: EntityManager, { teamId, person, membership }: Traces) {
  if (!person || !membership) return null
  const personId = person.id
  const changes = await manager.find(Change, { where: { teamId, personId }, order: { at: 'ASC' } })
  const openings = await manager.findBy(Opening, { teamId, personId })
  const scouted = await manager.findBy(ScoutedGame, { teamId, scoutId: personId })
  const signed = await manager.findBy(Plan, { teamId, signedById: personId })
  const read = await manager.findBy(Game, { teamId, readById: personId })
  const handedOn = await manager.findBy(HandOn, { teamId, fromId: personId })
  const gotBack = await manager.findBy(HandOn, { teamId, toId: personId })
  return {
    id: personId,
    name: person.name,
    email: person.email,
    createdAt: person.createdAt,
    password: 'kept as a digest that cannot be read back',
    signIns: await countSessions(manager, personId),
    membership: { role: membership.role, since: membership.createdAt, mail: membership.mail },
    changes: changes.map(({ kind, rowId, action, at }) => ({ kind, rowId, action, at })),
    opened: openings.map(({ sheetId, firstAt, lastAt }) => ({ sheetId, firstAt, lastAt })),
    gamesWatched: scouted.map(({ id, playedOn }) => ({ id, playedOn })),
    plansSigned: signed.map(({ gameId, number, signedAt }) => ({ gameId, version: number, signedAt })),
    gamesRead: read.map(({ id }) => ({ id })),
    handedOn: handedOn.map(({ gameId, station, note, at }) => ({ gameId, station, note, at })),
    handedTo: gotBack.map(({ gameId, station, at }) => ({ gameId, station, at })),
  }
}

async function invitations(manager: EntityManager, { invitationIds }: Traces) {
  const rows = await manager.findBy(Invitation, { id: In(invitationIds) })
  return rows.map(({ role, email, createdAt, expiresAt, usedAt, revokedAt }) => ({
    role,
    email,
    createdAt,
    expiresAt,
    usedAt,
    revokedAt,
  }))
}

async function letters(manager: EntityManager, { letterIds }: Traces) {
  const rows = await manager.findBy(Mail, { id: In(letterIds) })
  return rows.map(({ kind, recipient, subject, state, createdAt, sentAt }) => ({
    kind,
    recipient,
    subject,
    state,
    createdAt,
    sentAt,
  }))
}

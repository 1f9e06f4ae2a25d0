import type { DataSource, EntityManager } from 'typeorm'
import { labelOf, TEAM_ROLES } from '@shared/vocabulary'
import type { InvitationBody, InvitationMade } from '@shared/people/schemas'
import type { Context } from '../../context'
import { Invitation } from '../../database/entities/Invitation'
import { Person } from '../../database/entities/Person'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { recordChange } from '../../database/history'
import { BadInput, Conflict, NotFound, StaleVersion } from '../../http/problem'
import { linkTo } from '../mail/linkTo'
import { queueMail, withdrawMailAbout } from '../mail/queueMail'
import { digestOf, SECRET_PLACE, secretOf } from '../mail/secretLink'
import { checkPlace } from './members.service'
import { presentInvitation, stateOf } from './people.presenter'

const DAY_MS = 86_400_000
type Server = Pick<Context, 'db' | 'config' | 'sessionSecret'>

const secretFor = (server: Server, id: string) => secretOf(server.sessionSecret, 'invitation', id)
const joinLink = (server: Server, secret: string) => linkTo(server.config, `/join#${secret}`)

async function load(manager: EntityManager, teamId: string, id: string): Promise<Invitation> {
  const relations = { squadPlayer: true, invitedBy: true, usedBy: true }
  const row = await manager.findOne(Invitation, { where: { id, teamId }, relations })
  if (!row) throw new NotFound('invitation')
  return row
}

/** A row as made or sent again: the link is told only when nobody else brings it. */
async function made(server: Server, manager: EntityManager, row: Invitation, now: Date) {
  const whole = await load(manager, row.teamId, row.id)
  const body: InvitationMade = {
    ...presentInvitation(whole, { now, letter: row.email === null ? null : 'waiting' }),
    link: row.email === null ? joinLink(server, secretFor(server, row.id)) : null,
  }
  return { row: whole, body }
}

/** Where the letter goes, or null for a link. @throws BadInput when nobody knows her guardian's address */
function addressOf(body: InvitationBody, guardianEmail: string | null): string | null {
  if (body.way === 'link') return null
  const email = body.email ?? guardianEmail
  if (email === null)
    throw new BadInput([
      { field: 'email', message: 'Her guardian’s address is not known. Write an address, or copy a link.' },
    ])
  return email
}

/**
 * Asks somebody in. The same again is the same invitation, and tells its link again: an answer may get lost on its
 * way. An invitation is never changed; it is taken back and another one is made.
 * @throws NotFound, BadInput, Conflict, StaleVersion
 */
export function putInvitation(
  server: Server,
  options: {
    teamId: string
    id: string
    by: string
    body: InvitationBody
    ifMatch: number | null
    now: Date
  },
) {
  const { teamId, id, by, body, ifMatch, now } = options
  return server.db.transaction(async (manager) => {
    const found = await manager.findOneBy(Invitation, { id })
    if (found && found.teamId !== teamId) throw new NotFound('invitation')
    if (!found && ifMatch !== null) throw new NotFound('invitation')
    const player =
      body.squadPlayerId === null || found
        ? null
        : await checkPlace(manager, teamId, body.squadPlayerId, null)
    if (found) {
      const current = await made(server, manager, found, now)
      if (ifMatch !== null && ifMatch !== found.version)
        throw new StaleVersion(presentInvitation(current.row, { now }), found.version)
      const email =
        body.way === 'link' ? null : (body.email ?? current.row.squadPlayer?.guardianEmail ?? null)
      const same =
        body.role === found.role && body.squadPlayerId === found.squadPlayerId && email === found.email
      if (!same || stateOf(found, now) !== 'out')
        throw new Conflict(
          'An invitation is not changed. Take it back and make another one.',
          presentInvitation(current.row, { now }),
        )
      return { ...current, created: false }
    }
    const stamp = now.toISOString()
    const row = Object.assign(manager.create(Invitation), {
      id,
      teamId,
      role: body.role,
      squadPlayerId: body.squadPlayerId,
      email: addressOf(body, player?.guardianEmail ?? null),
      tokenHash: digestOf(secretFor(server, id)),
      expiresAt: new Date(now.getTime() + body.days * DAY_MS).toISOString(),
      invitedById: by,
      usedAt: null,
      usedById: null,
      revokedAt: null,
      version: 1,
      createdAt: stamp,
      updatedAt: stamp,
      deletedAt: null,
    })
    await manager.insert(Invitation, row as never)
    await recordChange(manager, Invitation, { teamId, rowId: id, action: 'made', by, now })
    await writeLetter(server, manager, row, now)
    return { ...(await made(server, manager, row, now)), created: true }
  })
}

/** "Tue 24 March", where the team is. */
const dayWords = (instant: string, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', { timeZone, weekday: 'long', day: 'numeric', month: 'long' }).format(
    new Date(instant),
  )

async function writeLetter(
  server: Server,
  manager: EntityManager,
  row: Invitation,
  now: Date,
): Promise<void> {
  if (row.email === null) return
  const team = await manager.findOneByOrFail(Team, { id: row.teamId })
  const whole = await load(manager, row.teamId, row.id)
  const asks = whole.invitedBy?.name ?? 'The head coach'
  const name = `${team.name}, ${team.squadName}`
  const player = whole.squadPlayer?.firstName
  await queueMail(manager, {
    teamId: row.teamId,
    kind: 'invitation',
    onceKey: `invitation:${row.id}:${row.version}`,
    aboutId: row.id,
    recipient: row.email,
    subject: player ? `${player} and the sheets of ${name}` : `Join ${name}`,
    body: {
      blocks: [
        { kind: 'heading', text: player ? `${player} is asked in.` : 'You are asked in.', ink: 'our' },
        {
          kind: 'paragraph',
          text: player
            ? `${asks} asks ${player} into ${name}. With an account she opens her own sheet before a game: one page of what they do and what we do.`
            : `${asks} asks you into ${name} as ${labelOf(TEAM_ROLES, row.role)}.`,
        },
        { kind: 'button', label: 'Come in', url: joinLink(server, SECRET_PLACE) },
        {
          kind: 'paragraph',
          text: `This works once, until ${dayWords(row.expiresAt, team.timeZone)}. You choose your own password.`,
        },
      ],
      why: `You get this because ${asks} wrote this address. If you do not know the team, throw the letter away: without the link nothing happens.`,
    },
    now,
  })
}

/** The letter again, or the link again, with new days to run. @throws NotFound, Conflict once it was used or taken back */
export function resendInvitation(
  server: Server,
  options: { teamId: string; id: string; by: string; days: number; now: Date },
) {
  const { teamId, id, days, by, now } = options
  return server.db.transaction(async (manager) => {
    const row = await load(manager, teamId, id)
    if (row.usedAt !== null) throw new Conflict('This invitation was used. There is nothing to send again.')
    if (row.revokedAt !== null) throw new Conflict('This invitation was taken back. Make a new one instead.')
    const next = {
      expiresAt: new Date(now.getTime() + days * DAY_MS).toISOString(),
      version: row.version + 1,
      updatedAt: now.toISOString(),
    }
    const fields = [{ field: 'expiresAt', from: row.expiresAt, to: next.expiresAt }]
    await manager.update(Invitation, { id }, next)
    Object.assign(row, next)
    await recordChange(manager, Invitation, { teamId, rowId: id, action: 'changed', by, now, fields })
    await withdrawMailAbout(manager, id, 'invitation')
    await writeLetter(server, manager, row, now)
    return made(server, manager, row, now)
  })
}

/** Takes it back; a repeat changes nothing. @throws NotFound, StaleVersion, Conflict once it was used */
export function revokeInvitation(
  db: DataSource,
  options: { teamId: string; id: string; by: string; ifMatch: number | null; now: Date },
): Promise<void> {
  const { teamId, id, by, ifMatch, now } = options
  return db.transaction(async (manager) => {
    const row = await findInTeam(manager, Invitation, teamId, id, 'invitation')
    if (row.revokedAt !== null) return
    if (ifMatch !== null && ifMatch !== row.version)
      throw new StaleVersion(presentInvitation(await load(manager, teamId, id), { now }), row.version)
    if (row.usedAt !== null) {
      const who = row.usedById && (await manager.findOneBy(Person, { id: row.usedById }))
      throw new Conflict(`${who ? who.name : 'Somebody'} has used it already. Take the person out instead.`)
    }
    const stamp = now.toISOString()
    await manager.update(Invitation, { id }, { revokedAt: stamp, updatedAt: stamp, version: row.version + 1 })
    await recordChange(manager, Invitation, { teamId, rowId: id, action: 'deleted', by, now })
    await withdrawMailAbout(manager, id, 'invitation')
  })
}

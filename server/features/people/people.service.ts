import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { InvitationRow, PeoplePage } from '@shared/people/schemas'
import { Erasure } from '../../database/entities/Erasure'
import { Invitation } from '../../database/entities/Invitation'
import { Mail } from '../../database/entities/Mail'
import { Membership } from '../../database/entities/Membership'
import { Person } from '../../database/entities/Person'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import {
  presentErasure,
  presentInvitation,
  presentMember,
  presentPlayerLine,
  type WithPerson,
} from './people.presenter'

const ORDER = ['head-coach', 'assistant-coach', 'player']

/** Who is in a team, with and without an account, who is asked in, and who is to be erased. */
export async function readPeople(
  { manager }: DataSource,
  { teamId, callerId, now }: { teamId: string; callerId: string; now: Date },
): Promise<Omit<PeoplePage, 'backupDays'>> {
  const found = await manager.find(Membership, { where: { teamId }, relations: { person: true } })
  const members = found.filter((row): row is WithPerson => row.person != null)
  members.sort(
    (a, b) => ORDER.indexOf(a.role) - ORDER.indexOf(b.role) || a.person.name.localeCompare(b.person.name),
  )
  const heads = members.filter(({ role }) => role === 'head-coach').length
  const squad = await manager.find(SquadPlayer, { where: { teamId }, order: { jersey: 'ASC' } })
  const erasures = await manager.find(Erasure, {
    where: { teamId, doneAt: IsNull(), stoppedAt: IsNull() },
    relations: { askedBy: true, stoppedBy: true },
    order: { dueAt: 'ASC' },
  })
  return {
    members: members.map((row) => presentMember(row, { callerId, heads })),
    players: squad.map((row) =>
      presentPlayerLine(
        row,
        members.find(({ squadPlayerId }) => squadPlayerId === row.id),
      ),
    ),
    invitations: await invitationsOf(manager, teamId, now),
    erasures: await Promise.all(erasures.map(async (row) => presentErasure(row, await nameOf(manager, row)))),
  }
}

async function invitationsOf(manager: EntityManager, teamId: string, now: Date): Promise<InvitationRow[]> {
  const rows = await manager.find(Invitation, {
    where: { teamId },
    relations: { squadPlayer: true, invitedBy: true, usedBy: true },
    order: { createdAt: 'DESC' },
  })
  const letters = await manager.find(Mail, {
    select: { aboutId: true, state: true },
    where: { teamId, kind: 'invitation' },
    order: { createdAt: 'ASC' },
  })
  const newest = new Map(letters.map(({ aboutId, state }) => [aboutId, state]))
  return rows.map((row) => presentInvitation(row, { now, letter: newest.get(row.id) ?? null }))
}

/** Whom an erasure is about, while they are there. */
export async function nameOf(
  manager: EntityManager,
  { kind, subjectId }: Pick<Erasure, 'kind' | 'subjectId'>,
): Promise<string | null> {
  if (kind === 'member') return (await manager.findOneBy(Person, { id: subjectId }))?.name ?? null
  const player = await manager.findOneBy(SquadPlayer, { id: subjectId })
  return player && `${player.firstName} ${player.lastName}`.trim()
}

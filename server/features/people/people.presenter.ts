import type { ErasureRow, InvitationRow, MemberRow, PlayerLine } from '@shared/people/schemas'
import type { Erasure } from '../../database/entities/Erasure'
import type { Invitation } from '../../database/entities/Invitation'
import type { Mail } from '../../database/entities/Mail'
import type { Membership } from '../../database/entities/Membership'
import type { Person } from '../../database/entities/Person'
import type { SquadPlayer } from '../../database/entities/SquadPlayer'
import { metaOf } from '../../http/present'
import { initialsOf } from '../session/session.presenter'

export type WithPerson = Membership & { person: Person }

export const presentMember = (
  row: WithPerson,
  { callerId, heads }: { callerId: string; heads: number },
): MemberRow => ({
  id: row.id,
  version: row.version,
  personId: row.personId,
  name: row.person.name,
  initials: initialsOf(row.person.name),
  role: row.role,
  squadPlayerId: row.squadPlayerId,
  since: row.createdAt,
  you: row.personId === callerId,
  lastHead: row.role === 'head-coach' && heads === 1,
})

export const presentPlayerLine = (row: SquadPlayer, account: Membership | undefined): PlayerLine => ({
  id: row.id,
  jersey: row.jersey,
  firstName: row.firstName,
  lastName: row.lastName,
  guardianEmail: row.guardianEmail,
  pictureConsent: row.pictureConsent,
  memberId: account?.id ?? null,
  since: account?.createdAt ?? null,
})

/** Where an invitation stands: what was decided about it wins over its day. */
export function stateOf(
  row: Pick<Invitation, 'usedAt' | 'revokedAt' | 'expiresAt'>,
  now: Date,
): InvitationRow['state'] {
  if (row.usedAt !== null) return 'used'
  if (row.revokedAt !== null) return 'revoked'
  return row.expiresAt <= now.toISOString() ? 'expired' : 'out'
}

/** `letter`: the newest one that was written for it. */
export const presentInvitation = (
  row: Invitation,
  { now, letter = null }: { now: Date; letter?: Mail['state'] | null },
): InvitationRow => ({
  ...metaOf(row),
  role: row.role,
  squadPlayerId: row.squadPlayerId,
  playerName: row.squadPlayer?.firstName ?? null,
  email: row.email,
  expiresAt: row.expiresAt,
  invitedBy: row.invitedBy?.name ?? null,
  state: stateOf(row, now),
  usedAt: row.usedAt,
  usedBy: row.usedBy?.name ?? null,
  letter,
})

export const presentErasure = (row: Erasure, name: string | null): ErasureRow => ({
  ...metaOf(row),
  kind: row.kind,
  subjectId: row.subjectId,
  name,
  askedBy: row.askedBy?.name ?? null,
  dueAt: row.dueAt,
  stoppedAt: row.stoppedAt,
  stoppedBy: row.stoppedBy?.name ?? null,
  doneAt: row.doneAt,
})

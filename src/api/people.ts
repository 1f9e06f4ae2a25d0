import type { z } from 'zod'
import {
  ErasurePreview,
  ErasureRow,
  InvitationLook,
  InvitationMade,
  Joined,
  MemberRow,
  PeoplePage,
  TeamMade,
  type ErasureBody,
  type InvitationBody,
  type MemberEdit,
  type NewAccount,
  type NewTeam,
} from '@shared/people/schemas'
import type { FirstCoachBySelf } from '@shared/session/firstCoach'
import { request, requestNothing, teamPath } from './http'

/** Who is in a team, asked in, and to be erased. */
export function getPeople(team: string, signal?: AbortSignal): Promise<PeoplePage> {
  return request('GET', teamPath(team, 'people'), PeoplePage, { signal })
}

/** Where the file of everything kept on one person lies. */
export const exportAddress = (team: string, subject: ErasureBody): string =>
  `${teamPath(team, 'people', 'export')}?kind=${subject.kind}&id=${encodeURIComponent(subject.subjectId)}`

export function patchMember(
  team: string,
  id: string,
  body: z.input<typeof MemberEdit>,
  version: number,
): Promise<MemberRow> {
  return request('PATCH', teamPath(team, 'members', id), MemberRow, { body, version })
}

export function deleteMember(team: string, id: string, version: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'members', id), { version })
}

/** Leaves the team oneself. 409 for the only head coach. */
export function leaveTeam(team: string): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'membership'))
}

/** The same id again is the same invitation; its answer alone tells the link. */
export function putInvitation(
  team: string,
  id: string,
  body: z.input<typeof InvitationBody>,
): Promise<InvitationMade> {
  return request('PUT', teamPath(team, 'invitations', id), InvitationMade, { body })
}

export function resendInvitation(team: string, id: string): Promise<InvitationMade> {
  return request('POST', teamPath(team, 'invitations', id, 'resend'), InvitationMade, { body: {} })
}

export function deleteInvitation(team: string, id: string, version: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'invitations', id), { version })
}

export function previewErasure(
  team: string,
  { kind, subjectId }: ErasureBody,
  signal?: AbortSignal,
): Promise<ErasurePreview> {
  return request('GET', teamPath(team, 'erasures', 'preview'), ErasurePreview, {
    query: { kind, subjectId },
    signal,
  })
}

export function putErasure(team: string, id: string, body: ErasureBody): Promise<ErasureRow> {
  return request('PUT', teamPath(team, 'erasures', id), ErasureRow, { body })
}

export function stopErasure(team: string, id: string): Promise<ErasureRow> {
  return request('POST', teamPath(team, 'erasures', id, 'stop'), ErasureRow, { body: {} })
}

/** Who asks, by the secret of a link. 410 once it is over. */
export function lookAtInvitation(secret: string, signal?: AbortSignal): Promise<InvitationLook> {
  return request('POST', '/api/invitations/look', InvitationLook, { body: { secret }, signal })
}

/** Joins: with a new account, or with the secret alone as whoever is signed in. */
export function acceptInvitation(body: NewAccount | Pick<NewAccount, 'secret'>): Promise<Joined> {
  return request('POST', '/api/invitations/accept', Joined, { body })
}

export function postTeam(body: z.input<typeof NewTeam>): Promise<TeamMade> {
  return request('POST', '/api/teams', TeamMade, { body })
}

/** The very first team, with the token that the server printed. */
export function postFirstCoach(body: z.input<typeof FirstCoachBySelf>): Promise<void> {
  return requestNothing('POST', '/api/first-coach', { body })
}

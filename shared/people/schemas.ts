import { z } from 'zod'
import { RulePackKey } from '../court/rulePacks'
import { Id, Name, RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { MAIL_STATES } from '../mail/schemas'
import { Email } from '../session/schemas'
import { TimeZone } from '../session/firstCoach'
import { TEAM_ROLES, valuesOf } from '../vocabulary'

const TeamRoleField = z.enum(valuesOf(TEAM_ROLES))

/** Somebody who signs in to this team. */
export const MemberRow = z.object({
  /** Of the membership. */
  id: z.uuid(),
  version: z.number().int().positive(),
  personId: z.uuid(),
  name: z.string(),
  initials: z.string(),
  role: TeamRoleField,
  squadPlayerId: z.uuid().nullable(),
  since: z.iso.datetime().nullable(),
  you: z.boolean(),
  /** The only head coach: neither demoted nor taken out. */
  lastHead: z.boolean(),
})
export type MemberRow = z.infer<typeof MemberRow>

export const MemberEdit = z
  .object({ role: TeamRoleField, squadPlayerId: Id.nullable().default(null) })
  .superRefine(playersHaveAPlace)
export type MemberEdit = z.infer<typeof MemberEdit>

/** A squad player, who needs no account. */
export const PlayerLine = z.object({
  id: z.uuid(),
  jersey: z.number().int(),
  firstName: z.string(),
  lastName: z.string(),
  guardianEmail: z.string().nullable(),
  pictureConsent: z.enum(['yes', 'no', 'not-asked']),
  /** Her account's membership, when she has one. */
  memberId: z.uuid().nullable(),
  since: z.iso.datetime().nullable(),
})
export type PlayerLine = z.infer<typeof PlayerLine>

/** A role player is somebody's account, and nobody else's role is. */
function playersHaveAPlace(
  value: { role: string; squadPlayerId: string | null },
  context: z.core.$RefinementCtx,
): void {
  const fault = (message: string) => context.addIssue({ code: 'custom', path: ['squadPlayerId'], message })
  if (value.role === 'player' && value.squadPlayerId === null) fault('Choose whose account this is.')
  if (value.role !== 'player' && value.squadPlayerId !== null)
    fault('Only a player’s account belongs to somebody in the squad. Leave this empty.')
}

export const InvitationBody = z
  .object({
    role: TeamRoleField,
    /** For the role player: whose account it makes. */
    squadPlayerId: Id.nullable().default(null),
    way: z.enum(['mail', 'link']),
    /** Where the letter goes; for a player left out it is her guardian's address. */
    email: Email.nullable().default(null),
    days: z.number().int().min(1).max(30).default(LIMITS.invitationDays),
  })
  .superRefine((body, context) => {
    playersHaveAPlace(body, context)
    if (body.way === 'mail' && body.role !== 'player' && body.email === null)
      context.addIssue({ code: 'custom', path: ['email'], message: 'Write the address that it goes to.' })
    if (body.way === 'link' && body.email !== null)
      context.addIssue({
        code: 'custom',
        path: ['email'],
        message: 'A link that you copy goes to no address. Leave this empty.',
      })
  })
export type InvitationBody = z.infer<typeof InvitationBody>

export const INVITATION_STATES = ['out', 'used', 'expired', 'revoked'] as const
export const InvitationRow = RowMeta.extend({
  role: TeamRoleField,
  squadPlayerId: z.uuid().nullable(),
  /** First name of the player that it is for. */
  playerName: z.string().nullable(),
  /** Null: the link was copied. */
  email: z.string().nullable(),
  expiresAt: z.iso.datetime(),
  invitedBy: z.string().nullable(),
  state: z.enum(INVITATION_STATES),
  usedAt: z.iso.datetime().nullable(),
  usedBy: z.string().nullable(),
  /** How its newest letter fares. */
  letter: z.enum(MAIL_STATES).nullable(),
})
export type InvitationRow = z.infer<typeof InvitationRow>

/** Answers the making of an invitation; the one time that a link's secret is told. */
export const InvitationMade = InvitationRow.extend({
  /** The whole address to copy; null when a letter brings it. */
  link: z.string().nullable(),
})
export type InvitationMade = z.infer<typeof InvitationMade>
export const ResendBody = z.object({
  days: z.number().int().min(1).max(30).default(LIMITS.invitationDays),
})

export const ERASURE_KINDS = ['squad-player', 'member'] as const
export const ErasureBody = z.object({
  kind: z.enum(ERASURE_KINDS),
  /** The squad player's or the person's id. */
  subjectId: Id,
})
export type ErasureBody = z.infer<typeof ErasureBody>

export const ErasureRow = RowMeta.extend({
  kind: z.enum(ERASURE_KINDS),
  subjectId: z.uuid(),
  /** Whom it is about, while they are still there. */
  name: z.string().nullable(),
  askedBy: z.string().nullable(),
  dueAt: z.iso.datetime(),
  stoppedAt: z.iso.datetime().nullable(),
  stoppedBy: z.string().nullable(),
  doneAt: z.iso.datetime().nullable(),
})
export type ErasureRow = z.infer<typeof ErasureRow>

const Counted = z.object({ key: z.string(), count: z.number().int().nonnegative() })
/** What an erasure takes and what it leaves, counted; keys are those of erasureWords.ts. */
export const ErasurePreview = z.object({
  name: z.string(),
  dueAt: z.iso.datetime(),
  goes: z.array(Counted),
  stays: z.array(Counted),
  /** The day on which the last backup that holds the person is deleted. */
  backupsUntil: z.iso.date(),
})
export type ErasurePreview = z.infer<typeof ErasurePreview>

export const PeoplePage = z.object({
  members: z.array(MemberRow),
  players: z.array(PlayerLine),
  /** Newest first; used ones stay in sight. */
  invitations: z.array(InvitationRow),
  /** Those that wait for midnight. */
  erasures: z.array(ErasureRow),
  /** Days that a backup is kept. */
  backupDays: z.number().int(),
})
export type PeoplePage = z.infer<typeof PeoplePage>

/** 256 bits as base64url. */
export const Secret = z
  .string()
  .trim()
  .regex(/^[\w-]{20,100}$/, { message: 'This link is not whole. Copy all of it.' })
export const LookBody = z.object({ secret: Secret })

/** What the holder of a link is told before anything is typed. */
export const InvitationLook = z.object({
  team: z.string(),
  squadName: z.string(),
  invitedBy: z.string().nullable(),
  role: TeamRoleField,
  playerName: z.string().nullable(),
  expiresAt: z.iso.datetime(),
})
export type InvitationLook = z.infer<typeof InvitationLook>

const Password = z.string().min(LIMITS.passwordShortest).max(LIMITS.passwordLongest)
/** With a session only the secret is read: the signed-in account joins. */
export const NewAccount = z.object({ secret: Secret, name: Name, email: Email, password: Password })
export type NewAccount = z.infer<typeof NewAccount>
export const Joined = z.object({ teamId: z.uuid() })
export type Joined = z.infer<typeof Joined>

export const NewTeam = z.object({
  name: Name,
  squadName: Name,
  timeZone: TimeZone,
  /** "2026/27". */
  season: z.string().trim().min(1).max(20),
  rulePack: RulePackKey,
})
export type NewTeam = z.infer<typeof NewTeam>
export const TeamMade = z.object({ id: z.uuid() })
export type TeamMade = z.infer<typeof TeamMade>

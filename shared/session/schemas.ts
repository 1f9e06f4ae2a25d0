import { z } from 'zod'
import { LIMITS } from '../limits'
import { TEAM_ROLES, valuesOf } from '../vocabulary'
import { RulePackKey } from '../court/rulePacks'

/** Everything that a person may be allowed to do in a team; the policy table says which role may. */
export const ACTIONS = [
  'opponent:read',
  'opponent:write',
  'game:read',
  'game:write',
  'scouting:read',
  'scouting:write',
  'counter:read',
  'rule:read',
  'rule:write',
  'squad:read',
  'squad:write',
  'plan:read',
  'plan:write',
  'plan:sign-off',
  'sheet:read',
  'sheet:hand-out',
  'sheet:recall',
  'history:read',
  'counter:write',
  'practice:read',
  'practice:write',
  'game:hand-on',
  'team:read',
  'team:write',
  'person:erase',
  'mail:read',
] as const
export type Action = (typeof ACTIONS)[number]

/** RFC 5321: local part 64 octets, address 254 as it stands in a path of 256. Letters are ASCII here, so octets are characters. */
export const Email = z
  .string()
  .trim()
  .toLowerCase()
  .max(LIMITS.email)
  .pipe(z.email())
  .refine((address) => address.indexOf('@') <= LIMITS.emailLocalPart, {
    message: 'This is too long before the @. Check the address.',
  })

export const SignIn = z.object({
  email: Email,
  password: z.string().min(1).max(LIMITS.passwordLongest),
})
export type SignIn = z.infer<typeof SignIn>

export const SessionTeam = z.object({
  id: z.uuid(),
  name: z.string(),
  /** Who they are, e.g. "U17 girls". */
  squadName: z.string(),
  timeZone: z.string(),
  season: z.string(),
  rulePack: RulePackKey,
  role: z.enum(valuesOf(TEAM_ROLES)),
  can: z.array(z.enum(ACTIONS)),
  /** The caller's own squad player, when the caller is one. */
  squadPlayerId: z.uuid().nullable(),
})
export type SessionTeam = z.infer<typeof SessionTeam>

export const Session = z.object({
  person: z.object({ id: z.uuid(), name: z.string(), initials: z.string() }),
  teams: z.array(SessionTeam),
})
export type Session = z.infer<typeof Session>

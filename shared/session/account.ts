import { z } from 'zod'
import { LIMITS } from '../limits'
import { TEAM_ROLES, valuesOf } from '../vocabulary'
import { Email } from './schemas'

/** A password as it is chosen; one that is checked may be shorter, it only has to fit. */
export const NewPassword = z.string().min(LIMITS.passwordShortest).max(LIMITS.passwordLongest)

/** Asks for a link to a new password. */
export const AskPassword = z.object({ email: Email })
export type AskPassword = z.infer<typeof AskPassword>

/** The same whoever asks and whether or not there is such an account. */
export const AskedPassword = z.object({
  /** Whether this server sends mail at all; without one only a head coach can hand on a link. */
  mail: z.boolean(),
})
export type AskedPassword = z.infer<typeof AskedPassword>

/** Spends the link. */
export const UsePasswordLink = z.object({
  token: z.string().min(1).max(200),
  password: NewPassword,
})
export type UsePasswordLink = z.infer<typeof UsePasswordLink>

/** A link that a head coach hands on, told once. */
export const PasswordLink = z.object({ url: z.url(), expiresAt: z.iso.datetime() })
export type PasswordLink = z.infer<typeof PasswordLink>

export const ChangePassword = z.object({
  old: z.string().min(1).max(LIMITS.passwordLongest),
  password: NewPassword,
})
export type ChangePassword = z.infer<typeof ChangePassword>

/** What the page You shows. */
export const Account = z.object({
  name: z.string(),
  email: z.string(),
  teams: z.array(
    z.object({
      id: z.uuid(),
      name: z.string(),
      squadName: z.string(),
      role: z.enum(valuesOf(TEAM_ROLES)),
      /** Whether sheets come by mail. */
      mail: z.boolean(),
    }),
  ),
})
export type Account = z.infer<typeof Account>

export const MailChoice = z.object({ mail: z.boolean() })
export type MailChoice = z.infer<typeof MailChoice>

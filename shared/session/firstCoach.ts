import { z } from 'zod'
import { RulePackKey } from '../court/rulePacks'
import { Name } from '../http/common'
import { LIMITS } from '../limits'
import { Email } from './schemas'

/** An IANA name. Bare offsets are not taken: they know no summer time. */
export const TimeZone = z
  .string()
  .trim()
  .refine(isZone, { message: 'This is not a time zone. Write it as Europe/London.' })

function isZone(name: string): boolean {
  if (!/^[a-z]/i.test(name)) return false
  try {
    new Intl.DateTimeFormat('en-GB', { timeZone: name })
    return true
  } catch {
    return false
  }
}

/** Who sets a club up, in a database without teams, and the team they coach. */
export const FirstCoach = z.object({
  name: Name,
  email: Email,
  team: Name,
  /** Who they are, e.g. "U17 girls". */
  squad: Name,
  zone: TimeZone,
  rules: RulePackKey,
  password: z.string().min(LIMITS.passwordShortest).max(LIMITS.passwordLongest),
})
export type FirstCoach = z.infer<typeof FirstCoach>

/** The same from the first-run page, with the token that the server printed when it started. */
export const FirstCoachBySelf = FirstCoach.extend({
  token: z
    .string()
    .trim()
    .min(1, { message: 'This is missing. Open the address that the server printed.' })
    .max(100),
})
export type FirstCoachBySelf = z.infer<typeof FirstCoachBySelf>

import { z } from 'zod'
import { Day, RowMeta } from '../http/common'
import { Jersey } from '../possessions/schemas'
import { Email } from '../session/schemas'
import { SKILLS } from '../counterWords'

/** 0 not yet, 1 when free, 2 under pressure, 3 our best (common practice, no source). */
export const SkillLevel = z.number().int().min(0).max(3)

export const Skills = z.object(
  Object.fromEntries(SKILLS.map((skill) => [skill.value, SkillLevel])) as Record<
    (typeof SKILLS)[number]['value'],
    typeof SkillLevel
  >,
)
export type Skills = z.infer<typeof Skills>

export const SquadPlayerBody = z.object({
  jersey: Jersey,
  firstName: z.string().trim().min(1).max(40),
  lastName: z.string().trim().max(40).default(''),
  skills: Skills,
  /** Out through this day; null is available. No reason is kept. */
  outUntil: Day.nullable().default(null),
  /** Where invitations and sheets go for a minor. */
  guardianEmail: Email.nullable().default(null),
  /** What the guardian said to pictures; anything but yes is no. */
  pictureConsent: z.enum(['yes', 'no', 'not-asked']).default('not-asked'),
  /** Seconds over 20 m from a standing start, where it was measured. */
  sprint20: z.number().min(2).max(9).nullable().default(null),
})
export type SquadPlayerBody = z.infer<typeof SquadPlayerBody>

export const SquadPlayerRow = RowMeta.extend({ ...SquadPlayerBody.shape, available: z.boolean() })
export type SquadPlayerRow = z.infer<typeof SquadPlayerRow>
export const SquadList = z.object({ rows: z.array(SquadPlayerRow), total: z.number().int() })
export type SquadList = z.infer<typeof SquadList>

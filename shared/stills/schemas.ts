import { z } from 'zod'
import { Day, Id } from '../http/common'
import { LIMITS } from '../limits'
import { Seconds, StillRow } from '../possessions/schemas'
import { Region, StillMarks } from './marks'
import { Caption } from './words'

/** The text fields that come with the picture in the multipart request. */
export const StillFields = z.object({
  t: z
    .string()
    .optional()
    .transform((text) => (text === undefined || text === '' ? null : Number(text)))
    .pipe(Seconds.nullable()),
  caption: Caption.default(''),
})
export type StillFields = z.infer<typeof StillFields>

/** More faces than a picture of ten players and a bench can show. */
const Faces = z.number().int().min(0).max(99)

/** A change of some fields of a still. */
export const StillPatch = z
  .object({
    marks: StillMarks.optional(),
    caption: Caption.optional(),
    t: Seconds.nullable().optional(),
    /** Place among the stills of its possession, from 1; the others make room. */
    position: z.number().int().min(1).max(999).optional(),
    facesLeft: Faces.nullable().optional(),
    inReport: z.boolean().optional(),
    expiresOn: Day.optional(),
  })
  .strict()
export type StillPatch = z.infer<typeof StillPatch>

/** Parts of a picture to be burned away for good. */
export const BlurBody = z
  .object({
    regions: z.array(Region).min(1).max(24),
    /** Faces that can still be made out after it; without it, as many fewer as there are regions. */
    facesLeft: Faces.optional(),
  })
  .strict()
export type BlurBody = z.infer<typeof BlurBody>

/** Which stills of an opponent: all, or those chosen for the report. */
export const OpponentStillsQuery = z.object({
  report: z.enum(['0', '1']).default('0'),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageRows).default(50),
  offset: z.coerce.number().int().min(0).default(0),
})
export type OpponentStillsQuery = z.input<typeof OpponentStillsQuery>

/** A still with the row it hangs on. */
export const OpponentStill = StillRow.extend({
  possessionId: Id,
  scoutedGameId: Id.nullable(),
  gameId: Id.nullable(),
  /** Number of the possession in its game. */
  number: z.number().int(),
})
export type OpponentStill = z.infer<typeof OpponentStill>

export const OpponentStills = z.object({ rows: z.array(OpponentStill), total: z.number().int() })
export type OpponentStills = z.infer<typeof OpponentStills>

import { z } from 'zod'
import { Seconds } from '../possessions/schemas'

/** The text fields that come with the picture in the multipart request. */
export const StillFields = z.object({
  t: z
    .string()
    .optional()
    .transform((text) => (text === undefined || text === '' ? null : Number(text)))
    .pipe(Seconds.nullable()),
  caption: z.string().trim().max(80).default(''),
})
export type StillFields = z.infer<typeof StillFields>

import { z } from 'zod'

/** What a head coach sets for the team; a stored row may lack any of it, then the default holds. */
export const TeamSettings = z.object({
  /** A guardian without an account gets the page itself with the letter; else the letter only says so. */
  attachSheet: z.boolean().default(false),
})
export type TeamSettings = z.infer<typeof TeamSettings>

/** The settings of a stored row; what can no longer be read has its default. */
export function settingsOf(stored: unknown): TeamSettings {
  const parsed = TeamSettings.safeParse(stored ?? {})
  return parsed.success ? parsed.data : TeamSettings.parse({})
}

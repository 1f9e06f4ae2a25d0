import { z } from 'zod'
import { OwnCourt } from '../court/ownCourt'
import { RulePackKey } from '../court/rulePacks'
import { Name } from '../http/common'
import { TimeZone } from '../session/firstCoach'
import { Figures } from './figures'

/** What a head coach sets for the team; a stored row may lack any of it, then the default holds. */
export const TeamSettings = z.object({
  /** A guardian without an account gets the page itself with the letter; else the letter only says so. */
  attachSheet: z.boolean().default(false),
  /** Figures of the engine that differ from their defaults. */
  figures: Figures.default({}),
  /** Our hall's own sides and counts, on top of the rule set; null is the book's court. */
  ownCourt: OwnCourt.nullable().default(null),
})
export type TeamSettings = z.infer<typeof TeamSettings>

/** The settings of a stored row; what can no longer be read has its default. */
export function settingsOf(stored: unknown): TeamSettings {
  const parsed = TeamSettings.safeParse(stored ?? {})
  return parsed.success ? parsed.data : TeamSettings.parse({})
}

/** A team as its head coach keeps it. */
export const TeamBody = z.object({
  name: Name,
  /** Who they are, e.g. "U17 girls". */
  squadName: Name,
  timeZone: TimeZone,
  /** e.g. "2026/27". */
  season: z
    .string()
    .trim()
    .regex(/^\d{4}[/-]\d{2}$/, { message: 'Write the season as 2026/27.' }),
  rulePack: RulePackKey,
  settings: TeamSettings,
})
export type TeamBody = z.infer<typeof TeamBody>

export const TeamRow = TeamBody.extend({ id: z.uuid(), version: z.number().int().positive() })
export type TeamRow = z.infer<typeof TeamRow>

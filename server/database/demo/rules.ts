import { ENTRY_RULES } from './rules/entry'
import { OWN_RULES } from './rules/own'
import { PERSON_RULES } from './rules/person'
import { READ_RULES } from './rules/reads'
import type { DemoRule } from './rules/terms'
import { ZONE_RULES } from './rules/zones'

/**
 * The rules a new team starts with: those of DOMAIN.md section 4 that the record, the squad, the rule set
 * and the book can answer, by its numbers. All of it is common practice, no source, and the head coach may
 * change every line. A rule's first demand carries its strength (S strong, M medium, L light); what it asks
 * besides is one step lighter, so that one rule never counts as several. Thresholds are one half and the
 * grade is lean unless a rule names its own; starred rules act on one sighting. What only the bench can see
 * in the game (the count, the score, a tired player) is a warning, never a condition.
 */
export const DEMO_RULES: DemoRule[] = [
  ...ENTRY_RULES,
  ...ZONE_RULES,
  ...PERSON_RULES,
  ...READ_RULES,
  ...OWN_RULES,
]

import { z } from 'zod'
import { Id } from '../http/common'
import { RuleBody } from '../rules/schemas'
import { Interval } from '../tendencies/schemas'
import { Role } from '../court/diagram'
import { STRENGTHS } from '../counterWords'
import { valuesOf } from '../vocabulary'

/** One line for or against a counter: the rule, the habit behind it, the count, the weight and its sign. */
export const Reason = z.object({
  ruleId: z.uuid(),
  ruleNumber: z.number().int().nullable(),
  title: z.string(),
  /** The habit's key, when the rule rests on one; opens its possessions. */
  habitKey: z.string().nullable(),
  because: z.string(),
  k: z.number().int().nullable(),
  n: z.number().int().nullable(),
  games: z.number().int().nullable(),
  /** Every habit that fired the rule, the first of them above; each opens its possessions. */
  facts: z.array(
    z.object({
      habitKey: z.string(),
      k: z.number().int(),
      n: z.number().int(),
      games: z.number().int(),
      thin: z.boolean(),
    }),
  ),
  /** What the rule asked, e.g. "wants middle entry". */
  asked: z.string(),
  sign: z.union([z.literal(1), z.literal(-1)]),
  strength: z.enum(valuesOf(STRENGTHS)),
  /** Probability that the habit is past the rule's threshold, 0 to 1; 1 for a starred rule. */
  credence: z.number(),
  /** sign x strength x credence, on the logit scale. */
  weight: z.number(),
  thin: z.boolean(),
})
export type Reason = z.infer<typeof Reason>

export const RoleFit = z.object({
  role: Role,
  title: z.string(),
  squadPlayerId: z.uuid().nullable(),
  runnerUpId: z.uuid().nullable(),
  /** Share of what the role asks that the player meets, 0 to 1. */
  fit: z.number(),
})
export type RoleFit = z.infer<typeof RoleFit>

export const Choice = z.object({
  counterId: z.uuid(),
  rank: z.number().int().min(1),
  /** Posterior mean and 80 % interval; null when nothing is known (no pressed rows, or sightings only). */
  expected: z.object({ mean: z.number(), interval: Interval }).nullable(),
  /** Our own game trips with it against the shape they show most, as counted. */
  record: z.object({ k: z.number().int(), n: z.number().int() }),
  /** How much of the expected success is record, 0 to 1; the rest is reasons. */
  recordShare: z.number(),
  /** What the reasons alone say, before the record; null when nothing is known. */
  prior: z.number().nullable(),
  reasons: z.array(Reason),
  warnings: z.array(z.object({ ruleId: z.uuid(), text: z.string() })),
  /** Logit term from 0 (every role well filled) to -1. */
  squadTerm: z.number(),
  roles: z.array(RoleFit),
  gameReady: z.boolean(),
})
export type Choice = z.infer<typeof Choice>

export const Choices = z.object({
  gameId: z.uuid(),
  opponentId: z.uuid(),
  /** True: no pressed rows, or all sightings. The universal counter comes first and no number is given. */
  unknown: z.boolean(),
  /** Our own success against pressure that every prior starts from. */
  base: z.object({ k: z.number().int(), n: z.number().int(), mean: z.number() }),
  /** The shape they show most and what others got through against them, when counted. */
  mostly: z.object({ shape: z.string(), k: z.number().int(), n: z.number().int() }).nullable(),
  others: z.object({ k: z.number().int(), n: z.number().int() }),
  choices: z.array(Choice),
  leftOut: z.array(z.object({ counterId: z.uuid(), reason: z.string(), ruleId: z.uuid().nullable() })),
  /** Rules that stayed silent because of a contra-fact. */
  silenced: z.array(z.object({ ruleId: z.uuid(), because: z.string() })),
  warnings: z.array(z.object({ ruleId: z.uuid(), text: z.string() })),
})
export type Choices = z.infer<typeof Choices>

/**
 * What would turn the order: if their next rows showed a habit so often, another counter would lead. `counterId` is
 * the counter that it is told of; for the one that leads `leads` takes its place, for the others it is itself.
 */
export const Turn = z.object({
  counterId: z.uuid(),
  habitKey: z.string(),
  /** Whether more or less of the habit would do it. */
  is: z.enum(['more', 'less']),
  /** So many of the next `of` rows. */
  rows: z.number().int(),
  of: z.number().int(),
  leads: z.uuid(),
})
export type Turn = z.infer<typeof Turn>
export const Turns = z.object({ rows: z.array(Turn), total: z.number().int() })
export type Turns = z.infer<typeof Turns>

/** A rule as it would read, for the order it would give. */
export const RulePreview = z.object({ id: Id, rule: RuleBody })
export type RulePreview = z.infer<typeof RulePreview>

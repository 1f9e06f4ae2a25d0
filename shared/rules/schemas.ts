import { z } from 'zod'
import { RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { STRENGTHS, TRAITS } from '../counterWords'
import { GRADES, valuesOf } from '../vocabulary'

/** Facts that are not habits: counts of the record, our squad, the rule set, the book. */
export const FACTS = [
  /** Pressed rows counted for the opponent. */
  'pressedRows',
  /** Available players who handle under pressure (handle 2 or more). */
  'handlers',
  /** Available players with a long arm (long-arm 2 or more). */
  'longArms',
  /** Available middle players (decide 2 or more). */
  'middlePlayers',
  /** Backcourt count, seconds. */
  'backcourtCount',
  /** Available players in all. */
  'available',
  /** Available players who throw in under pressure (throw-in 2 or more) and dribble at least when free. */
  'dribblingThrowers',
  /** Available players who handle best of all (handle 3). */
  'bestHandlers',
  /** Available long arms besides our best handlers: those of the highest handle among the available. */
  'otherLongArms',
  /** Available players who sprint (sprint 2 or more). */
  'sprinters',
  /** 1 where the thrower's team gets a time-out once the thrower has the ball, else 0. */
  'timeOutWhileThrowing',
  /** Pressed rows of the opponent after a made basket or a made free throw. */
  'pressedAfterScore',
  /** Pressed rows after the last free throw. */
  'pressedAfterFreeThrow',
  /** Pressed rows after a whistle. */
  'pressedAfterDeadBall',
  /** Pressed rows on the first ball after a time-out or a new period. */
  'pressedAfterBreak',
  /** Pressed rows in which they showed one shape and played another. */
  'disguised',
  /** Throw-ins of our own games on which the count ran out. */
  'ownThrowInCounts',
  /** Days from the newest counted game of theirs to our game; no answer while none is counted. */
  'filmDays',
  /** Most passes in the middle that one of theirs, known by her number, has taken. */
  'theirStealsInMiddle',
  /** Our own passes in the middle that were taken, in our games. */
  'ourStealsInMiddle',
  /** 1 where a time-out late in the game lets the coach move the throw-in up the court, else 0. */
  'timeOutAdvance',
  /** Counters of the book with a screen that its defender cannot see. */
  'blindScreens',
] as const
export const FactName = z.enum(FACTS)
export type FactName = z.infer<typeof FactName>

/** A habit's adjusted rate against a threshold, from a grade up. `seen` is one sighting: k of 1 or more. */
export const HabitCondition = z.object({
  habit: z.string().max(60),
  is: z.enum(['above', 'below', 'seen']),
  threshold: z.number().min(0).max(1).default(0.5),
  grade: z.enum(valuesOf(GRADES)).default('lean'),
})
export const FactCondition = z.object({
  fact: FactName,
  is: z.enum(['equal', 'at-least', 'at-most']),
  value: z.number(),
})
export type HabitCondition = z.infer<typeof HabitCondition>
export type FactCondition = z.infer<typeof FactCondition>
export type Condition = HabitCondition | FactCondition | { all: Condition[] } | { any: Condition[] }
export const Condition: z.ZodType<Condition> = z.lazy(() =>
  z.union([
    HabitCondition,
    FactCondition,
    z.object({ all: z.array(Condition).min(1).max(8) }),
    z.object({ any: z.array(Condition).min(1).max(8) }),
  ]),
)

export const Demand = z.discriminatedUnion('effect', [
  z.object({
    effect: z.enum(['want', 'avoid']),
    trait: z.enum(valuesOf(TRAITS)),
    strength: z.enum(valuesOf(STRENGTHS)),
  }),
  z.object({ effect: z.literal('ban'), trait: z.enum(valuesOf(TRAITS)) }),
  z.object({ effect: z.literal('warn'), text: z.string().max(LIMITS.reasonSentence) }),
])
export type Demand = z.infer<typeof Demand>

export const RuleBody = z.object({
  /** DOMAIN.md section 4's number; null for a rule of the team's own. */
  number: z.number().int().min(1).max(99).nullable(),
  /** What the rule is about, e.g. "2-2-1: fill the middle". */
  title: z.string().min(1).max(60),
  when: Condition,
  then: z.array(Demand).min(1).max(5),
  because: z.string().min(1).max(LIMITS.reasonSentence),
  /** Contra-facts: while they hold the rule stays silent and says so. */
  unless: Condition.nullable().default(null),
  unlessBecause: z.string().max(LIMITS.reasonSentence).default(''),
  /** Acts on one sighting; credence 1. */
  starred: z.boolean().default(false),
  on: z.boolean().default(true),
})
export type RuleBody = z.infer<typeof RuleBody>

export const RuleRow = RowMeta.extend(RuleBody.shape)
export type RuleRow = z.infer<typeof RuleRow>
export const RuleList = z.object({ rows: z.array(RuleRow), total: z.number().int() })
export type RuleList = z.infer<typeof RuleList>

import { z } from 'zod'
import { RowMeta } from '../http/common'
import { Diagram, Role } from '../court/diagram'
import { RulePackKey } from '../court/rulePacks'
import { FAMILIES, SKILLS, TRAITS } from '../counterWords'
import { valuesOf } from '../vocabulary'
import { SkillLevel } from '../squad/schemas'

export const CounterRole = z.object({
  role: Role,
  /** What the role is, e.g. "thrower" or "middle". */
  title: z.string().max(40),
  needs: z.array(z.object({ skill: z.enum(valuesOf(SKILLS)), level: SkillLevel })).max(3),
  /** What this player does, in order, to the player ("Screen for 4, then come to the ball."). At most four. */
  jobs: z.array(z.string().max(80)).max(4),
  /** The one line for this role when the counter is the change-up. */
  changeUpLine: z.string().max(80),
  /** Index of the step in which this role decides. */
  keyStep: z.number().int().min(0).max(11),
})
export type CounterRole = z.infer<typeof CounterRole>

export const CounterBody = z.object({
  name: z.string().trim().min(1).max(40),
  family: z.enum(valuesOf(FAMILIES)),
  /** Where they stand, in a few words. */
  alignment: z.string().max(60),
  call: z.string().max(20),
  /** Shown by hand; never printed on a sheet. */
  signal: z.string().max(40),
  traits: z.array(z.enum(valuesOf(TRAITS))),
  diagram: Diagram,
  roles: z.array(CounterRole).length(5),
  /** Passing options in order. */
  looks: z.array(z.string().max(60)).min(1).max(4),
  teachingPoints: z.array(z.string().max(90)).max(6),
  cautions: z.array(z.string().max(120)).max(4),
  /** Said to players, e.g. "Don’t catch in the corner." */
  donts: z.array(z.string().max(60)).max(3),
  rulePacks: z.array(RulePackKey).min(1),
  /** Live repetitions in practice to date. */
  liveReps: z.number().int().min(0).max(9999),
  /** Practice trips against a press, and how many got through. */
  practice: z.object({ k: z.number().int().min(0), n: z.number().int().min(0) }).default({ k: 0, n: 0 }),
  /** Actions in it that the squad has not yet run; breaks ties. */
  newActions: z.number().int().min(0).max(20),
})
export type CounterBody = z.infer<typeof CounterBody>

/**
 * A counter that is still being drawn: it may have no name, no look and no rule set yet, and its drawing may have
 * faults. It is kept as it is and never offered; counterFaults says what is left to do.
 */
export const CounterDraft = CounterBody.extend({
  name: z.string().trim().max(40),
  looks: z.array(z.string().max(60)).max(4),
  rulePacks: z.array(RulePackKey),
})
export type CounterDraft = z.infer<typeof CounterDraft>

/** What is put: in the book (`draft: false`) only without faults. */
export const CounterInput = CounterDraft.extend({ draft: z.boolean().default(false) })
export type CounterInput = z.infer<typeof CounterInput>

/** Which counters are listed: the book, those still being drawn, those taken out of it, or all of them. */
export const CounterQuery = z.object({ show: z.enum(['book', 'drafts', 'archived', 'all']).default('book') })
export type CounterShow = z.infer<typeof CounterQuery>['show']

/** Our own record with it: game trips against a shape, and practice trips. */
export const CounterRecord = z.object({
  shape: z.string(),
  k: z.number().int(),
  n: z.number().int(),
})

export const CounterRow = RowMeta.extend({
  ...CounterDraft.shape,
  /** Still being drawn: never offered. */
  draft: z.boolean().default(false),
  /** When it was taken out of the book; null while it is in it. */
  archivedAt: z.iso.datetime().nullable().default(null),
  /** When it was last walked on a screen. */
  walkedAt: z.iso.datetime().nullable().default(null),
  record: z.array(CounterRecord),
  /**
   * What practices logged of `liveReps` and `practice`: live reps, and of how many it was counted who got
   * through. Take it off both before the row is written back.
   */
  logged: z.object({ n: z.number().int(), counted: z.number().int(), k: z.number().int() }).optional(),
})
export type CounterRow = z.infer<typeof CounterRow>
export const CounterList = z.object({ rows: z.array(CounterRow), total: z.number().int() })
export type CounterList = z.infer<typeof CounterList>

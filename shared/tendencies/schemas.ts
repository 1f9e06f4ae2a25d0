import { z } from 'zod'
import { Id } from '../http/common'
import { PossessionRow } from '../possessions/schemas'
import { SpotName, SpotSide } from '../court/trapSpots'
import { CLAIMS, GRADES, PICKUPS, SHAPES, TRIGGERS, valuesOf } from '../vocabulary'

/** The situation; every filter may be left out or empty. Lists come as comma-separated text in the query. */
export const list = <T extends z.ZodType<unknown, unknown>>(item: T) =>
  z
    .string()
    .transform((text): unknown[] => text.split(',').filter(Boolean))
    .pipe(z.array(item).max(60) as z.ZodType<z.output<T>[], unknown[]>)
    .transform((values) => (values.length > 0 ? values : undefined))
    .optional()

export const MARGINS = ['behind', 'level', 'ahead'] as const

export const TendencyFilter = z.object({
  trigger: list(z.enum(valuesOf(TRIGGERS))),
  period: list(z.coerce.number().int().min(1).max(10)),
  /** The pressing team's margin: behind by 6 or more, within 5, ahead by 6 or more. */
  margin: list(z.enum(MARGINS)),
  pickup: list(z.enum(valuesOf(PICKUPS))),
  shape: list(z.enum(valuesOf(SHAPES))),
  game: list(Id),
})
export type TendencyFilter = z.infer<typeof TendencyFilter>

export const Interval = z.object({ low: z.number(), high: z.number() })
export type Interval = z.infer<typeof Interval>

export const Tendency = z.object({
  key: z.string(),
  k: z.number().int(),
  n: z.number().int(),
  /** Games behind n. */
  games: z.number().int(),
  /** k / n; null when nothing was counted. */
  rate: z.number().nullable(),
  /** Wilson 95 % of the raw k of n: the only interval that is drawn as a bar. */
  interval: Interval.nullable(),
  grade: z.enum(valuesOf(GRADES)),
  claim: z.enum(valuesOf(CLAIMS)),
  thin: z.boolean(),
  /** Recency, clustering and pooling taken in; for the engine, never drawn as the raw bar. */
  adjusted: z.object({ mean: z.number(), low80: z.number(), high80: z.number() }).nullable(),
})
export type Tendency = z.infer<typeof Tendency>

export const Situation = z.object({
  trigger: z.union([z.enum(valuesOf(TRIGGERS)), z.literal('all')]),
  pressed: z.number().int(),
  n: z.number().int(),
})

export type Situation = z.infer<typeof Situation>

export const TendencyRead = z.object({
  opponentId: z.uuid(),
  /** Rows in the filter that count, and rows left out because their stretch was not covered. */
  counted: z.number().int(),
  notCovered: z.number().int(),
  games: z.array(
    z.object({
      id: z.uuid(),
      kind: z.enum(['scouted', 'ours']),
      label: z.string(),
      playedOn: z.string(),
      rows: z.number().int(),
    }),
  ),
  /** Always over the other filters, so that the filter bar shows what each choice would hold. */
  situations: z.array(Situation),
  tendencies: z.array(Tendency),
  /** Their median pick-up, k of n at it; for the front on the court. Null when none was logged. */
  pickup: z
    .object({ value: z.enum(valuesOf(PICKUPS)), k: z.number().int(), n: z.number().int(), thin: z.boolean() })
    .nullable(),
  /** Counts per trap spot and side, all traps of a possession; for the court. */
  spots: z.array(
    z.object({
      spot: SpotName,
      side: SpotSide,
      k: z.number().int(),
      n: z.number().int(),
      order: z.enum(['first', 'later']),
    }),
  ),
  /**
   * Where the ball is after each second from the first touch: the middle of the n pressed rows whose track says, as a
   * fraction of the court. Empty where no track was logged.
   */
  ball: z.array(z.object({ second: z.number().int(), x: z.number(), n: z.number().int() })).default([]),
  /** How many claims are in view and how many of them chance alone would give at a true rate of one half. */
  luck: z.object({ inView: z.number().int(), claimed: z.number().int(), byChance: z.number() }),
})
export type TendencyRead = z.infer<typeof TendencyRead>

/** The rows behind one habit: those in n, and of each whether it is in k. */
export const EvidenceQuery = TendencyFilter.extend({
  habit: z.string().max(60),
  limit: z.coerce.number().int().min(1).max(200).default(100),
  offset: z.coerce.number().int().min(0).default(0),
})
export const Evidence = z.object({
  rows: z.array(z.object({ possession: PossessionRow, counted: z.boolean(), gameLabel: z.string() })),
  total: z.number().int(),
})
export type Evidence = z.infer<typeof Evidence>

import { z } from 'zod'
import { Id, RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { SpotName, SpotSide } from '../court/trapSpots'
import { FALLBACKS, FINISHES, FORCED_SIDES } from '../filmWords'
import { StillMarks } from '../stills/marks'
import {
  DENIED,
  GOALIES,
  HANDLERS,
  LANES,
  NOT_PRESSED,
  NOT_VISIBLE,
  ON_BALL,
  OUTCOMES,
  OUTCOME_PLACES,
  PICKUPS,
  SHAPES,
  SHAPE_VARIANTS,
  THROWER_GUARDS,
  TRAP_CUES,
  TRAP_RESULTS,
  TRIGGERS,
  valuesOf,
  type Term,
} from '../vocabulary'

/** Null: not logged. `not-visible`: looked for, could not be seen. Neither enters a denominator. */
const seen = <T extends string>(list: readonly Term<T>[]) =>
  z
    .union([z.enum(valuesOf(list)), z.literal(NOT_VISIBLE)])
    .nullable()
    .default(null)

/** An empty list says that the scout looked and there was none. */
const seenList = <T extends string>(list: readonly Term<T>[]) =>
  z
    .union([
      z
        .array(z.enum(valuesOf(list)))
        .max(list.length)
        .transform((values) => [...new Set(values)].sort()),
      z.literal(NOT_VISIBLE),
    ])
    .nullable()
    .default(null)

/** A player's shirt number. */
export const Jersey = z.number().int().min(0).max(LIMITS.jersey)

/** Seconds from the first legal touch in court, to a tenth. */
export const Seconds = z
  .number()
  .min(0)
  .max(LIMITS.seconds)
  .transform((value) => Math.round(value * 10) / 10)

/** Shirt numbers, each once; an empty list says that none could be read. */
const numbers = (most: number) =>
  z
    .array(Jersey)
    .max(most)
    .transform((values) => [...new Set(values)].sort((a, b) => a - b))
    .nullable()
    .default(null)

/** One shirt number, or that it was looked for and not seen. */
const oneNumber = z
  .union([Jersey, z.literal(NOT_VISIBLE)])
  .nullable()
  .default(null)

const count = (most: number) => z.number().int().min(0).max(most).nullable().default(null)

export const Trap = z.object({
  x: z.number().min(0).max(1),
  y: z.number().min(0).max(1),
  t: Seconds.nullable().default(null),
  cue: seen(TRAP_CUES),
  trappers: numbers(3),
  result: seen(TRAP_RESULTS),
})
export type Trap = z.infer<typeof Trap>

export const TrackPoint = z.object({
  t: z.number().min(-10).max(LIMITS.seconds),
  x: z.number().min(-0.1).max(1.05),
  y: z.number().min(-0.1).max(1.1),
  kind: z.enum(['pass', 'dribble', 'catch', 'throw-in']),
})
export type TrackPoint = z.infer<typeof TrackPoint>

/** What a scout writes: quick fields first, then the film fields that feed the habits. */
const PossessionFields = z.object({
  /** The landmark court that its places are fractions of (RECORD.md section 2). */
  frame: z.literal(1).default(1),
  scoutedGameId: Id.nullable().default(null),
  gameId: Id.nullable().default(null),
  /** Rows of one trip up the court share it: a fresh throw-in within the trip is a new row. */
  tripId: Id.nullable().default(null),
  /** Order in its game, from 1. */
  number: z.number().int().min(1).max(999),
  period: z.number().int().min(1).max(LIMITS.periods).nullable().default(null),
  /** Tenths of a second left in the period. */
  clock: z.number().int().min(0).max(12_000).nullable().default(null),
  /** The pressing team's score minus the other's. */
  margin: z.number().int().min(-99).max(99).nullable().default(null),
  trigger: z.enum(valuesOf(TRIGGERS)),
  shape: z.enum(valuesOf(SHAPES)).nullable().default(null),
  shapeVariant: z.enum(valuesOf(SHAPE_VARIANTS)).nullable().default(null),
  pickup: seen(PICKUPS),
  /** In order. An empty list: looked, no trap. */
  traps: z
    .union([z.array(Trap).max(LIMITS.traps), z.literal(NOT_VISIBLE)])
    .nullable()
    .default(null),
  outcome: z.enum(valuesOf(OUTCOMES)).nullable().default(null),
  outcomePlace: seen(OUTCOME_PLACES),
  throwerGuard: seen(THROWER_GUARDS),
  denied: seenList(DENIED),
  tookAway: seenList(LANES),
  leftOpen: seenList(LANES),
  onBall: seen(ON_BALL),
  handler: seen(HANDLERS),
  goalie: seen(GOALIES),
  shownShape: z.enum(valuesOf(SHAPES)).nullable().default(null),
  /** Where the ball-handler was steered. */
  forcedSide: seen(FORCED_SIDES),
  /** Where the throw-in was caught; its spot follows. */
  entrySpot: z
    .union([z.object({ x: z.number().min(0).max(1), y: z.number().min(0).max(1) }), z.literal(NOT_VISIBLE)])
    .nullable()
    .default(null),
  /** Whoever caught the throw-in, by the offence's shirt number. */
  receiver: oneNumber,
  /** The pressing five, by shirt number. */
  onFloor: numbers(5),
  /** Whoever took the ball, by the pressing team's shirt number. */
  thief: oneNumber,
  passes: count(30),
  /** Changes of side. */
  reversals: count(20),
  /** What they played once the press was over. */
  fallback: seen(FALLBACKS),
  finish: seen(FINISHES),
  /** Scored by the offence before its control ended, free throws with them. */
  points: count(6),
  /** Scored by the pressing team within eight seconds of a live loss. */
  pointsAgainst: count(6),
  timeOutBurned: z.boolean().nullable().default(null),
  /** Seconds from the start of the film. */
  filmTime: z.number().min(0).max(36_000).nullable().default(null),
  crossedAt: Seconds.nullable().default(null),
  track: z.array(TrackPoint).max(LIMITS.track).nullable().default(null),
  note: z.string().trim().max(LIMITS.note).default(''),
  /** Only on a row of one of our own games. */
  counterId: Id.nullable().default(null),
  rightCall: z.boolean().nullable().default(null),
  runWell: z.boolean().nullable().default(null),
})

/** The rules that tie fields together; each names the field and the remedy. */
function crossCheck(row: z.infer<typeof PossessionFields>, ctx: z.RefinementCtx): void {
  const fault = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message })
  if ((row.scoutedGameId === null) === (row.gameId === null))
    fault('scoutedGameId', 'Give either scoutedGameId or gameId, and only one of them.')
  const pressed = row.shape !== null && !NOT_PRESSED.includes(row.shape)
  if (!pressed && row.pickup !== null) fault('pickup', 'Pick-up is asked only when they press. Take it out.')
  if (!pressed && Array.isArray(row.traps) && row.traps.length > 0)
    fault('traps', 'They did not press here. Take the traps out or change the shape.')
  if (row.shapeVariant !== null) {
    const parent = SHAPE_VARIANTS.find((variant) => variant.value === row.shapeVariant)?.parent
    if (parent !== row.shape) fault('shapeVariant', 'This refines another shape. Change one of the two.')
  }
  if (row.outcome !== 'lost-live' && row.pointsAgainst !== null)
    fault('pointsAgainst', 'Asked only after a live loss. Take it out or change how it ended.')
  if (row.trigger === 'live' && (row.entrySpot !== null || row.receiver !== null))
    fault(
      row.entrySpot !== null ? 'entrySpot' : 'receiver',
      'Nobody threw in here. Take it out or change what came before.',
    )
  if (row.gameId === null) {
    for (const field of ['counterId', 'rightCall', 'runWell'] as const)
      if (row[field] !== null) fault(field, 'Only a row of one of our own games carries this. Take it out.')
  }
}

export const PossessionBody = PossessionFields.superRefine(crossCheck)
export type PossessionBody = z.infer<typeof PossessionBody>
/** What a form holds before parsing. */
export type PossessionInput = z.input<typeof PossessionBody>

/** A change of some fields; the whole row is checked again after it. */
export const PossessionPatch = z
  .object(
    Object.fromEntries(
      Object.entries(PossessionFields.shape).map(([key, field]) => [
        key,
        (field instanceof z.ZodDefault ? field.unwrap() : field).optional(),
      ]),
    ) as unknown as {
      [K in keyof typeof PossessionFields.shape]: z.ZodOptional<(typeof PossessionFields.shape)[K]>
    },
  )
  .strict()
export type PossessionPatch = Partial<PossessionBody>

export const StillRow = z.object({
  id: z.uuid(),
  version: z.number().int().positive(),
  position: z.number().int(),
  /** Seconds from the first touch, where known. */
  t: z.number().nullable(),
  caption: z.string(),
  width: z.number().int(),
  height: z.number().int(),
  url: z.string(),
  thumbnailUrl: z.string(),
  marks: StillMarks,
  /** Parts burned away; what was under them is gone. */
  blurred: z.number().int(),
  /** Faces that can still be made out; null: nobody has counted. */
  facesLeft: z.number().int().nullable(),
  inReport: z.boolean(),
  /** The last day it is kept, in the team's zone; null until the next sweep gives it one. */
  expiresOn: z.iso.date().nullable(),
})
export type StillRow = z.infer<typeof StillRow>

export const PossessionRow = RowMeta.extend({
  ...PossessionFields.shape,
  traps: z
    .union([z.array(z.object({ ...Trap.shape, spot: SpotName, side: SpotSide })), z.literal(NOT_VISIBLE)])
    .nullable(),
  pressed: z.boolean().nullable(),
  stills: z.array(StillRow),
})
export type PossessionRow = z.infer<typeof PossessionRow>

export const PossessionList = z.object({ rows: z.array(PossessionRow), total: z.number().int() })
export type PossessionList = z.infer<typeof PossessionList>

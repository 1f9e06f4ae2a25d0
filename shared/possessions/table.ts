import { z } from 'zod'
import { SPOT_NAMES } from '../court/trapSpots'
import { FALLBACKS, FINISHES, FORCED_SIDES } from '../filmWords'
import { Id } from '../http/common'
import { LIMITS } from '../limits'
import { list, TendencyFilter } from '../tendencies/schemas'
import {
  DENIED,
  GOALIES,
  HANDLERS,
  LANES,
  ON_BALL,
  OUTCOMES,
  OUTCOME_PLACES,
  THROWER_GUARDS,
  TRAP_CUES,
  valuesOf,
} from '../vocabulary'
import { Jersey, PossessionRow, type PossessionPatch } from './schemas'

/** Columns that the table can be ordered by; `played` is the order in which they were played. */
export const TABLE_SORTS = [
  'played',
  'number',
  'clock',
  'margin',
  'trigger',
  'pickup',
  'shape',
  'firstTrap',
  'secondTrap',
  'cue',
  'tookAway',
  'leftOpen',
  'denied',
  'onBall',
  'handler',
  'throwerGuard',
  'goalie',
  'forcedSide',
  'outcome',
  'outcomePlace',
  'crossedAt',
  'passes',
  'reversals',
  'fallback',
  'finish',
  'points',
  'pointsAgainst',
  'filmTime',
  'receiver',
  'thief',
  'note',
  'updatedAt',
] as const
export type TableSort = (typeof TABLE_SORTS)[number]

/** Which rows of an opponent; every filter may be left out or empty. Lists are comma-separated text in the query. */
export const TableFilter = TendencyFilter.extend({
  pressed: z.enum(['yes', 'no']).optional(),
  outcome: list(z.enum(valuesOf(OUTCOMES))),
  outcomePlace: list(z.enum(valuesOf(OUTCOME_PLACES))),
  /** Any trap there, on either side; `none`: looked for, and there was no trap. */
  trap: list(z.enum([...SPOT_NAMES, 'none'])),
  /** Of the first trap. */
  cue: list(z.enum(valuesOf(TRAP_CUES))),
  onBall: list(z.enum(valuesOf(ON_BALL))),
  handler: list(z.enum(valuesOf(HANDLERS))),
  throwerGuard: list(z.enum(valuesOf(THROWER_GUARDS))),
  goalie: list(z.enum(valuesOf(GOALIES))),
  forcedSide: list(z.enum(valuesOf(FORCED_SIDES))),
  fallback: list(z.enum(valuesOf(FALLBACKS))),
  finish: list(z.enum(valuesOf(FINISHES))),
  /** Any of these among them. */
  denied: list(z.enum(valuesOf(DENIED))),
  tookAway: list(z.enum(valuesOf(LANES))),
  leftOpen: list(z.enum(valuesOf(LANES))),
  counter: list(Id),
  /** Shirt numbers of theirs: on the floor, at a trap, or whoever took the ball. */
  jersey: list(z.coerce.number().pipe(Jersey)),
  /** Words in the note, whatever their case. */
  text: z.string().trim().max(LIMITS.note).optional(),
})
export type TableFilter = z.infer<typeof TableFilter>

export const TableQuery = TableFilter.extend({
  sort: z.enum(TABLE_SORTS).default('played'),
  direction: z.enum(['asc', 'desc']).default('asc'),
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageRows).default(50),
  /** The page on which this row stands, whatever `offset` says; a row that is not in the filter changes nothing. */
  row: Id.optional(),
  /** `no`: without the row ruler, for a further page of the same filter. */
  bars: z.enum(['yes', 'no']).default('yes'),
})
export type TableQuery = z.infer<typeof TableQuery>

/** The game that a row belongs to, as it is named beside an opponent. */
const TableGame = z.object({
  id: z.uuid(),
  kind: z.enum(['scouted', 'ours']),
  /** "v Tarn Valley", or "against us". */
  label: z.string(),
  /** Calendar day in the team's zone. */
  playedOn: z.string(),
})
export type TableGame = z.infer<typeof TableGame>

/** The last change of a field: what it was, for the struck-out word beside what it is. */
export const Fix = z.object({
  changeId: z.uuid(),
  field: z.string(),
  from: z.unknown(),
  at: z.iso.datetime(),
  initials: z.string().nullable(),
})
export type Fix = z.infer<typeof Fix>

export const TableRow = z.object({ possession: PossessionRow, game: TableGame, fixes: z.array(Fix) })
export type TableRow = z.infer<typeof TableRow>

/**
 * Every possession of the opponent in the order they were played, whatever the filter, as lists of one length:
 * the games follow each other and each takes its `rows` next entries. `shown`: in the filter.
 */
export const TableBars = z.object({
  games: z.array(TableGame.extend({ rows: z.number().int() })),
  ids: z.array(z.string()),
  numbers: z.array(z.number().int()),
  pressed: z.array(z.union([z.literal(0), z.literal(1)])),
  shown: z.array(z.union([z.literal(0), z.literal(1)])),
})
export type TableBars = z.infer<typeof TableBars>

export const PossessionTable = z.object({
  rows: z.array(TableRow),
  /** Rows before these in the filter. */
  offset: z.number().int(),
  /** Rows in the filter. */
  total: z.number().int(),
  /** Rows of the opponent in all. */
  of: z.number().int(),
  /** Null where they were not asked for. */
  bars: TableBars.nullable(),
})
export type PossessionTable = z.infer<typeof PossessionTable>

/** Fields that many rows can be changed in at once. */
export const BATCH_FIELDS = [
  'period',
  'margin',
  'trigger',
  'shape',
  'shapeVariant',
  'pickup',
  'traps',
  'outcome',
  'outcomePlace',
  'throwerGuard',
  'denied',
  'tookAway',
  'leftOpen',
  'onBall',
  'handler',
  'goalie',
  'shownShape',
  'forcedSide',
  'receiver',
  'onFloor',
  'thief',
  'passes',
  'reversals',
  'fallback',
  'finish',
  'points',
  'pointsAgainst',
  'timeOutBurned',
  'counterId',
  'rightCall',
  'runWell',
] as const satisfies readonly (keyof typeof PossessionPatch.shape)[]
export type BatchField = (typeof BATCH_FIELDS)[number]

/** Changes one field in many rows that hold the old value. */
export const BatchBody = z.object({
  batchId: Id,
  rows: z
    .array(z.object({ id: Id, version: z.number().int().positive() }))
    .min(1)
    .max(LIMITS.batchRows)
    .refine((rows) => new Set(rows.map(({ id }) => id)).size === rows.length, {
      message: 'A row is in here twice. Name each row once.',
    }),
  field: z.enum(BATCH_FIELDS),
  from: z.unknown(),
  to: z.unknown(),
})
export type BatchBody = z.infer<typeof BatchBody>

export const LEFT_OUT = ['other-value', 'changed-since', 'deleted', 'does-not-fit'] as const

export const BatchResult = z.object({
  batchId: z.uuid(),
  changed: z.array(z.object({ id: z.uuid(), version: z.number().int() })),
  /** Rows that this batch, or its undo, had changed before. */
  already: z.array(z.uuid()),
  leftOut: z.array(z.object({ id: z.uuid(), number: z.number().int(), why: z.enum(LEFT_OUT) })),
})
export type BatchResult = z.infer<typeof BatchResult>

/** Which field of which line of a row's history goes back to what it was. */
export const PutBackBody = z.object({ changeId: Id, field: z.string().min(1).max(40) })
export type PutBackBody = z.infer<typeof PutBackBody>

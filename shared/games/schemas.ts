import { z } from 'zod'
import { Id, Instant, listQuery, Notes, RowMeta, type ListQuery } from '../http/common'
import { RulePackKey } from '../court/rulePacks'
import { LIMITS } from '../limits'
import { STATIONS, valuesOf } from '../vocabulary'

export const GameBody = z.object({
  opponentId: Id,
  tipOff: Instant,
  place: z.enum(['home', 'away', 'neutral']),
  rulePack: RulePackKey,
  /** When the head coach must have picked. */
  chooseBy: Instant.nullable().default(null),
  /** When the other stations are due. */
  due: z
    .object({
      scout: Instant.nullable().default(null),
      read: Instant.nullable().default(null),
      teach: Instant.nullable().default(null),
      review: Instant.nullable().default(null),
    })
    .default({ scout: null, read: null, teach: null, review: null }),
  notes: Notes,
})
export type GameBody = z.infer<typeof GameBody>

/** Somebody of the staff as a game names them. */
export const Coach = z.object({ id: z.uuid(), name: z.string(), initials: z.string() })
export type Coach = z.infer<typeof Coach>

/** Who gets the ball, a person of this team's staff, and what there is to say about it. */
export const HandOnBody = z.object({
  toId: Id,
  note: z.string().trim().max(LIMITS.note).default(''),
})
export type HandOnBody = z.infer<typeof HandOnBody>

export const GameRow = RowMeta.extend({
  ...GameBody.shape,
  opponentName: z.string(),
  /** Where the work stands: worked out from what is there, never typed in. */
  station: z.enum(valuesOf(STATIONS)),
  counts: z.object({
    possessions: z.number().int(),
    scoutedGames: z.number().int(),
    ourGames: z.number().int(),
  }),
  /** Newest plan version of this game, signed or not. */
  plan: z
    .object({ id: z.uuid(), number: z.number().int(), signedAt: z.iso.datetime().nullable() })
    .nullable(),
  headCoach: z.object({ name: z.string(), initials: z.string() }).nullable(),
  /** Whoever has the ball; null is nobody yet. */
  holder: Coach.nullable(),
  /** When the read was signed off and by whom; `by` is null once that person was erased. */
  read: z.object({ at: z.iso.datetime(), by: Coach.nullable() }).nullable(),
  /** The last time it went from one to another. */
  handedOn: z
    .object({
      from: z.string().nullable(),
      to: z.string().nullable(),
      note: z.string(),
      at: z.iso.datetime(),
    })
    .nullable(),
  /** Whether the caller may hand the ball on, take it, and sign off the read. */
  mayHandOn: z.boolean(),
})
export type GameRow = z.infer<typeof GameRow>
export const GameList = z.object({ rows: z.array(GameRow), total: z.number().int() })
export type GameList = z.infer<typeof GameList>

/** In the order they are played, unless asked otherwise. */
export const GamesQuery = listQuery(['tipOff', 'opponent', 'station'])
export type GamesQuery = ListQuery<'tipOff' | 'opponent' | 'station'>

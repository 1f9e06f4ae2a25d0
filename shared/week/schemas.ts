import { z } from 'zod'
import { Coach, GameRow } from '../games/schemas'
import { Day } from '../http/common'
import { STATIONS, valuesOf } from '../vocabulary'

/** `on`: any day of the week that is wanted, in the team's zone; today's week without it. */
export const WeekQuery = z.object({ on: Day.optional() })

/** One mark on the ruler of the week. */
export const WeekMark = z.object({
  kind: z.enum(['tip-off', 'due', 'practice']),
  at: z.iso.datetime(),
  gameId: z.uuid(),
  opponentName: z.string(),
  place: z.enum(['home', 'away', 'neutral']),
  /** What is due; null for the other kinds. */
  station: z.enum(valuesOf(STATIONS)).nullable(),
  /** Whether the work has moved past that station. */
  done: z.boolean(),
  holder: Coach.nullable(),
})
export type WeekMark = z.infer<typeof WeekMark>

/** What something was done to: tables of the record, and three things that are not rows of their own. */
export const SINCE_KINDS = [
  'possessions',
  'scouted_games',
  'games',
  'opponents',
  'opponent_players',
  'counters',
  'rules',
  'squad_players',
  'plans',
  'practices',
  'read',
  'sheets',
  'ball',
] as const

/** What somebody did since yesterday, counted: never row by row. */
export const WeekEvent = z.object({
  /** Null once that person was erased, and for sheets, which several people open. */
  who: Coach.nullable(),
  kind: z.enum(SINCE_KINDS),
  action: z.enum(['made', 'changed', 'deleted', 'restored', 'signed', 'reopened', 'opened', 'handed-on']),
  count: z.number().int().positive(),
  /** Of how many, where that is known: people who can open a sheet. */
  of: z.number().int().nullable(),
  /** What it is about: an opponent, a game, a counter. */
  about: z.string().nullable(),
  /** To whom, for the ball. */
  to: z.string().nullable(),
  at: z.iso.datetime(),
})
export type WeekEvent = z.infer<typeof WeekEvent>

/** One counter that was called in the last game, beside what our record before it let us expect. */
export const LastCall = z.object({
  counterId: z.uuid(),
  name: z.string(),
  k: z.number().int(),
  n: z.number().int(),
  /** The trips of earlier games with it that were pressed and not stopped. */
  before: z.object({ k: z.number().int(), n: z.number().int() }),
  /** Successes to expect in n trips: the central eight tenths of what could come, both ends included. */
  expected: z.object({ low: z.number().int(), high: z.number().int() }),
})
export type LastCall = z.infer<typeof LastCall>

export const LastTime = z.object({
  gameId: z.uuid(),
  opponentId: z.uuid(),
  opponentName: z.string(),
  tipOff: z.iso.datetime(),
  place: z.enum(['home', 'away', 'neutral']),
  /** The shape they showed most; null while nothing of it is logged. */
  shape: z.string().nullable(),
  /** Pressed trips that were not stopped. */
  pressed: z.object({ k: z.number().int(), n: z.number().int() }),
  /** Where those that were not through ended, most first. */
  lost: z.array(z.object({ place: z.string().nullable(), count: z.number().int() })),
  calls: z.array(LastCall),
})
export type LastTime = z.infer<typeof LastTime>

export const Week = z.object({
  now: z.iso.datetime(),
  today: Day,
  /** Monday to Sunday. */
  days: z.array(Day).length(7),
  marks: z.array(WeekMark),
  /** Games ahead, next first. */
  games: z.array(GameRow),
  /** The last game that was played. */
  last: GameRow.nullable(),
  lastTime: LastTime.nullable(),
  /** Latest first, from the beginning of yesterday. */
  since: z.array(WeekEvent),
  /** The staff, the head coach first. */
  coaches: z.array(Coach),
  /** Whether anything at all is in this team yet. */
  empty: z.boolean(),
})
export type Week = z.infer<typeof Week>

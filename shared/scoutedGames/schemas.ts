import { z } from 'zod'
import { Day, Id, listQuery, Name, Notes, RowMeta, type ListQuery } from '../http/common'
import { RulePackKey } from '../court/rulePacks'

/**
 * Which possessions the scout set out to log. A rate uses only what was covered. Minutes run from 0 at
 * the opening throw-up through all periods.
 */
export const Coverage = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('all') }),
  z.object({ kind: z.literal('throw-ins') }),
  z
    .object({
      kind: z.literal('minutes'),
      from: z.number().min(0).max(80),
      to: z.number().min(0).max(80),
    })
    .refine((range) => range.from < range.to, {
      path: ['to'],
      message: 'The end must be later than the start.',
    }),
])
export type Coverage = z.infer<typeof Coverage>

export const ScoutedGameBody = z.object({
  opponentId: Id,
  /** Whom they played. */
  foe: Name,
  playedOn: Day,
  seen: z.enum(['live', 'film']),
  rulePack: RulePackKey,
  coverage: Coverage.default({ kind: 'all' }),
  blowout: z.boolean().default(false),
  finalScore: z
    .object({ theirs: z.number().int().min(0).max(250), foe: z.number().int().min(0).max(250) })
    .nullable()
    .default(null),
  notes: Notes,
})
export type ScoutedGameBody = z.infer<typeof ScoutedGameBody>

export const ScoutedGameRow = RowMeta.extend({
  ...ScoutedGameBody.shape,
  scout: z.string().nullable(),
  counts: z.object({ possessions: z.number().int(), pressed: z.number().int(), stills: z.number().int() }),
})
export type ScoutedGameRow = z.infer<typeof ScoutedGameRow>
export const ScoutedGameList = z.object({ rows: z.array(ScoutedGameRow), total: z.number().int() })
export type ScoutedGameList = z.infer<typeof ScoutedGameList>

/** Newest first, unless asked otherwise. */
export const ScoutedGamesQuery = listQuery(['playedOn', 'foe', 'possessions', 'pressed'])
export type ScoutedGamesQuery = ListQuery<'playedOn' | 'foe' | 'possessions' | 'pressed'>

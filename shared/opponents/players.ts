import { z } from 'zod'
import { PRESS_JOBS } from '../filmWords'
import { Id, RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { Jersey } from '../possessions/schemas'
import { valuesOf } from '../vocabulary'

/** One of theirs by shirt number: what she does in the press. No name is kept. */
export const OpponentPlayerBody = z.object({
  opponentId: Id,
  jersey: Jersey,
  does: z
    .array(z.enum(valuesOf(PRESS_JOBS)))
    .max(PRESS_JOBS.length)
    .transform((values) => [...new Set(values)].sort())
    .default([]),
  note: z.string().trim().max(LIMITS.note).default(''),
})
export type OpponentPlayerBody = z.infer<typeof OpponentPlayerBody>

export const OpponentPlayerRow = RowMeta.extend({
  ...OpponentPlayerBody.shape,
  /** Counted from the possessions, not stored. */
  counts: z.object({
    onFloor: z.number().int(),
    traps: z.number().int(),
    steals: z.number().int(),
  }),
})
export type OpponentPlayerRow = z.infer<typeof OpponentPlayerRow>
export const OpponentPlayerList = z.object({ rows: z.array(OpponentPlayerRow), total: z.number().int() })
export type OpponentPlayerList = z.infer<typeof OpponentPlayerList>

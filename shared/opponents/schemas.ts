import { z } from 'zod'
import { listQuery, Name, Notes, RowMeta, type ListQuery } from '../http/common'

export const OpponentBody = z.object({
  name: Name,
  /** One to three letters or a short word for narrow places, e.g. "Gulls". */
  shortName: z.string().trim().min(1).max(20),
  notes: Notes,
})
export type OpponentBody = z.infer<typeof OpponentBody>

export const OpponentRow = RowMeta.extend({
  ...OpponentBody.shape,
  /** Counted, not stored. */
  counts: z.object({
    scoutedGames: z.number().int(),
    /** Our own games against them in which something was logged: they press us too. */
    ourGames: z.number().int(),
    possessions: z.number().int(),
    pressed: z.number().int(),
    /** Rows that count towards how often they press: covered, with a shape. */
    pressable: z.number().int(),
    mostlyShape: z.object({ shape: z.string(), k: z.number().int(), n: z.number().int() }).nullable(),
  }),
  nextGame: z
    .object({ id: z.uuid(), tipOff: z.iso.datetime(), place: z.enum(['home', 'away', 'neutral']) })
    .nullable(),
})
export type OpponentRow = z.infer<typeof OpponentRow>
export const OpponentList = z.object({ rows: z.array(OpponentRow), total: z.number().int() })
export type OpponentList = z.infer<typeof OpponentList>

/** By their next meeting, unless asked otherwise. */
export const OpponentsQuery = listQuery(['meeting', 'name', 'possessions', 'pressed'])
export type OpponentsQuery = ListQuery<'meeting' | 'name' | 'possessions' | 'pressed'>

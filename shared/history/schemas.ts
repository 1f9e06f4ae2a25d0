import { z } from 'zod'
import { RowMeta } from '../http/common'

/** One field of one change. Values are as they stand in the row's body; a long text is told by its length only. */
export const FieldChange = z.object({ field: z.string(), from: z.unknown(), to: z.unknown() })
export type FieldChange = z.infer<typeof FieldChange>

export const CHANGE_ACTIONS = ['made', 'changed', 'deleted', 'restored'] as const

/** One entry of a row's history. `who` is null once that person was erased. */
export const ChangeRow = z.object({
  id: z.uuid(),
  kind: z.string(),
  rowId: z.uuid(),
  action: z.enum(CHANGE_ACTIONS),
  who: z.object({ id: z.uuid(), name: z.string(), initials: z.string() }).nullable(),
  at: z.iso.datetime(),
  batchId: z.uuid().nullable(),
  fields: z.array(FieldChange),
})
export type ChangeRow = z.infer<typeof ChangeRow>

/** Oldest first. */
export const History = z.object({ rows: z.array(ChangeRow), total: z.number().int() })
export type History = z.infer<typeof History>

/** A row that was deleted and can still be put back. */
export const Deleted = RowMeta.pick({ id: true }).extend({
  deletedAt: z.iso.datetime(),
  until: z.iso.datetime(),
})
export type Deleted = z.infer<typeof Deleted>

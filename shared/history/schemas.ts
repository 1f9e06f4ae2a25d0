import { z } from 'zod'
import { Id, Instant, RowMeta } from '../http/common'
import { LIMITS } from '../limits'

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

/** Whose history: any row of the team, by its id. */
export const HistoryQuery = z.object({ row: Id })

/** What has happened in the team since an instant; without one, in the last seven days. */
export const NewsQuery = z.object({
  since: Instant.optional(),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageRows).default(50),
})
export type NewsQuery = z.input<typeof NewsQuery>

/**
 * One line of what happened. Rows changed together are one line, and so are the rows that one person logged in
 * one game; `rows` counts them and the line's own entry is the newest.
 */
export const NewsRow = ChangeRow.extend({
  rows: z.number().int().positive(),
  /** The row's name as it is now, e.g. "No. 8, Gulls v Tarn Valley"; empty where it may not be told. */
  label: z.string(),
  /** Still there to be opened: neither deleted nor gone. */
  open: z.boolean(),
  /** The rows that it hangs on, for the way there. */
  opponentId: z.uuid().nullable(),
  scoutedGameId: z.uuid().nullable(),
  gameId: z.uuid().nullable(),
})
export type NewsRow = z.infer<typeof NewsRow>

/** Newest first. `total` counts the lines that there are, also past the limit. */
export const News = z.object({ rows: z.array(NewsRow), total: z.number().int() })
export type News = z.infer<typeof News>

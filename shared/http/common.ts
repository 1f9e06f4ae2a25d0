import { z } from 'zod'
import { LIMITS } from '../limits'

/** RFC 9562 UUID, made by whoever creates the row; lower case so that one id has one spelling. */
export const Id = z.uuid().transform((id) => id.toLowerCase())
export type Id = z.infer<typeof Id>

/** An instant on the wire, RFC 3339 in UTC. */
export const Instant = z.iso.datetime({ offset: true }).transform((text) => new Date(text).toISOString())

/** A calendar day in the team's time zone. */
export const Day = z.iso.date()

export const Name = z.string().trim().min(1).max(LIMITS.name)

/** Markdown, rendered and cleaned by the client. */
export const Notes = z.string().max(LIMITS.notes).default('')

/** What every stored row carries on the wire. `version` is the number inside the ETag. */
export const RowMeta = z.object({
  id: z.uuid(),
  version: z.number().int().positive(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
})
export type RowMeta = z.infer<typeof RowMeta>

/** RFC 9457 problem details, with our two extensions: the fields at fault, and the present row of a 412. */
export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string(),
  errors: z.array(z.object({ field: z.string(), message: z.string() })).optional(),
  current: z.unknown().optional(),
})
export type Problem = z.infer<typeof Problem>

/**
 * What a list may be asked: words that a row must hold, an order, a page. Everything may be left out; then all
 * rows come in the list's own order. `direction` goes with `sort` and is rising unless it says otherwise.
 */
export const listQuery = <S extends string>(sorts: readonly [S, ...S[]]) =>
  z.object({
    q: z.string().trim().max(LIMITS.name).optional(),
    sort: z.enum(sorts).optional(),
    direction: z.enum(['asc', 'desc']).optional(),
    offset: z.coerce.number().int().min(0).optional(),
    limit: z.coerce.number().int().min(1).max(LIMITS.pageRows).optional(),
  })
export type ListQuery<S extends string> = {
  q?: string | undefined
  sort?: S | undefined
  direction?: 'asc' | 'desc' | undefined
  offset?: number | undefined
  limit?: number | undefined
}

/** A page of rows and how many there are in all. */
export const pageOf = <T extends z.ZodType>(row: T) =>
  z.object({ rows: z.array(row), total: z.number().int().nonnegative() })

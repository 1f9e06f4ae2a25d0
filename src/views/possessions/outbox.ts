import { z } from 'zod'
import { PossessionBody, PossessionRow } from '@shared/possessions/schemas'
import { ApiProblem } from '@/api/problems'
import { draftOfRow, sameBody } from './draft'

/** A row on its way to the server, kept on this device until the server has it. */
export const Waiting = z.object({
  id: z.uuid(),
  body: PossessionBody,
  /** The version that an edit is based on; null for a new row. */
  version: z.number().int().nullable(),
  state: z.enum(['waiting', 'refused', 'conflict']),
  /** Why the server did not take it, in its words. */
  why: z.string(),
  fields: z.array(z.object({ field: z.string(), message: z.string() })),
  /** The row as somebody else left it meanwhile. */
  current: PossessionRow.nullable(),
  /** Goes up with every change, so that an answer to an earlier body is told from the latest. */
  stamp: z.number(),
})
export type Waiting = z.infer<typeof Waiting>

export const readWaiting = (value: unknown): Waiting | null => Waiting.safeParse(value).data ?? null

/** What an unsuccessful try means for a row. */
export type Verdict =
  | { kind: 'later' }
  | { kind: 'sent'; row: PossessionRow }
  | { kind: 'again'; version: number }
  | { kind: 'conflict'; current: PossessionRow; why: string }
  | { kind: 'refused'; error: ApiProblem }

/**
 * No signal and a server in trouble: later. An answer that got lost: the server already has exactly this row, or has
 * our own first body of it. Somebody else's change: both are shown. Anything else is refused with the server's words.
 */
export function verdictOf(error: unknown, entry: Pick<Waiting, 'body' | 'version'>): Verdict {
  if (!(error instanceof ApiProblem)) return { kind: 'later' }
  const { status } = error
  if (status === 401 || status === 408 || status === 429 || status >= 500) return { kind: 'later' }
  if (error.isConflict) {
    const current = PossessionRow.safeParse(error.current).data
    if (current !== undefined) {
      if (sameBody(draftOfRow(current), entry.body)) return { kind: 'sent', row: current }
      if (entry.version === null && current.version === 1) return { kind: 'again', version: 1 }
      return { kind: 'conflict', current, why: error.message }
    }
  }
  return { kind: 'refused', error }
}

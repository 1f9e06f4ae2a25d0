import { z } from 'zod'
import { LIMITS } from '@shared/limits'
import { Waiting } from './outbox'

/** A possession that was thrown away and can be put back for ten minutes. */
export const Thrown = z.object({
  id: z.uuid(),
  number: z.number().int(),
  /** Until when it can be put back, milliseconds since 1970. */
  until: z.number(),
  /** The row as it waited here, when it was on this device alone. */
  kept: Waiting.nullable(),
})
export type Thrown = z.infer<typeof Thrown>

export const readThrown = (value: unknown): Thrown[] | null => z.array(Thrown).safeParse(value).data ?? null

export const undoUntil = (now: number): number => now + LIMITS.undoMinutes * 60_000

/** Those that can still be put back, the latest first. */
export const stillThere = (thrown: readonly Thrown[], now: number): Thrown[] =>
  thrown.filter((each) => each.until > now).sort((a, b) => b.until - a.until)

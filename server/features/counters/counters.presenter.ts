import { readCounter } from '@shared/counters/counterFile'
import { CounterDraft, type CounterRow } from '@shared/counters/schemas'
import type { LoggedReps } from '../../database/counting/liveReps'
import type { Counter } from '../../database/entities/Counter'
import { metaOf } from '../../http/present'

/** A stored counter parsed at the boundary and mended where that is safe; null when it can no longer be read. */
export function bodyOfCounter(row: Counter): CounterDraft | null {
  const parsed = CounterDraft.safeParse(row.body)
  return parsed.success ? parsed.data : readCounter(row.body)
}

/** A counter with what was logged in practices added to what stands in its own row. */
export const presentCounter = (
  row: Counter,
  body: CounterDraft,
  record: CounterRow['record'],
  logged: Pick<LoggedReps, 'n' | 'counted' | 'k'> = { n: 0, counted: 0, k: 0 },
): CounterRow => ({
  ...metaOf(row),
  ...body,
  draft: row.draft,
  archivedAt: row.archivedAt,
  walkedAt: row.walkedAt,
  liveReps: body.liveReps + logged.n,
  practice: { k: body.practice.k + logged.k, n: body.practice.n + logged.counted },
  logged: { n: logged.n, counted: logged.counted, k: logged.k },
  record,
})

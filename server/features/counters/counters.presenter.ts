import { CounterBody, type CounterRow } from '@shared/counters/schemas'
import type { Counter } from '../../database/entities/Counter'
import { metaOf } from '../../http/present'

/** A stored counter parsed at the boundary; null when it can no longer be read. */
export function bodyOfCounter(row: Counter): CounterBody | null {
  const parsed = CounterBody.safeParse(row.body)
  return parsed.success ? parsed.data : null
}

export const presentCounter = (
  row: Counter,
  body: CounterBody,
  record: CounterRow['record'],
): CounterRow => ({
  ...metaOf(row),
  ...body,
  record,
})

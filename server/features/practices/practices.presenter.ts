import { PracticeBody, type PracticeRow } from '@shared/practices/schemas'
import type { Practice } from '../../database/entities/Practice'
import { metaOf } from '../../http/present'

/** A stored practice parsed at the boundary; null when it can no longer be read. */
export function bodyOfPractice(row: Practice): PracticeBody | null {
  const parsed = PracticeBody.safeParse(row.body)
  return parsed.success ? parsed.data : null
}

export const presentPractice = (row: Practice, body: PracticeBody): PracticeRow => ({
  ...metaOf(row),
  ...body,
})

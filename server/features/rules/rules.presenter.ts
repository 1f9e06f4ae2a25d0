import { RuleBody, type RuleRow } from '@shared/rules/schemas'
import type { Rule } from '../../database/entities/Rule'
import { metaOf } from '../../http/present'

/** A stored rule parsed at the boundary; null when it can no longer be read. */
export function bodyOfRule(row: Rule): RuleBody | null {
  const parsed = RuleBody.safeParse(row.body)
  return parsed.success ? { ...parsed.data, on: row.on } : null
}

export const presentRule = (row: Rule, body: RuleBody): RuleRow => ({ ...metaOf(row), ...body })

import type { ListQuery } from '@shared/http/common'

/** How a list can be searched and ordered. */
export interface Listing<T, S extends string> {
  /** The words of a row that `q` is looked for in. */
  words: (row: T) => string
  /** What rows are compared by; null comes last either way. */
  by: Record<S, (row: T) => string | number | null>
}

/**
 * The page of a list that a query asks for, of rows that stand in the list's own order; a query that asks for
 * nothing leaves them as they are. For lists of a season's size, whose rows are counted as a whole anyway.
 */
export function listPage<T, S extends string>(
  rows: readonly T[],
  query: ListQuery<S>,
  { words, by }: Listing<T, S>,
): { rows: T[]; total: number } {
  const wanted = query.q?.toLocaleLowerCase()
  const found = wanted ? rows.filter((row) => words(row).toLocaleLowerCase().includes(wanted)) : [...rows]
  if (query.sort) {
    const key = by[query.sort]
    const way = query.direction === 'desc' ? -1 : 1
    found.sort((a, b) => compare(key(a), key(b), way))
  }
  const offset = query.offset ?? 0
  const end = query.limit === undefined ? undefined : offset + query.limit
  return { rows: found.slice(offset, end), total: found.length }
}

function compare(a: string | number | null, b: string | number | null, way: 1 | -1): number {
  if (a === null || b === null) return Number(a === null) - Number(b === null)
  const order = typeof a === 'string' && typeof b === 'string' ? a.localeCompare(b) : Number(a) - Number(b)
  return order * way
}

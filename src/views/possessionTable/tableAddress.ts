import { TABLE_SORTS, TableFilter, type TableSort } from '@shared/possessions/table'

/** A page's query as the router hands it over. */
export type Query = Readonly<Record<string, string | null | undefined | readonly (string | null)[]>>

export const FILTER_KEYS = Object.keys(TableFilter.shape) as (keyof TableFilter)[]
/** Rows of one page. */
export const PAGE_ROWS = 50

/** What the page shows: all of it stands in its address. */
export interface TableView {
  filter: TableFilter
  sort: TableSort
  direction: 'asc' | 'desc'
  /** From 1. */
  page: number
  /** The row that is open. */
  row: string | null
}

const textOf = (value: Query[string]): string =>
  value === null || value === undefined ? '' : typeof value === 'string' ? value : value.join(',')

/**
 * What an address asks for. A word that it does not know is left out rather than refused: a link from another season
 * still opens.
 */
export function viewOf(query: Query): TableView {
  const filter: Record<string, unknown> = {}
  for (const key of FILTER_KEYS) {
    const text = textOf(query[key]).trim()
    if (text === '') continue
    const read = TableFilter.shape[key].safeParse(text)
    if (read.success && read.data !== undefined) filter[key] = read.data
  }
  const sort = TABLE_SORTS.find((each) => each === textOf(query['sort'])) ?? 'played'
  const page = Number(textOf(query['page']))
  const row = textOf(query['row'])
  return {
    filter: filter as TableFilter,
    sort,
    direction: textOf(query['direction']) === 'desc' ? 'desc' : 'asc',
    page: Number.isInteger(page) && page > 1 ? page : 1,
    row: row === '' ? null : row,
  }
}

/** The view as it stands in the address; undoes viewOf. What is as usual is no word at all. */
export function queryOf(view: TableView): Record<string, string> {
  const query: Record<string, string> = {}
  for (const key of FILTER_KEYS) {
    const value = view.filter[key]
    const text = Array.isArray(value) ? value.join(',') : (value ?? '')
    if (text !== '') query[key] = text
  }
  if (view.sort !== 'played') query['sort'] = view.sort
  if (view.direction === 'desc') query['direction'] = 'desc'
  if (view.page > 1) query['page'] = String(view.page)
  if (view.row !== null) query['row'] = view.row
  return query
}

/** The filter with one of its parts said anew; nothing said takes it out. */
export function withPart<K extends keyof TableFilter>(
  filter: TableFilter,
  key: K,
  value: TableFilter[K] | undefined,
): TableFilter {
  const others = Object.fromEntries(Object.entries(filter).filter(([each]) => each !== key)) as TableFilter
  const isNothing = value === undefined || value === '' || (Array.isArray(value) && value.length === 0)
  return isNothing ? others : { ...others, [key]: value }
}

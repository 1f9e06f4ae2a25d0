import { computed } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { TableFilter, TableSort } from '@shared/possessions/table'
import { queryOf, viewOf, type TableView } from './tableAddress'

/**
 * What the page shows, kept in its address: filter, order, page and the open row. A link opens the same view; Back
 * undoes one choice at a time.
 */
export function useTableAddress() {
  const route = useRoute()
  const router = useRouter()

  /** What is asked of the server, as text: the open row changes nothing of it. */
  const asked = computed(() => JSON.stringify(queryOf({ ...viewOf(route.query), row: null })))
  const view = computed<Omit<TableView, 'row'>>(() =>
    viewOf(JSON.parse(asked.value) as Record<string, string>),
  )
  const row = computed(() => viewOf(route.query).row)

  const go = (change: Partial<TableView>) =>
    void router.push({ query: queryOf({ ...viewOf(route.query), ...change }) })

  return {
    asked,
    view,
    row,
    setFilter: (filter: TableFilter) => go({ filter, page: 1, row: null }),
    setSort: (sort: TableSort, direction: 'asc' | 'desc') => go({ sort, direction, page: 1 }),
    /** Puts the page right on which the open row stands, without a step of its own for Back. */
    correctPage: (page: number) => void router.replace({ query: queryOf({ ...viewOf(route.query), page }) }),
    setPage: (page: number, open: string | null = null) => go({ page, row: open }),
    setRow: (open: string | null) => go({ row: open }),
  }
}

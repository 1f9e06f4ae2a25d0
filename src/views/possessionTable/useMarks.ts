import { computed, shallowRef } from 'vue'
import type { PossessionRow } from '@shared/possessions/schemas'

/** Marked rows by their id: they stay marked on other pages and in other filters. */
export function useMarks() {
  const marks = shallowRef<ReadonlyMap<string, PossessionRow>>(new Map())
  const rows = computed(() => [...marks.value.values()])
  const has = (id: string) => marks.value.has(id)

  function set(row: PossessionRow, marked: boolean): void {
    const next = new Map(marks.value)
    if (marked) next.set(row.id, row)
    else next.delete(row.id)
    marks.value = next
  }
  const toggle = (row: PossessionRow) => set(row, !has(row.id))

  /** All rows of a page, or none of them. */
  function setAll(page: readonly PossessionRow[], marked: boolean): void {
    const next = new Map(marks.value)
    for (const row of page)
      if (marked) next.set(row.id, row)
      else next.delete(row.id)
    marks.value = next
  }

  /** Marked rows as the server has them now. */
  function refresh(page: readonly PossessionRow[]): void {
    if (!page.some((row) => has(row.id) && marks.value.get(row.id) !== row)) return
    const next = new Map(marks.value)
    for (const row of page) if (next.has(row.id)) next.set(row.id, row)
    marks.value = next
  }

  return { rows, has, toggle, setAll, refresh, clear: () => (marks.value = new Map()) }
}
export type Marks = ReturnType<typeof useMarks>

import { nextTick } from 'vue'

/** The row that a link leads to: asked for with the first answer, then shown where it stands. */
export function useLinkedRow(id: string | null) {
  let sought = id
  return {
    /** For the query: the answer is the page on which that row stands. */
    asked: (): { row?: string } => (sought === null ? {} : { row: sought }),
    /** Shows the row once. @param show puts the page of the answer into the address */
    async found(show: () => void): Promise<void> {
      if (sought === null) return
      const row = sought
      sought = null
      show()
      await nextTick()
      document.querySelector(`[data-row="${CSS.escape(row)}"]`)?.scrollIntoView({ block: 'start' })
    },
  }
}

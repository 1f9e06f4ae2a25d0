import { ref, shallowRef } from 'vue'
import { LIMITS } from '@shared/limits'
import type { TendencyFilter } from '@shared/tendencies/schemas'
import { isAbort } from '@/api/problems'
import { getEvidence } from '@/api/tendencies'
import { useAsync } from '@/composables/useAsync'

/** Possessions asked for at a time: two lines of keys. */
const PAGE = 24

export interface EvidenceQuestion {
  team: string
  opponent: string
  habit: string
  filter: TendencyFilter
  /** A possession that the address names: rows are asked for until it is among them. */
  possession: string | null
}

/** The possessions behind one habit, a page at a time. For one question: key the component by it. */
export function useEvidence({ team, opponent, habit, filter, possession }: EvidenceQuestion) {
  const busy = ref(false)
  const problem = shallowRef<Error | null>(null)

  const rows = useAsync(async (signal) => {
    const page = await getEvidence(team, opponent, habit, filter, { limit: PAGE, offset: 0 }, signal)
    const here = possession === null || page.rows.some((row) => row.possession.id === possession)
    if (here || page.rows.length >= page.total) return page
    return getEvidence(team, opponent, habit, filter, { limit: LIMITS.pageRows, offset: 0 }, signal)
  })

  async function more(): Promise<void> {
    const have = rows.data
    if (have === null || busy.value) return
    busy.value = true
    problem.value = null
    try {
      const next = await getEvidence(team, opponent, habit, filter, { limit: PAGE, offset: have.rows.length })
      const known = new Set(have.rows.map((row) => row.possession.id))
      // A row logged meanwhile moves the later ones on by one; nothing may stand here twice.
      const fresh = next.rows.filter((row) => !known.has(row.possession.id))
      rows.set({ rows: [...have.rows, ...fresh], total: next.total })
    } catch (error) {
      if (!isAbort(error)) problem.value = error instanceof Error ? error : new Error(String(error))
    } finally {
      busy.value = false
    }
  }

  return { rows, more, busy, problem }
}

import { ref, shallowRef } from 'vue'
import { z } from 'zod'
import type { PossessionRow } from '@shared/possessions/schemas'
import type { BatchField } from '@shared/possessions/table'
import {
  changePossessions,
  deletePossession,
  putBackPossession,
  restorePossession,
  undoPossessions,
} from '@/api/possessions'
import { forget, keep, keyOf, recall } from '@/composables/kept'
import { newId } from '@/composables/newId'
import { resultWords } from './batch'

const DAY_MS = 86_400_000
const TEN_MINUTES_MS = 600_000

/** What was just done and can still be put back. */
const Undo = z.object({
  kind: z.enum(['batch', 'row']),
  id: z.uuid(),
  words: z.string(),
  /** "Put all 4 back" */
  back: z.string(),
  until: z.number(),
})
export type Undo = z.infer<typeof Undo>

export interface RowChangesOptions {
  team: string
  person: string
  opponent: string
  /** Something is another on the server now: rows are asked for anew. */
  changed: () => void
}

/** Changing, throwing away and putting back possessions from their table; one thing at a time. */
export function useRowChanges({ team, person, opponent, changed }: RowChangesOptions) {
  const key = keyOf('table-undo', person, opponent)
  const kept = recall(key, (value) => Undo.safeParse(value).data ?? null)
  const undo = shallowRef<Undo | null>(kept !== null && kept.until > Date.now() ? kept : null)
  const busy = ref(false)
  const problem = shallowRef<Error | null>(null)
  /** What came of the last change, in words. */
  const said = ref('')

  function remember(next: Undo | null): void {
    undo.value = next
    if (next === null) forget(key)
    else keep(key, next)
  }

  /** True when it was done; otherwise `problem` says why not. */
  async function doing(what: () => Promise<void>): Promise<boolean> {
    if (busy.value) return false
    busy.value = true
    problem.value = null
    said.value = ''
    try {
      await what()
      changed()
      return true
    } catch (error) {
      problem.value = error as Error
      // Somebody else's change is the usual reason: what stands here is old.
      changed()
      return false
    } finally {
      busy.value = false
    }
  }

  const change = (rows: readonly PossessionRow[], field: BatchField, from: unknown, to: unknown) =>
    doing(async () => {
      const result = await changePossessions(team, {
        batchId: newId(),
        rows: rows.map(({ id, version }) => ({ id, version })),
        field,
        from,
        to,
      })
      said.value = resultWords(result)
      const count = result.changed.length
      if (count === 0) return
      remember({
        kind: 'batch',
        id: result.batchId,
        words: said.value,
        back: count === 1 ? 'Put it back' : `Put all ${count} back`,
        until: Date.now() + DAY_MS,
      })
    })

  const throwAway = ({ id, version, number }: PossessionRow) =>
    doing(async () => {
      await deletePossession(team, id, version)
      remember({
        kind: 'row',
        id,
        words: `No. ${number} is thrown away. It can be put back for ten minutes.`,
        back: 'Put it back',
        until: Date.now() + TEN_MINUTES_MS,
      })
    })

  const putBack = ({ id, version }: PossessionRow, change: { changeId: string; field: string }) =>
    doing(async () => {
      await putBackPossession(team, id, change, version)
      said.value = 'Put back.'
    })

  /** Takes the last batch or deletion back. */
  const takeBack = () =>
    doing(async () => {
      const last = undo.value
      if (last === null) return
      if (last.kind === 'batch') said.value = resultWords(await undoPossessions(team, last.id), 'put back')
      else {
        await restorePossession(team, last.id)
        said.value = 'It is back.'
      }
      remember(null)
    })

  return { undo, busy, problem, said, change, throwAway, putBack, takeBack, hide: () => remember(null) }
}

import { computed, ref, shallowRef } from 'vue'
import { useIntervalFn } from '@vueuse/core'
import type { PossessionRow } from '@shared/possessions/schemas'
import { forget, keep, keyOf, recall } from '@/composables/kept'
import type { LogRow } from './logRows'
import { readThrown, stillThere, undoUntil, type Thrown } from './thrownAway'
import type { Outbox } from './useOutbox'

export interface ThrownAwayOptions {
  person: string
  game: string
  outbox: Outbox
  remove: (id: string, version: number) => Promise<void>
  restore: (id: string) => Promise<PossessionRow>
  /** The server does not count it any more, or does again. */
  gone: (id: string) => void
  back: (row: PossessionRow) => void
}

/** Throwing a possession away, after a question; it can be put back for ten minutes, also after the page was left. */
export function useThrownAway({ person, game, outbox, remove, restore, gone, back }: ThrownAwayOptions) {
  const key = keyOf('thrown', person, game)
  const all = shallowRef<readonly Thrown[]>(recall(key, readThrown) ?? [])
  const now = ref(Date.now())
  useIntervalFn(() => (now.value = Date.now()), 15_000)
  const latest = computed(() => stillThere(all.value, now.value)[0] ?? null)
  const asked = shallowRef<LogRow | null>(null)
  const busy = ref(false)
  const problem = shallowRef<Error | null>(null)

  function remember(list: readonly Thrown[]): void {
    now.value = Date.now()
    all.value = stillThere(list, now.value)
    if (all.value.length === 0) forget(key)
    else keep(key, all.value)
  }

  /** The answer was yes. True when the row is gone. */
  async function throwAway(): Promise<boolean> {
    const row = asked.value
    if (row === null || busy.value) return false
    busy.value = true
    problem.value = null
    try {
      const kept = outbox.find(row.id) ?? null
      if (row.version !== null) await remove(row.id, row.version)
      outbox.drop(row.id)
      gone(row.id)
      const one = {
        id: row.id,
        number: row.draft.number,
        until: undoUntil(Date.now()),
        kept: row.version === null ? kept : null,
      }
      remember([one, ...all.value.filter((each) => each.id !== row.id)])
      return true
    } catch (error) {
      problem.value = error as Error
      return false
    } finally {
      busy.value = false
      asked.value = null
    }
  }

  async function putBack(thrown: Thrown): Promise<void> {
    problem.value = null
    try {
      if (thrown.kept !== null) outbox.put(thrown.id, thrown.kept.body, thrown.kept.version)
      else back(await restore(thrown.id))
      remember(all.value.filter((each) => each.id !== thrown.id))
    } catch (error) {
      problem.value = error as Error
    }
  }

  return {
    asked,
    busy,
    problem,
    latest,
    throwAway,
    putBack,
    hide: () => remember(all.value.filter((each) => each.id !== latest.value?.id)),
  }
}

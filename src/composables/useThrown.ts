import { onScopeDispose, ref, shallowRef } from 'vue'
import { LIMITS } from '@shared/limits'

interface Throw {
  /** "The game against Tarn Valley is thrown away." */
  words: string
  remove: () => Promise<unknown>
  restore: () => Promise<unknown>
}

/**
 * Throwing a row away and putting it back, which works for ten minutes. The last one thrown away can be put back here.
 * @param after what to load again after either
 */
export function useThrown(after: () => Promise<void>) {
  const last = shallowRef<Throw | null>(null)
  const busy = ref(false)
  const problem = shallowRef<Error | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined
  onScopeDispose(() => clearTimeout(timer))

  async function run(act: () => Promise<unknown>, then: () => void): Promise<void> {
    if (busy.value) return
    busy.value = true
    problem.value = null
    try {
      await act()
      then()
      await after()
    } catch (error) {
      problem.value = error as Error
    } finally {
      busy.value = false
    }
  }
  const throwAway = (one: Throw): Promise<void> =>
    run(one.remove, () => {
      last.value = one
      clearTimeout(timer)
      timer = setTimeout(() => (last.value = null), LIMITS.undoMinutes * 60_000)
    })
  async function putBack(): Promise<void> {
    const one = last.value
    if (one !== null) await run(one.restore, () => (last.value = null))
  }
  return { last, busy, problem, throwAway, putBack }
}

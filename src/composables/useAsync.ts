import { computed, onScopeDispose, reactive, ref, shallowRef, watch, type WatchSource } from 'vue'
import { isAbort, OfflineError } from '@/api/problems'

/** Under this nothing is shown: most answers are quicker than the eye. */
export const SHOW_LOADING_AFTER_MS = 300
/** From here on the page says what is slow. */
export const SAY_SLOW_AFTER_MS = 8000

/** Something fetched. Made by `useAsync`; in templates its fields read without `.value`. */
export interface Async<T> {
  /** The last good answer; kept while a newer one is on its way and when that one fails. */
  readonly data: T | null
  readonly error: Error | null
  readonly pending: boolean
  /** Pending for longer than 300 ms. */
  readonly loading: boolean
  /** Pending for longer than 8 s. */
  readonly slow: boolean
  /** The last try did not get through. */
  readonly offline: boolean
  /** When `data` came, milliseconds since 1970; null before. */
  readonly loadedAt: number | null
  /** Asks again; a request under way is stopped and its answer dropped. */
  reload: () => Promise<void>
  /** Puts in a row that another answer brought (after saving it, say); a request under way is stopped. */
  set: (data: T) => void
}

export interface AsyncOptions {
  /** Loads again when one of these changes. What is shown stays until the new answer is there. */
  watch?: WatchSource<unknown> | WatchSource<unknown>[]
  /** False: waits for the first `reload`. */
  immediate?: boolean
}

/** Loads with the signal given, drops answers that come too late, and stops with the component. */
export function useAsync<T>(load: (signal: AbortSignal) => Promise<T>, options: AsyncOptions = {}): Async<T> {
  const data = shallowRef<T | null>(null)
  const error = shallowRef<Error | null>(null)
  const pending = ref(false)
  const loading = ref(false)
  const slow = ref(false)
  const loadedAt = ref<number | null>(null)

  let current: AbortController | null = null
  let timers: ReturnType<typeof setTimeout>[] = []

  function stop(): void {
    current?.abort()
    current = null
    timers.forEach(clearTimeout)
    timers = []
    pending.value = loading.value = slow.value = false
  }

  async function reload(): Promise<void> {
    stop()
    const mine = new AbortController()
    current = mine
    pending.value = true
    timers = [
      setTimeout(() => (loading.value = true), SHOW_LOADING_AFTER_MS),
      setTimeout(() => (slow.value = true), SAY_SLOW_AFTER_MS),
    ]
    try {
      const answer = await load(mine.signal)
      if (current !== mine) return
      take(answer)
    } catch (reason) {
      if (current !== mine) return
      if (!isAbort(reason)) error.value = reason instanceof Error ? reason : new Error(String(reason))
    }
    stop()
  }

  function take(answer: T): void {
    data.value = answer
    error.value = null
    loadedAt.value = Date.now()
  }

  function set(answer: T): void {
    stop()
    take(answer)
  }

  onScopeDispose(stop)
  if (options.watch !== undefined) watch(options.watch, () => void reload())
  if (options.immediate !== false) void reload()

  const offline = computed(() => error.value instanceof OfflineError)
  return reactive({ data, error, pending, loading, slow, offline, loadedAt, reload, set }) as Async<T>
}

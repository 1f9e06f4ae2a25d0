import { effectScope, nextTick, ref, type EffectScope } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { OfflineError } from '@/api/problems'
import { useAsync } from '@/composables/useAsync'

/** Requests that the test answers when it likes. */
function desk<T>() {
  const calls: { signal: AbortSignal; resolve: (value: T) => void; reject: (reason: unknown) => void }[] = []
  const load = (signal: AbortSignal) =>
    new Promise<T>((resolve, reject) => {
      signal.addEventListener('abort', () => reject(signal.reason as DOMException))
      calls.push({ signal, resolve, reject })
    })
  return { calls, load }
}

let scope: EffectScope
beforeEach(() => {
  vi.useFakeTimers()
  scope = effectScope()
})
afterEach(() => {
  scope.stop()
  vi.useRealTimers()
})
const inScope = <T>(make: () => T): T => scope.run(make)!
const settled = () => vi.advanceTimersByTimeAsync(0)

describe('useAsync', () => {
  it('says that it loads only after 300 ms, and that it is slow after 8 s', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load))
    expect(source).toMatchObject({ pending: true, loading: false, data: null })
    await vi.advanceTimersByTimeAsync(299)
    expect(source.loading).toBe(false)
    await vi.advanceTimersByTimeAsync(1)
    expect(source.loading).toBe(true)
    await vi.advanceTimersByTimeAsync(7700)
    expect(source.slow).toBe(true)
    calls[0]!.resolve('here')
    await settled()
    expect(source).toMatchObject({ data: 'here', pending: false, loading: false, slow: false })
  })

  it('shows no loading at all when the answer is quick', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load))
    await vi.advanceTimersByTimeAsync(200)
    calls[0]!.resolve('here')
    await vi.advanceTimersByTimeAsync(10_000)
    expect(source).toMatchObject({ loading: false, slow: false, data: 'here' })
  })

  it('drops an answer that comes after a newer request', async () => {
    const { calls, load } = desk<string>()
    const opponent = ref('gulls')
    // A loader that does not heed the signal: the late answer itself must be dropped.
    const source = inScope(() =>
      useAsync((signal) => Promise.race([load(new AbortController().signal), load(signal)]), {
        watch: opponent,
      }),
    )
    opponent.value = 'rovers'
    await nextTick()
    calls[2]!.resolve('rovers')
    await settled()
    calls[0]!.resolve('gulls')
    await settled()
    expect(source.data).toBe('rovers')
    expect(source.error).toBeNull()
  })

  it('stops the request under way when it asks again and when its scope ends', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load))
    void source.reload()
    expect(calls[0]!.signal.aborted).toBe(true)
    expect(calls[1]!.signal.aborted).toBe(false)
    scope.stop()
    expect(calls[1]!.signal.aborted).toBe(true)
    await vi.advanceTimersByTimeAsync(10_000)
    expect(source).toMatchObject({ error: null, loading: false, pending: false })
  })

  it('keeps what is there when a newer try fails, and forgets the fault when one works', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load))
    calls[0]!.resolve('first')
    await settled()
    void source.reload()
    calls[1]!.reject(new OfflineError())
    await settled()
    expect(source).toMatchObject({ data: 'first', offline: true, pending: false })
    void source.reload()
    calls[2]!.resolve('second')
    await settled()
    expect(source).toMatchObject({ data: 'second', offline: false, error: null })
  })

  it('takes a row that a save brought over the answer under way', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load))
    source.set('saved')
    calls[0]!.resolve('older')
    await settled()
    expect(source).toMatchObject({ data: 'saved', pending: false })
  })

  it('waits for the first reload when told to', async () => {
    const { calls, load } = desk<string>()
    const source = inScope(() => useAsync(load, { immediate: false }))
    await settled()
    expect(calls).toHaveLength(0)
    expect(source.pending).toBe(false)
  })
})

import { effectScope } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { StillRow } from '@shared/possessions/schemas'
import { NO_MARKS } from '@shared/stills/marks'
import type { StillPatch } from '@shared/stills/schemas'
import { ApiProblem, OfflineError } from '@/api/problems'
import { placed } from '@/components/stills/markMoves'
import { useMarking } from '@/components/stills/useMarking'

const row = (more: Partial<StillRow> = {}): StillRow => ({
  id: '0b0c7c0e-8a8e-4d58-9d5f-1d9a3a1f0a01',
  version: 1,
  position: 1,
  t: 2,
  caption: '',
  width: 1600,
  height: 900,
  url: '/full',
  thumbnailUrl: '/thumb',
  marks: NO_MARKS,
  blurred: 0,
  facesLeft: null,
  inReport: false,
  expiresOn: '2027-06-30',
  ...more,
})
const stale = (current: StillRow) =>
  new ApiProblem({ type: 't', title: 't', status: 412, detail: 'Changed.', instance: '/', current })

/** A server that takes what is sent, unless it is told to answer otherwise once. */
function start(still = row()) {
  const sent: { patch: StillPatch; version: number }[] = []
  const faults: Error[] = []
  const kept: StillRow[] = []
  const scope = effectScope()
  const desk = scope.run(() =>
    useMarking({
      still,
      send: (patch, version) => {
        sent.push({ patch, version })
        const fault = faults.shift()
        if (fault) return Promise.reject(fault)
        return Promise.resolve(row({ ...(patch as Partial<StillRow>), version: version + 1 }))
      },
      kept: (each) => kept.push(each),
      restMs: 100,
    }),
  )!
  return { desk, sent, faults, kept, scope }
}

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())
const rest = (ms = 150) => vi.advanceTimersByTimeAsync(ms)
const ring = (x: number) => placed(NO_MARKS, 'ring', { x, y: 0.7 })

describe('marks while they are drawn', () => {
  it('are kept once the hand rests, in one request, on the version before', async () => {
    const { desk, sent, kept } = start()
    for (const x of [0.2, 0.3, 0.4]) desk.change({ marks: ring(x) }, 'stroke 1')
    expect(sent).toEqual([])
    await rest()
    expect(sent).toEqual([{ patch: { marks: ring(0.4), caption: '' }, version: 1 }])
    expect([desk.unsaved.value, kept.at(-1)?.version]).toEqual([false, 2])
    desk.change({ caption: 'Trapped ' })
    await rest()
    expect(sent.at(-1)).toMatchObject({ patch: { caption: 'Trapped' }, version: 2 })
    expect(desk.unsaved.value).toBe(false)
  })

  it('a movement is one step back, and the step is kept too', async () => {
    const { desk, sent } = start()
    for (const x of [0.2, 0.3]) desk.change({ marks: ring(x) }, 'stroke 1')
    desk.change({ marks: ring(0.8) }, 'stroke 2')
    desk.stepBack()
    expect(desk.draft.value.marks).toEqual(ring(0.3))
    desk.stepBack()
    expect(desk.draft.value.marks).toEqual(NO_MARKS)
    desk.stepBack()
    await rest()
    // Back where it began: there is nothing to send.
    expect(sent).toEqual([])
  })

  it('where somebody was quicker both are there, and nothing is sent until one is chosen', async () => {
    const { desk, sent, faults } = start()
    const theirs = row({ version: 5, caption: 'Theirs' })
    faults.push(stale(theirs))
    desk.change({ caption: 'Mine' })
    await rest()
    expect(desk.conflict.value).toEqual(theirs)
    desk.change({ caption: 'Mine still' })
    await rest()
    expect([sent.length, desk.draft.value.caption]).toEqual([1, 'Mine still'])
    await desk.settle('ours')
    expect(sent.at(-1)).toMatchObject({ patch: { caption: 'Mine still' }, version: 5 })
    expect(desk.conflict.value).toBeNull()
  })

  it('theirs can be taken, and then there is nothing of ours to step back to', async () => {
    const { desk, sent, faults } = start()
    faults.push(stale(row({ version: 5, caption: 'Theirs' })))
    desk.change({ caption: 'Mine' })
    await rest()
    await desk.settle('theirs')
    expect([desk.draft.value.caption, desk.steps.value.length, sent.length]).toEqual(['Theirs', 0, 1])
  })

  it('without a signal they stay and go when it is back', async () => {
    const { desk, sent, faults } = start()
    faults.push(new OfflineError())
    desk.change({ caption: 'Mine' })
    await rest()
    expect([desk.unsaved.value, desk.problem.value instanceof OfflineError]).toEqual([true, true])
    window.dispatchEvent(new Event('online'))
    await rest(0)
    expect([sent.length, desk.unsaved.value, desk.problem.value]).toEqual([2, false, null])
  })

  it('a blur goes after the marks, on the version that they made; not over a refused one', async () => {
    const { desk, sent, faults } = start()
    desk.change({ caption: 'Mine' })
    const versions: number[] = []
    const blur = (version: number) => {
      versions.push(version)
      return Promise.resolve(row({ version: version + 1, caption: 'Mine', blurred: 1 }))
    }
    expect(await desk.alsoChange(blur)).toBe(true)
    expect([sent.length, versions]).toEqual([1, [2]])
    faults.push(new OfflineError())
    desk.change({ caption: 'More' })
    expect(await desk.alsoChange(blur)).toBe(false)
    expect(versions).toEqual([2])
  })

  it('leaving the desk sends what is not kept yet', async () => {
    const { desk, sent, scope } = start()
    desk.change({ caption: 'Mine' })
    scope.stop()
    await rest(0)
    expect(sent).toHaveLength(1)
  })
})

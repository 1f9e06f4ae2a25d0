import { computed, onScopeDispose, ref, shallowRef } from 'vue'
import { useEventListener } from '@vueuse/core'
import { StillRow } from '@shared/possessions/schemas'
import { marksOf, type StillMarks } from '@shared/stills/marks'
import type { StillPatch } from '@shared/stills/schemas'
import { ApiProblem, OfflineError } from '@/api/problems'

export interface Marking {
  marks: StillMarks
  caption: string
}

export interface MarkingOptions {
  still: StillRow
  send: (patch: StillPatch, version: number) => Promise<StillRow>
  /** The server has this row now. */
  kept: (row: StillRow) => void
  /** How long a hand rests before it is kept, ms. */
  restMs?: number
}

const REST_MS = 700
const AGAIN_MS = 5000

const markingOf = (row: StillRow): Marking => ({ marks: row.marks, caption: row.caption })
const same = (a: Marking, b: Marking) =>
  a.caption.trim() === b.caption.trim() &&
  JSON.stringify(marksOf(a.marks)) === JSON.stringify(marksOf(b.marks))

/**
 * The marks and words of one still while somebody draws: kept by itself once the hand rests, step by step back, and
 * where somebody else was quicker both are there until one is chosen. One request at a time, each on the version
 * that the one before it made.
 */
export function useMarking({ still, send, kept, restMs = REST_MS }: MarkingOptions) {
  const row = shallowRef(still)
  const draft = shallowRef(markingOf(still))
  const steps = shallowRef<Marking[]>([])
  const conflict = shallowRef<StillRow | null>(null)
  const problem = shallowRef<Error | null>(null)
  const busy = ref(false)
  let joined: string | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let chain: Promise<unknown> = Promise.resolve()

  const unsaved = computed(() => !same(draft.value, markingOf(row.value)))

  function rest(ms = restMs): void {
    clearTimeout(timer)
    timer = setTimeout(() => void keep(), ms)
  }

  /** Changes of one hand movement share `join` and are one step back. */
  function change(next: Partial<Marking>, join: string | null = null): void {
    if (join === null || join !== joined) steps.value = [...steps.value, draft.value].slice(-50)
    joined = join
    draft.value = { ...draft.value, ...next }
    rest()
  }

  function stepBack(): void {
    const last = steps.value.at(-1)
    if (last === undefined) return
    steps.value = steps.value.slice(0, -1)
    joined = null
    draft.value = last
    rest()
  }

  /** One request after the other. False when it was not done; `problem` or `conflict` says why. */
  function edit(ask: (version: number) => Promise<StillRow>): Promise<boolean> {
    const turn = chain.then(async () => {
      if (conflict.value !== null) return false
      busy.value = true
      try {
        row.value = await ask(row.value.version)
        problem.value = null
        kept(row.value)
        return true
      } catch (error) {
        refuse(error)
        return false
      } finally {
        busy.value = false
      }
    })
    chain = turn
    return turn
  }

  function refuse(error: unknown): void {
    const present =
      error instanceof ApiProblem && error.status === 412 ? StillRow.safeParse(error.current).data : undefined
    if (present !== undefined) {
      conflict.value = present
      return
    }
    problem.value = error instanceof Error ? error : new Error('This did not work.')
    if (error instanceof OfflineError) rest(AGAIN_MS)
  }

  /** Keeps what is drawn now. True when the server has all of it. */
  async function keep(): Promise<boolean> {
    clearTimeout(timer)
    await chain
    if (!unsaved.value) return true
    const { marks, caption } = draft.value
    const done = await edit((version) => send({ marks, caption: caption.trim() }, version))
    // Drawn on while it was on its way.
    return done && unsaved.value ? keep() : done
  }

  /** Another change of the same still, after the marks are kept. */
  async function alsoChange(ask: (version: number) => Promise<StillRow>): Promise<boolean> {
    return (await keep()) && edit(ask)
  }

  /** Which of the two versions holds. */
  function settle(whose: 'ours' | 'theirs'): Promise<boolean> {
    const present = conflict.value
    if (present === null) return keep()
    conflict.value = null
    row.value = present
    kept(present)
    if (whose === 'theirs') {
      draft.value = markingOf(present)
      steps.value = []
    }
    return keep()
  }

  useEventListener(window, 'online', () => void keep())
  useEventListener(window, 'beforeunload', (event) => {
    if (unsaved.value) event.preventDefault()
  })
  onScopeDispose(() => {
    void keep()
  })

  return { row, draft, steps, conflict, problem, busy, unsaved, change, stepBack, keep, alsoChange, settle }
}

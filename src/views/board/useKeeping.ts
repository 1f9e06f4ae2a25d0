import { computed, onBeforeUnmount, ref, shallowRef, watch } from 'vue'
import { useEventListener } from '@vueuse/core'
import { CounterDraft, CounterRow } from '@shared/counters/schemas'
import { putCounter } from '@/api/counters'
import { ApiProblem, OfflineError } from '@/api/problems'
import { textOfBody } from './boardBody'
import { forget, keep, keyOf, recall } from '@/composables/kept'

/** What a device keeps of a drawing that is not sent: what it was drawn on, and how it is now. */
export interface KeptDrawing {
  version: number | null
  body: CounterDraft
}

export const drawingKey = (person: string, team: string, id: string) => keyOf('board', person, team, id)

export function readKeptDrawing(value: unknown): KeptDrawing | null {
  if (typeof value !== 'object' || value === null || !('body' in value) || !('version' in value)) return null
  const body = CounterDraft.safeParse(value.body)
  const { version } = value
  if (!body.success || (version !== null && typeof version !== 'number')) return null
  return { version, body: body.data }
}

export const recallDrawing = (key: string): KeptDrawing | null => recall(key, readKeptDrawing)

/** Milliseconds after the last change, and until the next try without a signal. */
const PAUSE = 1500
const AGAIN = 15_000

/**
 * Keeps what is drawn: a draft by itself, a little after the last change; a counter of the book on this device until
 * it is put there again, for what the book holds has no faults. A newer version of somebody else's waits for a choice.
 */
export function useKeeping(options: {
  teamId: string
  id: string
  key: string
  /** What the server has; null for a new drawing. */
  row: CounterRow | null
  stored: CounterDraft | null
  /** The version that what is on the board was drawn on. */
  version: number | null
  body: () => CounterDraft
  saved: (row: CounterRow) => void
}) {
  const version = ref(options.version)
  const draft = ref(options.row?.draft ?? true)
  const stored = ref(options.stored ? textOfBody(options.stored) : '')
  const text = computed(() => textOfBody(options.body()))
  const changed = computed(() => text.value !== stored.value)
  const sending = ref(false)
  const offline = ref(false)
  const onDevice = ref(true)
  const error = shallowRef<Error | null>(null)
  const theirs = shallowRef<CounterRow | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined

  const words = computed(() => {
    if (theirs.value) return 'Somebody else changed it.'
    if (sending.value) return 'Keeping it.'
    if (!changed.value) return draft.value ? 'Draft, kept.' : 'In the book.'
    if (error.value) return 'Not kept yet.'
    const where = onDevice.value ? 'kept on this device' : 'not kept: this device keeps nothing'
    if (offline.value) return `No signal; ${where}.`
    return draft.value ? 'Draft, changed just now.' : `Changed, ${where} until it is put in the book.`
  })

  watch(
    text,
    () => {
      clearTimeout(timer)
      error.value = null
      if (!changed.value) return forget(options.key)
      onDevice.value = keep(options.key, { version: version.value, body: options.body() })
      if (draft.value) timer = setTimeout(() => void send(), PAUSE)
    },
    { immediate: options.row !== null || options.stored !== null },
  )

  /** Sends what is there; `toBook` puts it in the book. True when it was taken. */
  async function send(toBook = false): Promise<boolean> {
    clearTimeout(timer)
    if (sending.value || theirs.value) return false
    sending.value = true
    const sent = options.body()
    try {
      const row = await putCounter(
        options.teamId,
        options.id,
        { ...sent, draft: draft.value && !toBook },
        version.value ?? undefined,
      )
      version.value = row.version
      draft.value = row.draft
      stored.value = textOfBody(sent)
      offline.value = false
      error.value = null
      if (changed.value) {
        keep(options.key, { version: row.version, body: options.body() })
        if (draft.value) timer = setTimeout(() => void send(), PAUSE)
      } else forget(options.key)
      options.saved(row)
      return true
    } catch (reason) {
      failed(reason)
      return false
    } finally {
      sending.value = false
    }
  }

  function failed(reason: unknown): void {
    if (reason instanceof OfflineError) {
      offline.value = true
      if (draft.value) timer = setTimeout(() => void send(), AGAIN)
      return
    }
    const current =
      reason instanceof ApiProblem && reason.isConflict ? CounterRow.safeParse(reason.current) : undefined
    if (current?.success) theirs.value = current.data
    else error.value = reason instanceof Error ? reason : new Error(String(reason))
  }

  /** Mine over theirs: written on their version. */
  async function keepMine(): Promise<void> {
    const row = theirs.value
    if (!row) return
    version.value = row.version
    draft.value = row.draft
    theirs.value = null
    if (draft.value) await send()
    else keep(options.key, { version: row.version, body: options.body() })
  }

  /** Theirs in the place of mine; the caller shows it. */
  function takeTheirs(body: CounterDraft): void {
    const row = theirs.value
    if (!row) return
    version.value = row.version
    draft.value = row.draft
    stored.value = textOfBody(body)
    theirs.value = null
    forget(options.key)
  }

  useEventListener(window, 'online', () => offline.value && draft.value && void send())
  useEventListener(window, 'beforeunload', (event) => changed.value && event.preventDefault())
  onBeforeUnmount(() => clearTimeout(timer))

  return { version, draft, changed, sending, error, theirs, words, send, keepMine, takeTheirs }
}

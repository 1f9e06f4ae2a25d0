import { computed, onScopeDispose, ref, shallowRef } from 'vue'
import { useEventListener } from '@vueuse/core'
import type { PossessionBody, PossessionRow } from '@shared/possessions/schemas'
import { OfflineError } from '@/api/problems'
import { forget, keep, outboxKey, recallAll } from '@/composables/kept'
import { readWaiting, verdictOf, type Waiting } from './outbox'

const FIRST_WAIT_MS = 3000
const LONGEST_WAIT_MS = 60_000

export interface OutboxOptions {
  person: string
  game: string
  /** PUT of one row; the same again changes nothing. */
  send: (id: string, body: PossessionBody, version?: number) => Promise<PossessionRow>
  /** The server has the row. */
  sent: (row: PossessionRow) => void
}

/**
 * Rows that are said and not yet on the server: kept on this device from the moment they are saved, sent one after
 * the other, and sent again when the signal is back. Every row has its id from the start, so a second try changes
 * nothing twice.
 */
export function useOutbox({ person, game, send, sent }: OutboxOptions) {
  const below = outboxKey(person, game)
  const entries = shallowRef<readonly Waiting[]>(recallAll(below, readWaiting).sort(byNumber))
  const sending = ref<string | null>(null)
  const offline = ref(false)
  /** False once this browser refused to keep a row: then leaving the page would lose it. */
  const isKept = ref(true)
  let wait = FIRST_WAIT_MS
  let timer: ReturnType<typeof setTimeout> | undefined

  const waiting = computed(() => entries.value.filter((entry) => entry.state === 'waiting'))
  const find = (id: string) => entries.value.find((entry) => entry.id === id)

  function store(entry: Waiting): void {
    entries.value = [...entries.value.filter((each) => each.id !== entry.id), entry].sort(byNumber)
    isKept.value = keep(`${below}.${entry.id}`, entry) && isKept.value
  }

  /** Takes a row out of what is to be sent. */
  function drop(id: string): void {
    entries.value = entries.value.filter((each) => each.id !== id)
    forget(`${below}.${id}`)
  }

  /** Keeps a row here and sends it as soon as it can be. */
  function put(id: string, body: PossessionBody, version: number | null): void {
    store({
      id,
      body,
      version,
      state: 'waiting',
      why: '',
      fields: [],
      current: null,
      stamp: (find(id)?.stamp ?? 0) + 1,
    })
    void flush()
  }

  /** After a change by somebody else: ours over theirs, or theirs as it stands. */
  function settle(id: string, whose: 'ours' | 'theirs'): void {
    const entry = find(id)
    if (entry?.current == null) return
    if (whose === 'ours') return put(id, entry.body, entry.current.version)
    drop(id)
    sent(entry.current)
  }

  async function flush(): Promise<void> {
    if (sending.value !== null) return
    clearTimeout(timer)
    for (let entry = waiting.value[0]; entry !== undefined; entry = waiting.value[0]) {
      sending.value = entry.id
      const goOn = await sendOne(entry)
      sending.value = null
      if (!goOn) return later()
      wait = FIRST_WAIT_MS
    }
  }

  /** False when it has to wait. */
  async function sendOne(entry: Waiting): Promise<boolean> {
    try {
      took(entry, await send(entry.id, entry.body, entry.version ?? undefined))
      return true
    } catch (error) {
      offline.value = error instanceof OfflineError
      const verdict = verdictOf(error, entry)
      if (verdict.kind === 'later') return false
      if (verdict.kind === 'sent') took(entry, verdict.row)
      // The row was changed here or taken back while it was under way: that later word counts.
      else if (find(entry.id)?.stamp !== entry.stamp) return true
      else if (verdict.kind === 'again') store({ ...entry, version: verdict.version })
      else if (verdict.kind === 'conflict')
        store({ ...entry, state: 'conflict', why: verdict.why, current: verdict.current })
      else
        store({ ...entry, state: 'refused', why: verdict.error.message, fields: [...verdict.error.fields] })
      return true
    }
  }

  function took(entry: Waiting, row: PossessionRow): void {
    offline.value = false
    const latest = find(entry.id)
    if (latest !== undefined && latest.stamp !== entry.stamp) store({ ...latest, version: row.version })
    else drop(entry.id)
    sent(row)
  }

  function later(): void {
    timer = setTimeout(() => void flush(), wait)
    wait = Math.min(wait * 2, LONGEST_WAIT_MS)
  }

  function now(): void {
    wait = FIRST_WAIT_MS
    void flush()
  }

  useEventListener(window, 'online', now)
  useEventListener(window, 'offline', () => (offline.value = true))
  useEventListener(document, 'visibilitychange', () => document.visibilityState === 'visible' && now())
  onScopeDispose(() => clearTimeout(timer))
  if (entries.value.length > 0) void flush()

  return { entries, waiting, sending, offline, isKept, find, put, drop, settle, flush: now }
}
export type Outbox = ReturnType<typeof useOutbox>

const byNumber = (a: Waiting, b: Waiting) => a.body.number - b.body.number

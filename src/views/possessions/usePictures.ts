import { computed, onScopeDispose, ref } from 'vue'
import { useEventListener } from '@vueuse/core'
import type { StillRow } from '@shared/possessions/schemas'
import type { StillText } from '@/api/stills'
import { ApiProblem, isAbort, OfflineError } from '@/api/problems'
import { newId } from '@/composables/newId'
import { pictureFault, roomFor } from './pictureFaults'

/** A picture on its way to a possession. */
export interface Picture {
  readonly id: string
  readonly possession: string
  readonly name: string
  readonly file: Blob
  /** Shows it before it is sent. */
  readonly preview: string
  caption: string
  /** As typed, seconds from the first touch. */
  seconds: string
  /** `here`: waits for its row to be saved; `ready`: the row is saved, the picture goes next. */
  state: 'here' | 'ready' | 'sending' | 'refused'
  /** Share sent, 0 to 1. */
  share: number
  why: string
}

export interface PicturesOptions {
  send: (
    possession: string,
    id: string,
    file: Blob,
    text: StillText,
    options: { signal: AbortSignal; onProgress: (share: number) => void },
  ) => Promise<StillRow>
  /** The server has it. */
  sent: (possession: string, still: StillRow) => void
  /** Whether the server has the row already; before that no picture can go. */
  hasRow: (possession: string) => boolean
  readSeconds: (text: string) => number | null
}

const AGAIN_MS = 5000

/** Pictures wait on this page until their row is on the server, then go one after the other. */
export function usePictures({ send, sent, hasRow, readSeconds }: PicturesOptions) {
  const pictures = ref<Picture[]>([])
  /** Why some could not be taken, in words. */
  const faults = ref<string[]>([])
  const stop = new AbortController()
  let busy = false
  let timer: ReturnType<typeof setTimeout> | undefined

  const of = (possession: string) => pictures.value.filter((each) => each.possession === possession)
  const waiting = computed(() => pictures.value.filter((each) => each.state !== 'refused').length)

  /** Takes pictures for a possession; those that cannot be taken are named in `faults`. */
  function add(possession: string, files: readonly File[], there: number): void {
    const refused = files.map(pictureFault)
    const good = files.filter((_, index) => refused[index] === null)
    const room = roomFor(there + of(possession).length, good.length)
    faults.value = [...refused, room.fault].filter((fault): fault is string => fault !== null)
    for (const file of good.slice(0, room.take))
      pictures.value.push({
        id: newId(),
        possession,
        name: file.name,
        file,
        preview: URL.createObjectURL(file),
        caption: '',
        seconds: '',
        state: 'here',
        share: 0,
        why: '',
      })
  }

  /** What a picture shows and when, told before it is sent. */
  function say(id: string, words: { caption?: string; seconds?: string }): void {
    const picture = pictures.value.find((each) => each.id === id)
    if (picture?.state === 'here') Object.assign(picture, words)
  }

  function remove(id: string): void {
    const picture = pictures.value.find((each) => each.id === id)
    if (picture !== undefined) URL.revokeObjectURL(picture.preview)
    pictures.value = pictures.value.filter((each) => each.id !== id)
  }

  /** The row is saved: its pictures may go as soon as the server has it. */
  function release(possession: string): void {
    for (const picture of of(possession)) if (picture.state === 'here') picture.state = 'ready'
    void flush()
  }

  /** Tries a refused one again. */
  function again(id: string): void {
    const picture = pictures.value.find((each) => each.id === id)
    if (picture !== undefined) Object.assign(picture, { state: 'ready', why: '' })
    void flush()
  }

  async function flush(): Promise<void> {
    if (busy) return
    busy = true
    clearTimeout(timer)
    const next = () => pictures.value.find((each) => each.state === 'ready' && hasRow(each.possession))
    for (let picture = next(); picture !== undefined; picture = next()) if (!(await sendOne(picture))) break
    busy = false
  }

  /** False when it has to wait. */
  async function sendOne(picture: Picture): Promise<boolean> {
    Object.assign(picture, { state: 'sending', share: 0, why: '' })
    try {
      const text = { t: readSeconds(picture.seconds), caption: picture.caption.trim() }
      const still = await send(picture.possession, picture.id, picture.file, text, {
        signal: stop.signal,
        onProgress: (share) => (picture.share = share),
      })
      sent(picture.possession, still)
      remove(picture.id)
      return true
    } catch (error) {
      if (isAbort(error)) return false
      const problem = error instanceof ApiProblem && error.status < 500 && error.status !== 401 ? error : null
      if (problem !== null) {
        const why = problem.fields.map((fault) => fault.message).join(' ')
        Object.assign(picture, { state: 'refused', why: why === '' ? problem.message : why })
        return true
      }
      Object.assign(picture, {
        state: 'ready',
        why:
          error instanceof OfflineError
            ? 'No signal. It goes when the signal is back.'
            : 'It did not get through. It goes again soon.',
      })
      timer = setTimeout(() => void flush(), AGAIN_MS)
      return false
    }
  }

  useEventListener(window, 'online', () => void flush())
  // A picture is too large to be kept by the browser's own small store: closing the window would lose it.
  useEventListener(window, 'beforeunload', (event) => {
    if (waiting.value > 0) event.preventDefault()
  })
  onScopeDispose(() => {
    stop.abort()
    clearTimeout(timer)
    for (const picture of pictures.value) URL.revokeObjectURL(picture.preview)
  })

  return { pictures, faults, waiting, of, add, say, remove, release, again, flush }
}
export type Pictures = ReturnType<typeof usePictures>

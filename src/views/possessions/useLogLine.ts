import { computed, ref, shallowRef, watch, type Ref } from 'vue'
import { bodyOfDraft } from './draft'
import { halfRowsOf, isBegun, lineOfHalf, nextLine, readHalfRows, renumbered } from './halfRow'
import { forget, keep, keyOf, recall } from '@/composables/kept'
import { newId } from '@/composables/newId'
import type { Act } from './acts'
import { applyAct, courtTap, isComplete, lineOf, openSlot, stepBack, type Line } from './line'
import type { LogGame } from './logGame'
import type { LogRow } from './logRows'
import type { Slot } from './slots'

export interface LogLineOptions {
  person: string
  game: Pick<LogGame, 'id' | 'ours'>
  /** All rows, newest first; null until they are known. */
  rows: Ref<readonly LogRow[] | null>
  /** Keeps the row and sends it. */
  save: (line: Line, body: NonNullable<ReturnType<typeof bodyOfDraft>>) => void
}

/**
 * The possession being said: a new one, or a saved one that is open again while the new one waits. Half a row is kept
 * on this device and is there again when the page is.
 */
export function useLogLine({ person, game, rows, save: keepRow }: LogLineOptions) {
  const key = keyOf('half', person, game.id)
  const half = recall(key, readHalfRows)
  const all = () => rows.value ?? []
  const fresh = shallowRef<Line>(nextLine(newId(), game, all()))
  if (half?.fresh != null) fresh.value = lineOfHalf(half.fresh, game, null)
  const edit = shallowRef<Line | null>(half?.edit == null ? null : lineOfHalf(half.edit, game, null))
  const restored = ref(half !== null)
  const line = computed(() => edit.value ?? fresh.value)
  const complete = computed(() => isComplete(line.value))

  watch(rows, () => {
    if (!isBegun(fresh.value)) fresh.value = { ...nextLine(fresh.value.id, game, all()) }
    else
      fresh.value = {
        ...renumbered(fresh.value, all()),
        before: nextLine(fresh.value.id, game, all()).before,
      }
  })
  watch([fresh, edit], () => {
    const value = halfRowsOf(fresh.value, edit.value)
    if (value === null) forget(key)
    else keep(key, value)
  })

  function change(next: Line): void {
    restored.value = false
    if (edit.value !== null) edit.value = next
    else fresh.value = next
  }

  const act = (what: Act) => change(applyAct(line.value, what))
  const open = (slot: Slot | null) => change(openSlot(line.value, slot))
  const back = () => change(stepBack(line.value))

  /** True when the tap said something. */
  function tap(place: { x: number; y: number }): boolean {
    const what = courtTap(line.value, place)
    if (what !== null) act(what)
    return what !== null
  }

  /** Saves the row that is open when it is complete; the next one opens with what it carries over. */
  function save(): number | null {
    const now = line.value
    const body = bodyOfDraft(now.draft)
    if (body === null || !isComplete(now)) return null
    keepRow(now, body)
    if (edit.value !== null) edit.value = null
    else fresh.value = nextLine(newId(), game, all())
    return body.number
  }

  /** Opens a saved row in the sentence; the half-said new one stays as it is. */
  function openRow(row: LogRow): void {
    edit.value = lineOf(row.id, row.draft, row.version)
    // A kept new row has no version yet, but was complete when it was saved: nothing is asked again.
    if (row.version === null)
      edit.value = { ...edit.value, passed: lineOf(row.id, row.draft, 1).passed, open: null }
  }

  const leaveRow = () => (edit.value = null)
  /** Throws the half-said new row away. */
  const startOver = () => (fresh.value = nextLine(newId(), game, all()))

  return { line, edit, fresh, complete, restored, act, open, back, tap, save, openRow, leaveRow, startOver }
}
export type LogLine = ReturnType<typeof useLogLine>

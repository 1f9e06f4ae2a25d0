import type { Ref } from 'vue'
import type { Act } from './acts'
import { trapsOf } from './draft'
import { trapSlot } from './filmKeys'
import type { Line } from './line'
import type { Pictures } from './usePictures'

export interface FilmOptions {
  line: Ref<Line>
  act: (act: Act) => void
  addPictures: (files: File[]) => void
  pictures: Pictures
}

/** What the film beside the log says in the row that is open. */
export function useFilm({ line, act, addPictures, pictures }: FilmOptions) {
  /** The count at which a trap was called and not yet placed. */
  let pending: { row: string; trap: number; count: number } | null = null

  /** The first touch is here on the film. */
  const touch = (seconds: number) => act({ do: 'set', slot: { field: 'filmTime' }, value: seconds })
  const over = (count: number) => act({ do: 'set', slot: { field: 'crossedAt' }, value: count })

  /** Two came to the ball now: the time of a trap that is placed, or the court is asked where. */
  function trap(count: number | null): void {
    const slot = trapSlot(line.value.draft)
    if (slot === null) return
    if (slot.field === 'trapTime') {
      if (count !== null) act({ do: 'set', slot, value: count })
      return
    }
    pending = count === null ? null : { row: line.value.id, trap: slot.trap ?? 0, count }
    act({ do: 'open', slot })
  }

  /** After a tap on the court: the trap that was called gets its time. */
  function placed(): void {
    const due = pending
    pending = null
    if (due === null || due.row !== line.value.id) return
    const there = trapsOf(line.value.draft)[due.trap]
    if (there?.t !== null) return
    const { open } = line.value
    act({ do: 'set', slot: { field: 'trapTime', trap: due.trap }, value: due.count })
    if (open !== null) act({ do: 'open', slot: open })
  }

  /** A frame of the film as a picture of this row, with its count. */
  function still(file: File, count: number | null): void {
    const before = new Set(pictures.of(line.value.id).map((each) => each.id))
    addPictures([file])
    const added = pictures.of(line.value.id).find((each) => !before.has(each.id))
    if (added !== undefined && count !== null) pictures.say(added.id, { seconds: count.toFixed(1) })
  }

  return { touch, over, trap, placed, still }
}

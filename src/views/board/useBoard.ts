import { computed, ref, shallowRef } from 'vue'
import type { Diagram } from '@shared/court/diagram'
import { applyEdit, type Edit } from '@shared/court/edit/edits'
import type { Station } from '@shared/court/edit/gestures'
import { drawnFrom, edited, redone, undone, type Drawn } from '@shared/court/edit/history'
import { choicesFor, nextMove, type Choice } from '@shared/court/edit/choices'
import {
  moveOf,
  NOTHING_SAID,
  openSlot,
  say,
  sentenceOf,
  type Sentence,
  type SlotName,
} from '@shared/court/edit/sentence'
import type { RulePack } from '@shared/court/rulePacks'

/** Which slot of which sentence is open: of a drawn move, or of the next one. */
export interface OpenSlot {
  /** Index of the move; null for the next sentence. */
  move: number | null
  slot: SlotName
}

/** The drawing on the board with its undo, the step in hand, and the sentence that is being said. */
export function useBoard(start: Diagram, pack: () => RulePack) {
  const drawn = shallowRef<Drawn>(drawnFrom(start))
  const station = ref<Station>(0)
  const picked = ref<number | null>(null)
  const sentence = shallowRef<Sentence>(NOTHING_SAID)
  const opened = shallowRef<OpenSlot | null>(null)

  const diagram = computed(() => drawn.value.present)
  const step = computed(() => (station.value === 'start' ? 0 : station.value))

  /** The next sentence's own open slot, unless another one was tapped. */
  const open = computed((): OpenSlot | null => {
    if (station.value === 'start') return null
    if (opened.value) return opened.value
    const slot = openSlot(sentence.value)
    return slot && { move: null, slot }
  })
  const choices = computed((): Choice[] => {
    const slot = open.value
    if (!slot) return []
    const move = slot.move === null ? null : diagram.value.steps[step.value]?.moves[slot.move]
    const said = move ? sentenceOf(move) : sentence.value
    return choicesFor(diagram.value, step.value, said, slot.slot)
  })

  function settle(next: Drawn): void {
    drawn.value = next
    const last = next.present.steps.length - 1
    if (station.value !== 'start' && station.value > last) station.value = last
    const moves = next.present.steps[step.value]?.moves.length ?? 0
    if (picked.value !== null && picked.value >= moves) picked.value = null
    sentence.value = NOTHING_SAID
    opened.value = null
  }

  /** One gesture. */
  function edit(...edits: Edit[]): void {
    const next = edited(drawn.value, ...edits)
    const [one] = edits
    if (one?.do === 'add-step' && next !== drawn.value) go(one.after + 1)
    if (one?.do === 'duplicate-step' && next !== drawn.value) go(one.step + 1)
    if (one?.do === 'order-step' && next !== drawn.value) go(one.step + one.by)
    if (one?.do === 'remove-move' || one?.do === 'order-move') picked.value = null
    settle(next)
    if (one?.do === 'add-move') picked.value = (next.present.steps[one.step]?.moves.length ?? 1) - 1
  }

  function go(to: Station): void {
    if (to === station.value) return
    station.value = to
    picked.value = null
    sentence.value = NOTHING_SAID
    opened.value = null
  }

  function tell(value: Choice['value']): void {
    const slot = open.value
    if (!slot) return
    if (slot.move !== null) return retell(slot.move, slot.slot, value)
    const said = say(sentence.value, slot.slot, value)
    opened.value = null
    const move = nextMove(diagram.value, step.value, said, pack())
    if (move) return edit({ do: 'add-move', step: step.value, move })
    sentence.value = said
  }

  /** Another word in a sentence that is drawn; what it opens is said as the next sentence in its place. */
  function retell(index: number, slot: SlotName, value: Choice['value']): void {
    const move = diagram.value.steps[step.value]?.moves[index]
    if (!move) return
    const said = say(sentenceOf(move), slot, value)
    const next = moveOf(
      said,
      'to' in move && typeof move.to === 'object' ? move.to : { x: 0.2, y: 0.5 },
      move,
    )
    if (next) return edit({ do: 'change-move', step: step.value, index, move: next })
    edit({ do: 'remove-move', step: step.value, index })
    sentence.value = said
  }

  /** Takes back the last word said, or lets the open slot go. */
  function unsay(): void {
    if (opened.value) {
      opened.value = null
      return
    }
    const { who, does, to } = sentence.value
    if (to !== null) sentence.value = { ...sentence.value, to: null }
    else if (does !== null) sentence.value = { ...NOTHING_SAID, who }
    else sentence.value = NOTHING_SAID
  }

  return {
    drawn,
    diagram,
    station: computed<Station>({ get: () => station.value, set: go }),
    step,
    picked,
    pick: (index: number | null) => (picked.value = index),
    sentence,
    open,
    choices,
    go,
    edit,
    tell,
    unsay,
    openAt: (slot: OpenSlot | null) => (opened.value = slot),
    startWith: (who: Sentence['who']) => {
      opened.value = null
      sentence.value = say(NOTHING_SAID, 'who', who)
    },
    hush: () => {
      sentence.value = NOTHING_SAID
      opened.value = null
      picked.value = null
    },
    undo: () => settle(undone(drawn.value)),
    redo: () => settle(redone(drawn.value)),
    /** Another drawing in the place of this one, with nothing to undo. */
    replace: (other: Diagram) => settle(drawnFrom(other)),
    /** Whether an edit would change anything. */
    would: (one: Edit) => applyEdit(diagram.value, one) !== diagram.value,
  }
}
export type Board = ReturnType<typeof useBoard>

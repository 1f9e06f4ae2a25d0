import { useEventListener } from '@vueuse/core'
import type { Board } from './useBoard'

const TYPED = 'input, textarea, select, [contenteditable], dialog'

/** Letters and figures say the next word of a sentence; Backspace takes it back, Ctrl Z the last gesture. */
export function useBoardKeys(board: Board): void {
  useEventListener(window, 'keydown', (event) => {
    if (event.defaultPrevented || event.altKey) return
    if (event.target instanceof Element && event.target.closest(TYPED)) return
    const key = event.key.toLowerCase()
    if (event.ctrlKey || event.metaKey) {
      if (key !== 'z' && key !== 'y') return
      if (key === 'y' || event.shiftKey) board.redo()
      else board.undo()
      return event.preventDefault()
    }
    const choice = board.choices.value.find((one) => one.key === key)
    if (choice) board.tell(choice.value)
    else if (key === 'backspace') board.unsay()
    else if (key === 'escape') board.hush()
    else if (key === 'delete' && board.picked.value !== null && board.station.value !== 'start')
      board.edit({ do: 'remove-move', step: board.station.value, index: board.picked.value })
    else return
    event.preventDefault()
  })
}

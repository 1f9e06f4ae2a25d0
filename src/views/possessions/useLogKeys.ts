import { useEventListener } from '@vueuse/core'
import type { Answer } from './answer'
import type { Act } from './acts'

export interface LogKeys {
  answers: () => readonly Answer[]
  act: (act: Act) => void
  back: () => void
  /** Enter on the sentence: saves, or goes on. */
  enter: () => void
  /** Esc: closes the word that is open, or the row. */
  leave: () => void
  clock: () => void
  /** A typed slot is open: keys belong to its field. */
  typing: () => (() => void) | null
}

const FIELDS = 'input, textarea, select, [contenteditable]'

/**
 * The keyboard of the log page: numbers and the dot answer, Backspace steps back, Enter saves, C opens the clock.
 * A key belongs to a field while one has the focus, to the browser with Ctrl, Alt or Meta, and to an open dialog.
 */
export function useLogKeys(keys: LogKeys): void {
  useEventListener(document, 'keydown', (event: KeyboardEvent) => {
    if (event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey || event.isComposing) return
    const target = event.target instanceof Element ? event.target : null
    if (target?.closest(FIELDS) != null || document.querySelector('dialog[open]') !== null) return
    if (target !== null && target !== document.body && target.closest('main') === null) return
    if (handle(event, target)) event.preventDefault()
  })

  function handle(event: KeyboardEvent, target: Element | null): boolean {
    // Held down, a key would answer slot after slot.
    if (event.repeat && event.key !== 'Backspace') return false
    if (event.key === 'Backspace') return done(keys.back)
    if (event.key === 'Escape') return done(keys.leave)
    if (event.key === 'Enter') return isAnothers(target) ? false : done(keys.enter)
    if (event.key.toLowerCase() === 'c') return done(keys.clock)
    const focusField = keys.typing()
    // The field takes the focus before the character lands, so that it lands there.
    if (focusField !== null && /^[\d.+-]$/.test(event.key)) {
      focusField()
      return false
    }
    const answer = keys.answers().find((each) => each.key === event.key)
    if (answer === undefined) return false
    keys.act(answer.act)
    return true
  }
}

/** Enter on a control does what the control says; on the word that is already open it is the page's. */
function isAnothers(target: Element | null): boolean {
  const control = target?.closest('button, a, [role="button"], summary')
  return control != null && control.getAttribute('data-slot') === null
    ? true
    : control != null && control.getAttribute('aria-expanded') !== 'true'
}

function done(act: () => void): true {
  act()
  return true
}

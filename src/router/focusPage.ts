import { nextTick } from 'vue'

/** After a change of page the reader starts at its name: the h1, or the main part while there is none yet. */
export async function focusPage(): Promise<void> {
  await nextTick()
  const target = document.querySelector<HTMLElement>('main h1') ?? document.querySelector<HTMLElement>('main')
  if (target === null) return
  target.tabIndex = -1
  target.focus({ preventScroll: true })
}

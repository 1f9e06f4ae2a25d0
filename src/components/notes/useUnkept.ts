import { ref } from 'vue'
import { onBeforeRouteLeave } from 'vue-router'

/** Asks before the page is left while something written is not kept. For a page's own setup. */
export function useUnkept() {
  const dirty = ref(false)
  const asking = ref(false)
  let answer: ((leave: boolean) => void) | null = null

  onBeforeRouteLeave(() => {
    if (!dirty.value) return true
    asking.value = true
    return new Promise<boolean>((resolve) => (answer = resolve))
  })
  function settle(leave: boolean): void {
    asking.value = false
    answer?.(leave)
    answer = null
  }
  return { dirty, asking, settle }
}

import { ref } from 'vue'

const KEY = 'overtop.lights'
const down = ref(false)

/** Lights down, for the film room: kept on this device, off by default. */
export function useLights() {
  function set(value: boolean): void {
    down.value = value
    const { dataset } = document.documentElement
    if (value) dataset.lights = 'down'
    else delete dataset.lights
    try {
      localStorage.setItem(KEY, value ? 'down' : 'up')
    } catch {
      // A browser that keeps nothing only forgets the choice.
    }
  }

  function recall(): void {
    let kept: string | null = null
    try {
      kept = localStorage.getItem(KEY)
    } catch {
      // As above.
    }
    if (kept === 'down') set(true)
  }

  return { down, toggle: () => set(!down.value), recall }
}

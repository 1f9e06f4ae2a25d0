import { ref } from 'vue'
import { useEventListener } from '@vueuse/core'

/** Pictures pasted or dragged anywhere on the page. `over` while something is being dragged. */
export function useFiles(take: (files: File[]) => void) {
  const over = ref(false)
  let depth = 0

  useEventListener(document, 'paste', (event: ClipboardEvent) => {
    const files = [...(event.clipboardData?.files ?? [])]
    if (files.length === 0) return
    event.preventDefault()
    take(files)
  })
  const hasFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') ?? false
  useEventListener(document, 'dragenter', (event: DragEvent) => {
    if (!hasFiles(event)) return
    depth += 1
    over.value = true
  })
  useEventListener(document, 'dragleave', (event: DragEvent) => {
    if (!hasFiles(event)) return
    depth = Math.max(0, depth - 1)
    over.value = depth > 0
  })
  // Without this the browser opens the file in the page's place and what was half said is gone from sight.
  useEventListener(document, 'dragover', (event: DragEvent) => {
    if (hasFiles(event)) event.preventDefault()
  })
  useEventListener(document, 'drop', (event: DragEvent) => {
    depth = 0
    over.value = false
    if (!hasFiles(event)) return
    event.preventDefault()
    take([...(event.dataTransfer?.files ?? [])])
  })
  return { over }
}

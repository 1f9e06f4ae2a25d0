/** The step of an address ("?step=2" is the second), from 0; anything else, and a step too many, is the nearest that is there. */
export function stepOfQuery(value: unknown, steps: number): number {
  const asked = typeof value === 'string' ? Number.parseInt(value, 10) : 1
  const wanted = Number.isFinite(asked) ? asked : 1
  return Math.min(Math.max(1, wanted), Math.max(1, steps)) - 1
}

/** The step that an arrow key leads to; null for every other key and where the keys belong to a field. */
export function stepOfKey(event: KeyboardEvent, step: number, steps: number): number | null {
  if (event.altKey || event.ctrlKey || event.metaKey || event.shiftKey) return null
  if (event.target instanceof Element && event.target.closest('input, select, textarea, [contenteditable]'))
    return null
  if (event.key === 'ArrowRight') return Math.min(steps - 1, step + 1)
  if (event.key === 'ArrowLeft') return Math.max(0, step - 1)
  return null
}

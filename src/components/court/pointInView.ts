/** A box in any unit. */
interface Box {
  x: number
  y: number
  width: number
  height: number
}

/**
 * Where a pointer falls in a drawing, in the drawing's own unit. `shown` is the element on screen, px; the
 * drawing sits in its middle, as large as fits (SVG's own default).
 */
export function pointInView(
  view: Box,
  shown: { left: number; top: number; width: number; height: number },
  clientX: number,
  clientY: number,
): { x: number; y: number } {
  const scale = Math.min(shown.width / view.width, shown.height / view.height)
  const left = shown.left + (shown.width - view.width * scale) / 2
  const top = shown.top + (shown.height - view.height * scale) / 2
  return { x: view.x + (clientX - left) / scale, y: view.y + (clientY - top) / scale }
}

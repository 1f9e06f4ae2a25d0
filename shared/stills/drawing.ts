import type { MarkPoint, StillMarks } from './marks'

/** The width of the picture that the sizes of the marks were drawn for, px. */
const DRAWN_FOR = 920

/** White over a dark casing, both in the px of the picture. */
export interface Pens {
  ring: number
  shade: number
  pass: number
  /** Added to a line's width for the casing under it. */
  casing: number
}

/** Marks as shapes in the px of a picture: the same on the screen, in a report and on paper. */
export interface DrawnMarks {
  pens: Pens
  ring: { cx: number; cy: number; rx: number; ry: number } | null
  shade: { x: number; y: number; width: number; height: number; radius: number } | null
  /** The line stops at the head's notch; `head` is its three corners. */
  pass: { from: MarkPoint; to: MarkPoint; dashes: [number, number]; head: MarkPoint[] } | null
}

/** Lengthwise and half across, of the arrow's head. */
const HEAD = { long: 22, half: 10 }

function headOf(from: MarkPoint, to: MarkPoint, scale: number): MarkPoint[] {
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1
  const [ux, uy] = [(to.x - from.x) / length, (to.y - from.y) / length]
  const foot = { x: to.x - ux * HEAD.long * scale, y: to.y - uy * HEAD.long * scale }
  const side = (way: number) => ({
    x: foot.x - uy * way * HEAD.half * scale,
    y: foot.y + ux * way * HEAD.half * scale,
  })
  return [side(1), to, side(-1)]
}

/**
 * @param width px of the picture
 * @param height px of the picture
 */
export function drawnMarks({ ring, shade, pass }: StillMarks, width: number, height: number): DrawnMarks {
  const scale = width / DRAWN_FOR
  const px = ({ x, y }: MarkPoint): MarkPoint => ({ x: x * width, y: y * height })
  const from = pass && px(pass.from)
  const to = pass && px(pass.to)
  return {
    pens: { ring: 5 * scale, shade: 4 * scale, pass: 6 * scale, casing: 5 * scale },
    ring: ring && { cx: ring.x * width, cy: ring.y * height, rx: ring.rx * width, ry: ring.ry * height },
    shade: shade && {
      x: shade.x * width,
      y: shade.y * height,
      width: shade.w * width,
      height: shade.h * height,
      radius: Math.min(34 * scale, (shade.w * width) / 2, (shade.h * height) / 2),
    },
    pass: from && to && { from, to, dashes: [19 * scale, 13 * scale], head: headOf(from, to, scale) },
  }
}

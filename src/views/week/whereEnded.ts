export interface EndMark {
  x: number
  y: number
  /** Half a cross's width, a circle's radius. */
  r: number
}

const LARGE = 5
const ROWS = 3

/**
 * So many marks in one part of a strip, as large as there is room: in a row round the middle, then in three.
 * @param part where it begins and ends, in the strip's units
 * @param middle the height of the strip's line
 */
export function ended(count: number, [from, to]: readonly [number, number], middle: number): EndMark[] {
  if (count === 0) return []
  const wide = to - from
  const inOneRow = Math.floor(wide / (LARGE * 2.8))
  const rows = count <= inOneRow ? 1 : ROWS
  const columns = Math.ceil(count / rows)
  const step = Math.min(LARGE * 2.8, wide / columns)
  const r = Math.min(LARGE, step / 2.8)
  const start = from + (wide - (columns - 1) * step) / 2
  return Array.from({ length: count }, (_, index) => ({
    x: start + Math.floor(index / rows) * step,
    y: middle + ((index % rows) - (rows - 1) / 2) * r * 3.2,
    r,
  }))
}

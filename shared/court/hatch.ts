import { lineD, type Box, type Point } from './path'

/** How often, as hatch: under 1 in 5, 1 in 5 to 2 in 5, over 2 in 5 (DESIGN.md section 2). */
export type HatchStep = 1 | 2 | 3
export type HatchMedium = 'screen' | 'small' | 'paper' | 'wall'

/**
 * Gap and line in px. On paper the steps lie at least 8 apart in mean lightness at 150 dots an inch, so that a
 * grey copy still tells them (tests/reference/grey.test.ts).
 */
const HATCH: Record<HatchMedium, Record<HatchStep, { gap: number; line: number }>> = {
  screen: { 1: { gap: 11, line: 1.3 }, 2: { gap: 7, line: 1.5 }, 3: { gap: 4.4, line: 1.7 } },
  small: { 1: { gap: 6.5, line: 0.9 }, 2: { gap: 4.4, line: 1 }, 3: { gap: 3, line: 1.15 } },
  paper: { 1: { gap: 9, line: 0.9 }, 2: { gap: 4.4, line: 1.25 }, 3: { gap: 2.9, line: 1.4 } },
  wall: { 1: { gap: 19, line: 2 }, 2: { gap: 12.5, line: 2.3 }, 3: { gap: 7.6, line: 2.7 } },
}

/** Gap between lines (measured square to them) and their weight, px. */
export const hatchOf = (medium: HatchMedium, step: HatchStep) => HATCH[medium][step]

/** The step of k of n; nothing counted is step 1, like everything thin. Exact at 1 in 5 and 2 in 5. */
export function hatchStep(k: number, n: number): HatchStep {
  if (n <= 0 || 5 * k < n) return 1
  return 5 * k <= 2 * n ? 2 : 3
}

/**
 * Lines at 45 degrees, rising to the right, cut at the edges of a box. `gap` is the distance between
 * neighbours square to them, in the box's unit.
 */
export function hatchLines(box: Box, gap: number): [Point, Point][] {
  if (!(gap > 0) || box.width <= 0 || box.height <= 0) return []
  const [right, bottom] = [box.x + box.width, box.y + box.height]
  // On a line that rises to the right x + y is constant; gap square to it is gap x sqrt 2 along x.
  const stride = gap * Math.SQRT2
  const lines: [Point, Point][] = []
  for (let sum = stride / 2; sum < box.width + box.height; sum += stride) {
    const left = Math.max(0, sum - box.height)
    const far = Math.min(box.width, sum)
    lines.push([
      { x: box.x + left, y: Math.min(bottom, box.y + (sum - left)) },
      { x: Math.min(right, box.x + far), y: box.y + Math.max(0, sum - far) },
    ])
  }
  return lines
}

/** Path data of the hatch of a box, one path. */
export const hatchD = (box: Box, gap: number): string =>
  hatchLines(box, gap)
    .map(([a, b]) => lineD(a, b))
    .join('')

import { grown, inside, overlaps, type Box, type Point } from './path'
import { CAP_HEIGHT, DESCENT, textWidth } from './textWidth'
import type { Cut, Ink, SceneNode, TextNode } from './scene'

export interface LabelLine {
  text: string
  /** Metres. */
  size: number
  cut: Cut
  weight: TextNode['weight']
}

/** A place for a label: its top left corner, metres, and how its lines stand in it. */
export interface LabelSpot extends Point {
  align?: 'start' | 'middle' | 'end'
}
export interface LabelSize {
  width: number
  height: number
}

/** A count with its few words, to be set near what it belongs to. */
export interface Label {
  id: string
  lines: readonly LabelLine[]
  ink: Ink
  /** Places worth trying, best first, that must keep clear of labels and marks. */
  wishes(size: LabelSize): readonly LabelSpot[]
  /** Where it may cover a mark rather than stray from its own; labels are still kept apart. */
  fallbacks?(size: LabelSize): readonly LabelSpot[]
  /** The mark that it may lie on: one of those kept clear, by identity. */
  own?: Box
  /** How far it may move from its first wish before it covers a mark instead, metres. Default: no limit. */
  stray?: number
}

export interface PlacedLabel {
  label: Label
  box: Box
  align: 'start' | 'middle' | 'end'
}

const LEADING = 1.16

/** The room a label takes, metres. */
export function labelSize(label: Pick<Label, 'lines'>): LabelSize {
  const first = label.lines[0]
  const last = label.lines.at(-1)
  if (!first || !last) return { width: 0, height: 0 }
  const width = Math.max(...label.lines.map((line) => textWidth(line.text, line.size, line.cut)))
  const below = label.lines.slice(1).reduce((sum, line) => sum + line.size * LEADING, 0)
  return { width, height: first.size * CAP_HEIGHT + below + last.size * DESCENT }
}

/**
 * Sets labels one after the other, each at the first of its wishes that keeps clear of the labels before
 * it, of what must stay visible and of what is better left clear (`avoid`); failing that, of what must stay
 * visible alone; failing that, where it may cover a mark; failing that, at the nearest free place. Where no
 * room is left for all its lines it keeps its first, the count; a label without any room is left out, since
 * two over one another say nothing. Same input, same result.
 */
export function placeLabels(
  labels: readonly Label[],
  area: Box,
  keepClear: readonly Box[],
  gap: number,
  avoid: readonly Box[] = [],
): PlacedLabel[] {
  const placed: PlacedLabel[] = []
  for (const label of labels) {
    const short = { ...label, lines: label.lines.slice(0, 1) }
    const taken = placed.map((other) => grown(other.box, gap))
    const one =
      placeOne(label, area, taken, keepClear, gap, avoid) ??
      (label.lines.length > 1 ? placeOne(short, area, taken, keepClear, gap, avoid) : undefined)
    if (one) placed.push(one)
  }
  return placed
}

function placeOne(
  label: Label,
  area: Box,
  taken: readonly Box[],
  keepClear: readonly Box[],
  gap: number,
  avoid: readonly Box[],
): PlacedLabel | undefined {
  const size = labelSize(label)
  const boxAt = (at: Point): Box => ({ x: at.x, y: at.y, ...size })
  const free = (box: Box) => inside(box, area) && !taken.some((other) => overlaps(box, other))
  const clear = (box: Box) =>
    free(box) && !keepClear.some((other) => other !== label.own && overlaps(box, other))
  const airy = (box: Box) => clear(box) && !avoid.some((other) => overlaps(box, other))
  const wishes = label.wishes(size)
  const wish = boxAt(wishes[0] ?? area)
  const found = (fits: (box: Box) => boolean) =>
    wishes.find((at) => fits(boxAt(at))) ?? nearest(wish, area, gap * 2, fits, label.stray)
  const spot =
    (avoid.length > 0 ? found(airy) : undefined) ??
    found(clear) ??
    label.fallbacks?.(size).find((at) => free(boxAt(at))) ??
    nearest(wish, area, gap, free)
  return spot && { label, box: boxAt(spot), align: ('align' in spot && spot.align) || 'start' }
}

/** Looks over the area on a grid, nearest first; at equal distance the upper, then the left one. */
function nearest(
  wish: Box,
  area: Box,
  grid: number,
  fits: (box: Box) => boolean,
  stray = Infinity,
): LabelSpot | undefined {
  let best: { box: Box; far: number } | undefined
  const step = Math.max(grid, area.width / 120)
  for (let y = area.y; y + wish.height <= area.y + area.height; y += step) {
    for (let x = area.x; x + wish.width <= area.x + area.width; x += step) {
      const box = { ...wish, x, y }
      const far = Math.hypot(x - wish.x, y - wish.y)
      if (far <= stray && (!best || far < best.far - 1e-9) && fits(box)) best = { box, far }
    }
  }
  return best?.box
}

/** The text of a placed label, with a floor-coloured edge. */
export function labelNodes({ label, box, align }: PlacedLabel, halo: number): SceneNode[] {
  const x = box.x + (align === 'middle' ? box.width / 2 : align === 'end' ? box.width : 0)
  let baseline = box.y
  return label.lines.map((line, i): TextNode => {
    baseline += i === 0 ? line.size * CAP_HEIGHT : line.size * LEADING
    return {
      kind: 'text',
      x,
      y: baseline,
      text: line.text,
      size: line.size,
      cut: line.cut,
      weight: line.weight,
      anchor: align,
      ink: label.ink,
      halo: { ink: 'floor', width: halo },
    }
  })
}

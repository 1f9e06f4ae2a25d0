import { lengthOf, pointAt, type Curve } from './curve'
import { labelNodes, placeLabels, type Label, type LabelSize, type LabelSpot } from './labels'
import type { Box } from './path'
import type { Pen } from './pen'
import type { GroupNode } from './scene'
import type { Verdict } from './walk/laneWindow'

/** How a pass that is open, tight or closed is drawn: weight against a plain pass, dash and gap in px. */
export interface PassStroke {
  emphasis: number
  dash: readonly [on: number, off: number]
}

/** The less a pass is on, the thinner its line and the wider its gaps; a word beside it says the same. */
export const PASS_STROKES: Readonly<Record<Verdict, PassStroke>> = {
  open: { emphasis: 1.35, dash: [10, 4] },
  tight: { emphasis: 1, dash: [6, 7] },
  closed: { emphasis: 0.75, dash: [3, 9] },
}

/** A pass with its verdict, as it was drawn. */
export interface MarkedPass {
  id: string
  way: Curve
  verdict: Verdict
}

const TYPE = 12.5

/**
 * The word beside each pass, clear of each other and of the tokens where there is room. A pass that cannot be
 * seen (an empty way) has none.
 */
export function verdictWords(
  passes: readonly MarkedPass[],
  area: Box,
  keepClear: readonly Box[],
  pen: Pen,
): GroupNode {
  const labels = passes.flatMap(({ id, way, verdict }): Label[] => {
    if (lengthOf(way) === 0) return []
    const wishes = (size: LabelSize) =>
      [0.5, 0.35, 0.65, 0.2, 0.8].flatMap((share) => beside(way, share, size, pen))
    return [
      {
        id,
        ink: 'our',
        lines: [{ text: verdict, size: pen.px(TYPE), cut: 'label', weight: verdict === 'open' ? 500 : 700 }],
        wishes,
        fallbacks: wishes,
        stray: 0,
      },
    ]
  })
  const placed = placeLabels(labels, area, keepClear, pen.px(2))
  return {
    kind: 'group',
    id: 'verdicts',
    nodes: placed.map((one): GroupNode => ({
      kind: 'group',
      id: `verdict-${one.label.id}`,
      nodes: labelNodes(one, pen.px(3)),
    })),
  }
}

/** A place on either side of a way, just off the line. */
function beside(way: Curve, share: number, size: LabelSize, pen: Pen): LabelSpot[] {
  const { point, along } = pointAt(way, lengthOf(way) * share)
  // Square to the way; the box's own half extent in that direction keeps it off the line.
  const square = { x: -along.y, y: along.x }
  const off = (Math.abs(square.x) * size.width + Math.abs(square.y) * size.height) / 2 + pen.px(6)
  return [-1, 1].map((side) => ({
    x: point.x + square.x * off * side - size.width / 2,
    y: point.y + square.y * off * side - size.height / 2,
  }))
}

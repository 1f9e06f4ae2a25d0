import { toMetres } from '@shared/court/frame'
import { labelNodes, labelSize, placeLabels, type Label } from '@shared/court/labels'
import { circleD, lineD, polygonD, type Box, type Point } from '@shared/court/path'
import { penOf, type Pen } from '@shared/court/pen'
import type { RulePack } from '@shared/court/rulePacks'
import type { GroupNode, Scene, SceneNode } from '@shared/court/scene'
import { CAP_HEIGHT } from '@shared/court/textWidth'
import { NOT_VISIBLE } from '@shared/vocabulary'
import { trapTapScene } from '@shared/court/trapTapScene'
import { secondsWords } from './clockWords'
import { trapsOf, type Draft } from './draft'
import { edgeRuler, RULER_PX } from './courtEdge'
import { capital, trapWords } from './words'

/** Half the diagonal of a trap's diamond, px. */
const DIAMOND = 20

/** The court to tap, with the traps of the row on it: numbered diamonds in their ink, the ball's way between them. */
export function logScene(
  pack: RulePack,
  draft: Draft,
  openTrap: number | null,
  widthPx: number,
  scale: number,
): Scene {
  const pen = penOf(scale)
  const base = trapTapScene(pack, scale)
  const traps = trapsOf(draft)
  const places = traps.map((trap) => toMetres(pack, trap))
  const half = pen.px(widthPx < 500 ? DIAMOND * 0.7 : DIAMOND)
  const labels = traps.map((trap, index): Label => {
    const at = places[index] ?? { x: 0, y: 0 }
    const time = trap.t === null ? '' : `, ${secondsWords(trap.t)}`
    const words = `${capital(trapWords(trap).word)}${time}`
    return {
      id: `trap-${index}`,
      ink: 'their',
      lines: [{ text: words, size: pen.px(widthPx < 500 ? 12.5 : 15), cut: 'label', weight: 700 }],
      wishes: ({ width, height }) => besides(at, half, width, height, pen),
    }
  })
  const taken = places.map((at): Box => ({
    x: at.x - half,
    y: at.y - half,
    width: half * 2,
    height: half * 2,
  }))
  const area: Box = { x: 0, y: 0, width: pack.court.length, height: pack.court.width }
  const shown =
    widthPx < 420
      ? []
      : placeLabels(
          labels.filter((label) => labelSize(label).width > 0),
          area,
          taken,
          pen.px(3),
        )
  const ruler = pen.px(RULER_PX)
  return {
    view: { ...base.view, y: base.view.y - ruler, height: base.view.height + ruler },
    nodes: [
      ...base.nodes,
      edgeRuler(pack, draft, pen, widthPx < 500 ? 12.5 : 14),
      ...wayBetween(places, half, pen),
      ...caughtAt(pack, draft, pen),
      ...places.map((at, index) => diamond(at, index, half, openTrap === index, pen)),
      { kind: 'group', id: 'trap-words', nodes: shown.flatMap((label) => labelNodes(label, pen.px(4))) },
    ],
    description: `${base.description}${traps.map((trap, index) => ` Trap ${index + 1}: ${trapWords(trap).word}.`).join('')}`,
  }
}

/** Where the throw-in was caught: a ring in a third team's ink, since their opponent there is not us. */
function caughtAt(pack: RulePack, draft: Draft, pen: Pen): SceneNode[] {
  if (draft.entrySpot === null || draft.entrySpot === NOT_VISIBLE) return []
  const at = toMetres(pack, draft.entrySpot)
  const ring = (radius: number): SceneNode => ({
    kind: 'path',
    d: circleD(at, pen.px(radius)),
    fill: 'floor',
    stroke: radius > 9 ? 'floor' : 'graphite',
    strokeWidth: pen.px(2),
  })
  return [ring(11), ring(7)]
}

function besides(at: Point, half: number, width: number, height: number, pen: Pen): Point[] {
  const gap = pen.px(7)
  const middle = at.y - height / 2
  return [
    { x: at.x + half + gap, y: middle },
    { x: at.x - half - gap - width, y: middle },
    { x: at.x + half * 0.6, y: at.y - half - height },
    { x: at.x + half * 0.6, y: at.y + half },
    { x: at.x - width / 2, y: at.y + half + gap },
  ]
}

/** That the ball got from one trap to the next is known; which way is not: a thin straight dash in a third team's ink. */
function wayBetween(places: readonly Point[], half: number, pen: Pen): SceneNode[] {
  return places.slice(1).flatMap((to, index): SceneNode[] => {
    const from = places[index]
    if (from === undefined) return []
    const length = Math.hypot(to.x - from.x, to.y - from.y)
    if (length < half * 2.6) return []
    const step = (half + pen.px(4)) / length
    const at = (share: number) => ({
      x: from.x + (to.x - from.x) * share,
      y: from.y + (to.y - from.y) * share,
    })
    return [
      {
        kind: 'path',
        d: lineD(at(step), at(1 - step)),
        stroke: 'graphite',
        strokeWidth: pen.px(1.8),
        dash: [pen.px(7), pen.px(5)],
      },
    ]
  })
}

function diamond(at: Point, index: number, half: number, open: boolean, pen: Pen): GroupNode {
  const shape = (size: number) =>
    polygonD(
      { x: at.x, y: at.y - size },
      { x: at.x + size, y: at.y },
      { x: at.x, y: at.y + size },
      { x: at.x - size, y: at.y },
    )
  const size = half * 0.8
  return {
    kind: 'group',
    id: `trap-${index}`,
    nodes: [
      { kind: 'path', d: shape(half + pen.px(4)), fill: 'floor' },
      {
        kind: 'path',
        d: shape(half),
        fill: open ? 'ball' : 'their',
        ...(open ? { stroke: 'graphite', strokeWidth: pen.px(2) } : {}),
      },
      {
        kind: 'text',
        x: at.x,
        y: at.y + (size * CAP_HEIGHT) / 2,
        text: String(index + 1),
        size,
        cut: 'count',
        weight: 700,
        anchor: 'middle',
        ink: open ? 'graphite' : 'paper',
      },
    ],
  }
}

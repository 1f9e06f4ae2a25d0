import { toMetres } from '@shared/court/frame'
import { lineD } from '@shared/court/path'
import type { Pen } from '@shared/court/pen'
import type { RulePack } from '@shared/court/rulePacks'
import { fanned } from '@shared/court/fan'
import type { GroupNode, SceneNode, TextNode } from '@shared/court/scene'
import { textWidth } from '@shared/court/textWidth'
import { secondsWords } from './clockWords'
import { trapsOf, type Draft } from './draft'

/** Room over the court for its edge, px. */
export const RULER_PX = 36

/**
 * The court's upper edge as time, for one row: how far the ball was met, the second of each trap at the place of that
 * trap, and the half-court bar with when it was crossed, or by when it must be.
 */
export function edgeRuler(pack: RulePack, draft: Draft, pen: Pen, type: number): GroupNode {
  const { length } = pack.court
  const axis = -pen.px(7)
  const size = pen.px(type)
  const half = length / 2
  const traps = trapsOf(draft)
    .map((trap) => ({ x: toMetres(pack, trap).x, t: trap.t }))
    .sort((a, b) => a.x - b.x)
  const reached = Math.max(0, draft.crossedAt === null ? 0 : half, ...traps.map((trap) => trap.x))
  const stroke = (d: string, weight: number): SceneNode => ({
    kind: 'path',
    d,
    stroke: 'graphite',
    strokeWidth: pen.px(weight),
  })
  const nodes: SceneNode[] = [stroke(lineD({ x: 0, y: axis }, { x: length, y: axis }), 1.5)]
  if (reached > 0) nodes.push(stroke(lineD({ x: 0, y: axis }, { x: reached, y: axis }), 6))
  nodes.push(stroke(lineD({ x: half, y: -pen.px(RULER_PX - 4) }, { x: half, y: 0 }), 4))
  const over =
    draft.crossedAt === null
      ? `over half by ${pack.backcourtSeconds} s`
      : `over at ${secondsWords(draft.crossedAt)}`
  nodes.push(words(over, half + pen.px(9), -pen.px(21), size, 'start'))
  const timed = traps.filter((trap): trap is { x: number; t: number } => trap.t !== null)
  const wide = textWidth('00.0 s', size, 'label') + pen.px(6)
  const overEnd = half + pen.px(14) + textWidth(over, size, 'label')
  const places = fanned(
    timed.map((trap) =>
      trap.x > half - wide / 2 && trap.x < overEnd + wide / 2 ? overEnd + wide / 2 : trap.x,
    ),
    wide,
  )
  timed.forEach((trap, index) => {
    const at = places[index] ?? trap.x
    nodes.push(
      stroke(
        lineD({ x: trap.x, y: axis }, { x: trap.x, y: axis - pen.px(5) }, { x: at, y: axis - pen.px(9) }),
        1.3,
      ),
      words(secondsWords(trap.t), at, -pen.px(21), size, 'middle'),
    )
  })
  return { kind: 'group', id: 'edge', nodes }
}

const words = (text: string, x: number, y: number, size: number, anchor: TextNode['anchor']): TextNode => ({
  kind: 'text',
  x,
  y,
  text,
  size,
  cut: 'label',
  weight: 600,
  anchor,
  ink: 'graphite',
})

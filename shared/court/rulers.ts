import type { Pen } from './pen'
import { lineD } from './path'
import type { RulePack } from './rulePacks'
import type { GroupNode, SceneNode, TextNode } from './scene'
import { textWidth } from './textWidth'

/** What stands above the court, heights in px over its upper sideline. */
const AXIS = 6
const BAR = 30
const LABEL = 17
/** Width of the throw-in ruler and its distance from the baseline, px. */
const THROW_IN = { width: 68, off: 8 }

export interface RulerOptions {
  /** The small even ruler for the throw-in count. */
  throwIn: boolean
  /** x as fractions of the length where the ball is after 1, 2, 3 ... seconds (middle of many). */
  ballBySecond?: readonly number[]
  /** Size of type, px. */
  type: number
}

const textNode = (
  text: string,
  x: number,
  y: number,
  size: number,
  anchor: TextNode['anchor'],
  weight: TextNode['weight'] = 600,
): TextNode => ({ kind: 'text', x, y, text, size, cut: 'label', weight, anchor, ink: 'graphite' })

/**
 * The court's own upper edge as time: the half-court bar with its deadline, a tick for each second where
 * the ball has come to, and left of the baseline the throw-in's own count.
 */
export function countRuler(pack: RulePack, end: number, pen: Pen, options: RulerOptions): GroupNode {
  const { length } = pack.court
  const axis = -pen.px(AXIS)
  const size = pen.px(options.type)
  const half = length / 2
  const graphite = (d: string, weight: number): SceneNode => ({
    kind: 'path',
    d,
    stroke: 'graphite',
    strokeWidth: pen.px(weight),
  })
  const nodes: SceneNode[] = [graphite(lineD({ x: 0, y: axis }, { x: Math.min(end, length), y: axis }), 1.5)]
  if (half < end) {
    const words = `over half by ${pack.backcourtSeconds} s`
    nodes.push(graphite(lineD({ x: half, y: -pen.px(BAR) }, { x: half, y: 0 }), 4))
    const room = end - half > pen.px(10) + textWidth(words, size, 'label')
    nodes.push(
      textNode(words, half + pen.px(room ? 8 : -8), -pen.px(LABEL), size, room ? 'start' : 'end', 700),
    )
  }
  nodes.push(...ballTicks(options.ballBySecond ?? [], pack, end, pen, size, axis))
  if (options.throwIn) nodes.push(...throwInRuler(pack, pen, size, axis))
  return { kind: 'group', id: 'ruler', label: `over half by ${pack.backcourtSeconds} seconds`, nodes }
}

/** Ticks where the ball is each second. Bunched ticks fan out their numbers; none is left out. */
function ballTicks(
  places: readonly number[],
  pack: RulePack,
  end: number,
  pen: Pen,
  size: number,
  axis: number,
): SceneNode[] {
  const xs = places.map((x) => x * pack.court.length).filter((x) => x >= 0 && x <= end)
  const apart = size * 0.95
  const label = fanned(xs, apart)
  return xs.flatMap((x, i): SceneNode[] => {
    const at = label[i] ?? x
    const top = axis - pen.px(7)
    return [
      {
        kind: 'path',
        d: lineD({ x, y: axis }, { x, y: top }, { x: at, y: top - pen.px(5) }),
        stroke: 'graphite',
        strokeWidth: pen.px(1.2),
      },
      textNode(String(i + 1), at, top - pen.px(7), size * 0.92, 'middle'),
    ]
  })
}

/** Moves numbers apart until neighbours are `apart` from each other, keeping their order and their middle. */
export function fanned(xs: readonly number[], apart: number): number[] {
  const order = xs.map((x, i) => ({ x, i })).sort((a, b) => a.x - b.x || a.i - b.i)
  let groups = order.map(({ x, i }) => ({ middle: x, members: [i] }))
  for (let merged = true; merged;) {
    merged = false
    for (let g = 0; g + 1 < groups.length; g += 1) {
      const [a, b] = [groups[g], groups[g + 1]]
      if (!a || !b) continue
      const reach = ((a.members.length + b.members.length) / 2) * apart
      if (b.middle - a.middle >= reach - 1e-9) continue
      const members = [...a.members, ...b.members]
      const middle = (a.middle * a.members.length + b.middle * b.members.length) / members.length
      groups = [...groups.slice(0, g), { middle, members }, ...groups.slice(g + 2)]
      merged = true
      break
    }
  }
  const result = [...xs]
  for (const { middle, members } of groups)
    members.forEach((i, place) => {
      result[i] = middle + (place - (members.length - 1) / 2) * apart
    })
  return result
}

function throwInRuler(pack: RulePack, pen: Pen, size: number, axis: number): SceneNode[] {
  const right = -pen.px(THROW_IN.off)
  const width = pen.px(THROW_IN.width)
  const seconds = pack.throwInSeconds
  let d = lineD({ x: right - width, y: axis }, { x: right, y: axis })
  for (let s = 0; s <= seconds; s += 1) {
    const x = right - width + (width * s) / seconds
    const high = s === 0 || s === seconds ? 9 : 5
    d += lineD({ x, y: axis - pen.px(high) }, { x, y: axis })
  }
  return [
    { kind: 'path', d, stroke: 'graphite', strokeWidth: pen.px(1.2) },
    textNode(`Throw-in, ${seconds} s`, right - width, -pen.px(LABEL + 3), size, 'start'),
  ]
}

/** What the ruler needs above the court and left of it, px. */
export const rulerMargins = (throwIn: boolean, type: number) => ({
  top: Math.max(BAR, LABEL + type) + 4,
  left: throwIn ? THROW_IN.width + THROW_IN.off + 4 : 0,
})

import { toMetres } from './frame'
import type { Pen } from './pen'
import { lineD } from './path'
import type { RulePack } from './rulePacks'
import type { GroupNode, SceneNode, TextNode } from './scene'
import { textWidth } from './textWidth'

/** What stands above the court, heights in px over its upper sideline. */
const AXIS = 6
const BAR = 30
const LABEL = 17
/** With ticks the bar and its words stand over the numbers. */
const OVER_TICKS = { bar: 48, label: 34 }
/** Width of the throw-in ruler and its distance from the baseline, px. */
const THROW_IN = { width: 68, off: 8 }
const TICK = 7
const ELBOW = 5

/** A second and where the ball is by then, as a fraction of the court. */
export interface BallTick {
  second: number
  x: number
}

export interface RulerOptions {
  /** The small even ruler for the throw-in count. */
  throwIn: boolean
  /** Where the ball is after each second; ballBySecond() has it for many possessions. */
  ballBySecond?: readonly BallTick[]
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
  const ticks = ticksIn(options.ballBySecond ?? [], pack, end)
  const tall = ticks.length > 0 ? OVER_TICKS : { bar: BAR, label: LABEL }
  const nodes: SceneNode[] = [graphite(lineD({ x: 0, y: axis }, { x: Math.min(end, length), y: axis }), 1.5)]
  if (half < end) {
    nodes.push(graphite(lineD({ x: half, y: -pen.px(tall.bar) }, { x: half, y: 0 }), 4))
    nodes.push(...deadline(pack, end, pen, size, -pen.px(tall.label)))
  }
  nodes.push(...ballTicks(ticks, half, end, pen, size, axis))
  if (options.throwIn) nodes.push(...throwInRuler(pack, pen, size, axis))
  return { kind: 'group', id: 'ruler', label: `over half by ${pack.backcourtSeconds} seconds`, nodes }
}

/** "over half by 8 s" beside the bar, on the side that has room; shorter where neither has. */
function deadline(pack: RulePack, end: number, pen: Pen, size: number, y: number): TextNode[] {
  const half = pack.court.length / 2
  const gap = pen.px(8)
  for (const words of [`over half by ${pack.backcourtSeconds} s`, `${pack.backcourtSeconds} s`]) {
    const room = gap + textWidth(words, size, 'label')
    if (end - half > room + pen.px(2)) return [textNode(words, half + gap, y, size, 'start', 700)]
    if (half > room) return [textNode(words, half - gap, y, size, 'end', 700)]
  }
  return []
}

/** Ticks on the shown part of the court, metres. */
const ticksIn = (places: readonly BallTick[], pack: RulePack, end: number): BallTick[] =>
  places
    .map(({ second, x }) => ({ second, x: toMetres(pack, { x, y: 0.5 }).x }))
    .filter(({ x }) => x >= 0 && x <= end)

/** Ticks where the ball is each second. Bunched ticks fan out their numbers; none is left out. */
function ballTicks(
  ticks: readonly BallTick[],
  half: number,
  end: number,
  pen: Pen,
  size: number,
  axis: number,
): SceneNode[] {
  const type = size * 0.92
  // Room for two figures, and the half-court bar is nobody's place.
  const wide = textWidth('00', type, 'label')
  const clear = wide / 2 + pen.px(4)
  const short = ticks.filter(({ x }) => x <= half)
  const over = ticks.filter(({ x }) => x > half)
  const places = [
    ...fannedWithin(
      short.map(({ x }) => x),
      wide,
      wide / 2,
      Math.min(half - clear, end - wide / 2),
    ),
    ...fannedWithin(
      over.map(({ x }) => x),
      wide,
      half + clear,
      end - wide / 2,
    ),
  ]
  return [...short, ...over].flatMap(({ second, x }, i): SceneNode[] => {
    const at = places[i] ?? x
    const top = axis - pen.px(TICK)
    return [
      {
        kind: 'path',
        d: lineD({ x, y: axis }, { x, y: top }, { x: at, y: top - pen.px(ELBOW) }),
        stroke: 'graphite',
        strokeWidth: pen.px(1.2),
      },
      textNode(String(second), at, top - pen.px(TICK), type, 'middle'),
    ]
  })
}

/** Fanned between two bounds; where they leave no room for all, as far apart as they let them be. */
function fannedWithin(xs: readonly number[], apart: number, from: number, to: number): number[] {
  const step = xs.length > 1 ? Math.min(apart, Math.max(0, to - from) / (xs.length - 1)) : apart
  const order = fanned(xs, step)
    .map((x, i) => ({ x, i }))
    .sort((a, b) => a.x - b.x || a.i - b.i)
  const result = [...xs]
  let least = from
  order.forEach(({ x, i }, place) => {
    const most = to - (order.length - 1 - place) * step
    const at = Math.max(least, Math.min(x, most))
    result[i] = at
    least = at + step
  })
  return result
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
    textNode(throwInWords(seconds), -pen.px(3), -pen.px(LABEL + 3), size, 'end'),
  ]
}

const throwInWords = (seconds: number): string => `Throw-in, ${seconds} s`

/** What the ruler needs above the court and left of it, px. */
export const rulerMargins = (throwIn: boolean, type: number, ticks = false) => ({
  top: (ticks ? Math.max(OVER_TICKS.bar, OVER_TICKS.label + type) : Math.max(BAR, LABEL + type)) + 4,
  left: throwIn
    ? Math.max(THROW_IN.width + THROW_IN.off, textWidth(throwInWords(10), type, 'label') + 3) + 4
    : 0,
})

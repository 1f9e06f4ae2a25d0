import type { Pen } from './pen'
import { lineD } from './path'
import type { RulePack } from './rulePacks'
import { ballTicks, heldMark, rulerText, ticksIn, type BallTick, type Held } from './rulerTicks'
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

export interface RulerOptions {
  /** The small even ruler for the throw-in count. */
  throwIn: boolean
  /** Where the ball is after each second; ballBySecond() has it for many possessions. */
  ballBySecond?: readonly BallTick[]
  /** The seconds between which they hold the ball up: a bar in their ink, a bracket and words. */
  held?: Held | null
  /** Size of type, px. */
  type: number
}

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
  const words = half < end ? deadline(pack, end, pen, size, -pen.px(tall.label)) : []
  if (half < end) {
    nodes.push(graphite(lineD({ x: half, y: -pen.px(tall.bar) }, { x: half, y: 0 }), 4))
    nodes.push(...words)
  }
  nodes.push(...ballTicks(ticks, half, end, pen, size, axis))
  if (options.held)
    nodes.push(...heldMark(ticks, options.held, words, half < end ? [half, end] : [end], pen, size, axis))
  if (options.throwIn) nodes.push(...throwInRuler(pack, pen, size, axis))
  const held = options.held ? `; held from ${options.held.from} to ${options.held.to} seconds` : ''
  return { kind: 'group', id: 'ruler', label: `over half by ${pack.backcourtSeconds} seconds${held}`, nodes }
}

/** "over half by 8 s" beside the bar, on the side that has room; shorter where neither has. */
function deadline(pack: RulePack, end: number, pen: Pen, size: number, y: number): TextNode[] {
  const half = pack.court.length / 2
  const gap = pen.px(8)
  for (const words of [`over half by ${pack.backcourtSeconds} s`, `${pack.backcourtSeconds} s`]) {
    const room = gap + textWidth(words, size, 'label')
    if (end - half > room + pen.px(2)) return [rulerText(words, half + gap, y, size, 'start', 700)]
    if (half > room) return [rulerText(words, half - gap, y, size, 'end', 700)]
  }
  return []
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
    rulerText(throwInWords(seconds), -pen.px(3), -pen.px(LABEL + 3), size, 'end'),
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

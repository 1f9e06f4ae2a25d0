import { toMetres } from './frame'
import { fannedWithin } from './fan'
import { lineD, overlaps, type Box } from './path'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { SceneNode, TextNode } from './scene'
import { CAP_HEIGHT, DESCENT, textWidth } from './textWidth'

/** A second and where the ball is by then, as a fraction of the court. */
export interface BallTick {
  second: number
  x: number
}

/** Seconds between which the ball hardly comes on. */
export interface Held {
  from: number
  to: number
}

const TICK = 7
const ELBOW = 5

/** A word on the ruler. */
export const rulerText = (
  text: string,
  x: number,
  y: number,
  size: number,
  anchor: TextNode['anchor'],
  weight: TextNode['weight'] = 600,
  ink: TextNode['ink'] = 'graphite',
): TextNode => ({ kind: 'text', x, y, text, size, cut: 'label', weight, anchor, ink })

/** Ticks on the shown part of the court, metres. */
export const ticksIn = (places: readonly BallTick[], pack: RulePack, end: number): BallTick[] =>
  places
    .map(({ second, x }) => ({ second, x: toMetres(pack, { x, y: 0.5 }).x }))
    .filter(({ x }) => x >= 0 && x <= end)

/**
 * Ticks where the ball is each second. Bunched ticks fan out their numbers; only where a crop leaves no room for
 * all of them do the last ones stand without.
 */
export function ballTicks(
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
    const at = places[i] ?? null
    const top = axis - pen.px(TICK)
    const elbow = at === null ? [] : [{ x: at, y: top - pen.px(ELBOW) }]
    return [
      {
        kind: 'path',
        d: lineD({ x, y: axis }, { x, y: top }, ...elbow),
        stroke: 'graphite',
        strokeWidth: pen.px(1.2),
      },
      ...(at === null ? [] : [rulerText(String(second), at, top - pen.px(TICK), type, 'middle')]),
    ]
  })
}

/**
 * A bar on the axis from the first held tick to the last, a bracket over their numbers, and words where there
 * is room: clear of what is `taken`, and crossing none of the `edges` (half court, the end of the drawing).
 */
export function heldMark(
  ticks: readonly BallTick[],
  held: Held,
  taken: readonly TextNode[],
  edges: readonly number[],
  pen: Pen,
  size: number,
  axis: number,
): SceneNode[] {
  const xs = ticks.filter(({ second }) => second >= held.from && second <= held.to).map(({ x }) => x)
  if (xs.length < 2) return []
  const [from, to] = [Math.min(...xs), Math.max(...xs)]
  const [low, high] = [-pen.px(30), -pen.px(34)]
  const theirs = { stroke: 'their', cap: 'butt', join: 'miter' } as const
  const words = rulerText(
    `held, ${held.from} s to ${held.to} s`,
    to + pen.px(7),
    -pen.px(33),
    size * 0.92,
    'start',
    600,
    'their',
  )
  // The words of the deadline stay; these are the first to go, and the bracket still says it.
  const room = boxOf(words)
  const free =
    taken.every((other) => !overlaps(room, boxOf(other))) &&
    edges.every((edge) => edge + pen.px(3) < room.x || edge - pen.px(3) > room.x + room.width)
  return [
    {
      kind: 'path',
      d: lineD({ x: from, y: axis }, { x: Math.max(to, from + pen.px(3)), y: axis }),
      strokeWidth: pen.px(6),
      ...theirs,
    },
    {
      kind: 'path',
      d: lineD({ x: from, y: low }, { x: from, y: high }, { x: to, y: high }, { x: to, y: low }),
      strokeWidth: pen.px(1.5),
      ...theirs,
    },
    ...(free ? [words] : []),
  ]
}

function boxOf({ x, y, text, size, cut, anchor }: TextNode): Box {
  const width = textWidth(text, size, cut)
  return {
    x: anchor === 'end' ? x - width : x,
    y: y - size * CAP_HEIGHT,
    width,
    height: size * (CAP_HEIGHT + DESCENT),
  }
}

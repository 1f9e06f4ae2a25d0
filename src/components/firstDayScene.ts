import { courtLines } from '@shared/court/courtLines'
import { straight } from '@shared/court/curve'
import { movement } from '@shared/court/movement'
import { circleD, type Point } from '@shared/court/path'
import { penOf } from '@shared/court/pen'
import { rulePack, type RulePackKey } from '@shared/court/rulePacks'
import type { Scene, SceneNode } from '@shared/court/scene'
import { ballAt, ourToken, tokenSize } from '@shared/court/tokens'

/** Where each of the four stands, metres on a court of 28 x 15. */
const STATIONS: readonly Point[] = [
  { x: -1, y: 10.4 },
  { x: 6.6, y: 4.6 },
  { x: 14, y: 9.4 },
  { x: 22.4, y: 5.4 },
]

/**
 * A club's first day as one way up the court: what is done is solid, what is ahead dashed, and the ball is at the
 * one to do.
 * @param done whether each of the four is done
 * @param names a word under each, none for the first, which stands out of bounds
 */
export function firstDayScene(pack: RulePackKey, done: readonly boolean[], names: readonly string[]): Scene {
  const book = rulePack(pack)
  const pen = penOf(22)
  const token = tokenSize(pen, false, 18)
  const at = done.findIndex((one) => !one)
  const scale = book.court.length / 28
  const places = STATIONS.map(({ x, y }) => ({ x: x * scale, y: y * (book.court.width / 15) }))
  const ways = places.slice(1).flatMap((to, index) => {
    const from = places[index] ?? to
    const length = Math.hypot(to.x - from.x, to.y - from.y)
    const beside = (token.r + 0.25) / length
    const near = (point: Point, other: Point) => ({
      x: point.x + (other.x - point.x) * beside,
      y: point.y + (other.y - point.y) * beside,
    })
    return movement('pass', straight(near(from, to), near(to, from)), pen)
  })
  const tokens = places.map((point, index): SceneNode => {
    const number = String(index + 1)
    if (done[index] === true || index === at)
      return ourToken(point, number, index === at, token, pen, `station-${number}`)
    return {
      kind: 'group',
      id: `station-${number}`,
      nodes: [
        { kind: 'path', d: circleD(point, token.r + pen.px(3)), fill: 'floor' },
        {
          kind: 'path',
          d: circleD(point, token.r),
          fill: 'sheet',
          stroke: 'our',
          strokeWidth: pen.px(1.6),
          dash: [pen.px(3), pen.px(2.6)],
        },
        {
          kind: 'text',
          x: point.x,
          y: point.y + token.r * 0.46,
          text: number,
          size: token.r * 1.28,
          cut: 'count',
          weight: 700,
          anchor: 'middle',
          ink: 'our',
        },
      ],
    }
  })
  const words = places.map((point, index): SceneNode => {
    const text = names[index] ?? ''
    return {
      kind: 'text',
      x: index === 0 ? point.x + token.r : point.x,
      y: point.y + (index === 1 || index === 3 ? -token.r - 0.5 : token.r + 0.95),
      text,
      size: 0.72,
      cut: 'label',
      weight: 700,
      anchor: index === 0 ? 'start' : 'middle',
      ink: 'our',
      halo: { ink: 'floor', width: pen.px(4) },
    }
  })
  const here = places[at]
  return {
    view: { x: -2.4, y: -0.6, width: book.court.length + 3, height: book.court.width + 1.2 },
    description: `Four steps to the first read: ${names
      .map((name, index) => `${name}, ${done[index] === true ? 'done' : index === at ? 'now' : 'ahead'}`)
      .join('; ')}.`,
    nodes: [
      courtLines(book, pen),
      ...ways,
      ...words.filter((_, index) => (names[index] ?? '') !== ''),
      ...tokens,
      ...(here ? [ballAt(here, token, pen)] : []),
    ],
  }
}

import { arcMeetsLine } from './relations'
import { boxD, circleD, lineD, n } from './path'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, Ink, SceneNode } from './scene'

/**
 * The court of a rule set: floor, every marking at both ends, boundary, boards and rings. Metres, our
 * endline at x = 0. Weights are DESIGN.md section 3: boundary and board 2, ring 1.3, markings 1.2 px.
 */
export function courtLines(pack: RulePack, pen: Pen): GroupNode {
  const { length, width } = pack.court
  const line = (d: string, weight: number, ink: Ink = 'court-line'): SceneNode => ({
    kind: 'path',
    d,
    stroke: ink,
    strokeWidth: pen.line(weight),
    join: 'miter',
  })
  const middle = { x: length / 2, y: width / 2 }
  const court = { x: 0, y: 0, width: length, height: width }
  return {
    kind: 'group',
    id: 'court',
    nodes: [
      { kind: 'path', d: boxD(court), fill: 'floor' },
      line(lineD({ x: middle.x, y: 0 }, { x: middle.x, y: width }), 1.2),
      line(circleD(middle, pack.centreCircle), 1.2),
      ...ENDS.flatMap((end) => [
        ...markings(pack, end).map((d) => line(d, 1.2)),
        line(board(pack, end), 2, 'graphite-3'),
        line(circleD({ x: end(pack, pack.basket), y: middle.y }, pack.ringRadius), 1.3, 'graphite-3'),
      ]),
      line(boxD(court), 2),
    ],
  }
}

/** Turns a distance from an endline into x: our end, then the end we attack. */
type End = (pack: RulePack, fromEndline: number) => number
const ourEnd: End = (_pack, fromEndline) => fromEndline
const farEnd: End = (pack, fromEndline) => pack.court.length - fromEndline
const ENDS: readonly End[] = [ourEnd, farEnd]

function markings(pack: RulePack, end: End): string[] {
  const middle = pack.court.width / 2
  const x = (fromEndline: number) => end(pack, fromEndline)
  // At the far end every arc is walked the other way round.
  const sweep = end === ourEnd ? 1 : 0
  const lane = pack.laneWidth / 2
  const [endline, line] = [x(0), x(pack.freeThrowLine)]
  const key =
    `M${n(endline)} ${n(middle - lane)}H${n(line)}V${n(middle + lane)}H${n(endline)}` +
    `M${n(line)} ${n(middle - pack.centreCircle)}` +
    `A${n(pack.centreCircle)} ${n(pack.centreCircle)} 0 0 ${sweep} ${n(line)} ${n(middle + pack.centreCircle)}`
  const { radius, cornerInset } = pack.threePoint
  const meets = x(arcMeetsLine(pack))
  const three =
    `M${n(endline)} ${n(cornerInset)}H${n(meets)}` +
    `A${n(radius)} ${n(radius)} 0 0 ${sweep} ${n(meets)} ${n(pack.court.width - cornerInset)}H${n(endline)}`
  const r = pack.noCharge
  if (r === null) return [key, three]
  const [face, basket] = [x(pack.board.face), x(pack.basket)]
  const noCharge =
    `M${n(face)} ${n(middle - r)}H${n(basket)}` +
    `A${n(r)} ${n(r)} 0 0 ${sweep} ${n(basket)} ${n(middle + r)}H${n(face)}`
  return [key, three, noCharge]
}

function board(pack: RulePack, end: End): string {
  const face = end(pack, pack.board.face)
  const [middle, half] = [pack.court.width / 2, pack.board.width / 2]
  return lineD({ x: face, y: middle - half }, { x: face, y: middle + half })
}

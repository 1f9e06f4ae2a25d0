import type { Label, LabelLine } from './labels'
import type { Box, Point } from './path'
import type { Pen } from './pen'
import { pickupWords, roomWords } from './pressWords'
import type { Counted, PressSceneOptions } from './pressOptions'
import type { DeniedWay } from './pressMarks'
import { DENIED, labelOf, type Denied } from '../vocabulary'
import type { Ink } from './scene'
import { zoneBox } from './trapZones'

interface Input {
  options: PressSceneOptions
  pen: Pen
  room: Box | null
  front: Box | null
  denied: readonly { one: Counted & { lane: Denied }; way: DeniedWay }[]
}

/** Under this many px per metre there is room for counts only. */
const NOTES_FROM = 18

/** The counts with their words, most fixed first: the room's has one place, a lane's has many. */
export function pressLabels({ options, pen, room, front, denied }: Input): Label[] {
  const type = options.type ?? 1
  const scale = pen.pxPerMetre
  const countPx = (scale >= 22 ? 20 : scale >= 13 ? 16 : 14) * type
  const withNotes = scale >= NOTES_FROM
  const lines = (count: Counted, words: string, px = countPx): LabelLine[] => [
    { text: `${count.k} of ${count.n}`, size: pen.px(px), cut: 'count', weight: count.thin ? 500 : 700 },
    ...(withNotes && words
      ? [{ text: words, size: pen.px(13 * type), cut: 'label', weight: 500 } satisfies LabelLine]
      : []),
  ]
  const gap = pen.px(10)
  const labels: Label[] = []
  const add = (id: string, ink: Ink, text: LabelLine[], wishes: Label['wishes']) =>
    labels.push({ id, ink, lines: text, wishes })

  if (room && options.room) {
    const text = lines(options.room, options.room.note ?? roomWords(options.room.lane), countPx * 1.08)
    add('room', 'our', text, ({ width, height }) => [
      { x: room.x + (room.width - width) / 2, y: room.y + (room.height - height) / 2 },
      ...beside(room, gap, width, height),
    ])
  }
  for (const zone of options.zones) {
    const box = zoneBox(options.pack, zone, pen)
    if (!box) continue
    const note = [zone.thin ? 'thin' : '', zone.note ?? ''].filter(Boolean).join(', ')
    add(`zone-${zone.spot}-${zone.side}`, 'their', lines(zone, note), ({ width, height }) => {
      const outer = zone.side === 'right'
      return beside(box, gap, width, height, outer)
    })
  }
  if (front && options.pickup) {
    const text = lines(options.pickup, options.pickup.note ?? pickupWords(options.pickup.at))
    add('pickup', 'their', text, ({ width, height }) => [
      ...[0.1, 0.3, 0.75, 0.9].map((share) => ({
        x: front.x + front.width + gap,
        y: front.y + (front.height - height) * share,
      })),
      ...beside(front, gap, width, height),
    ])
  }
  for (const { one, way } of denied) {
    const text = lines(one, one.note ?? `${withoutArticle(labelOf(DENIED, one.lane))} denied`)
    add(`denied-${one.lane}`, 'their', text, ({ width, height }) => beside(way.box, pen.px(4), width, height))
  }
  return labels
}

/** Right, left, above, below and inside a box. `low` hangs the label at the box's lower end. */
function beside(box: Box, gap: number, width: number, height: number, low = false): Point[] {
  const edges = [box.y + gap / 2, box.y + (box.height - height) / 2, box.y + box.height - height - gap / 2]
  const ys = low
    ? [edges[1] ?? 0, edges[2] ?? 0, edges[0] ?? 0]
    : [edges[0] ?? 0, edges[1] ?? 0, edges[2] ?? 0]
  const right = box.x + box.width + gap
  const left = box.x - gap - width
  const middle = box.x + (box.width - width) / 2
  return [
    ...ys.map((y) => ({ x: right, y })),
    { x: box.x, y: low ? box.y - height - gap : box.y + box.height + gap },
    ...ys.map((y) => ({ x: left, y })),
    { x: box.x, y: low ? box.y + box.height + gap : box.y - height - gap },
    { x: middle, y: box.y + (box.height - height) / 2 },
  ]
}

const withoutArticle = (words: string): string => words.replace(/^the /, '')

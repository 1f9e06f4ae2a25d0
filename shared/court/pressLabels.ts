import type { Label, LabelLine, LabelSize, LabelSpot } from './labels'
import type { Box } from './path'
import type { Pen } from './pen'
import { pickupWords, roomWords } from './pressWords'
import type { Counted, PressSceneOptions } from './pressOptions'
import type { DeniedWay } from './pressMarks'
import { DENIED, labelOf, type Denied } from '../vocabulary'
import type { TrapZone } from './trapZones'

interface Input {
  options: PressSceneOptions
  pen: Pen
  /** The shown part of a zone; null where it is not to be named. */
  zoneOf: (zone: TrapZone) => Box | null
  room: Box | null
  front: Box | null
  denied: readonly { one: Counted & { lane: Denied }; way: DeniedWay }[]
}

/** Under this many px per metre there is room for counts only. */
const NOTES_FROM = 20

/** The counts with their words, most fixed first: the room's has one place, a lane's has many. */
export function pressLabels({ options, pen, zoneOf, room, front, denied }: Input): Label[] {
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
  if (room && options.room) {
    labels.push({
      id: 'room',
      ink: 'our',
      lines: lines(options.room, options.room.note ?? roomWords(options.room.lane), countPx * 1.08),
      wishes: (size) => [within(room, size), ...beside(room, gap, size)],
      fallbacks: (size) => [within(room, size)],
      own: room,
      stray: 0,
    })
  }
  for (const zone of options.zones) {
    const box = zoneOf(zone)
    if (!box) continue
    const note = [zone.thin ? 'thin' : '', zone.note ?? ''].filter(Boolean).join(', ')
    labels.push({
      id: `zone-${zone.spot}-${zone.side}`,
      ink: 'their',
      lines: lines(zone, note),
      wishes: (size) => beside(box, gap, size, zone.side === 'right'),
      // Beside a zone that is hemmed in, a count would seem its neighbour's: it goes on its own hatch.
      fallbacks: (size) => [within(box, size)],
      stray: 0,
    })
  }
  if (front && options.pickup) {
    labels.push({
      id: 'pickup',
      ink: 'their',
      lines: lines(options.pickup, options.pickup.note ?? pickupWords(options.pickup.at)),
      wishes: (size) => [
        ...[0.1, 0.3, 0.75, 0.9].map((share) => ({
          x: front.x + front.width + gap,
          y: front.y + (front.height - size.height) * share,
        })),
        ...beside(front, gap, size),
      ],
    })
  }
  for (const { one, way } of denied) {
    const wishes = (size: LabelSize) => beside(way.box, pen.px(4), size)
    labels.push({
      id: `denied-${one.lane}`,
      ink: 'their',
      lines: lines(one, one.note ?? `${withoutArticle(labelOf(DENIED, one.lane))} denied`),
      wishes,
      fallbacks: wishes,
      stray: 3,
    })
  }
  return labels
}

const within = (box: Box, { width, height }: LabelSize): LabelSpot => ({
  x: box.x + (box.width - width) / 2,
  y: box.y + (box.height - height) / 2,
  align: 'middle',
})

/** Right, below, left and above a box; `low` hangs the label at the box's lower end. */
function beside(box: Box, gap: number, { width, height }: LabelSize, low = false): LabelSpot[] {
  const top = box.y + gap / 2
  const middle = box.y + (box.height - height) / 2
  const bottom = box.y + box.height - height - gap / 2
  const ys = low ? [middle, bottom, top] : [top, middle, bottom]
  const above = { x: box.x, y: box.y - height - gap }
  const below = { x: box.x, y: box.y + box.height + gap }
  return [
    ...ys.map((y) => ({ x: box.x + box.width + gap, y })),
    low ? above : below,
    ...ys.map((y): LabelSpot => ({ x: box.x - gap - width, y, align: 'end' })),
    low ? below : above,
  ]
}

const withoutArticle = (words: string): string => words.replace(/^the /, '')

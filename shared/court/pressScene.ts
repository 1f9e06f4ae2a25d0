import { heldStretch } from './ballBySecond'
import { courtLines } from './courtLines'
import { toMetres } from './frame'
import { labelNodes, placeLabels } from './labels'
import type { Box } from './path'
import { penOf, type Pen } from './pen'
import { pressLabels } from './pressLabels'
import type { Counted, PressSceneOptions } from './pressOptions'
import { deniedLane, middleOf, pickupFront, roomBox, roomNode, type BallSide } from './pressMarks'
import { pressSentence } from './pressWords'
import { countRuler, rulerMargins } from './rulers'
import type { GroupNode, Scene, SceneNode } from './scene'
import { ballAt, letterDisc, ourToken, theirToken, tokenSize } from './tokens'
import { trapZones, zoneBox, type TrapZone } from './trapZones'
import { cropEnd, scaleToFit, viewOf, type Margins } from './view'

const LETTER_R = 13

/** What an opponent's press does, on the long court (DESIGN.md section 3). Plain values in, a scene out. */
export function pressScene(options: PressSceneOptions): Scene {
  const { pack, zones } = options
  const pen = penOf(options.pxPerMetre)
  const medium = options.medium ?? (pen.pxPerMetre < 18 ? 'small' : 'screen')
  const crop = options.crop ?? 'full'
  const end = cropEnd(pack, crop)
  const side = options.ballSide ?? denserSide(zones)
  const labels = options.labels ?? 'counts'
  // A cropped court names only what it shows.
  const shown = (box: Box | null): Box | null => shownPart(box, end, pen)
  const boxes = zones.flatMap((zone) => shown(zoneBox(pack, zone, pen)) ?? [])

  const front =
    options.pickup &&
    pickupFront(pack, options.pickup.at, options.pickup.thin, boxes, pen, counted('pick up', options.pickup))
  const denied = (options.denied ?? []).map((one) => ({
    one,
    way: deniedLane(pack, one.lane, side, pen, counted('denied', one)),
  }))
  const room = options.room ? roomBox(pack, options.room.lane, side) : null
  const size = tokenSize(pen, medium === 'small')
  const defenders = (options.defenders ?? []).map((place) => toMetres(pack, place))

  const nodes: SceneNode[] = [
    courtLines(pack, pen),
    trapZones(pack, zones, pen, medium),
    { kind: 'group', id: 'denied', nodes: denied.map(({ way }) => way.node) },
    ...(front ? [front.node] : []),
    ...(room && options.room ? [roomNode(room, pen, counted('room', options.room))] : []),
    {
      kind: 'group',
      id: 'defenders',
      nodes: defenders.map((at, i) => theirToken(at, `X${i + 1}`, size, pen)),
    },
    ...throwerNodes(options, pen, size),
  ]

  const roomShown = shown(room)
  const frontShown = shown(front?.box ?? null)
  if (labels === 'letters') nodes.push(letters(options, pen, shown, roomShown, frontShown))
  if (labels === 'counts') {
    const arm = size.r
    const standing = defenders.map((at): Box => ({
      x: at.x - arm,
      y: at.y - arm,
      width: 2 * arm,
      height: 2 * arm,
    }))
    const keepClear = [
      ...boxes,
      ...standing,
      ...(front ? [front.box] : []),
      ...(roomShown ? [roomShown] : []),
      ...denied.map(({ way }) => way.box),
    ]
    const wanted = pressLabels({
      options,
      pen,
      zoneOf: (zone) => shown(zoneBox(pack, zone, pen)),
      room: roomShown,
      front: frontShown,
      denied: denied.filter(({ way }) => shown(way.box) !== null),
    })
    const inset = pen.px(4)
    const area = { x: inset, y: inset, width: end - 2 * inset, height: pack.court.width - 2 * inset }
    const placed = placeLabels(
      wanted,
      area,
      keepClear,
      pen.px(3),
      denied.flatMap(({ way }) => way.line),
    )
    nodes.push({
      kind: 'group',
      id: 'labels',
      nodes: placed.map((one): GroupNode => ({
        kind: 'group',
        id: `label-${one.label.id}`,
        nodes: labelNodes(one, pen.px(4)),
      })),
    })
  }
  if (options.ruler !== false)
    nodes.push(
      countRuler(pack, end, pen, {
        throwIn: options.throwInRuler === true,
        ballBySecond: options.ballBySecond,
        held: heldStretch(options.ballBySecond ?? []),
        type: rulerType(options),
      }),
    )
  return { view: viewOf(pack, crop, pressMargins(options), pen), nodes, description: pressSentence(options) }
}

/** Room round the court in px. */
export function pressMargins(options: Omit<PressSceneOptions, 'pxPerMetre' | 'zones'>): Margins {
  const ruler =
    options.ruler === false
      ? { top: 3, left: 0 }
      : rulerMargins(
          options.throwInRuler === true,
          rulerType(options),
          (options.ballBySecond ?? []).length > 0,
        )
  const thrower = options.thrower ? 48 : 0
  return { top: ruler.top, right: 3, bottom: 3, left: Math.max(3, ruler.left, thrower) }
}

/** px per metre at which the press drawing of these options is `widthPx` wide. */
export const pressScale = (
  options: Omit<PressSceneOptions, 'pxPerMetre' | 'zones'>,
  widthPx: number,
): number => scaleToFit(options.pack, options.crop ?? 'full', pressMargins(options), widthPx)

const rulerType = (options: Pick<PressSceneOptions, 'type'>): number => 13 * (options.type ?? 1)

const counted = (what: string, { k, n, thin }: Counted): string =>
  `${what}: ${k} of ${n}${thin ? ', thin' : ''}`

/** The side whose corner is trapped more; right where both are alike, as the design draws it. */
function denserSide(zones: readonly TrapZone[]): BallSide {
  const count = (side: BallSide) =>
    zones
      .filter((zone) => zone.side === side && zone.spot === 'coffin-corner')
      .reduce((sum, { k }) => sum + k, 0)
  return count('left') > count('right') ? 'left' : 'right'
}

function throwerNodes(options: PressSceneOptions, pen: Pen, size: ReturnType<typeof tokenSize>): SceneNode[] {
  if (!options.thrower) return []
  const at = toMetres(options.pack, options.thrower.at)
  return [ourToken(at, options.thrower.role, false, size, pen), ballAt(at, size, pen)]
}

/** The part of a mark's box that a crop shows; null where that is too little to name. */
function shownPart(box: Box | null, end: number, pen: Pen): Box | null {
  if (!box) return null
  const width = Math.min(box.width, end - box.x)
  return width === box.width || width >= pen.px(LETTER_R) ? { ...box, width } : null
}

function letters(
  options: PressSceneOptions,
  pen: Pen,
  shown: (box: Box | null) => Box | null,
  room: Box | null,
  front: Box | null,
): GroupNode {
  const r = pen.px(LETTER_R * (options.type ?? 1))
  const nodes: SceneNode[] = []
  for (const zone of options.zones) {
    const box = shown(zoneBox(options.pack, zone, pen))
    if (box && zone.letter) nodes.push(...letterDisc(middleOf(box), zone.letter, r, pen))
  }
  if (room && options.room?.letter) nodes.push(...letterDisc(middleOf(room), options.room.letter, r, pen))
  if (front && options.pickup?.letter) {
    const at = { x: front.x + front.width + r + pen.px(4), y: front.y + r }
    nodes.push(...letterDisc(at, options.pickup.letter, r, pen))
  }
  return { kind: 'group', id: 'letters', nodes }
}

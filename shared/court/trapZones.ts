import { spotLabel } from '../tendencies/habits'
import { toMetres } from './frame'
import { boxD, type Box } from './path'
import { hatchD, hatchOf, hatchStep, type HatchMedium } from './hatch'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode } from './scene'
import { spotCell, type SpotName, type SpotSide } from './trapSpots'

/** A spot where they trap: k of n, thin or not. */
export interface TrapZone {
  spot: SpotName
  side: SpotSide
  k: number
  n: number
  /** One game, a sighting, or a wide range (RECORD.md section 4): dashed edge and open hatch. */
  thin: boolean
  /** A few words under the count. */
  note?: string
  /** Stands on the zone instead of its count, when a drawing is lettered. */
  letter?: string
  /** The habit in hand: heavier edge. */
  selected?: boolean
}

/** Room left beside the half-court line, px, so that the line itself stays clear. */
const OFF_HALF = 4

/** The zone's box, metres; null for a spot without an outline. */
export function zoneBox(pack: RulePack, zone: Pick<TrapZone, 'spot' | 'side'>, pen: Pen): Box | null {
  const cell = spotCell(zone.spot, zone.side)
  if (!cell) return null
  const a = toMetres(pack, { x: cell.x0, y: cell.y0 })
  const b = toMetres(pack, { x: cell.x1, y: cell.y1 })
  const left = cell.x0 === 0.5 ? a.x + pen.px(OFF_HALF) : a.x
  const right = cell.x1 === 0.5 ? b.x - pen.px(OFF_HALF) : b.x
  return { x: left, y: a.y, width: right - left, height: b.y - a.y }
}

/** The zones, hatched by how often, in their ink; `faint` where they lie under our way. */
export function trapZones(
  pack: RulePack,
  zones: readonly TrapZone[],
  pen: Pen,
  medium: HatchMedium,
  faint = false,
): GroupNode {
  const opacity = faint ? { strokeOpacity: 0.6 } : {}
  const nodes = zones.flatMap((zone): GroupNode[] => {
    const box = zoneBox(pack, zone, pen)
    if (!box) return []
    const hatch = hatchOf(medium, zone.thin ? 1 : hatchStep(zone.k, zone.n))
    const edge = pen.px(zone.selected ? 2.4 : 1.3)
    return [
      {
        kind: 'group',
        id: `trap-zone-${zone.spot}-${zone.side}`,
        label: `${spotLabel(zone.spot, zone.side)}: ${zone.k} of ${zone.n}${zone.thin ? ', thin' : ''}`,
        at: { x: box.x + box.width / 2, y: box.y + box.height / 2 },
        nodes: [
          // Nothing to see: it makes the whole zone answer to a pointer, not its lines alone.
          { kind: 'path', d: boxD(box), fill: 'floor', fillOpacity: 0 },
          {
            kind: 'path',
            d: hatchD(box, pen.px(hatch.gap)),
            stroke: 'their',
            strokeWidth: pen.px(hatch.line),
            cap: 'butt',
            ...opacity,
          },
          {
            kind: 'path',
            d: boxD(box),
            stroke: 'their',
            strokeWidth: edge,
            join: 'miter',
            ...(zone.thin ? { dash: [pen.px(5), pen.px(3)] } : {}),
            ...opacity,
          },
        ],
      },
    ]
  })
  return { kind: 'group', id: 'trap-zones', nodes }
}

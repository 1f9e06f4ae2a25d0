import { spotLabel } from '../tendencies/habits'
import { courtLines } from './courtLines'
import { toMetres, toPlace, inMetres } from './frame'
import { boxD } from './path'
import { penOf } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, Scene } from './scene'
import { SPOT_CELLS, spotCentre } from './trapSpots'
import { scaleToFit, viewOf, type Margins } from './view'

const MARGINS: Margins = { top: 3, right: 3, bottom: 3, left: 3 }

/** The court with the trap spots as dotted cells, to be tapped; each cell is a group that can be chosen by key. */
export function trapTapScene(pack: RulePack, pxPerMetre = 26): Scene {
  const pen = penOf(pxPerMetre)
  const cells = SPOT_CELLS.map((cell): GroupNode => {
    const a = toMetres(pack, { x: cell.x0, y: cell.y0 })
    const b = toMetres(pack, { x: cell.x1, y: cell.y1 })
    const centre = spotCentre(cell.spot, cell.side)
    const d = boxD({ x: a.x, y: a.y, width: b.x - a.x, height: b.y - a.y })
    return {
      kind: 'group',
      id: `spot-${cell.spot}-${cell.side}`,
      label: spotLabel(cell.spot, cell.side),
      ...(centre ? { at: toMetres(pack, centre) } : {}),
      nodes: [
        { kind: 'path', d, fill: 'floor', fillOpacity: 0 },
        {
          kind: 'path',
          d,
          stroke: 'graphite-3',
          strokeWidth: pen.px(1.3),
          dash: [pen.px(1.5), pen.px(5)],
        },
      ],
    }
  })
  return {
    view: viewOf(pack, 'full', MARGINS, pen),
    nodes: [courtLines(pack, pen), { kind: 'group', id: 'spots', nodes: cells }],
    description: 'The court, our endline at the left. Tap where two came to the ball.',
  }
}

/** px per metre at which the tap court is `widthPx` wide. */
export const trapTapScale = (pack: RulePack, widthPx: number): number =>
  scaleToFit(pack, 'full', MARGINS, widthPx)

/** The stored place of a tapped point in metres, kept inside the court: a finger may land on the line. */
export function placeOfPoint(pack: RulePack, point: { x: number; y: number }): { x: number; y: number } {
  const place = toPlace(pack, inMetres(point.x, point.y))
  const kept = (value: number) => Math.round(Math.min(1, Math.max(0, value)) * 1e4) / 1e4
  return { x: kept(place.x), y: kept(place.y) }
}

import { spotLabel } from '../tendencies/habits'
import { courtLines } from './courtLines'
import { toMetres, toPlace, inMetres } from './frame'
import { boxD, lineD } from './path'
import { penOf } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, Scene, SceneNode } from './scene'
import { SPOT_CELLS } from './trapSpots'
import { scaleToFit, viewOf, type Margins } from './view'

const MARGINS: Margins = { top: 3, right: 3, bottom: 3, left: 3 }

/** The court with the trap spots as dotted cells, to be tapped; each cell is a group that can be chosen by key. */
export function trapTapScene(pack: RulePack, pxPerMetre = 26): Scene {
  const pen = penOf(pxPerMetre)
  const cells = SPOT_CELLS.map((cell): GroupNode => {
    const a = toMetres(pack, { x: cell.x0, y: cell.y0 })
    const b = toMetres(pack, { x: cell.x1, y: cell.y1 })
    return {
      kind: 'group',
      id: `spot-${cell.spot}-${cell.side}`,
      label: spotLabel(cell.spot, cell.side),
      at: inMetres((a.x + b.x) / 2, (a.y + b.y) / 2),
      nodes: [
        {
          kind: 'path',
          d: boxD({ x: a.x, y: a.y, width: b.x - a.x, height: b.y - a.y }),
          fill: 'floor',
          fillOpacity: 0,
        },
      ],
    }
  })
  const dotted: SceneNode = {
    kind: 'path',
    d: cellEdges(pack),
    stroke: 'graphite-3',
    strokeWidth: pen.px(1.3),
    dash: [pen.px(1.5), pen.px(5)],
  }
  return {
    view: viewOf(pack, 'full', MARGINS, pen),
    nodes: [courtLines(pack, pen), { kind: 'group', id: 'spots', nodes: [dotted, ...cells] }],
    description: 'The court, our endline at the left. Tap where two came to the ball.',
  }
}

/** Every edge between cells once; court lines are not dotted over. */
function cellEdges(pack: RulePack): string {
  const edges = new Set<string>()
  const edge = (x0: number, y0: number, x1: number, y1: number) =>
    edges.add(lineD(toMetres(pack, { x: x0, y: y0 }), toMetres(pack, { x: x1, y: y1 })))
  for (const { x0, x1, y0, y1 } of SPOT_CELLS) {
    for (const y of [y0, y1]) if (y > 0 && y < 1) edge(x0, y, x1, y)
    for (const x of [x0, x1]) if (x > 0 && x < 1 && x !== 0.5) edge(x, y0, x, y1)
  }
  return [...edges].join('')
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

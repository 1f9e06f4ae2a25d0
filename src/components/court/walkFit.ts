import { counterScale } from '@shared/court/counterScene'
import type { Diagram } from '@shared/court/diagram'
import { startOfDiagram, walkDiagram } from '@shared/court/diagramWalk'
import { toMetres } from '@shared/court/frame'
import type { RulePack } from '@shared/court/rulePacks'
import type { Crop } from '@shared/court/view'
import { standingAt } from '@shared/court/walk/standing'
import type { Timeline } from '@shared/court/walk/timeline'
import { walkScene } from '@shared/court/walkScene'
import type { RulerAxis } from './rulerPlaces'

/** How a court to be walked sits in its place, px. */
export interface WalkFit {
  crop: Crop
  /** Left of the drawing, for the throw-in's count. */
  pad: number
  axis: RulerAxis
}

/** Narrower than this the court ends soon after whoever of ours goes furthest. */
const NARROW = 600
const PAD = { wide: 70, narrow: 46 }
const OFF = 9
const PAST = 1.5

export function walkFit(diagram: Diagram, timeline: Timeline, width: number): WalkFit {
  const { pack } = timeline
  const narrow = width < NARROW
  const crop = narrow ? furthest(diagram, pack) : 'full'
  const pad = narrow ? PAD.narrow : PAD.wide
  const options = { diagram, pack, crop }
  const pxPerMetre = counterScale(options, width - pad)
  const standing = standingAt(timeline, 0)
  const { view } = walkScene({ ...options, pxPerMetre, standing, part: 'moving' })
  const left = pad - view.x * pxPerMetre
  const end = Math.min(pack.court.length, view.x + view.width)
  return {
    crop,
    pad,
    axis: { throwIn: { from: 2, to: left - OFF }, left, pxPerMetre, right: left + end * pxPerMetre },
  }
}

function furthest(diagram: Diagram, pack: RulePack): Crop {
  const standings = [startOfDiagram(diagram), ...walkDiagram(diagram).map(({ after }) => after)]
  const xs = standings.flatMap(({ ours }) => [...ours.values()].map((place) => toMetres(pack, place).x))
  const toX = Math.max(pack.court.length / 2, ...xs) + PAST
  return toX >= pack.court.length - PAST ? 'full' : { toX }
}

import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { Scene } from './scene'

/** How much of the court is shown, from our endline on: all, to just past half, or to x metres. */
export type Crop = 'full' | 'half' | { toX: number }

/** Room round the court in px, for labels, rulers and the thrower. */
export interface Margins {
  top: number
  right: number
  bottom: number
  left: number
}

/** Past half a cropped court runs on this far, metres, so that the line and the bar on it stand free. */
const PAST_HALF = 1.5

/** The last x that is shown, metres from our endline. */
export function cropEnd(pack: RulePack, crop: Crop): number {
  const { length } = pack.court
  if (crop === 'full') return length
  if (crop === 'half') return length / 2 + PAST_HALF
  return Math.min(length, Math.max(pack.freeThrowLine, crop.toX))
}

/** A cropped court runs off the paper: no margin on that side. */
export function viewOf(pack: RulePack, crop: Crop, margins: Margins, pen: Pen): Scene['view'] {
  const end = cropEnd(pack, crop)
  const right = end < pack.court.length ? 0 : margins.right
  return {
    x: -pen.px(margins.left),
    y: -pen.px(margins.top),
    width: end + pen.px(margins.left + right),
    height: pack.court.width + pen.px(margins.top + margins.bottom),
  }
}

/** The scale at which a drawing with these margins is `widthPx` wide. */
export function scaleToFit(pack: RulePack, crop: Crop, margins: Margins, widthPx: number): number {
  const end = cropEnd(pack, crop)
  const right = end < pack.court.length ? 0 : margins.right
  return Math.max(1, widthPx - margins.left - right) / end
}

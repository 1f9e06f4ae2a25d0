import type { Crop } from '@shared/court/view'
import type { RulePack } from '@shared/court/rulePacks'
import type { RulerAxis } from '@/components/court/rulerPlaces'

/** How the board's court sits in its place: the same whatever is drawn, so that nothing jumps under the hand. */
export interface BoardFit {
  crop: Crop
  pxPerMetre: number
  /** Metres. */
  view: { x: number; y: number; width: number; height: number }
  /** Left of the drawing, px. */
  pad: number
  axis: RulerAxis
}

/** Px. */
export const TOKEN = 14
const PAD = 26
const OFF = 9
/** Metres round the court: as far out as a player may be put. */
const ROUND = { left: 2.3, right: 0.6, side: 0.15 }
/** Metres past half that a narrow board shows. */
const PAST_HALF = 2.5

/** @param part a narrow board shows one half at a time, with a little of the other; null is the whole court */
export function boardFit(pack: RulePack, width: number, part: 'ours' | null): BoardFit {
  const { length, width: wide } = pack.court
  const pad = part === null ? PAD : 0
  const end = part === null ? length + ROUND.right : length / 2 + PAST_HALF
  const pxPerMetre = Math.max(4, (width - pad) / (end + ROUND.left))
  const view = { x: -ROUND.left, y: -ROUND.side, width: end + ROUND.left, height: wide + 2 * ROUND.side }
  const left = pad + ROUND.left * pxPerMetre
  return {
    crop: part === null ? 'full' : { toX: end },
    pxPerMetre,
    view,
    pad,
    axis: {
      throwIn: { from: 2, to: left - OFF },
      left,
      pxPerMetre,
      right: left + Math.min(end, length) * pxPerMetre,
    },
  }
}

import { pressMargins, pressScale } from '@shared/court/pressScene'
import type { RulePack } from '@shared/court/rulePacks'
import type { Crop } from '@shared/court/view'

/** How the long court sits in its column; the threads below it use the same, so that both share one axis. */
export interface CourtFit {
  crop: Crop
  throwInRuler: boolean
  pxPerMetre: number
  /** Px from the column's left edge to the endline. */
  left: number
  /** The last metre shown. */
  end: number
}

/** Narrower than this the front court is left away and with it the throw-in's ruler. */
const NARROW = 600
/** Just past the trap spots over half, as a fraction of the length. */
const NARROW_END = 0.64

export function courtFit(pack: RulePack, width: number): CourtFit {
  const narrow = width < NARROW
  const end = narrow ? NARROW_END * pack.court.length : pack.court.length
  const crop: Crop = narrow ? { toX: end } : 'full'
  const options = { pack, crop, throwInRuler: !narrow }
  return {
    crop,
    throwInRuler: !narrow,
    pxPerMetre: pressScale(options, width),
    left: pressMargins(options).left,
    end,
  }
}

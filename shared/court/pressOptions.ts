import type { Denied, Lane, Pickup, Role } from '../vocabulary'
import type { InFractions } from './frame'
import type { HatchMedium } from './hatch'
import type { BallSide } from './pressMarks'
import type { RulePack } from './rulePacks'
import type { BallTick } from './rulerTicks'
import type { TrapZone } from './trapZones'
import type { Crop } from './view'

/** k of n with its mark: what every counted sign on the press court carries. */
export interface Counted {
  k: number
  n: number
  thin: boolean
  /** Instead of the count, when the drawing is lettered. */
  letter?: string
  /** The words under the count; a default is there. */
  note?: string
}

export interface PressSceneOptions {
  pack: RulePack
  /** CSS px per metre at which it is shown; on paper pt per metre times 4/3. */
  pxPerMetre: number
  zones: readonly TrapZone[]
  /** `at`: the class as logged, or the median as a fraction of the court. */
  pickup?: (Counted & { at: Pickup | number }) | null
  room?: (Counted & { lane: Lane }) | null
  denied?: readonly (Counted & { lane: Denied })[]
  /** Where theirs stand, fractions; shapeSpots() gives a shape's. */
  defenders?: readonly InFractions[]
  /** Our thrower, drawn with the ball. */
  thrower?: { role: Role; at: InFractions } | null
  /** Counts beside the marks, letters on them (a mark without a letter then stays bare), or neither. */
  labels?: 'counts' | 'letters' | 'none'
  /** Where the ball comes in; turns the denied lanes and the room. Default: the side of the denser corner. */
  ballSide?: BallSide
  crop?: Crop
  /** Default: by scale, small under 18 px per metre. Paper and wall must be asked for. */
  medium?: HatchMedium
  /** The over-half bar above the court. Default true. */
  ruler?: boolean
  /** The throw-in's own count at the left of the ruler. Default false. */
  throwInRuler?: boolean
  /** Ticks where the ball has got to at each second; ballBySecond() of many possessions gives them. */
  ballBySecond?: readonly BallTick[]
  /** Size of type against the screen's: 1.2 for the player sheet. */
  type?: number
}

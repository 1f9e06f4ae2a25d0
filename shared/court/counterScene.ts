import type { Lane, Pickup, Role } from '../vocabulary'
import { courtLines } from './courtLines'
import { counterOverview } from './counterOverview'
import { counterStep } from './counterStep'
import type { Diagram } from './diagram'
import { walkDiagram } from './diagramWalk'
import { ballWaySentence, stepInWords } from './diagramWords'
import { toMetres } from './frame'
import type { HatchMedium } from './hatch'
import { verdictWords } from './passMark'
import { grown, type Box, type Point } from './path'
import { penOf, type Pen } from './pen'
import { pickupFront, roomBox, roomNode, type BallSide } from './pressMarks'
import type { Counted } from './pressOptions'
import type { RulePack } from './rulePacks'
import { countRuler, rulerMargins } from './rulers'
import type { BallTick } from './rulerTicks'
import type { GroupNode, Scene } from './scene'
import { tokenSize, type TokenSize } from './tokens'
import { trapZones, zoneBox, type TrapZone } from './trapZones'
import { cropEnd, scaleToFit, viewOf, type Crop, type Margins } from './view'
import type { Verdict } from './walk/laneWindow'

export interface CounterSceneOptions {
  diagram: Diagram
  pack: RulePack
  /** CSS px per metre at which it is shown; on paper pt per metre times 4/3. */
  pxPerMetre: number
  /** One step, from where they stand at its start; or the whole way in one drawing. */
  step: number | 'all'
  /** The reader's own role: that token alone is solid. Without it, who is on the ball's way. */
  you?: Role | null
  /** The opponent's traps, under our drawing. */
  zones?: readonly TrapZone[]
  /** Room the press leaves, drawn without a count. */
  room?: { lane: Lane; ballSide?: BallSide } | null
  /** Tokens of 9.5 px instead of 12, small hatch. Default: under 18 px per metre. */
  small?: boolean
  /** Radius of a token in px where neither fits: 14 in an editor. */
  tokenRadius?: number
  crop?: Crop
  medium?: HatchMedium
  /** Default: yes in a step, no in the whole way. */
  defenders?: boolean
  /** Last step's places as ghosts. Default true. */
  ghosts?: boolean
  /** The over-half bar. Default false. */
  ruler?: boolean
  /** The throw-in's own count at the left of the ruler. Default false. */
  throwInRuler?: boolean
  /** Ticks on the ruler where the ball is at each second: as drawn (drawnBySecond) or as counted. */
  ballBySecond?: readonly BallTick[]
  /** Verdicts of passes by "step-move" (verdictsOf): line, gap and a word say whether each is on. */
  windows?: ReadonlyMap<string, Verdict> | null
  /** Where the opponent picks up, under our drawing. */
  pickup?: (Counted & { at: Pickup | number }) | null
}

/** What a counter's ground and its ruler need. */
export type CounterGroundOptions = Pick<
  CounterSceneOptions,
  | 'pack'
  | 'zones'
  | 'room'
  | 'pickup'
  | 'small'
  | 'medium'
  | 'crop'
  | 'ruler'
  | 'throwInRuler'
  | 'ballBySecond'
>

/** Half a metre more than the deepest a thrower may stand, so that every drawing of a list lines up. */
const THROWER_ROOM = 1.6
const RULER_TYPE = 13

/** A counter as drawn on the court: one step or the whole way (DESIGN.md section 3). */
export function counterScene(options: CounterSceneOptions): Scene {
  const { diagram, pack } = options
  const pen = penOf(options.pxPerMetre)
  const small = options.small ?? pen.pxPerMetre < 18
  const size = tokenSize(pen, small, options.tokenRadius)
  const crop = options.crop ?? 'full'
  const drawing = { pack, pen, size, you: options.you ?? null, windows: options.windows ?? null }
  const step = options.step
  const view = viewOf(pack, crop, counterMargins(options, pen.pxPerMetre, size), pen)
  const drawn =
    step === 'all'
      ? counterOverview(diagram, { ...drawing, defenders: options.defenders ?? false })
      : counterStep(diagram, step, {
          ...drawing,
          defenders: options.defenders ?? true,
          ghosts: options.ghosts ?? true,
        })
  return {
    view,
    nodes: [
      ...counterGround(options, pen, step !== 'all'),
      ...drawn.nodes,
      ...(drawn.passes.length > 0
        ? [
            verdictWords(
              drawn.passes,
              // Words never climb into the ruler.
              grown(options.ruler ? { ...view, y: 0, height: view.height + view.y } : view, -pen.px(2)),
              drawn.tokens.map((at) => around(at, size.r)),
              pen,
            ),
          ]
        : []),
      ...counterRuler(options, pen),
    ],
    description: counterSentence(diagram, step),
  }
}

/** What lies under our way: the court, the opponent's traps and pick-up, the room that is left. */
export function counterGround(options: CounterGroundOptions, pen: Pen, faint: boolean): GroupNode[] {
  const { pack, zones = [], room, pickup } = options
  const medium = options.medium ?? ((options.small ?? pen.pxPerMetre < 18) ? 'small' : 'screen')
  const boxes = zones.flatMap((zone) => zoneBox(pack, zone, pen) ?? [])
  const words = pickup && `pick up: ${pickup.k} of ${pickup.n}${pickup.thin ? ', thin' : ''}`
  return [
    courtLines(pack, pen),
    ...(zones.length > 0 ? [trapZones(pack, zones, pen, medium, faint)] : []),
    ...(pickup && words ? [pickupFront(pack, pickup.at, pickup.thin, boxes, pen, words).node] : []),
    ...(room ? [roomNode(roomBox(pack, room.lane, room.ballSide ?? 'right'), pen, 'room')] : []),
  ]
}

/** The court's edge as time, where it is asked for. */
export function counterRuler(options: CounterGroundOptions, pen: Pen): GroupNode[] {
  if (!options.ruler) return []
  return [
    countRuler(options.pack, cropEnd(options.pack, options.crop ?? 'full'), pen, {
      throwIn: options.throwInRuler ?? false,
      ballBySecond: options.ballBySecond,
      type: RULER_TYPE,
    }),
  ]
}

const around = ({ x, y }: Point, r: number): Box => ({ x: x - r, y: y - r, width: 2 * r, height: 2 * r })

/** What a drawing says in words. */
export function counterSentence(diagram: Diagram, step: number | 'all'): string {
  if (step === 'all') return ballWaySentence(diagram)
  const title = diagram.steps[step]?.title
  if (title === undefined) return ballWaySentence(diagram)
  return `Step ${step + 1} of ${diagram.steps.length}, ${title}: ${stepInWords(diagram, step)}`
}

/** px per metre at which the counter drawing of these options is `widthPx` wide. */
export function counterScale(
  options: CounterGroundOptions & Pick<CounterSceneOptions, 'diagram' | 'tokenRadius'>,
  widthPx: number,
): number {
  // Margins depend a little on the scale (tokens are set in px, places in metres): two rounds settle it.
  let scale = widthPx / options.pack.court.length
  for (let round = 0; round < 3; round += 1) {
    const small = options.small ?? scale < 18
    const size = tokenSize(penOf(scale), small, options.tokenRadius)
    scale = scaleToFit(options.pack, options.crop ?? 'full', counterMargins(options, scale, size), widthPx)
  }
  return scale
}

/** Room for whoever stands off the court, tokens whole. */
export function counterMargins(
  options: CounterGroundOptions & Pick<CounterSceneOptions, 'diagram'>,
  pxPerMetre: number,
  size: TokenSize,
): Margins {
  const { pack, diagram } = options
  const places = [
    ...diagram.start.ours.map(({ at }) => at),
    ...walkDiagram(diagram).flatMap(({ after }) => [...after.ours.values()]),
  ].map((place) => toMetres(pack, place))
  const reach = size.r * 1.6
  const over = (metres: number) => Math.max(0, metres) * pxPerMetre + 3
  const most = (list: number[]) => Math.max(0, ...list)
  const left = most(places.filter((at) => at.x < size.r).map((at) => reach - at.x))
  const ruler = options.ruler
    ? rulerMargins(options.throwInRuler ?? false, RULER_TYPE, (options.ballBySecond ?? []).length > 0)
    : { top: 0, left: 0 }
  return {
    left: Math.max(ruler.left, over(Math.max(THROWER_ROOM, left))),
    right: over(
      most(
        places
          .filter((at) => at.x > pack.court.length - size.r)
          .map((at) => at.x + reach - pack.court.length),
      ),
    ),
    top: Math.max(ruler.top, over(most(places.filter((at) => at.y < size.r).map((at) => reach - at.y)))),
    bottom: over(
      most(
        places.filter((at) => at.y > pack.court.width - size.r).map((at) => at.y + reach - pack.court.width),
      ),
    ),
  }
}

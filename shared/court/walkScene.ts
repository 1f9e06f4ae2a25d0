import type { Role } from '../vocabulary'
import { counterGround, counterMargins, counterRuler, type CounterGroundOptions } from './counterScene'
import { stepMoves } from './counterStep'
import type { Diagram } from './diagram'
import { penOf, type Pen } from './pen'
import type { GroupNode, Scene } from './scene'
import { ballAt, ourToken, theirToken, tokenSize, type TokenSize } from './tokens'
import { viewOf } from './view'
import { written } from './written'
import type { Verdict } from './walk/laneWindow'
import type { WalkStanding } from './walk/standing'

export interface WalkSceneOptions extends CounterGroundOptions {
  diagram: Diagram
  pxPerMetre: number
  /** Where everybody is at the moment shown: standingAt(). */
  standing: WalkStanding
  /** The step whose moves are drawn under the tokens; none by default. */
  step?: number | null
  you?: Role | null
  tokenRadius?: number
  /** Default true. */
  defenders?: boolean
  windows?: ReadonlyMap<string, Verdict> | null
  /**
   * `ground` is what stands still (court, traps, ruler, the step's moves), `moving` the tokens and the ball: two
   * drawings with one view, so that a frame redraws only the second. Default: both in one.
   */
  part?: 'all' | 'ground' | 'moving'
}

/** A lob at its top is drawn this much larger for every metre over a hand's height. */
const NEARER_PER_METRE = 0.12
const HAND = 2

/** A counter at one moment of its walk. The view is that of counterScene with the same options. */
export function walkScene(options: WalkSceneOptions): Scene {
  const { diagram, pack, standing, part = 'all' } = options
  const pen = penOf(options.pxPerMetre)
  const small = options.small ?? pen.pxPerMetre < 18
  const size = tokenSize(pen, small, options.tokenRadius)
  const ground = part !== 'moving'
  const moving = part !== 'ground'
  return {
    view: viewOf(pack, options.crop ?? 'full', counterMargins(options, pen.pxPerMetre, size), pen),
    nodes: [
      ...(ground ? counterGround(options, pen, true) : []),
      ...(ground ? moves(options, pen, size) : []),
      ...(moving ? players(options, pen, size) : []),
      ...(ground ? counterRuler(options, pen) : []),
    ],
    description: walkSentence(diagram, standing),
  }
}

function moves(options: WalkSceneOptions, pen: Pen, size: TokenSize): GroupNode[] {
  const { diagram, pack, step } = options
  if (step === undefined || step === null) return []
  const { nodes } = stepMoves(diagram, step, {
    pack,
    pen,
    size,
    you: options.you ?? null,
    defenders: options.defenders ?? true,
    windows: options.windows ?? null,
  })
  return [{ kind: 'group', id: 'moves', nodes }, ...written(diagram.steps[step]?.words, { pack, pen, size })]
}

/** Solid is the reader alone, or who has the ball and who is about to. */
function players(options: WalkSceneOptions, pen: Pen, size: TokenSize): GroupNode[] {
  const { standing, you } = options
  const { ball } = standing
  const onBall = (role: Role): boolean =>
    ball.flight ? role === ball.flight.by || role === ball.flight.to : role === ball.holder
  const theirs =
    options.defenders === false ? [] : [...standing.theirs].map(([id, at]) => theirToken(at, id, size, pen))
  const ours = [...standing.ours].map(([role, at]) =>
    ourToken(at, role, you ? role === you : onBall(role), size, pen),
  )
  const nearer = 1 + NEARER_PER_METRE * Math.max(0, (ball.height ?? HAND) - HAND)
  return [
    { kind: 'group', id: 'theirs', nodes: theirs },
    { kind: 'group', id: 'tokens', nodes: ours },
    ballAt(ball.at, size, pen, nearer),
  ]
}

/** What a moment shows, for who cannot see it. */
function walkSentence(diagram: Diagram, { ball }: WalkStanding): string {
  if (ball.flight) return `The ball is on its way from ${ball.flight.by} to ${ball.flight.to}.`
  return `${ball.holder ?? diagram.start.ball} has the ball.`
}

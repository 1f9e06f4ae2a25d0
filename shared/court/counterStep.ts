import type { Role } from '../vocabulary'
import { bent, keptInside, straight, trimmed, type Curve } from './curve'
import type { Diagram } from './diagram'
import { stateAt, walkDiagram, type WalkedMove, type WalkedStep } from './diagramWalk'
import { toMetres, type InFractions, type InMetres } from './frame'
import { BESIDE, movement } from './movement'
import { PASS_STROKES, type MarkedPass } from './passMark'
import type { Point } from './path'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, SceneNode } from './scene'
import { ballAt, ghost, ourToken, theirToken, type TokenSize } from './tokens'
import { written } from './written'
import type { Verdict } from './walk/laneWindow'

export interface Drawing {
  pack: RulePack
  pen: Pen
  size: TokenSize
  you: Role | null
  defenders: boolean
  /** Verdicts of passes by "step-move": the line says whether the pass is on. */
  windows?: ReadonlyMap<string, Verdict> | null
}

/** What is drawn of a counter, and what its words must keep clear of. */
export interface Drawn {
  nodes: GroupNode[]
  /** Passes that carry a verdict. */
  passes: MarkedPass[]
  /** Middles of all tokens, metres. */
  tokens: Point[]
}

/** One step: tokens where it starts, everything that happens in it as movement, last step as ghosts. */
export function counterStep(diagram: Diagram, index: number, drawing: Drawing & { ghosts: boolean }): Drawn {
  const { pack, pen, size } = drawing
  const step = stateAt(diagram, index)
  const metres = (place: InFractions): InMetres => toMetres(pack, place)
  const onWay = ballWay(step)
  const tokens = [...step.before.ours].map(([role, place]) =>
    ourToken(metres(place), role, drawing.you ? role === drawing.you : onWay.has(role), size, pen),
  )
  const holder = step.before.ours.get(step.before.ball)
  const theirs = drawing.defenders
    ? [...step.before.theirs].map(([id, place]) => theirToken(metres(place), id, size, pen))
    : []
  const moves = stepMoves(diagram, index, drawing)
  const standing = [...step.before.ours.values(), ...(drawing.defenders ? step.before.theirs.values() : [])]
  return {
    nodes: [
      { kind: 'group', id: 'ghosts', nodes: drawing.ghosts ? ghosts(diagram, index, step, drawing) : [] },
      { kind: 'group', id: 'moves', nodes: moves.nodes },
      { kind: 'group', id: 'theirs', nodes: theirs },
      { kind: 'group', id: 'tokens', nodes: tokens },
      ...(holder ? [ballAt(metres(holder), size, pen)] : []),
      ...written(diagram.steps[index]?.words, drawing),
    ],
    passes: moves.passes,
    tokens: standing.map(metres),
  }
}

/** Everything that happens in a step, as movement. */
export function stepMoves(
  diagram: Diagram,
  index: number,
  drawing: Drawing,
): { nodes: GroupNode[]; passes: MarkedPass[] } {
  const step = stateAt(diagram, index)
  const passes: MarkedPass[] = []
  const nodes = oursOnTop(step.moves).flatMap((move) => stepMove(move, index, step, drawing, passes))
  return { nodes, passes }
}

/** Our way lies over theirs. */
const oursOnTop = (moves: readonly WalkedMove[]): WalkedMove[] =>
  [...moves].sort((a, b) => Number(b.move.kind === 'theirs') - Number(a.move.kind === 'theirs'))

/** Whoever has the ball at some moment of a step. */
function ballWay(step: WalkedStep): Set<Role> {
  const roles = new Set<Role>([step.before.ball])
  for (const { move } of step.moves) if (move.kind === 'pass') roles.add(move.from).add(move.to)
  return roles
}

function ghosts(
  diagram: Diagram,
  index: number,
  step: WalkedStep,
  { pack, pen, size }: Drawing,
): SceneNode[] {
  const before = walkDiagram(diagram)[index - 1]?.before
  if (!before) return []
  return [...before.ours].flatMap(([role, place]) => {
    const now = step.before.ours.get(role)
    if (!now) return []
    const [was, is] = [toMetres(pack, place), toMetres(pack, now)]
    return Math.hypot(was.x - is.x, was.y - is.y) < size.r ? [] : [ghost(was, size, pen)]
  })
}

function stepMove(
  walked: WalkedMove,
  step: number,
  { before, moves }: WalkedStep,
  drawing: Drawing,
  passes: MarkedPass[],
): GroupNode[] {
  const { pack, pen, size } = drawing
  const { move } = walked
  if (move.kind === 'theirs' && !drawing.defenders) return []
  const [from, to] = [toMetres(pack, walked.from), toMetres(pack, walked.to)]
  const bend = 'bend' in move ? move.bend : 0
  const kind = move.kind === 'theirs' ? 'cut' : move.kind
  const tokens = [...before.ours.values(), ...before.theirs.values()].map((place) => toMetres(pack, place))
  const stands = (at: InMetres) => tokens.some((token) => Math.hypot(token.x - at.x, token.y - at.y) < size.r)
  // A pass and its receiver's own way meet in one place: both stop a token short of it.
  const meets = moves.some(
    (other) =>
      other !== walked &&
      (other.move.kind === 'pass' || move.kind === 'pass') &&
      other.to.x === walked.to.x &&
      other.to.y === walked.to.y,
  )
  const startGap = stands(from) ? size.r + pen.px(2) : move.kind === 'pass' ? size.r * 0.6 : 0
  const endGap = stands(to) ? size.r + pen.px(3) : meets ? size.r * 0.8 : 0
  const way = trimmed(walkedWay(pack, from, to, bend), startGap, endGap)
  const name = `${step}-${walked.index}`
  const verdict = move.kind === 'pass' ? drawing.windows?.get(name) : undefined
  if (verdict) passes.push({ id: name, way, verdict })
  const nodes = movement(
    kind,
    way,
    pen,
    move.kind === 'theirs' ? 'their' : 'our',
    verdict ? PASS_STROKES[verdict] : move.kind === 'theirs' ? { emphasis: BESIDE } : {},
  )
  return nodes.length === 0 ? [] : [{ kind: 'group', id: `move-${name}`, nodes }]
}

/** A walk from one place to another; its swing stays 30 cm inside the lines. */
export function walkedWay(pack: RulePack, from: InMetres, to: InMetres, bend: number): Curve {
  if (bend === 0) return straight(from, to)
  const edge = 0.3
  const { length, width } = pack.court
  return keptInside(bent(from, to, bend), {
    x: edge,
    y: edge,
    width: length - 2 * edge,
    height: width - 2 * edge,
  })
}

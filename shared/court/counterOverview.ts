import type { Role } from '../vocabulary'
import { walkedWay, type Drawing, type Drawn } from './counterStep'
import { bent, distance, pointAt, lengthOf, startOf, straight, through, trimmed, type Curve } from './curve'
import type { Diagram, Move } from './diagram'
import { startOfDiagram, walkDiagram, type WalkedMove } from './diagramWalk'
import { toMetres, type InMetres } from './frame'
import type { RulePack } from './rulePacks'
import { BESIDE, movement, type LineStyle } from './movement'
import { PASS_STROKES, type MarkedPass } from './passMark'
import type { GroupNode, SceneNode } from './scene'
import { ballAt, ourToken, theirToken } from './tokens'

/** Metres: a walk shorter than this before a catch is not drawn; the token where it catches says enough. */
const SHORT_WALK = 2.2

/** Somebody on the ball's way: who, and where the ball is caught. */
interface Catch {
  role: Role
  at: InMetres
}

/** One walk of a player without the ball, from where it is last drawn. */
interface Walk {
  role: Role
  from: InMetres
  legs: { to: InMetres; bend: number; screen: boolean }[]
  /** Ends where the ball is caught, so at a token. */
  caught: boolean
  /** Begins where the ball was passed on: drawn only if the ball comes back. */
  passed: boolean
}

/**
 * The whole way in one drawing: where each of ours starts, the ball's way with whoever carries it solid at
 * the place of the catch, and the walk of everybody else as one line.
 */
export function counterOverview(diagram: Diagram, drawing: Drawing): Drawn {
  const { pack, pen, size } = drawing
  const start = startOfDiagram(diagram)
  const trip = new Trip(diagram, drawing)
  walkDiagram(diagram).forEach(({ moves }, step) => {
    for (const walked of moves) trip.take(walked, step)
  })
  const walks = trip.finish()
  const theirs = drawing.defenders
    ? [...start.theirs].map(([id, place]) => theirToken(toMetres(pack, place), id, size, pen))
    : []
  const tokens: GroupNode[] = []
  for (const walk of walks) {
    if (trip.catches.some(({ role, at }) => role === walk.role && distance(at, walk.from) < size.r)) continue
    const solid = drawing.you === walk.role
    tokens.push(ourToken(walk.from, walk.role, solid, size, pen, `start-${walk.role}-${tokens.length}`))
  }
  // Whoever catches twice has two tokens; every part of a drawing has a name of its own.
  const seen = new Map<Role, number>()
  const catchId = (role: Role): string => {
    const times = (seen.get(role) ?? 0) + 1
    seen.set(role, times)
    return times === 1 ? `token-${role}` : `token-${role}-${times}`
  }
  for (const { role, at } of trip.catches)
    tokens.push(ourToken(at, role, drawing.you ? drawing.you === role : true, size, pen, catchId(role)))
  const first = start.ours.get(start.ball)
  return {
    nodes: [
      { kind: 'group', id: 'walks', nodes: walks.flatMap((walk, i) => walkNodes(walk, i, drawing)) },
      { kind: 'group', id: 'ball-way', nodes: trip.ballWay },
      { kind: 'group', id: 'theirs', nodes: theirs },
      { kind: 'group', id: 'tokens', nodes: tokens },
      ...(first ? [ballAt(toMetres(pack, first), size, pen)] : []),
    ],
    passes: trip.passes,
    tokens: [
      ...walks.map(({ from }) => from),
      ...trip.catches.map(({ at }) => at),
      ...(drawing.defenders ? [...start.theirs.values()].map((place) => toMetres(pack, place)) : []),
    ],
  }
}

/** Follows a trip move by move and keeps what its overview needs. */
class Trip {
  readonly catches: Catch[] = []
  readonly ballWay: GroupNode[] = []
  readonly passes: MarkedPass[] = []
  private readonly pending = new Map<Role, Walk>()
  private readonly done: Walk[] = []
  private ballAt: InMetres
  private holder: Role
  private carry: { kind: 'dribble' | 'cut'; curve: Curve } | null = null

  constructor(
    diagram: Diagram,
    private readonly drawing: Drawing,
  ) {
    const start = startOfDiagram(diagram)
    this.holder = start.ball
    for (const [role, place] of start.ours)
      this.pending.set(role, {
        role,
        from: toMetres(drawing.pack, place),
        legs: [],
        caught: false,
        passed: false,
      })
    const first = this.pending.get(start.ball)
    this.ballAt = first?.from ?? toMetres(drawing.pack, { x: 0, y: 0.5 })
    if (first) {
      this.catches.push({ role: start.ball, at: first.from })
      this.pending.delete(start.ball)
    }
  }

  take({ move, index, to: place }: WalkedMove, step: number): void {
    const to = toMetres(this.drawing.pack, place)
    if (move.kind === 'theirs') return
    if (move.kind === 'pass') return this.pass(move, to, `${step}-${index}`)
    if (move.kind === 'dribble' && move.who === this.holder) return this.ballMove('dribble', to, move.bend)
    if (move.who === this.holder) return this.ballMove('cut', to, 'bend' in move ? move.bend : 0)
    this.pending
      .get(move.who)
      ?.legs.push({ to, bend: 'bend' in move ? move.bend : 0, screen: move.kind === 'screen' })
  }

  /** Walks that are worth a line; short ones that end in a catch are told by the token there. */
  finish(): Walk[] {
    this.drawCarry()
    const left = [...this.pending.values()].filter((walk) => !walk.passed)
    return [...this.done.filter((walk) => walkLength(walk) > SHORT_WALK), ...left]
  }

  private pass(move: Extract<Move, { kind: 'pass' }>, to: InMetres, name: string): void {
    this.drawCarry()
    const walk = this.pending.get(move.to)
    if (walk) {
      this.pending.delete(move.to)
      this.done.push({ ...walk, caught: true })
    }
    const { size, pen } = this.drawing
    const atToken = this.catches.some(({ at }) => distance(at, this.ballAt) < size.r)
    const way = trimmed(
      straight(this.ballAt, to),
      atToken ? size.r + pen.px(2) : pen.px(4),
      size.r + pen.px(3),
    )
    const verdict = this.drawing.windows?.get(name)
    if (verdict) this.passes.push({ id: name, way, verdict })
    this.push('pass', way, verdict && PASS_STROKES[verdict])
    // Whoever has passed is drawn no further, unless the ball comes back.
    if (this.holder !== move.to)
      this.pending.set(this.holder, {
        role: this.holder,
        from: this.ballAt,
        legs: [],
        caught: false,
        passed: true,
      })
    const known = this.catches.some(({ role, at }) => role === move.to && distance(at, to) < size.r * 2)
    if (!known) this.catches.push({ role: move.to, at: to })
    this.ballAt = to
    this.holder = move.to
  }

  /** Legs of one carry are drawn as one way, with one arrow. */
  private ballMove(kind: 'dribble' | 'cut', to: InMetres, bend: number): void {
    if (this.carry && this.carry.kind !== kind) this.drawCarry()
    this.carry = { kind, curve: [...(this.carry?.curve ?? []), ...bent(this.ballAt, to, bend)] }
    this.ballAt = to
  }

  private drawCarry(): void {
    if (!this.carry) return
    const { size, pen } = this.drawing
    const start = startOf(this.carry.curve)
    const atToken = this.catches.some(({ at }) => distance(at, start) < size.r)
    this.push(this.carry.kind, trimmed(this.carry.curve, atToken ? size.r + pen.px(2) : 0, 0))
    this.carry = null
  }

  private push(kind: 'pass' | 'dribble' | 'cut', way: Curve, style: LineStyle = {}): void {
    const nodes = movement(kind, way, this.drawing.pen, 'our', style)
    if (nodes.length > 0) this.ballWay.push({ kind: 'group', id: `ball-way-${this.ballWay.length}`, nodes })
  }
}

const walkLength = ({ from, legs }: Walk): number =>
  legs.reduce(([length, at], leg): [number, InMetres] => [length + distance(at, leg.to), leg.to], [
    0,
    from,
  ] as [number, InMetres])[0]

function walkNodes(walk: Walk, index: number, { pack, pen, size }: Drawing): SceneNode[] {
  const curve = walkCurve(pack, walk)
  if (curve.length === 0) return []
  const way = trimmed(curve, size.r + pen.px(2), walk.caught ? size.r + pen.px(3) : 0)
  const nodes = movement(walk.legs.at(-1)?.screen ? 'screen' : 'cut', way, pen, 'our', {
    emphasis: BESIDE,
  })
  return nodes.length === 0 ? [] : [{ kind: 'group', id: `walk-${index}-${walk.role}`, nodes }]
}

/**
 * All legs as one line. Mostly one arc that bows to where the walk strayed furthest; only a walk that
 * doubles back (away and then to the ball) is drawn through every place.
 */
function walkCurve(pack: RulePack, walk: Walk): Curve {
  const { from, legs } = walk
  const [only] = legs
  const end = legs.at(-1)?.to
  if (!only || !end) return []
  if (legs.length === 1) return walkedWay(pack, from, end, only.bend)
  const chord = distance(from, end)
  if (chord < walkLength(walk) / 2) return through([from, ...legs.map(({ to }) => to)])
  return walkedWay(pack, from, end, bow(from, end, walk))
}

/** The furthest that a walk strays from the straight line, as a share of its length; + is to the right. */
function bow(from: InMetres, end: InMetres, { legs }: Walk): number {
  const chord = distance(from, end)
  let furthest = 0
  let at = from
  for (const { to, bend } of legs) {
    const swing = bent(at, to, bend)
    for (const point of [pointAt(swing, lengthOf(swing) / 2).point, to]) {
      const aside = (end.x - from.x) * (point.y - from.y) - (end.y - from.y) * (point.x - from.x)
      const share = aside / (chord * chord)
      if (Math.abs(share) > Math.abs(furthest)) furthest = share
    }
    at = to
  }
  return Math.max(-0.3, Math.min(0.3, furthest))
}

import type { Role } from '../../vocabulary'
import type { DefenderId, Move } from '../diagram'
import type { Standing, WalkedMove } from '../diagramWalk'
import { toMetres, type InMetres } from '../frame'
import type { RulePack } from '../rulePacks'
import { passFlight } from './passFlight'
import { ourSprint, theirSprint, type Sprint, type WalkSettings } from './settings'
import { sprintSeconds } from './sprint'
import type { BallFlight, Leg, TimedMove } from './timeline'
import { measuredWay } from './way'

type Pass = Extract<Move, { kind: 'pass' }>
type Walk = Exclude<Move, Pass>
type Walker = Role | DefenderId

interface Kept {
  start: InMetres
  at: InMetres
  legs: Leg[]
}

/** A walk with the ball in hand: its leg says when the ball passes half. */
export interface Carry {
  step: number
  index: number
  leg: Leg
}

/** Runs a trip beat by beat and keeps when everybody, and the ball, is free again. */
export class TripClock {
  /** When the latest beat began. */
  now = 0
  readonly moves: TimedMove[] = []
  readonly flights: BallFlight[] = []
  readonly carries: Carry[] = []
  readonly ours: Map<Role, Kept>
  readonly theirs: Map<DefenderId, Kept>
  private readonly free = new Map<Walker, number>()
  /** Whoever is screened for does not go before this. */
  private readonly screened = new Map<Role, number>()
  private holder: Role
  private ballFree = 0
  private begun = false

  constructor(
    start: Standing,
    private readonly pack: RulePack,
    private readonly settings: WalkSettings,
  ) {
    const kept = (place: { x: number; y: number }): Kept => {
      const at = toMetres(pack, place)
      return { start: at, at, legs: [] }
    }
    this.ours = new Map([...start.ours].map(([role, place]) => [role, kept(place)]))
    this.theirs = new Map([...start.theirs].map(([id, place]) => [id, kept(place)]))
    this.holder = start.ball
  }

  /** Times the moves of one step; a step without moves takes no time. */
  step(index: number, walked: readonly WalkedMove[]): { start: number; end: number } {
    const first = this.moves.length
    let start: number | null = null
    const beats = new Map<number, WalkedMove[]>()
    for (const one of walked) beats.set(one.move.beat, [...(beats.get(one.move.beat) ?? []), one])
    for (const [, beat] of [...beats].sort(([a], [b]) => a - b)) {
      this.beat(index, beat)
      start ??= this.now
    }
    const ends = this.moves.slice(first).map(({ end }) => end)
    return { start: start ?? this.now, end: Math.max(this.now, ...ends) }
  }

  private beat(step: number, beat: readonly WalkedMove[]): void {
    const began = this.begins(beat)
    this.now = began
    this.begun = true
    for (const one of inOrder(beat, this.holder)) {
      if (one.move.kind === 'pass') this.pass(step, one, one.move, began)
      else this.walk(step, one, one.move, began)
    }
  }

  /** A beat follows the last one's start and the ball's last move; the first begins at once. */
  private begins(beat: readonly WalkedMove[]): number {
    if (!this.begun) return 0
    const ballMoves = this.ballFree > 0 ? this.ballFree : 0
    const gap = this.settings.beatGap
    const dribblers = beat.flatMap(({ move }) => (move.kind === 'dribble' ? [this.freeAt(move.who)] : []))
    return Math.max(this.now + gap, ballMoves > 0 ? ballMoves + gap : 0, ...dribblers)
  }

  private freeAt(who: Walker): number {
    return this.free.get(who) ?? 0
  }

  private sprintOf(move: Walk): Sprint {
    if (move.kind === 'theirs') return theirSprint(this.settings)
    const sprint = ourSprint(this.settings, move.who)
    if (move.kind !== 'dribble') return sprint
    return { ...sprint, topSpeed: sprint.topSpeed * this.settings.dribbleShare }
  }

  private walk(step: number, { index }: WalkedMove, move: Walk, began: number): void {
    const kept = move.kind === 'theirs' ? this.theirs.get(move.who) : this.ours.get(move.who)
    if (!kept) return
    const carries = move.kind !== 'theirs' && move.who === this.holder
    const start = Math.max(
      began,
      this.freeAt(move.who),
      carries ? this.ballFree : 0,
      move.kind === 'theirs' ? 0 : (this.screened.get(move.who) ?? 0),
    )
    const from = kept.at
    const to = toMetres(this.pack, move.to)
    const way = measuredWay(this.pack, from, to, 'bend' in move ? move.bend : 0)
    const sprint = this.sprintOf(move)
    const end = start + sprintSeconds(sprint, way.length)
    const leg: Leg = { start, end, way, sprint }
    kept.legs.push(leg)
    kept.at = to
    this.free.set(move.who, end)
    this.moves.push({ step, index, move, from, to, start, end, length: way.length })
    if (move.kind === 'theirs') return
    this.screened.delete(move.who)
    if (move.kind === 'screen')
      this.screened.set(move.for, Math.max(this.screened.get(move.for) ?? 0, end + this.settings.screenWait))
    if (carries) {
      this.ballFree = end
      this.carries.push({ step, index, leg })
    }
  }

  private pass(step: number, { index }: WalkedMove, move: Pass, began: number): void {
    const [by, receiver] = [this.ours.get(move.from), this.ours.get(move.to)]
    if (!by || !receiver) return
    const [from, at] = [by.at, receiver.at]
    const length = Math.hypot(at.x - from.x, at.y - from.y)
    const { seconds, heightAt, top } = passFlight(move.flight, length, this.settings)
    const start = Math.max(began, this.ballFree, this.freeAt(move.from), this.freeAt(move.to) - seconds)
    const end = start + seconds
    this.flights.push({ step, index, by: move.from, to: move.to, start, end, from, at, heightAt, top })
    this.moves.push({ step, index, move, from, to: at, start, end, length })
    this.free.set(move.from, Math.max(this.freeAt(move.from), start))
    this.free.set(move.to, Math.max(this.freeAt(move.to), end))
    this.holder = move.to
    this.ballFree = end
  }
}

/**
 * The order in which the moves of a beat are timed; each player's own moves stay as they were written. Screens
 * come first, so that whoever uses one waits for it. Who passes and cuts in one beat passes first, from where
 * the beat found them; a dribbler dribbles first.
 */
function inOrder(beat: readonly WalkedMove[], holder: Role): WalkedMove[] {
  const walks = (who: Walker) => beat.filter(({ move }) => move.kind !== 'pass' && move.who === who)
  const passesOn =
    beat.some(({ move }) => move.kind === 'pass' && move.from === holder) &&
    !walks(holder).some(({ move }) => move.kind === 'dribble')
  const rank = ({ move }: WalkedMove): number => {
    if (move.kind === 'pass') return 2
    if (passesOn && move.who === holder) return 3
    return move.kind === 'screen' && walks(move.who).length === 1 ? 0 : 1
  }
  return [...beat].sort((a, b) => rank(a) - rank(b))
}

import type { Diagram, Move, Place } from '@shared/court/diagram'
import { toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { spotAt } from '@shared/court/trapSpots'

const FIBA = rulePack('fiba')
const { width: WIDTH } = FIBA.court
const onFloor = (place: Place) => toMetres(FIBA, place)
/** Metres a second: an honest cut, a dribble under pressure, a pass, a lob (judgement). */
const SPEED = { cut: 5.5, screen: 5.5, dribble: 4.8, pass: 11, lob: 10 }
const HALF = 0.5

export const metres = (a: Place, b: Place) => {
  const [from, to] = [onFloor(a), onFloor(b)]
  return Math.hypot(from.x - to.x, from.y - to.y)
}

/** Metres from p to the segment a-b, and how far along it (0 to 1) the nearest point lies. */
function offLane(p: Place, a: Place, b: Place): { off: number; along: number } {
  const [at, from, to] = [onFloor(p), onFloor(a), onFloor(b)]
  const [dx, dy] = [to.x - from.x, to.y - from.y]
  const [px, py] = [at.x - from.x, at.y - from.y]
  const along = Math.min(1, Math.max(0, (px * dx + py * dy) / (dx * dx + dy * dy)))
  return { off: Math.hypot(px - along * dx, py - along * dy), along }
}

export interface Walk {
  faults: string[]
  throwInAt: number
  /** Seconds from the first touch until the ball is over half; null if it never is. */
  overHalfAt: number | null
  firstCatch: Place | null
  firstCatchInCoffin: boolean
  catches: { who: string; at: Place; behind: boolean; middle: boolean; deep: boolean }[]
  thrower: string
  holder: string
  /** Metres that the thrower runs along the line with the ball in hand. */
  lineRun: number
}

const outside = ({ x, y }: Place) => x < 0 || x > 1 || y < 0 || y > 1

const where = (map: Map<string, Place>, who: string): Place => {
  const at = map.get(who)
  if (!at) throw new Error(`nobody called ${who} on the floor`)
  return at
}

/** Walks a counter beat by beat, as five players and five defenders would, and lists what could not happen. */
export function walk(diagram: Diagram): Walk {
  const ours = new Map<string, Place>(diagram.start.ours.map(({ role, at }) => [role, at]))
  const defenders = new Map<string, Place>(diagram.start.theirs.map(({ id, at }) => [id, at]))
  const faults: string[] = []
  const result: Walk = {
    faults,
    throwInAt: 0,
    overHalfAt: null,
    firstCatch: null,
    firstCatchInCoffin: false,
    catches: [],
    thrower: diagram.start.ball,
    holder: diagram.start.ball,
    lineRun: 0,
  }
  if (ours.size !== 5) faults.push('not five of ours')
  if (defenders.size !== 5) faults.push('not five of theirs')
  if (!outside(where(ours, result.thrower))) faults.push('the thrower stands in court')
  for (const [role, at] of ours)
    if (role !== result.thrower && outside(at)) faults.push(`${role} starts out of bounds`)
  for (const [id, at] of defenders) if (outside(at)) faults.push(`${id} starts out of bounds`)

  let live = false
  let clock = 0
  diagram.steps.forEach((step, index) => {
    const name = `step ${index + 1}`
    const beats = [...new Set(step.moves.map((move) => move.beat))].sort((a, b) => a - b)
    const run = new Map<string, number>()
    for (const beat of beats) {
      const moves = step.moves.filter((move) => move.beat === beat)
      let longest = 0
      const moved = new Set<string>()
      const steps: { who: string; length: number }[] = []
      for (const move of moves) {
        if (move.kind === 'pass') continue
        if (moved.has(move.who)) faults.push(`${name}: ${move.who} moves twice in one beat`)
        moved.add(move.who)
        const map = move.kind === 'theirs' ? defenders : ours
        const from = where(map, move.who)
        const length = metres(from, move.to)
        if (move.kind === 'dribble') {
          if (move.who !== result.holder || !live)
            faults.push(`${name}: ${move.who} dribbles without the ball`)
          if (length > 12) faults.push(`${name}: ${move.who} dribbles ${length.toFixed(1)} m`)
          if (result.overHalfAt === null && from.x < HALF && move.to.x >= HALF)
            result.overHalfAt = clock + (length * ((HALF - from.x) / (move.to.x - from.x))) / SPEED.dribble
        } else if (move.who === result.holder && live) faults.push(`${name}: ${move.who} walks with the ball`)
        if (move.kind !== 'theirs') {
          if (outside(move.to) && (live || move.who !== result.thrower))
            faults.push(`${name}: ${move.who} leaves the court`)
          if (!live && move.who === result.thrower) {
            if (!outside(move.to)) faults.push(`${name}: the thrower steps in before throwing`)
            if (from.x >= 0) faults.push(`${name}: the thrower runs along a sideline`)
            result.lineRun += length
          }
          longest = Math.max(longest, length / SPEED[move.kind])
        }
        steps.push({ who: move.who, length })
        run.set(move.who, (run.get(move.who) ?? 0) + length)
        map.set(move.who, move.to)
      }
      for (const move of moves) {
        if (move.kind !== 'pass') continue
        longest = Math.max(longest, doPass(move, name, moved))
      }
      for (const { who, length } of steps)
        if (who.startsWith('X') && length > longest * 6.5 + 0.6)
          faults.push(`${name}: ${who} covers ${length.toFixed(1)} m in ${longest.toFixed(2)} s`)
      if (live && result.firstCatch && moves.some((m) => m.kind === 'pass' && m.throwIn)) clock = 0
      else clock += longest
      if (!live) result.throwInAt = clock
      crowding(name)
    }
    for (const [who, length] of run)
      if (length > 10) faults.push(`${name}: ${who} runs ${length.toFixed(1)} m in one step`)
  })

  function doPass(move: Extract<Move, { kind: 'pass' }>, name: string, moved: Set<string>): number {
    if (move.from !== result.holder) faults.push(`${name}: ${move.from} passes without the ball`)
    if (move.from === move.to) faults.push(`${name}: ${move.from} passes to herself`)
    if (moved.has(move.to) || moved.has(move.from))
      faults.push(`${name}: ${move.from} to ${move.to} while one of them runs`)
    if (move.throwIn !== !live) faults.push(`${name}: the throw-in is marked wrong`)
    const [from, to] = [where(ours, move.from), where(ours, move.to)]
    const length = metres(from, to)
    const flight = length / (move.flight === 'lob' ? SPEED.lob : SPEED.pass)
    if (live && from.x >= HALF && to.x < HALF) faults.push(`${name}: back over half`)
    const offLines = Math.min(onFloor(to).x, onFloor(to).y, WIDTH - onFloor(to).y)
    if (offLines < 2) faults.push(`${name}: ${move.to} catches ${offLines.toFixed(1)} m off a line`)
    for (const [id, at] of defenders) {
      const { off, along } = offLane(at, from, to)
      const high = move.flight === 'lob' && along < 0.85
      if (off < (metres(at, from) < 1.6 ? 0.55 : 0.8) && !high)
        faults.push(`${name}: ${id} stands in the lane ${move.from} to ${move.to}, ${off.toFixed(2)} m`)
    }
    if (!live) {
      live = true
      if (from.x < 0 && Math.abs(from.y - 0.5) < 0.08) faults.push(`${name}: thrown from under the backboard`)
      result.firstCatch = to
      result.firstCatchInCoffin = spotAt(to).spot === 'coffin-corner'
      result.throwInAt = clock
    }
    if (result.overHalfAt === null && to.x >= HALF)
      result.overHalfAt = result.firstCatch === to ? 0 : clock + flight
    result.holder = move.to
    const mates = [...ours].filter(([role]) => role !== move.to).map(([, at]) => at)
    result.catches.push({
      who: move.to,
      at: to,
      behind: mates.some((at) => at.x < to.x - 0.02),
      middle: mates.some((at) => at.y > 0.33 && at.y < 0.67 && metres(at, to) < 11),
      deep: mates.some((at) => at.x > to.x + 0.1 && at.x >= 0.44),
    })
    return flight
  }

  function crowding(name: string) {
    const all = [...ours, ...defenders]
    all.forEach(([a, at], i) => {
      for (const [b, other] of all.slice(i + 1)) {
        const gap = metres(at, other)
        if (gap < 0.6) faults.push(`${name}: ${a} and ${b} stand ${gap.toFixed(2)} m apart`)
      }
    })
  }
  return result
}

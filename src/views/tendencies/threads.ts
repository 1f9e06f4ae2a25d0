import { toMetres } from '@shared/court/frame'
import type { RulePack } from '@shared/court/rulePacks'
import { spotCell, type SpotName, type SpotSide } from '@shared/court/trapSpots'
import type { PossessionRow } from '@shared/possessions/schemas'
import type { Evidence } from '@shared/tendencies/schemas'

/** Metres up court from the endline, seconds from the first touch in court. */
export interface ThreadPoint {
  x: number
  t: number
}

export type ThreadEnd = 'lost' | 'count' | 'through' | 'with-numbers'

/** One possession over the court's length (x) and its time (down). */
export interface Thread {
  id: string
  /** Place in the list, from 1. */
  number: number
  counted: boolean
  /** In order of time; a single point draws no line. */
  line: ThreadPoint[]
  traps: ThreadPoint[]
  end: { at: ThreadPoint; mark: ThreadEnd } | null
}

/** Points nearer in time than this are the same moment, seconds. */
const SAME_MOMENT = 0.15

/**
 * The threads of the rows that can be drawn: those with a track, a timed trap or a time of crossing. Where the
 * ball was in between is not known, so the line runs straight from one known place to the next.
 */
export function threadsOf(rows: Evidence['rows'], pack: RulePack): Thread[] {
  return rows.flatMap((row, index) => {
    const thread = threadOf(row.possession, row.counted, index + 1, pack)
    return thread.line.length === 0 && thread.end === null ? [] : [thread]
  })
}

export function threadOf(
  possession: PossessionRow,
  counted: boolean,
  number: number,
  pack: RulePack,
): Thread {
  const x = (place: { x: number; y: number }) => toMetres(pack, place).x
  const tracked = (possession.track ?? [])
    .filter((point) => point.t >= 0)
    .map((point): ThreadPoint => ({ x: x(point), t: point.t }))
  const traps = (Array.isArray(possession.traps) ? possession.traps : []).flatMap((trap): ThreadPoint[] =>
    trap.t === null ? [] : [{ x: x(trap), t: trap.t }],
  )
  const crossing: ThreadPoint[] =
    possession.crossedAt === null ? [] : [{ x: pack.court.length / 2, t: possession.crossedAt }]
  const line = [...tracked]
  for (const point of [...traps, ...crossing])
    if (!line.some((known) => Math.abs(known.t - point.t) < SAME_MOMENT)) line.push(point)
  line.sort((a, b) => a.t - b.t)
  const end = endOf(possession, line.at(-1), pack)
  if (end?.mark === 'count' && line.length > 0 && end.at.t > (line.at(-1)?.t ?? 0)) line.push(end.at)
  return { id: possession.id, number, counted, line, traps, end }
}

const MARKS: Partial<Record<NonNullable<PossessionRow['outcome']>, ThreadEnd>> = {
  'lost-live': 'lost',
  'lost-dead': 'lost',
  count: 'count',
  through: 'through',
  'foul-drawn': 'through',
  'through-with-numbers': 'with-numbers',
}

function endOf(possession: PossessionRow, last: ThreadPoint | undefined, pack: RulePack): Thread['end'] {
  const mark = possession.outcome === null ? undefined : MARKS[possession.outcome]
  if (!mark) return null
  // A throw-in count runs out before the clock of this drawing starts: the ball is still at the line.
  if (mark === 'count' && possession.outcomePlace === 'entry') return { at: { x: 0, t: 0 }, mark }
  if (!last) return null
  return { at: mark === 'count' ? { x: last.x, t: Math.max(last.t, pack.backcourtSeconds) } : last, mark }
}

/** The last second that the drawing shows: the count's end at least, even seconds, and never past three counts. */
export function lastSecond(threads: readonly Thread[], pack: RulePack): number {
  const latest = Math.max(
    pack.backcourtSeconds + 1,
    ...threads.flatMap(({ line }) => line.map((point) => point.t)),
  )
  return Math.min(2 * Math.ceil(latest / 2), 3 * pack.backcourtSeconds)
}

/** The stretch of the court that a trap habit is about, metres from the endline; null for other habits. */
export function stretchOf(habit: string, pack: RulePack): { from: number; to: number } | null {
  const [kind, spot = '', side = ''] = habit.split(':')
  if (kind !== 'trap-at') return null
  const cell = spotCell(spot as SpotName, (side === 'any' ? 'left' : side) as SpotSide)
  if (!cell) return null
  return { from: toMetres(pack, { x: cell.x0, y: 0 }).x, to: toMetres(pack, { x: cell.x1, y: 0 }).x }
}

import type { EntityManager } from 'typeorm'
import { ballBySecond, type BallSecond } from '@shared/court/ballBySecond'
import { TrackPoint } from '@shared/possessions/schemas'
import type { TendencyFilter } from '@shared/tendencies/schemas'
import { COVERED, JOINED, PRESSED, SOURCES } from './expressions'
import { situation } from './filters'

/** Marks of a stored track; none where it can no longer be read. */
function marksOf(text: string | null): TrackPoint[] {
  if (text === null) return []
  const parsed = TrackPoint.array().safeParse(JSON.parse(text))
  return parsed.success ? parsed.data : []
}

/**
 * Where the ball is second by second against their press: the pressed, covered rows of a situation whose track was
 * logged. A crossing without a track says only when, at half, and would draw every tick there.
 */
export async function ballAgainst(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
): Promise<BallSecond[]> {
  const where = situation(filter)
  const rows: { track: string | null; crossedAt: number | null }[] = await manager.query(
    `WITH ${SOURCES}
     SELECT p.track, p.crossedAt FROM ${JOINED}
      WHERE ${where.sql} AND ${PRESSED} AND ${COVERED} AND p.track IS NOT NULL`,
    [opponentId, opponentId, ...where.parameters],
  )
  return ballBySecond(rows.map(({ track, crossedAt }) => ({ track: marksOf(track), crossedAt })))
}

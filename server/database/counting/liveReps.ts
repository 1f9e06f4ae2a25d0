import type { EntityManager } from 'typeorm'

/** Live repetitions of a counter that were logged in practices: n run, k of them through where it was counted. */
export interface LoggedReps {
  counterId: string
  /** All live ones. */
  n: number
  /** Those of which it was counted who got through, and how many did. */
  counted: number
  k: number
}

/** Logged live reps of every counter of a team; practices that were thrown away do not count. */
export function countLoggedReps(manager: EntityManager, teamId: string): Promise<LoggedReps[]> {
  return manager.query(
    `SELECT r.counterId, sum(r.n) AS n, sum(CASE WHEN r.k IS NULL THEN 0 ELSE r.n END) AS counted,
            coalesce(sum(r.k), 0) AS k
       FROM practice_reps r JOIN practices p ON p.id = r.practiceId
      WHERE r.teamId = ? AND r.kind = 'live' AND p.deletedAt IS NULL
      GROUP BY r.counterId`,
    [teamId],
  )
}

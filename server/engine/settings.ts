import type { Strength } from '@shared/counterWords'
import { POOL, type PoolSettings } from '@shared/stats/pooling'
import { LEAST_FIT } from '@shared/stats/roles'

/** Every figure that a head coach may change; the defaults are RECORD.md sections 4 and 5. */
export interface EngineSettings {
  /** Games after which a row weighs half. */
  halfLifeGames: number
  /** How alike rows of one game are, while there are fewer games than `iccFromGames` to tell it from. */
  icc: number
  iccFromGames: number
  pool: PoolSettings
  /** Weight of a demand on the logit scale. */
  strengths: Record<Strength, number>
  /** Our own success against pressure before anything was counted, and how many trips that is worth. */
  basePrior: { rate: number; trips: number }
  /** How many trips the reasons are worth beside our own record with a counter. */
  priorTrips: number
  /** Weight of a trip of our record: against the shape they show most, another shape, in practice. */
  recordWeights: { sameShape: number; otherShape: number; practice: number }
  /** Expected successes this close are a tie. */
  tieWithin: number
  /** Live repetitions from which a counter is game-ready. */
  leastLiveReps: number
  /** Share of a role's needs that a player must meet to fill it (common practice, no source). */
  leastFit: number
}

export const ENGINE_DEFAULTS: EngineSettings = {
  halfLifeGames: 4,
  icc: 0.05,
  iccFromGames: 8,
  pool: POOL,
  strengths: { light: 0.2, medium: 0.4, strong: 0.7 },
  basePrior: { rate: 0.7, trips: 10 },
  priorTrips: 8,
  recordWeights: { sameShape: 1, otherShape: 0.25, practice: 0.25 },
  tieWithin: 0.02,
  leastLiveReps: 10,
  leastFit: LEAST_FIT,
}

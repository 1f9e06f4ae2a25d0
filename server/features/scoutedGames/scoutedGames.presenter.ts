import type { Coverage, ScoutedGameBody, ScoutedGameRow } from '@shared/scoutedGames/schemas'
import type { ScoutedGame } from '../../database/entities/ScoutedGame'
import { metaOf } from '../../http/present'

const coverageOf = (row: ScoutedGame): Coverage =>
  row.coverageKind === 'minutes'
    ? { kind: 'minutes', from: row.coverageFrom ?? 0, to: row.coverageTo ?? 0 }
    : { kind: row.coverageKind }

/** The stored row as the body that would have made it. */
export const bodyOfScoutedGame = (row: ScoutedGame): ScoutedGameBody => ({
  opponentId: row.opponentId,
  foe: row.foe,
  playedOn: row.playedOn,
  seen: row.seen,
  rulePack: row.rulePack,
  coverage: coverageOf(row),
  blowout: row.blowout,
  finalScore: row.finalScore,
  notes: row.notes,
})

export const presentScoutedGame = (
  row: ScoutedGame,
  counts: ScoutedGameRow['counts'] = { possessions: 0, pressed: 0, stills: 0 },
): ScoutedGameRow => ({
  ...metaOf(row),
  ...bodyOfScoutedGame(row),
  scout: row.scout?.name ?? null,
  counts,
})

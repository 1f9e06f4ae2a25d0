import type { Coverage, ScoutedGameBody, ScoutedGameRow } from '@shared/scoutedGames/schemas'
import type { ScoutedGame } from '../../database/entities/ScoutedGame'
import type { Listing } from '../../http/listing'
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

/** How the list of scouted games is searched and ordered. */
export const SCOUTED_GAME_LISTING: Listing<ScoutedGameRow, 'playedOn' | 'foe' | 'possessions' | 'pressed'> = {
  words: (row) => `${row.foe} ${row.scout ?? ''}`,
  by: {
    playedOn: (row) => row.playedOn,
    foe: (row) => row.foe,
    possessions: (row) => row.counts.possessions,
    pressed: (row) => row.counts.pressed,
  },
}

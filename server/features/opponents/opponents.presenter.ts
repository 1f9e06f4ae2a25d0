import type { OpponentRow } from '@shared/opponents/schemas'
import type { OpponentCounts } from '../../database/counting/opponentCounts'
import type { Opponent } from '../../database/entities/Opponent'
import type { Listing } from '../../http/listing'
import { metaOf } from '../../http/present'

const NOTHING: OpponentRow['counts'] = {
  scoutedGames: 0,
  ourGames: 0,
  possessions: 0,
  pressed: 0,
  pressable: 0,
  mostlyShape: null,
}

export const presentOpponent = (row: Opponent, counted: OpponentCounts | undefined): OpponentRow => ({
  ...metaOf(row),
  name: row.name,
  shortName: row.shortName,
  notes: row.notes,
  counts: counted?.counts ?? NOTHING,
  nextGame: counted?.nextGame ?? null,
})

/** How the list of opponents is searched and ordered. */
export const OPPONENT_LISTING: Listing<OpponentRow, 'meeting' | 'name' | 'possessions' | 'pressed'> = {
  words: (row) => `${row.name} ${row.shortName}`,
  by: {
    meeting: (row) => row.nextGame?.tipOff ?? null,
    name: (row) => row.name,
    possessions: (row) => row.counts.possessions,
    pressed: (row) => row.counts.pressed,
  },
}

import type { PossessionBody } from '@shared/possessions/schemas'
import type { ScoutedGameBody } from '@shared/scoutedGames/schemas'

/** A possession's body as columns; its traps have a table of their own. */
export const possessionColumns = ({ traps, ...columns }: PossessionBody) => ({
  ...columns,
  trapsLogged: traps === null ? null : Array.isArray(traps) ? ('seen' as const) : traps,
  deletedAt: null,
})

/** A possession's traps as rows of their table, in order; none when they were not logged or not visible. */
export const trapColumns = (possessionId: string, traps: PossessionBody['traps'], newId: () => string) =>
  Array.isArray(traps)
    ? traps.map((trap, index) => ({ ...trap, id: newId(), possessionId, position: index + 1 }))
    : []

/** A scouted game's header as columns. */
export const scoutedGameColumns = ({ coverage, ...columns }: ScoutedGameBody) => ({
  ...columns,
  coverageKind: coverage.kind,
  coverageFrom: coverage.kind === 'minutes' ? coverage.from : null,
  coverageTo: coverage.kind === 'minutes' ? coverage.to : null,
})

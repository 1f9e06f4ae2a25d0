import { In, type EntityManager } from 'typeorm'
import { z } from 'zod'
import { FieldChange } from '@shared/history/schemas'
import type { Fix, PossessionTable, TableGame, TableQuery, TableRow } from '@shared/possessions/table'
import {
  countTable,
  placeInTable,
  tableBars,
  tablePage,
  type RowGame,
} from '../../database/counting/possessionTable'
import { Change } from '../../database/entities/Change'
import { Possession } from '../../database/entities/Possession'
import { initialsOf } from '../session/session.presenter'
import { gameLabel } from '../tendencies/tendencies.presenter'
import { withParts } from './loadPossessions'
import { presentPossession } from './possessions.presenter'

const presentGame = (game: RowGame): TableGame => ({
  id: game.gameId,
  kind: game.kind,
  label: gameLabel(game),
  playedOn: game.day,
})

const Fields = z.array(FieldChange).catch([])

/** The last change of every field of some rows, by row. */
async function fixesOf(manager: EntityManager, ids: readonly string[]): Promise<Map<string, Fix[]>> {
  const changes = await manager.find(Change, {
    where: { rowId: In([...ids]), action: 'changed' },
    relations: { person: true },
    order: { at: 'ASC' },
  })
  const byRow = new Map<string, Map<string, Fix>>()
  for (const { id, rowId, at, person, fields } of changes) {
    const row = byRow.get(rowId) ?? new Map<string, Fix>()
    byRow.set(rowId, row)
    for (const { field, from } of Fields.parse(fields))
      row.set(field, { changeId: id, field, from, at, initials: person ? initialsOf(person.name) : null })
  }
  return new Map([...byRow].map(([id, fixes]) => [id, [...fixes.values()]]))
}

async function wholeRows(
  manager: EntityManager,
  page: Awaited<ReturnType<typeof tablePage>>,
): Promise<TableRow[]> {
  const ids = page.map(({ id }) => id)
  const found = await withParts(manager, await manager.findBy(Possession, { id: In(ids) }))
  const whole = new Map(found.map((entry) => [entry.row.id, entry]))
  const fixes = await fixesOf(manager, ids)
  return page.flatMap((row) => {
    const entry = whole.get(row.id)
    return entry
      ? [{ possession: presentPossession(entry), game: presentGame(row), fixes: fixes.get(row.id) ?? [] }]
      : []
  })
}

/** One page of an opponent's possessions as a table, and every row as a bar of the row ruler. */
export async function readTable(
  manager: EntityManager,
  opponentId: string,
  { sort, direction, offset: asked, limit, bars: wanted, row, ...filter }: TableQuery,
): Promise<PossessionTable> {
  const place =
    row === undefined ? null : await placeInTable(manager, opponentId, filter, { sort, direction, row })
  const offset = place === null ? asked : place - (place % limit)
  const page = await tablePage(manager, opponentId, filter, { sort, direction, offset, limit })
  const counted = await countTable(manager, opponentId, filter)
  const rows = await wholeRows(manager, page)
  if (wanted === 'no') return { rows, offset, ...counted, bars: null }
  const { bars, games } = await tableBars(manager, opponentId, filter)
  return {
    rows,
    offset,
    ...counted,
    bars: {
      games: games.map((game) => ({ ...presentGame(game), rows: game.rows })),
      ids: bars.map(({ id }) => id),
      numbers: bars.map(({ number }) => number),
      pressed: bars.map(({ pressed }) => pressed),
      shown: bars.map(({ shown }) => shown),
    },
  }
}

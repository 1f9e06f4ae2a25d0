import {
  PossessionList,
  PossessionRow,
  type PossessionInput,
  type PossessionPatch,
} from '@shared/possessions/schemas'
import {
  BatchResult,
  PossessionTable,
  type BatchBody,
  type PutBackBody,
  type TableQuery,
} from '@shared/possessions/table'
import { request, requestNothing, teamPath } from './http'

/** The rows of a game that a scout watched, in order. */
export function listPossessions(
  team: string,
  scoutedGame: string,
  signal?: AbortSignal,
): Promise<PossessionList> {
  return request('GET', teamPath(team, 'scouted-games', scoutedGame, 'possessions'), PossessionList, {
    signal,
  })
}

/** The rows of one of our own games, in order. */
export function listGamePossessions(
  team: string,
  game: string,
  signal?: AbortSignal,
): Promise<PossessionList> {
  return request('GET', teamPath(team, 'games', game, 'possessions'), PossessionList, { signal })
}

/** Creates with a new id; replaces the row when the version it is based on is given. */
export function putPossession(
  team: string,
  id: string,
  body: PossessionInput,
  version?: number,
): Promise<PossessionRow> {
  return request('PUT', teamPath(team, 'possessions', id), PossessionRow, { body, version })
}

/** Changes the fields given and leaves the others. */
export function patchPossession(
  team: string,
  id: string,
  body: PossessionPatch,
  version: number,
): Promise<PossessionRow> {
  return request('PATCH', teamPath(team, 'possessions', id), PossessionRow, { body, version })
}

/** Can be undone for ten minutes with `restorePossession`. */
export function deletePossession(team: string, id: string, version: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'possessions', id), { version })
}

export function restorePossession(team: string, id: string): Promise<PossessionRow> {
  return request('POST', teamPath(team, 'possessions', id, 'restore'), PossessionRow)
}

/** What the table may be asked; what is left out is not asked. */
export type TableAsk = { [K in keyof TableQuery]?: TableQuery[K] | undefined }

/** Possessions against an opponent: filtered, in any order, page by page, with every row as a bar. */
export function possessionTable(
  team: string,
  opponent: string,
  query: TableAsk = {},
  signal?: AbortSignal,
): Promise<PossessionTable> {
  return request('GET', teamPath(team, 'opponents', opponent, 'possessions'), PossessionTable, {
    query,
    signal,
  })
}

/** Changes one field in the rows that hold the old value. The same batch again changes nothing. */
export function changePossessions(team: string, body: BatchBody): Promise<BatchResult> {
  return request('POST', teamPath(team, 'possessions', 'batch'), BatchResult, { body })
}

/** Puts back what a batch changed, within a day. */
export function undoPossessions(team: string, batchId: string): Promise<BatchResult> {
  return request('POST', teamPath(team, 'possessions', 'batch', batchId, 'undo'), BatchResult)
}

/** Puts one field back to what it was before one line of the row's history. */
export function putBackPossession(
  team: string,
  id: string,
  body: PutBackBody,
  version: number,
): Promise<PossessionRow> {
  return request('POST', teamPath(team, 'possessions', id, 'put-back'), PossessionRow, { body, version })
}

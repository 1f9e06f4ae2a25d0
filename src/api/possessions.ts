import {
  PossessionList,
  PossessionRow,
  type PossessionInput,
  type PossessionPatch,
} from '@shared/possessions/schemas'
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

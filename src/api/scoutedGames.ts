import type { z } from 'zod'
import {
  ScoutedGameList,
  ScoutedGameRow,
  type ScoutedGameBody,
  type ScoutedGamesQuery,
} from '@shared/scoutedGames/schemas'
import { request, requestNothing, teamPath } from './http'

export function listScoutedGames(
  team: string,
  opponent: string,
  signal?: AbortSignal,
  query: ScoutedGamesQuery = {},
): Promise<ScoutedGameList> {
  return request('GET', teamPath(team, 'opponents', opponent, 'scouted-games'), ScoutedGameList, {
    query,
    signal,
  })
}

export function getScoutedGame(team: string, id: string, signal?: AbortSignal): Promise<ScoutedGameRow> {
  return request('GET', teamPath(team, 'scouted-games', id), ScoutedGameRow, { signal })
}

/** Creates with a new id; edits when the version it is based on is given. */
export function putScoutedGame(
  team: string,
  id: string,
  body: z.input<typeof ScoutedGameBody>,
  version?: number,
): Promise<ScoutedGameRow> {
  return request('PUT', teamPath(team, 'scouted-games', id), ScoutedGameRow, { body, version })
}

/** With its possessions; can be undone for ten minutes with `restoreScoutedGame`. */
export function deleteScoutedGame(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'scouted-games', id), { version })
}

export function restoreScoutedGame(team: string, id: string): Promise<ScoutedGameRow> {
  return request('POST', teamPath(team, 'scouted-games', id, 'restore'), ScoutedGameRow)
}

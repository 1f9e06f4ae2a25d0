import type { z } from 'zod'
import { GameList, GameRow, type GameBody, type GamesQuery } from '@shared/games/schemas'
import { request, requestNothing, teamPath } from './http'

/** Our own games, next meeting first. */
export function listGames(team: string, signal?: AbortSignal, query: GamesQuery = {}): Promise<GameList> {
  return request('GET', teamPath(team, 'games'), GameList, { query, signal })
}

export function getGame(team: string, id: string, signal?: AbortSignal): Promise<GameRow> {
  return request('GET', teamPath(team, 'games', id), GameRow, { signal })
}

/** Creates with a new id; edits when the version it is based on is given. */
export function putGame(
  team: string,
  id: string,
  body: z.input<typeof GameBody>,
  version?: number,
): Promise<GameRow> {
  return request('PUT', teamPath(team, 'games', id), GameRow, { body, version })
}

/** With its possessions, plans and practices; can be undone for ten minutes with `restoreGame`. */
export function deleteGame(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'games', id), { version })
}

export function restoreGame(team: string, id: string): Promise<GameRow> {
  return request('POST', teamPath(team, 'games', id, 'restore'), GameRow)
}

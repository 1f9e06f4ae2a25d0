import type { z } from 'zod'
import { GameList, GameRow, type GameBody } from '@shared/games/schemas'
import { request, teamPath } from './http'

/** Our own games, next meeting first. */
export function listGames(team: string, signal?: AbortSignal): Promise<GameList> {
  return request('GET', teamPath(team, 'games'), GameList, { signal })
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

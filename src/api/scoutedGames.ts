import type { z } from 'zod'
import { ScoutedGameList, ScoutedGameRow, type ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { request, teamPath } from './http'

export function listScoutedGames(
  team: string,
  opponent: string,
  signal?: AbortSignal,
): Promise<ScoutedGameList> {
  return request('GET', teamPath(team, 'opponents', opponent, 'scouted-games'), ScoutedGameList, { signal })
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

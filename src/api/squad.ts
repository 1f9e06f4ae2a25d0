import type { z } from 'zod'
import { SquadList, SquadPlayerRow, type SquadPlayerBody } from '@shared/squad/schemas'
import { request, teamPath } from './http'

export function listSquad(team: string, signal?: AbortSignal): Promise<SquadList> {
  return request('GET', teamPath(team, 'squad'), SquadList, { signal })
}

export function getSquadPlayer(team: string, id: string, signal?: AbortSignal): Promise<SquadPlayerRow> {
  return request('GET', teamPath(team, 'squad', id), SquadPlayerRow, { signal })
}

/** Adds with a new id; edits when the version it is based on is given. */
export function putSquadPlayer(
  team: string,
  id: string,
  body: z.input<typeof SquadPlayerBody>,
  version?: number,
): Promise<SquadPlayerRow> {
  return request('PUT', teamPath(team, 'squad', id), SquadPlayerRow, { body, version })
}

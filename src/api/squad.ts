import { SquadList, SquadPlayerRow } from '@shared/squad/schemas'
import { request, teamPath } from './http'

export function listSquad(team: string, signal?: AbortSignal): Promise<SquadList> {
  return request('GET', teamPath(team, 'squad'), SquadList, { signal })
}

export function getSquadPlayer(team: string, id: string, signal?: AbortSignal): Promise<SquadPlayerRow> {
  return request('GET', teamPath(team, 'squad', id), SquadPlayerRow, { signal })
}

import { TeamRow, type TeamBody } from '@shared/team/settings'
import { request, teamPath } from './http'

/** The team and what its head coach has set. */
export function getTeam(team: string, signal?: AbortSignal): Promise<TeamRow> {
  return request('GET', teamPath(team, 'settings'), TeamRow, { signal })
}

export function putTeam(team: string, body: TeamBody, version: number): Promise<TeamRow> {
  return request('PUT', teamPath(team, 'settings'), TeamRow, { body, version })
}

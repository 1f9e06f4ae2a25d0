import { StripList } from '@shared/opponents/strips'
import { request, teamPath } from './http'

/** The press of every opponent of a team, for the list. */
export function listStrips(team: string, signal?: AbortSignal): Promise<StripList> {
  return request('GET', teamPath(team, 'strips'), StripList, { signal })
}

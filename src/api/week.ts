import { Week } from '@shared/week/schemas'
import { request, teamPath } from './http'

/** The week of today, or the one that a calendar day lies in. */
export function getWeek(team: string, on: string | null, signal?: AbortSignal): Promise<Week> {
  return request('GET', teamPath(team, 'week'), Week, { signal, query: { on } })
}

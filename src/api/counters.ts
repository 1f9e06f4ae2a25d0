import { CounterList, CounterRow } from '@shared/counters/schemas'
import { request, requestNothing, teamPath } from './http'

export function listCounters(team: string, signal?: AbortSignal): Promise<CounterList> {
  return request('GET', teamPath(team, 'counters'), CounterList, { signal })
}

export function getCounter(team: string, id: string, signal?: AbortSignal): Promise<CounterRow> {
  return request('GET', teamPath(team, 'counters', id), CounterRow, { signal })
}

/** Refused while an open plan names it; can be undone for ten minutes with `restoreCounter`. */
export function deleteCounter(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'counters', id), { version })
}

export function restoreCounter(team: string, id: string): Promise<CounterRow> {
  return request('POST', teamPath(team, 'counters', id, 'restore'), CounterRow)
}

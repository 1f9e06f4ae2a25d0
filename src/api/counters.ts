import { CounterList, CounterRow } from '@shared/counters/schemas'
import { request, teamPath } from './http'

export function listCounters(team: string, signal?: AbortSignal): Promise<CounterList> {
  return request('GET', teamPath(team, 'counters'), CounterList, { signal })
}

export function getCounter(team: string, id: string, signal?: AbortSignal): Promise<CounterRow> {
  return request('GET', teamPath(team, 'counters', id), CounterRow, { signal })
}

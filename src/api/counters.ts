import { CounterPreview } from '@shared/counters/counterFile'
import { CounterList, CounterRow, type CounterInput, type CounterShow } from '@shared/counters/schemas'
import { request, requestNothing, teamPath } from './http'

/** The book, unless drafts, archived ones or all are asked for. */
export function listCounters(team: string, signal?: AbortSignal, show?: CounterShow): Promise<CounterList> {
  return request('GET', teamPath(team, 'counters'), CounterList, { signal, query: { show } })
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

/** Draws a counter or changes it; the book (`draft: false`) takes none with faults. */
export function putCounter(
  team: string,
  id: string,
  body: CounterInput,
  version?: number,
): Promise<CounterRow> {
  return request('PUT', teamPath(team, 'counters', id), CounterRow, { body, version })
}

/** Takes a counter out of the book; it keeps its record. */
export function archiveCounter(team: string, id: string, version?: number): Promise<CounterRow> {
  return request('POST', teamPath(team, 'counters', id, 'archive'), CounterRow, { version })
}

/** Puts an archived counter back in the book. */
export function unarchiveCounter(team: string, id: string, version?: number): Promise<CounterRow> {
  return request('POST', teamPath(team, 'counters', id, 'unarchive'), CounterRow, { version })
}

/** Notes that it was walked on a screen just now. */
export function noteWalked(team: string, id: string): Promise<CounterRow> {
  return request('POST', teamPath(team, 'counters', id, 'walked'), CounterRow)
}

/** What a file would bring; nothing is kept. */
export function previewCounterFile(team: string, file: unknown): Promise<CounterPreview> {
  return request('POST', teamPath(team, 'counters', 'preview'), CounterPreview, { body: file })
}

/** Where a counter can be fetched as a file. */
export const counterFileUrl = (team: string, id: string): string =>
  teamPath(team, 'counters', id, 'export.json')

import { History, News, type NewsQuery } from '@shared/history/schemas'
import { request, teamPath } from './http'

/** What happened to one row, oldest first. */
export function rowHistory(team: string, row: string, signal?: AbortSignal): Promise<History> {
  return request('GET', teamPath(team, 'history'), History, { query: { row }, signal })
}

/** What happened in the team since an instant, newest first; without one, in the last seven days. */
export function teamChanges(
  team: string,
  query: Pick<NewsQuery, 'since'> & { limit?: number } = {},
  signal?: AbortSignal,
): Promise<News> {
  return request('GET', teamPath(team, 'changes'), News, { query, signal })
}

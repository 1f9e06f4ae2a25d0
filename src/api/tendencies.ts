import { Evidence, TendencyRead, type TendencyFilter } from '@shared/tendencies/schemas'
import { request, teamPath } from './http'

/** Everything counted about one opponent inside the situation asked for. */
export function getTendencies(
  team: string,
  opponent: string,
  filter: TendencyFilter = {},
  signal?: AbortSignal,
): Promise<TendencyRead> {
  return request('GET', teamPath(team, 'opponents', opponent, 'tendencies'), TendencyRead, {
    query: { ...filter },
    signal,
  })
}

/** The rows behind one habit: those in n, and of each whether it is in k. */
export function getEvidence(
  team: string,
  opponent: string,
  habit: string,
  filter: TendencyFilter = {},
  page: { limit?: number; offset?: number } = {},
  signal?: AbortSignal,
): Promise<Evidence> {
  return request('GET', teamPath(team, 'opponents', opponent, 'evidence'), Evidence, {
    query: { ...filter, ...page, habit },
    signal,
  })
}

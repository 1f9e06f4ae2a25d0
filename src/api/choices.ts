import { Choices } from '@shared/choices/schemas'
import { request, teamPath } from './http'

/** The team's counters for one game, ranked, with every reason. */
export function getChoices(team: string, game: string, signal?: AbortSignal): Promise<Choices> {
  return request('GET', teamPath(team, 'games', game, 'choices'), Choices, { signal })
}

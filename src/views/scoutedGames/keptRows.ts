import type { ScoutedGameRow } from '@shared/scoutedGames/schemas'
import { outboxKey, recallAll } from '@/composables/kept'

/** How many possessions of each game wait on this device to be sent. */
export function keptRows(person: string, games: readonly ScoutedGameRow[]): Record<string, number> {
  return Object.fromEntries(
    games
      .map(({ id }) => [id, recallAll(outboxKey(person, id), () => true as const).length] as const)
      .filter(([, count]) => count > 0),
  )
}

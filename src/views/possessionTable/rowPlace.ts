import type { RouteLocationRaw } from 'vue-router'
import type { TableRow } from '@shared/possessions/table'
import { valueWords } from './fieldWords'
import { gameName } from './filterSlots'

/** The log with this row open: of the game that was scouted, or of our own. */
export function logOfRow({ possession }: TableRow, team: string): RouteLocationRaw | null {
  const game = possession.scoutedGameId ?? possession.gameId
  if (game === null) return null
  const name = possession.scoutedGameId === null ? 'game-log' : 'log'
  return { name, params: { team, game }, query: { row: possession.id } }
}

/** "Tarn Valley, 14 Mar, 6:44, down 3": where and when it was, as far as it was logged. */
export const whereWords = ({ possession, game }: TableRow): string =>
  [
    gameName(game),
    possession.clock === null ? '' : valueWords('clock', possession.clock),
    possession.margin === null ? '' : valueWords('margin', possession.margin),
  ]
    .filter(Boolean)
    .join(', ')

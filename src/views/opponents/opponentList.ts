import type { GameRow } from '@shared/games/schemas'
import type { OpponentRow } from '@shared/opponents/schemas'

/** One row of the page: the opponent, the meeting it is sorted by, and the work on that meeting. */
export interface Listed {
  opponent: OpponentRow
  /** The next meeting, or the last one when none is ahead. */
  meeting: { tipOff: string; place: 'home' | 'away' | 'neutral' } | null
  ahead: boolean
  game: GameRow | null
}

/** Next meeting first, then those with none ahead, latest first. */
export function listed(
  opponents: readonly OpponentRow[],
  games: readonly GameRow[],
  now: number,
): { ahead: Listed[]; behind: Listed[] } {
  const rows = opponents.map((opponent): Listed => {
    const theirs = games.filter((game) => game.opponentId === opponent.id)
    if (opponent.nextGame !== null) {
      const { id } = opponent.nextGame
      return {
        opponent,
        meeting: opponent.nextGame,
        ahead: true,
        game: theirs.find((game) => game.id === id) ?? null,
      }
    }
    const last = theirs
      .filter((game) => Date.parse(game.tipOff) <= now)
      .sort((a, b) => b.tipOff.localeCompare(a.tipOff))[0]
    return { opponent, meeting: last ?? null, ahead: false, game: last ?? null }
  })
  const time = (row: Listed) => (row.meeting === null ? 0 : Date.parse(row.meeting.tipOff))
  return {
    ahead: rows.filter((row) => row.ahead).sort((a, b) => time(a) - time(b)),
    behind: rows.filter((row) => !row.ahead).sort((a, b) => time(b) - time(a)),
  }
}

const NUMBERS = 'none one two three four five six seven eight nine ten eleven twelve'.split(' ')
const inWords = (count: number) => NUMBERS[count] ?? String(count)
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)

/** The counted sentence under the page's name. */
export function countedSentence(ahead: readonly Listed[], behind: readonly Listed[]): string {
  const sum = (key: 'possessions' | 'pressed' | 'scoutedGames' | 'ourGames') =>
    [...ahead, ...behind].reduce((total, row) => total + row.opponent.counts[key], 0)
  const behindWords = behind.length === 0 ? '' : `, ${inWords(behind.length)} with none ahead`
  const games = sum('scoutedGames') + sum('ourGames')
  const aheadWords = ahead.length === 0 ? 'no one' : inWords(ahead.length)
  const met = capital(`${aheadWords} ahead of us${behindWords}.`)
  if (sum('possessions') === 0) return `${met} Nothing counted yet.`
  return `${met} ${sum('possessions')} possessions counted in ${games} ${games === 1 ? 'game' : 'games'}, ${sum('pressed')} of them pressed.`
}

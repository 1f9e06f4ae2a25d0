import type { GameRow } from '@shared/games/schemas'
import type { ScoutedGameRow } from '@shared/scoutedGames/schemas'
import { calendarDay, shortDay } from '@/composables/when'

/** A game of theirs that can be counted. */
export interface GameChoice {
  id: string
  /** "Tarn Valley", or "against us". */
  label: string
  /** Calendar day in the team's zone. */
  playedOn: string
}

/** Their scouted games and the games that we have played against them, newest first. */
export function gameChoices(
  scouted: readonly ScoutedGameRow[],
  ours: readonly GameRow[],
  timeZone: string,
  now: number,
): GameChoice[] {
  return [
    ...scouted
      .filter(({ counts }) => counts.possessions > 0)
      .map(({ id, foe, playedOn }) => ({ id, label: `v ${foe}`, playedOn })),
    ...ours
      .filter(({ tipOff }) => Date.parse(tipOff) < now)
      .map(({ id, tipOff }) => ({ id, label: 'against us', playedOn: calendarDay(tipOff, timeZone) })),
  ].sort((a, b) => b.playedOn.localeCompare(a.playedOn))
}

const inView = (
  chosen: readonly string[] | undefined,
  games: readonly GameChoice[],
): readonly GameChoice[] => (chosen === undefined ? games : games.filter(({ id }) => chosen.includes(id)))

/** "All 3 games", "2 of 3 games", "The only game" */
export function gamesWords(chosen: readonly string[] | undefined, games: readonly GameChoice[]): string {
  if (games.length === 0) return 'No games yet'
  if (chosen === undefined) return games.length === 1 ? 'The only game' : `All ${games.length} games`
  return `${inView(chosen, games).length} of ${games.length} games`
}

/** "28 Feb", the weekday left away. */
const date = (day: string): string => shortDay(day).replace(/^\S+ /, '')

/** "28 Feb, 7 Mar, 14 Mar", oldest first; from the fifth on only the first and the last. */
export function datesWords(chosen: readonly string[] | undefined, games: readonly GameChoice[]): string {
  const days = inView(chosen, games)
    .map(({ playedOn }) => playedOn)
    .sort()
  const [first, last] = [days[0], days.at(-1)]
  if (first === undefined || last === undefined) return ''
  return days.length <= 4 ? days.map(date).join(', ') : `${date(first)} to ${date(last)}`
}

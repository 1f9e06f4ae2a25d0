import type { RouteLocationRaw } from 'vue-router'
import type { GameRow } from '@shared/games/schemas'
import { STATIONS, type Station } from '@shared/vocabulary'
import type { RailStation } from '@/components/railStations'
import { weekdayAndTime } from './when'

export interface Rail {
  stations: RailStation[]
  tipOff: { label: string; when: string }
}

const plural = (count: number, word: string) => `${count} ${count === 1 ? word : `${word}s`}`

/**
 * A game's way from Scout to Review: everything before its station is done, everything after it is ahead.
 * With `team` the stations that have a page lead to it.
 */
export function railOf(game: GameRow, timeZone: string, team?: string): Rail {
  const here = STATIONS.findIndex((station) => station.value === game.station)
  return {
    stations: STATIONS.map(({ value: station }, index) => ({
      station,
      state: index < here ? 'done' : index === here ? 'here' : 'ahead',
      what: whatOf(game, station, index - here, timeZone),
      ...(index === here && game.holder !== null ? { holder: game.holder.initials } : {}),
      ...(team === undefined ? {} : { to: pageOf(game, station, team) }),
    })),
    tipOff: { label: 'Tip-off', when: weekdayAndTime(game.tipOff, timeZone) },
  }
}

/** When a station of a game is due; the head coach's pick has a date of its own. */
export const dueOf = (game: Pick<GameRow, 'chooseBy' | 'due'>, station: Station): string | null =>
  station === 'choose' ? game.chooseBy : game.due[station]

function doneWords(game: GameRow, station: Station, timeZone: string): string {
  const [verb, at] =
    station === 'read'
      ? ['Signed off', game.read?.at ?? null]
      : station === 'choose'
        ? ['Signed off', game.plan?.signedAt ?? null]
        : ['', null]
  return at === null ? '' : `${verb} ${weekdayAndTime(at, timeZone)}`
}

function whatOf(game: GameRow, station: Station, ahead: number, timeZone: string): string {
  const { possessions, scoutedGames, ourGames } = game.counts
  if (station === 'scout' && possessions > 0)
    return `${plural(possessions, 'possession')}, ${plural(scoutedGames + ourGames, 'game')}`
  if (ahead < 0) return doneWords(game, station, timeZone)
  const due = dueOf(game, station)
  const dueWords = due === null ? '' : `due ${weekdayAndTime(due, timeZone)}`
  if (ahead > 0) return dueWords
  if (station === 'scout') return 'Nothing counted yet'
  if (station === 'review' && due === null) return ''
  const first = game.holder === null ? '' : `With ${game.holder.name.split(' ')[0] ?? game.holder.name}`
  return first !== '' && dueWords !== '' ? `${first}, ${dueWords}` : first || dueWords
}

function pageOf(game: GameRow, station: Station, team: string): RouteLocationRaw | undefined {
  if (station === 'scout') return { name: 'scouted-games', params: { team, opponent: game.opponentId } }
  if (station === 'read') return { name: 'read', params: { team, opponent: game.opponentId } }
  if (station === 'choose') return { name: 'choose', params: { team, game: game.id } }
  if (station === 'teach') return { name: 'teach', params: { team, game: game.id } }
  return undefined
}

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
      ...(index === here && game.headCoach !== null && station === 'choose'
        ? { holder: game.headCoach.initials }
        : {}),
      ...(team === undefined ? {} : { to: pageOf(game, station, team) }),
    })),
    tipOff: { label: 'Tip-off', when: weekdayAndTime(game.tipOff, timeZone) },
  }
}

function whatOf(game: GameRow, station: Station, ahead: number, timeZone: string): string {
  if (station === 'scout') {
    const { possessions, scoutedGames } = game.counts
    if (possessions === 0) return ahead === 0 ? 'Nothing counted yet' : ''
    return `${plural(possessions, 'possession')}, ${plural(scoutedGames, 'game')}`
  }
  if (station !== 'choose') return ''
  const signed = game.plan?.signedAt ?? null
  if (ahead < 0) return signed === null ? '' : `Signed off ${weekdayAndTime(signed, timeZone)}`
  const due = game.chooseBy === null ? '' : `due ${weekdayAndTime(game.chooseBy, timeZone)}`
  if (ahead > 0 || game.headCoach === null) return due
  const first = game.headCoach.name.split(' ')[0] ?? game.headCoach.name
  return due === '' ? `With ${first}` : `With ${first}, ${due}`
}

function pageOf(game: GameRow, station: Station, team: string): RouteLocationRaw | undefined {
  if (station === 'scout') return { name: 'scouted-games', params: { team, opponent: game.opponentId } }
  if (station === 'read') return { name: 'read', params: { team, opponent: game.opponentId } }
  if (station === 'choose') return { name: 'choose', params: { team, game: game.id } }
  if (station === 'teach' && game.plan?.signedAt) return { name: 'sheets', params: { team } }
  return undefined
}

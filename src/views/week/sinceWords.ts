import type { WeekEvent } from '@shared/week/schemas'
import { firstName } from './weekWords'

const count = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`

const PAST: Record<string, string> = {
  made: 'added',
  changed: 'changed',
  deleted: 'threw away',
  restored: 'put back',
}

type Say = (event: WeekEvent, verb: string) => string
const about = ({ about: name }: WeekEvent, before: string): string =>
  name === null ? '' : `${before}${name}`

const SAY: Record<WeekEvent['kind'], Say> = {
  possessions: (event, verb) =>
    `${event.action === 'made' ? 'logged' : verb} ${count(event.count, 'possession')}${about(event, ', ')}`,
  scouted_games: (event, verb) =>
    `${event.action === 'made' ? 'set up' : verb} a game to watch${about(event, ': ')}`,
  games: (event, verb) => `${verb} our game${about(event, ' with ')}`,
  opponents: (event, verb) => `${verb} ${event.about ?? 'an opponent'}`,
  opponent_players: (event, verb) => `${verb} ${count(event.count, 'player')} of theirs${about(event, ', ')}`,
  counters: (event, verb) => `${event.action === 'made' ? 'drew' : verb} ${event.about ?? 'a counter'}`,
  rules: (event, verb) => `${verb} ${count(event.count, 'rule')}`,
  squad_players: (event, verb) => `${verb} ${count(event.count, 'player')} of ours`,
  plans: (event, verb) =>
    event.action === 'signed'
      ? `signed off the plan${about(event, ' for ')}`
      : event.action === 'made'
        ? `began to pick${about(event, ' for ')}`
        : `${verb} the picks${about(event, ' for ')}`,
  practices: (event, verb) => `${verb} ${count(event.count, 'practice')}${about(event, ' for ')}`,
  read: (event) =>
    event.action === 'signed'
      ? `signed off the read${about(event, ' of ')}`
      : `opened the read${about(event, ' of ')} again`,
  sheets: () => '',
  ball: (event) =>
    `handed ${event.about ?? 'a game'} to ${event.to === null ? 'somebody' : firstName(event.to)}`,
}

/** One line of what happened: "Tomas logged 12 possessions, Gulls against Tarn Valley." */
export function sinceSentence(event: WeekEvent, me: string): string {
  if (event.kind === 'sheets') {
    const all = event.of === null ? '' : ` of ${event.of}`
    const players = (event.of ?? event.count) === 1 ? 'player' : 'players'
    return `${event.count}${all} ${players} opened the sheet${about(event, ' for ')}.`
  }
  const who = event.who === null ? 'Somebody' : event.who.id === me ? 'You' : firstName(event.who.name)
  return `${who} ${SAY[event.kind](event, PAST[event.action] ?? 'changed')}.`
}

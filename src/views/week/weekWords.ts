import type { GameRow } from '@shared/games/schemas'
import type { Station } from '@shared/vocabulary'
import { dueOf } from '@/composables/prepRail'
import { daysUntil, weekdayAndTime } from '@/composables/when'

const NUMBERS = 'no one two three four five six seven eight nine ten eleven twelve'.split(' ')
const inWords = (count: number): string => NUMBERS[count] ?? String(count)
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

export const firstName = (name: string): string => name.split(' ')[0] ?? name

/** The page's name: how long it is to the next game, and against whom. */
export function weekTitle(next: GameRow | undefined, timeZone: string, now: number): string {
  if (next === undefined) return 'This week'
  const days = daysUntil(next.tipOff, timeZone, now)
  if (days <= 0) return `Today: ${next.opponentName}`
  if (days === 1) return `Tomorrow: ${next.opponentName}`
  return `${capital(inWords(days))} days to ${next.opponentName}`
}

const VERBS: Record<Station, [you: string, they: string, what: string]> = {
  scout: ['scout', 'scouts', 'them'],
  read: ['read', 'reads', 'what is counted'],
  choose: ['choose', 'chooses', 'the counter'],
  teach: ['teach', 'teaches', 'it'],
  review: ['look', 'looks', 'back at it'],
}

/** Where the next game stands and who acts: "The read is signed off. You choose the counter." */
export function standsSentence(game: GameRow | undefined, me: string): string {
  if (game === undefined) return 'No game is ahead of us.'
  const { possessions } = game.counts
  const counted =
    possessions === 0
      ? 'Nothing is counted yet.'
      : `${possessions} ${possessions === 1 ? 'possession is' : 'possessions are'} counted.`
  const done: Record<Station, string> = {
    scout: counted,
    read: counted,
    choose: game.read === null ? counted : 'The read is signed off.',
    teach: 'The plan is signed off.',
    review: 'It is played.',
  }
  const [you, they, what] = VERBS[game.station]
  const acts =
    game.holder === null
      ? 'Nobody has the ball yet.'
      : game.holder.id === me
        ? `You ${you} ${what}.`
        : `${firstName(game.holder.name)} ${they} ${what}.`
  return `${done[game.station]} ${acts}`
}

/** "due Wed 18:00", "due today 18:00", "was due Mon 18:00"; empty without a date. */
export function dueWords(due: string | null, timeZone: string, now: number): string {
  if (due === null) return ''
  const time = weekdayAndTime(due, timeZone)
  if (Date.parse(due) < now) return `was due ${time}`
  const days = daysUntil(due, timeZone, now)
  const clock = time.split(' ')[1] ?? ''
  return days === 0 ? `due today ${clock}` : days === 1 ? `due tomorrow ${clock}` : `due ${time}`
}

export const isOverdue = (due: string | null, now: number): boolean => due !== null && Date.parse(due) < now

/** One thing that waits for whoever looks at the page. */
export interface Waiting {
  game: GameRow
  title: string
  detail: string
  due: string | null
  /** Name of the page where it is done. */
  page: 'scouted-games' | 'read' | 'choose' | 'teach'
  button: string
}

const TITLES: Record<Station, (name: string) => string> = {
  scout: (name) => `Scout ${name}`,
  read: (name) => `Read ${name}`,
  choose: (name) => `Choose for ${name}`,
  teach: (name) => `Teach it for ${name}`,
  review: (name) => `Look back at ${name}`,
}
const PAGES: Record<Station, [page: Waiting['page'], button: string]> = {
  scout: ['scouted-games', 'Watch and log'],
  read: ['read', 'Open the read'],
  choose: ['choose', 'Compare them'],
  teach: ['teach', 'Plan the practice'],
  review: ['read', 'Open what is counted'],
}

function detailOf(game: GameRow): string {
  const { possessions, scoutedGames, ourGames } = game.counts
  const counted = scoutedGames + ourGames
  const games = `${counted} ${counted === 1 ? 'game' : 'games'}`
  if (game.station === 'scout')
    return possessions === 0 ? 'Nothing counted yet.' : `${possessions} possessions so far, ${games}.`
  if (game.station === 'read') return `${possessions} possessions of ${games} to decide from.`
  if (game.station === 'choose') return game.plan === null ? 'Nothing is picked yet.' : 'Picks are begun.'
  if (game.station === 'teach') return `Version ${game.plan?.number ?? 1} of the plan is signed off.`
  return 'Set what happened beside what was expected.'
}

/** A game that was played waits for a look back for a week, or until the date that was set for it. */
const LOOK_BACK_DAYS = 7

/** A look back without a date waits until everything else is done. */
const urgency = ({ due, game }: Waiting): string => due ?? (game.station === 'review' ? '9' : game.tipOff)

/** What is with a person: what is due first stands first, then the game that is played first. */
export function withMe(games: readonly GameRow[], last: GameRow | null, me: string, now: number): Waiting[] {
  const back =
    last !== null &&
    (last.due.review !== null
      ? Date.parse(last.due.review) > now - LOOK_BACK_DAYS * 86_400_000
      : Date.parse(last.tipOff) > now - LOOK_BACK_DAYS * 86_400_000)
  const mine = [...games, ...(back ? [last] : [])].filter((game) => game.holder?.id === me)
  return mine
    .map((game): Waiting => {
      const [page, button] = PAGES[game.station]
      const due = dueOf(game, game.station)
      return {
        game,
        title: TITLES[game.station](game.opponentName),
        detail: detailOf(game),
        due,
        page,
        button,
      }
    })
    .sort((a, b) => urgency(a).localeCompare(urgency(b)))
}

/** "Choose, with you, due Wed 18:00" under a game's rail. */
export function standsUnder(game: GameRow, me: string, timeZone: string, now: number): string {
  const who =
    game.holder === null
      ? 'with nobody yet'
      : `with ${game.holder.id === me ? 'you' : firstName(game.holder.name)}`
  const due = dueWords(dueOf(game, game.station), timeZone, now)
  return [who, due].filter((words) => words !== '').join(', ')
}

/** What a club has on its first days. */
export interface FirstDayCounts {
  players: number
  /** Meetings that are set. */
  games: number
  opponents: number
  possessions: number
}

/** Ten are thin, but they draw a read. */
export const ENOUGH = 10

export interface FirstDayStep {
  key: 'team' | 'squad' | 'next' | 'count'
  /** On the court. */
  name: string
  title: string
  detail: string
  /** On the button. */
  act: string
  done: boolean
}

/** The four steps to a first read, with what is done of each. The team was named when it was made. */
export function firstDaySteps({ players, games, opponents, possessions }: FirstDayCounts): FirstDayStep[] {
  return [
    {
      key: 'team',
      name: 'Team',
      title: 'Name the team and its rules',
      detail: 'Done when the team was made.',
      act: '',
      done: true,
    },
    {
      key: 'squad',
      name: 'Squad',
      title: 'Put the squad on the list',
      detail:
        players > 0 && players < 5
          ? `${players} so far; five make a counter.`
          : 'Numbers and first names are enough to start.',
      act: 'Squad',
      done: players >= 5,
    },
    {
      key: 'next',
      name: 'Who is next',
      title: 'Say who you meet next',
      detail: 'A date and a tip-off. Everybody’s week hangs from it.',
      act: 'Opponent',
      done: games > 0 && opponents > 0,
    },
    {
      key: 'count',
      name: 'Ten throw-ins',
      title: 'Count ten throw-ins',
      detail:
        possessions > 0
          ? `${possessions} of ten so far. Ten is thin, but it draws a read.`
          : 'From film or from the stands. Ten is thin, but it draws a read.',
      act: 'Log',
      done: possessions >= ENOUGH,
    },
  ]
}

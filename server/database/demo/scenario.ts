import { localDay, localInstant } from './days'
import { seeded } from './random'
import { gullsTrips } from './scenario/gulls'
import { filmed } from './scenario/film'
import { lowmoorAfter, lowmoorEarlier, lowmoorTrips, tarnTrips } from './scenario/lowmoor'
import { ottersTrips } from './scenario/otters'
import { ourTrips } from './scenario/ours'
import { PRESS_FIVES } from './scenario/players'
import { layOut, type Played, type Stretch } from './scenario/timeline'
import type { DemoGame, DemoOpponent, DemoPossession, DemoScoutedGame, Trip } from './scenario/types'

export interface DemoScenario {
  opponents: DemoOpponent[]
  games: DemoGame[]
  scoutedGames: DemoScoutedGame[]
  possessions: DemoPossession[]
}

const SEED = 20_26
/** Seconds of play. */
const GAME = 2400
const MINUTE = 60

const DEMO_OPPONENTS: DemoOpponent[] = [
  {
    key: 'gulls',
    name: 'Port Selby Gulls',
    shortName: 'Gulls',
    notes:
      '## Bench\n\nTwo fists: trap on the catch. One fist: wait for the dribble.\n\n## To look for\n\n1. Does no. 14 come up after the first trap?\n2. Who takes the throw-in when 7 rests?',
  },
  { key: 'lowmoor', name: 'Lowmoor Rovers', shortName: 'Lowmoor' },
  { key: 'tarn', name: 'Tarn Valley', shortName: 'Tarn' },
  { key: 'otters', name: 'Brindle Moor Otters', shortName: 'Otters' },
]

function play(): Record<string, Played> {
  const random = seeded(SEED)
  const put = (trips: Trip[], stretch: Partial<Stretch> & Pick<Stretch, 'key'>) =>
    layOut(
      trips,
      { kind: 'scouted', from: 0, to: GAME, score: [0, 0], foeScores: 0.62, later: [2, 1], ...stretch },
      random,
    )
  const [first = [], second = [], third = []] = gullsTrips(random)
  const [home = [], lowmoor = [], away = []] = ourTrips(random)
  const covered = put(lowmoorTrips(random), { key: 'scout-lowmoor-1', to: 32 * MINUTE })
  const after = put(lowmoorAfter(random), {
    key: 'scout-lowmoor-after',
    from: 33 * MINUTE,
    score: [covered.score.theirs - 2, covered.score.foe - 1],
    later: [5, 2],
  })
  const played = {
    'scout-gulls-1': put(first, { key: 'scout-gulls-1', from: 20 * MINUTE, score: [22, 29], later: [0, 3] }),
    'scout-gulls-2': put(second, { key: 'scout-gulls-2', to: 20 * MINUTE, later: [25, 28] }),
    'scout-gulls-3': put(third, { key: 'scout-gulls-3', foeScores: 0.8, later: [4, 3] }),
    'scout-lowmoor-1': joined(covered, after),
    'scout-tarn-1': put(tarnTrips(random), { key: 'scout-tarn-1', to: 6 * MINUTE }),
    'game-otters-1': put(home, { key: 'game-otters-1', kind: 'ours' }),
    'game-lowmoor-1': put(lowmoor, { key: 'game-lowmoor-1', kind: 'ours' }),
    'game-otters-2': put(away, { key: 'game-otters-2', kind: 'ours' }),
  }
  // Drawn after everything else: what stands above stays as it was.
  const [film = [], stands = []] = ottersTrips(random)
  const all: Record<string, Played> = {
    ...played,
    'scout-lowmoor-2': put(lowmoorEarlier(random), { key: 'scout-lowmoor-2' }),
    'scout-otters-1': put(film, { key: 'scout-otters-1' }),
    'scout-otters-2': put(stands, { key: 'scout-otters-2' }),
  }
  FILMED.forEach(([key, opponent], i) => {
    const game = all[key]
    if (game) all[key] = { ...game, rows: filmed(game.rows, PRESS_FIVES[opponent], i) }
  })
  return all
}

/** Games that were seen on film, or gone over again on it. */
const FILMED: readonly (readonly [game: string, opponent: keyof typeof PRESS_FIVES])[] = [
  ['scout-gulls-2', 'gulls'],
  ['scout-gulls-3', 'gulls'],
  ['scout-lowmoor-1', 'lowmoor'],
  ['scout-lowmoor-2', 'lowmoor'],
  ['scout-otters-1', 'otters'],
  ['game-otters-1', 'otters'],
  ['game-lowmoor-1', 'lowmoor'],
  ['game-otters-2', 'otters'],
]

/** Everything that was played, laid out once: it depends on the seed and never on the day. */
const PLAYED = play()
/** Every possession of the scenario, scouted and our own. */
export const DEMO_POSSESSIONS: DemoPossession[] = Object.values(PLAYED).flatMap(({ rows }) => rows)

/** The second stretch of the same game, numbered on. */
function joined(game: Played, later: Played): Played {
  const key = game.rows[0]?.scoutedGameKey ?? null
  const rows = later.rows.map((row, i) => {
    const number = game.rows.length + i + 1
    return { ...row, key: `${key}-${number}`, number, scoutedGameKey: key }
  })
  return { rows: [...game.rows, ...rows], score: later.score }
}

/**
 * The invented season as plain rows that name each other by key. Dates run from `now`: a game at Choose in
 * three days, two more ahead, three behind; what happened in the games is always the same.
 * @param timeZone IANA name of the team's zone; tip-offs are told in its hours.
 */
export function demoScenario(now: Date, timeZone: string): DemoScenario {
  const at = (days: number, hour: string) => localInstant(now, timeZone, days, hour)
  const game = (
    key: string,
    opponentKey: string,
    tipOff: string,
    place: DemoGame['place'],
    more: Partial<Pick<DemoGame, 'chooseBy' | 'due' | 'readKey' | 'notes'>> = {},
  ): DemoGame => ({
    key,
    opponentKey,
    tipOff,
    place,
    rulePack: 'fiba',
    chooseBy: null,
    readKey: null,
    ...more,
  })
  const scouted = (
    key: string,
    opponentKey: string,
    foe: string,
    daysAgo: number,
    rest: Pick<DemoScoutedGame, 'seen' | 'coverage' | 'scoutKey'>,
  ): DemoScoutedGame => ({
    key,
    opponentKey,
    foe,
    playedOn: localDay(now, timeZone, -daysAgo),
    rulePack: 'fiba',
    blowout: false,
    finalScore: key === 'scout-tarn-1' ? null : (PLAYED[key]?.score ?? null),
    ...rest,
  })
  return {
    opponents: DEMO_OPPONENTS,
    games: [
      game('game-otters-1', 'otters', at(-45, '19:00'), 'home'),
      game('game-lowmoor-1', 'lowmoor', at(-24, '14:00'), 'home'),
      game('game-otters-2', 'otters', at(-4, '18:30'), 'away'),
      game('game-gulls', 'gulls', at(3, '19:15'), 'home', {
        chooseBy: at(2, '18:00'),
        due: { read: at(-1, '22:00'), teach: at(3, '12:00') },
        readKey: 'tomas',
        notes:
          '**Hall:** the far basket is close to the wall.\n\n- They warm up in the press.\n- Ask for the ball that bounces.',
      }),
      game('game-otters-3', 'otters', at(6, '18:30'), 'home', {
        chooseBy: at(0, '18:00'),
        due: { teach: at(5, '20:00') },
        readKey: 'priya',
      }),
      game('game-lowmoor-2', 'lowmoor', at(8, '18:45'), 'away', {
        chooseBy: at(7, '18:00'),
        due: { read: at(2, '20:00') },
      }),
      game('game-tarn', 'tarn', at(11, '14:00'), 'home', { due: { scout: at(5, '20:00') } }),
    ],
    scoutedGames: [
      scouted('scout-gulls-1', 'gulls', 'Skerry Point Terns', 17, {
        seen: 'live',
        coverage: { kind: 'minutes', from: 20, to: 40 },
        scoutKey: 'tomas',
      }),
      scouted('scout-gulls-2', 'gulls', 'Dunholt Badgers', 10, {
        seen: 'film',
        coverage: { kind: 'minutes', from: 0, to: 20 },
        scoutKey: 'tomas',
      }),
      scouted('scout-gulls-3', 'gulls', 'Tarn Valley', 3, {
        seen: 'film',
        coverage: { kind: 'throw-ins' },
        scoutKey: 'tomas',
      }),
      scouted('scout-lowmoor-1', 'lowmoor', 'Wexcombe Larks', 6, {
        seen: 'film',
        coverage: { kind: 'minutes', from: 0, to: 32 },
        scoutKey: 'priya',
      }),
      scouted('scout-lowmoor-2', 'lowmoor', 'Skerry Point Terns', 13, {
        seen: 'film',
        coverage: { kind: 'all' },
        scoutKey: 'priya',
      }),
      scouted('scout-otters-1', 'otters', 'Tarn Valley', 52, {
        seen: 'film',
        coverage: { kind: 'all' },
        scoutKey: 'tomas',
      }),
      scouted('scout-otters-2', 'otters', 'Dunholt Badgers', 12, {
        seen: 'live',
        coverage: { kind: 'all' },
        scoutKey: 'priya',
      }),
      scouted('scout-tarn-1', 'tarn', 'Ashdown Kestrels', 5, {
        seen: 'live',
        coverage: { kind: 'all' },
        scoutKey: 'priya',
      }),
    ],
    possessions: DEMO_POSSESSIONS,
  }
}

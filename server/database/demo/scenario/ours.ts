import type { Outcome, Shape } from '@shared/vocabulary'
import type { Random } from '../random'
import { pressed, unpressed, type Pressed } from './drafts'
import type { Trip } from './types'

/** How often each counter was called in a game of ours, and how often it got us through. */
interface Called {
  counterKey: string
  shape: Shape
  k: number
  n: number
}

const GOT_THROUGH: readonly Outcome[] = [
  'through',
  'through',
  'through-with-numbers',
  'through',
  'foul-drawn',
]
const LOST: readonly Outcome[] = ['lost-live', 'lost-dead', 'lost-live', 'count']

/** Two games against Brindle Moor Otters, who trap the corners out of a 1-2-1-1, and one against Lowmoor's 2-2-1. */
const CALLED: readonly (readonly Called[])[] = [
  [
    { counterKey: 'one-four', shape: '1-2-1-1', k: 8, n: 11 },
    { counterKey: 'box', shape: '1-2-1-1', k: 7, n: 9 },
    { counterKey: 'stack', shape: '1-2-1-1', k: 2, n: 3 },
    { counterKey: 'two-up', shape: '1-2-1-1', k: 3, n: 6 },
  ],
  [
    { counterKey: 'two-up', shape: '2-2-1', k: 7, n: 8 },
    { counterKey: 'middle-three', shape: '2-2-1', k: 6, n: 7 },
    { counterKey: 'box', shape: '2-2-1', k: 4, n: 5 },
    { counterKey: 'one-four', shape: '2-2-1', k: 2, n: 4 },
  ],
  [
    { counterKey: 'one-four', shape: '1-2-1-1', k: 10, n: 11 },
    { counterKey: 'box', shape: '1-2-1-1', k: 6, n: 9 },
    { counterKey: 'stack', shape: '1-2-1-1', k: 2, n: 3 },
    { counterKey: 'two-up', shape: '1-2-1-1', k: 2, n: 5 },
  ],
]
/** Lowmoor leave our weaker dribblers room. */
const SAGGED = { handler: 'weak', onBall: 'sagged' } as const
const TRIGGERS = [
  'made-basket',
  'made-basket',
  'made-free-throw',
  'made-basket',
  'dead-ball',
  'break',
] as const

/** Our own games, oldest first: each row carries the counter we called and how it was run. */
export function ourTrips(random: Random): Trip[][] {
  return CALLED.map((game) => {
    const trips: Trip[] = game.flatMap((called) =>
      Array.from({ length: called.n }, (_, i): Trip => [oneTrip(called, i < called.k, i, random)]),
    )
    for (const trigger of ['made-basket', 'dead-ball', 'dead-ball', 'live'] as const)
      trips.push([unpressed(trigger, 'dropped-back', 'through', random)])
    return trips
  })
}

function oneTrip({ counterKey, shape }: Called, through: boolean, index: number, random: Random) {
  const end = through
    ? (GOT_THROUGH[index % GOT_THROUGH.length] ?? 'through')
    : (LOST[index % LOST.length] ?? 'count')
  const rightCall = random.next() < (through ? 0.9 : 0.65)
  const runWell = random.next() < (through ? 0.85 : 0.3)
  const told: Pressed = {
    trigger: random.pick(TRIGGERS),
    shape,
    end,
    ...(through ? {} : { at: 'backcourt' as const }),
    ...(random.next() < 0.55 ? { trap: trapFor(shape, end, random) } : {}),
    over: { handler: null, track: null, ...(shape === '2-2-1' && index < 3 ? SAGGED : {}) },
  }
  return { ...pressed(told, random), counterKey, rightCall, runWell }
}

function trapFor(shape: Shape, end: Outcome, random: Random): NonNullable<Pressed['trap']> {
  const side = random.next() < 0.55 ? 'left' : 'right'
  const result =
    end === 'foul-drawn'
      ? 'foul'
      : end === 'through' || end === 'through-with-numbers'
        ? 'passed-out'
        : 'lost'
  return shape === '1-2-1-1'
    ? { area: 'corner', side, cue: 'on-catch', result }
    : { area: 'short', side, cue: 'first-dribble', result }
}

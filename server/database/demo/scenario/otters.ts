import type { Random } from '../random'
import { pressed, unpressed, type Pressed, type Side } from './drafts'
import type { Trip } from './types'

/**
 * Brindle Moor Otters: a 1-2-1-1 after baskets that waits for the first dribble and traps in either corner or
 * early on the sideline; nobody goes again after the first trap.
 */
const diamond = (
  trigger: Pressed['trigger'],
  trap: { area: 'corner' | 'early'; side: Side; result?: NonNullable<Pressed['trap']>['result'] } | null,
  rest: Omit<Pressed, 'trigger' | 'shape' | 'trap'>,
): Pressed => ({
  trigger,
  shape: '1-2-1-1',
  ...(trap ? { trap: { cue: 'first-dribble', result: 'passed-out', ...trap } } : {}),
  ...rest,
})

const LOST = { end: 'lost-live', at: 'backcourt' } as const

const FILMED: readonly Pressed[] = [
  diamond(
    'made-basket',
    { area: 'corner', side: 'left' },
    { end: 'through', open: ['middle'], deny: ['near'] },
  ),
  diamond('made-basket', { area: 'corner', side: 'right', result: 'lost' }, { ...LOST, open: ['far-side'] }),
  diamond('made-basket', { area: 'early', side: 'left' }, { end: 'through', open: ['middle', 'far-side'] }),
  diamond('made-basket', { area: 'early', side: 'right' }, { end: 'through-with-numbers', open: ['middle'] }),
  diamond('made-basket', { area: 'corner', side: 'left' }, { end: 'through', open: ['sideline'], deny: [] }),
  diamond('made-basket', null, { end: 'through', deny: ['best-handler'] }),
  diamond('made-free-throw', { area: 'corner', side: 'right' }, { end: 'through', open: ['middle'] }),
  diamond(
    'made-free-throw',
    { area: 'early', side: 'left', result: 'foul' },
    { end: 'foul-drawn', at: 'backcourt' },
  ),
  diamond('made-free-throw', null, {
    end: 'count',
    at: 'backcourt',
    over: { handler: 'weak', onBall: 'pressured' },
  }),
  diamond(
    'break',
    { area: 'corner', side: 'left', result: 'dribbled-out' },
    { end: 'through', deny: ['near', 'far'] },
  ),
  diamond('made-basket', { area: 'early', side: 'left', result: 'lost' }, { ...LOST, open: ['pass-back'] }),
  {
    trigger: 'dead-ball',
    shape: 'person',
    end: 'through',
    over: { shapeVariant: 'straight', pickup: 'half' },
  },
]

const SEEN_LIVE: readonly Pressed[] = [
  diamond('made-basket', { area: 'corner', side: 'left' }, { end: 'through', quick: true }),
  diamond('made-basket', { area: 'corner', side: 'right' }, { end: 'lost-live', quick: true }),
  diamond('made-basket', { area: 'early', side: 'left' }, { end: 'through', quick: true }),
  diamond('made-basket', null, { end: 'through-with-numbers', quick: true }),
  diamond('made-basket', { area: 'early', side: 'right' }, { end: 'through', quick: true }),
  diamond('made-free-throw', { area: 'corner', side: 'left' }, { end: 'through', quick: true }),
  diamond('made-free-throw', { area: 'corner', side: 'right' }, { end: 'lost-dead', quick: true }),
  diamond('break', { area: 'early', side: 'left' }, { end: 'through', quick: true }),
  {
    trigger: 'made-basket',
    shape: 'other-zone',
    end: 'through',
    quick: true,
    over: { shapeVariant: '1-2-2' },
  },
]

const LEFT: readonly (readonly [Parameters<typeof unpressed>[0], 'dropped-back' | 'fake', number])[] = [
  ['made-basket', 'dropped-back', 2],
  ['made-basket', 'fake', 1],
  ['dead-ball', 'dropped-back', 4],
  ['break', 'dropped-back', 1],
  ['live', 'dropped-back', 2],
]

/** Two scouted games, oldest first: 22 rows from film, 19 from the stands. */
export function ottersTrips(random: Random): Trip[][] {
  return [FILMED, SEEN_LIVE].map((list) => [
    ...list.map((told): Trip => [pressed(told, random)]),
    ...LEFT.flatMap(([trigger, shape, count]) =>
      Array.from({ length: count }, (): Trip => [unpressed(trigger, shape, 'through', random)]),
    ),
  ])
}

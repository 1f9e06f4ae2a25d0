import type { Random } from '../random'
import { pressed, unpressed, type Pressed, type Side } from './drafts'
import type { Trip } from './types'

/** Lowmoor Rovers: a 2-2-1 from three-quarter court that shows the sideline and traps short of half. */
const zone = (
  trigger: Pressed['trigger'],
  side: Side | null,
  rest: Omit<Pressed, 'trigger' | 'shape' | 'trap'>,
  result: NonNullable<Pressed['trap']>['result'] = 'passed-out',
): Pressed => ({
  trigger,
  shape: '2-2-1',
  ...(side ? { trap: { area: 'short', side, cue: 'first-dribble', result } } : {}),
  ...rest,
  over: rest.quick ? rest.over : { handler: 'unknown', ...rest.over },
})

const SAGGED = { handler: 'weak', onBall: 'sagged' } as const
const TOLD: Pressed[] = [
  zone('made-basket', 'right', { end: 'through', open: ['middle'], over: { ...SAGGED, denied: [] } }),
  zone('made-basket', 'right', { end: 'through', open: ['far-side', 'middle'], over: { denied: [] } }),
  zone('made-basket', 'left', { end: 'through-with-numbers', open: ['middle'], over: { denied: [] } }),
  zone(
    'made-basket',
    'right',
    { end: 'lost-live', at: 'backcourt', open: ['pass-back'], over: SAGGED },
    'lost',
  ),
  zone('made-basket', null, { end: 'through', over: { ...SAGGED, denied: [] } }),
  zone('made-basket', null, {
    end: 'count',
    at: 'backcourt',
    over: { onBall: 'contained', handler: 'unknown' },
  }),
  zone('made-free-throw', 'right', {
    end: 'through',
    open: ['middle'],
    over: { ...SAGGED, goalie: 'left-early' },
  }),
  zone('made-free-throw', 'left', { end: 'through', open: ['middle', 'pass-back'], over: { denied: [] } }),
  zone('made-free-throw', null, { end: 'through-with-numbers', quick: true }),
  zone('dead-ball', 'right', { end: 'lost-live', at: 'past-half', then: 'right', open: ['far-side'] }),
  zone('dead-ball', 'left', {
    end: 'through',
    open: ['middle'],
    over: { handler: 'weak', onBall: 'contained' },
  }),
  zone('dead-ball', null, { end: 'through', quick: true }),
  { trigger: 'break', shape: 'person', end: 'through', over: { shapeVariant: 'straight', pickup: 'half' } },
  {
    trigger: 'made-basket',
    shape: 'other-zone',
    end: 'through',
    over: { shapeVariant: '1-2-2', pickup: 'three-quarter', shownShape: '2-2-1' },
  },
]

const LEFT: readonly (readonly [Parameters<typeof unpressed>[0], 'dropped-back' | 'fake', number])[] = [
  ['made-basket', 'dropped-back', 5],
  ['made-basket', 'fake', 2],
  ['made-free-throw', 'dropped-back', 1],
  ['dead-ball', 'dropped-back', 4],
  ['break', 'dropped-back', 1],
  ['live', 'dropped-back', 3],
]

/** One scouted game, covered to the second minute of the last period: 30 rows inside, 14 of them pressed. */
export function lowmoorTrips(random: Random): Trip[] {
  return [
    ...TOLD.map((told): Trip => [pressed(told, random)]),
    ...LEFT.flatMap(([trigger, shape, count]) =>
      Array.from({ length: count }, (): Trip => [unpressed(trigger, shape, 'through', random)]),
    ),
  ]
}

const AGAIN: Pressed[] = [
  zone('made-basket', 'right', { end: 'through', open: ['middle'], over: { ...SAGGED, denied: [] } }),
  zone('made-basket', 'left', { end: 'through', open: ['far-side'], over: SAGGED }),
  zone('made-basket', 'right', { end: 'lost-live', at: 'backcourt', open: ['pass-back'] }, 'lost'),
  zone('made-basket', null, { end: 'through', over: { ...SAGGED, denied: [] } }),
  zone('made-basket', 'left', { end: 'through-with-numbers', open: ['middle'] }),
  zone('made-free-throw', 'right', { end: 'through', open: ['middle'], over: { goalie: 'left-early' } }),
  zone('made-free-throw', null, { end: 'through', over: { onBall: 'contained', handler: 'strong' } }),
  zone('dead-ball', 'right', { end: 'through', open: ['middle', 'far-side'] }),
  zone('dead-ball', null, { end: 'count', at: 'backcourt', over: { onBall: 'contained' } }),
  zone('break', 'right', { end: 'through', open: ['middle'], over: { ...SAGGED, denied: [] } }),
]

/** Their game before, all of it from film: 20 rows, 10 of them pressed. */
export function lowmoorEarlier(random: Random): Trip[] {
  return [
    ...AGAIN.map((told): Trip => [pressed(told, random)]),
    ...LEFT.flatMap(([trigger, shape, count]) =>
      Array.from({ length: Math.ceil(count / 2) }, (): Trip => [
        unpressed(trigger, shape, 'through', random),
      ]),
    ),
  ]
}

/** Two rows after the stretch that was covered: kept, never counted. */
export function lowmoorAfter(random: Random): Trip[] {
  return [
    [unpressed('made-basket', 'dropped-back', 'through', random, 'After the stretch I meant to log.')],
    [pressed(zone('made-basket', null, { end: 'through', quick: true }), random)],
  ]
}

/** Tarn Valley: five rows of one game, too few for anything but a sighting. */
export function tarnTrips(random: Random): Trip[] {
  return [
    [pressed({ trigger: 'made-basket', shape: 'person', end: 'through', quick: true }, random)],
    [pressed({ trigger: 'made-basket', shape: 'person', end: 'lost-live', quick: true }, random)],
    [unpressed('made-basket', 'dropped-back', 'through', random)],
    [unpressed('dead-ball', 'dropped-back', 'through', random)],
    [unpressed('live', 'dropped-back', 'through', random)],
  ]
}

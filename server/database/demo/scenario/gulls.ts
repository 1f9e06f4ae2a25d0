import type { Random } from '../random'
import { pressed, unpressed, type Pressed, type Side } from './drafts'
import type { Trip } from './types'

/**
 * Port Selby Gulls, written as a scout would sum them up: a 1-2-1-1 after baskets and free throws, a trap in
 * the corner on the catch (right more than left), the pass back denied, the middle left open, a second trap
 * just over half, the safety at home; after a whistle sometimes a 2-2-1 from three-quarter court.
 */
type Rest = Omit<Pressed, 'trigger' | 'shape' | 'trap'>

const corner = (
  trigger: Pressed['trigger'],
  side: Side,
  result: NonNullable<Pressed['trap']>['result'],
  rest: Rest,
  cue: NonNullable<Pressed['trap']>['cue'] = 'on-catch',
): Pressed => ({ trigger, shape: '1-2-1-1', trap: { area: 'corner', side, cue, result }, ...rest })

const diamond = (trigger: Pressed['trigger'], rest: Rest & Pick<Pressed, 'trap'>): Pressed => ({
  trigger,
  shape: '1-2-1-1',
  ...rest,
})

const twoTwoOne = (trigger: Pressed['trigger'], rest: Rest & Pick<Pressed, 'trap'>): Pressed => ({
  trigger,
  shape: '2-2-1',
  ...rest,
})

const BASKET = 'made-basket'
const FREE = 'made-free-throw'
const DEAD = 'dead-ball'
const BREAK = 'break'
const LOST_PAST_HALF = { end: 'lost-live', at: 'past-half' } as const
const LOST_BACK = { end: 'lost-live', at: 'backcourt' } as const

/** Seen live from the stands, second half only: some rows hold no more than the five touches. */
const FIRST: Pressed[] = [
  corner(FREE, 'right', 'passed-out', {
    ...LOST_PAST_HALF,
    then: 'right',
    open: ['middle'],
    deny: ['pass-back'],
  }),
  corner(FREE, 'right', 'passed-out', { end: 'through-with-numbers', open: ['middle'], deny: ['near'] }),
  diamond(FREE, { end: 'through-with-numbers', quick: true }),
  corner(BASKET, 'right', 'passed-out', {
    end: 'through',
    then: 'right',
    open: ['middle'],
    deny: ['pass-back'],
  }),
  corner(BASKET, 'left', 'passed-out', {
    ...LOST_PAST_HALF,
    then: 'right',
    open: ['middle'],
    deny: ['pass-back'],
  }),
  diamond(BASKET, { end: 'through', quick: true }),
  twoTwoOne(BASKET, {
    end: 'through',
    quick: true,
    trap: { area: 'short', side: 'right', cue: 'first-dribble', result: 'passed-out' },
  }),
  twoTwoOne(DEAD, {
    ...LOST_BACK,
    trap: { area: 'short', side: 'right', cue: 'first-dribble', result: 'lost' },
    over: { throwerGuard: 'none', goalie: 'not-visible' },
  }),
  corner(BREAK, 'right', 'passed-out', { end: 'through', quick: true }),
]

const SECOND: Pressed[] = [
  corner(FREE, 'right', 'lost', { ...LOST_BACK, open: ['far-side'], deny: ['near', 'pass-back'] }),
  corner(FREE, 'left', 'passed-out', { end: 'through', then: 'left', open: ['middle'], deny: ['pass-back'] }),
  diamond(FREE, { end: 'count', at: 'entry', over: { onBall: null, crossedAt: null, track: null } }),
  corner(BASKET, 'right', 'lost', {
    end: 'lost-dead',
    at: 'backcourt',
    open: ['far-side'],
    deny: ['pass-back'],
  }),
  corner(BASKET, 'right', 'passed-out', {
    end: 'through',
    then: 'right',
    open: ['middle'],
    deny: ['far', 'pass-back'],
  }),
  corner(BASKET, 'left', 'dribbled-out', {
    end: 'through',
    then: 'left',
    open: ['middle'],
    deny: ['pass-back'],
    over: { shownShape: 'person' },
  }),
  diamond(BASKET, {
    ...LOST_BACK,
    trap: { area: 'early', side: 'right', cue: 'turned-back', result: 'lost' },
    open: ['long'],
    deny: 'not-visible',
    over: { handler: 'weak', note: 'Spun into the second one.' },
  }),
  diamond(BASKET, { end: 'stopped', over: { shownShape: '1-2-1-1' } }),
  twoTwoOne(DEAD, {
    end: 'through',
    trap: { area: 'short', side: 'right', cue: 'first-dribble', result: 'passed-out' },
    over: { denied: [] },
  }),
  twoTwoOne(DEAD, { end: 'through', over: { denied: [], throwerGuard: 'none' } }),
  twoTwoOne(BREAK, {
    ...LOST_PAST_HALF,
    trap: { area: 'over', side: 'right', cue: 'on-crossing', result: 'lost' },
    over: { pickup: 'half' },
  }),
]

const THIRD: Pressed[] = [
  corner(FREE, 'right', 'passed-out', {
    ...LOST_PAST_HALF,
    then: 'right',
    open: ['middle'],
    deny: ['pass-back'],
    over: { note: 'Out once, caught again past half.', shownShape: '1-2-1-1' },
  }),
  corner(FREE, 'right', 'passed-out', {
    end: 'through-with-numbers',
    open: ['middle', 'long'],
    deny: ['pass-back'],
    over: { goalie: 'left-early' },
  }),
  corner(FREE, 'left', 'lost', {
    end: 'count',
    at: 'backcourt',
    open: ['long'],
    deny: ['near', 'pass-back'],
  }),
  diamond(FREE, { end: 'through', over: { throwerGuard: 'off' } }),
  corner(BASKET, 'right', 'foul', { end: 'foul-drawn', at: 'backcourt', open: 'not-visible' }),
  corner(BASKET, 'right', 'passed-out', {
    end: 'through-with-numbers',
    open: ['middle'],
    deny: ['pass-back'],
    over: { goalie: 'left-early', shownShape: '1-2-1-1' },
  }),
  corner(
    BASKET,
    'right',
    'dribbled-out',
    { end: 'through', then: 'right', open: ['middle'], deny: ['near', 'pass-back'] },
    'first-dribble',
  ),
  corner(BASKET, 'left', 'passed-out', {
    end: 'through',
    open: ['far-side', 'middle'],
    deny: ['far', 'pass-back'],
    over: { shownShape: '1-2-1-1' },
  }),
  diamond(BASKET, {
    end: 'through',
    then: 'left',
    trap: { area: 'early', side: 'left', cue: 'first-dribble', result: 'passed-out' },
    open: ['middle'],
    deny: ['best-handler', 'near'],
  }),
  diamond(BASKET, {
    end: 'through-with-numbers',
    trap: { area: 'middle', side: 'left', cue: 'head-down', result: 'dribbled-out' },
    over: { goalie: null },
  }),
  twoTwoOne(BASKET, { end: 'through-with-numbers', over: { denied: [] } }),
  twoTwoOne(DEAD, {
    end: 'through',
    trap: { area: 'short', side: 'left', cue: 'first-dribble', result: 'dribbled-out' },
    over: { shownShape: '2-2-1' },
  }),
  diamond(DEAD, { end: 'through', over: { pickup: 'not-visible', throwerGuard: 'not-visible' } }),
  corner(BREAK, 'left', 'lost', { ...LOST_BACK, open: ['sideline'], deny: ['best-handler'] }),
  twoTwoOne(BREAK, {
    end: 'through',
    over: { traps: 'not-visible', onBall: 'not-visible', shownShape: 'person', track: null },
  }),
]

type Left = readonly [
  Parameters<typeof unpressed>[0],
  Parameters<typeof unpressed>[1],
  Parameters<typeof unpressed>[2],
]
const LEFT: readonly (readonly Left[])[] = [
  [
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'fake', 'through'],
    [DEAD, 'dropped-back', 'through'],
    [DEAD, 'dropped-back', 'lost-dead'],
    [BREAK, 'dropped-back', 'through'],
  ],
  [
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'fake', 'through'],
    [DEAD, 'dropped-back', 'through'],
    [DEAD, 'fake', 'through'],
    [BREAK, 'dropped-back', 'through'],
  ],
  [
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'dropped-back', 'through-with-numbers'],
    [BASKET, 'dropped-back', 'through'],
    [BASKET, 'dropped-back', 'stopped'],
    [BASKET, 'fake', 'through'],
    [FREE, 'dropped-back', 'through'],
    [DEAD, 'dropped-back', 'through'],
    [DEAD, 'dropped-back', 'through'],
  ],
]

/** Their three scouted games, oldest first, as trips without an order: 16, 18 and 24 rows, 35 of 58 pressed. */
export function gullsTrips(random: Random): Trip[][] {
  return [FIRST, SECOND, THIRD].map((list, game) => {
    const trips = list.map((told): Trip => [pressed(told, random)])
    for (const [trigger, shape, outcome] of LEFT[game] ?? [])
      trips.push([unpressed(trigger, shape, outcome, random)])
    // A whistle within the trip: the fresh throw-in is a row of its own.
    const whistle = trips.find(([draft]) => draft?.outcome === 'foul-drawn' || draft?.outcome === 'stopped')
    const again = unpressed(DEAD, 'dropped-back', 'through', random)
    if (whistle) whistle.push(again)
    else trips.push([again])
    return trips
  })
}

import type { PossessionInput } from '@shared/possessions/schemas'

type Row = Partial<PossessionInput>

const trap = (x: number, y: number, more: object = {}) => ({ x, y, ...more })

/**
 * Twenty possessions of one scouted game with known answers. What is left out was not logged. Rows 1 to
 * 13 and 20 are pressed, 14 and 15 fakes, 16 to 18 dropped back; in 19 nobody looked.
 */
export const TWENTY: readonly Row[] = [
  // 1
  {
    trigger: 'made-basket',
    shape: '1-2-1-1',
    pickup: 'full',
    throwerGuard: 'mirror',
    denied: ['near', 'pass-back'],
    onBall: 'pressured',
    handler: 'weak',
    traps: [
      trap(0.08, 0.9, { cue: 'on-catch', result: 'passed-out' }),
      trap(0.55, 0.1, { cue: 'on-crossing', result: 'lost' }),
    ],
    leftOpen: ['middle'],
    goalie: 'home',
    shownShape: '1-2-1-1',
    forcedSide: 'right',
    outcome: 'lost-live',
  },
  // 2
  {
    trigger: 'made-basket',
    shape: '1-2-1-1',
    pickup: 'full',
    throwerGuard: 'mirror',
    denied: [],
    onBall: 'contained',
    handler: 'strong',
    traps: [trap(0.1, 0.1, { cue: 'on-catch', result: 'dribbled-out' })],
    leftOpen: ['middle', 'long'],
    goalie: 'left-early',
    shownShape: '2-2-1',
    crossedAt: 6,
    forcedSide: 'left',
    outcome: 'through-with-numbers',
  },
  // 3: looked for a trap and there was none, so lanes and safety say nothing of a trap
  {
    trigger: 'made-free-throw',
    shape: '1-2-1-1',
    pickup: 'three-quarter',
    throwerGuard: 'off',
    denied: ['far'],
    onBall: 'sagged',
    handler: 'weak',
    traps: [],
    leftOpen: ['far-side'],
    goalie: 'home',
    crossedAt: 6.5,
    forcedSide: 'left',
    outcome: 'through',
  },
  // 4
  {
    trigger: 'made-free-throw',
    shape: '2-2-1',
    pickup: 'three-quarter',
    throwerGuard: 'none',
    onBall: 'sagged',
    handler: 'weak',
    outcome: 'through',
  },
  // 5
  {
    trigger: 'dead-ball',
    shape: '2-2-1',
    pickup: 'half',
    throwerGuard: 'none',
    denied: ['middle'],
    onBall: 'contained',
    handler: 'unknown',
    traps: [trap(0.45, 0.05, { cue: 'first-dribble', result: 'held' })],
    leftOpen: 'not-visible',
    goalie: 'not-visible',
    shownShape: 'dropped-back',
    outcome: 'stopped',
  },
  // 6: the camera saw nothing
  {
    trigger: 'break',
    shape: '2-2-1',
    pickup: 'not-visible',
    throwerGuard: 'not-visible',
    denied: 'not-visible',
    onBall: 'not-visible',
    handler: 'weak',
    traps: 'not-visible',
    leftOpen: 'not-visible',
    goalie: 'not-visible',
    forcedSide: 'not-visible',
    outcome: 'foul-drawn',
  },
  // 7: a live ball has no thrower, whatever was written
  {
    trigger: 'live',
    shape: '1-3-1',
    pickup: 'half',
    throwerGuard: 'mirror',
    denied: ['best-handler'],
    onBall: 'pressured',
    handler: 'strong',
    traps: [trap(0.5, 0.8, { cue: 'not-visible', result: 'lost' })],
    leftOpen: ['pass-back'],
    goalie: 'left-early',
    forcedSide: 'middle',
    outcome: 'lost-live',
  },
  // 8
  {
    trigger: 'live',
    shape: 'person',
    shapeVariant: 'deny',
    pickup: 'full',
    denied: ['near', 'far', 'middle'],
    onBall: 'pressured',
    handler: 'strong',
    traps: [
      trap(0.3, 0.5, { cue: 'turned-back', result: 'passed-out' }),
      trap(0.7, 0.1, { cue: 'head-down', result: 'passed-out' }),
      trap(0.9, 0.9),
    ],
    leftOpen: ['sideline'],
    forcedSide: 'left',
    outcome: 'count',
  },
  // 9
  { trigger: 'made-basket', shape: 'person', traps: [] },
  // 10
  {
    trigger: 'made-basket',
    shape: 'person',
    shapeVariant: 'straight',
    pickup: 'full',
    throwerGuard: 'none',
    denied: [],
    onBall: 'contained',
    handler: 'weak',
    traps: [],
    outcome: 'through',
  },
  // 11
  {
    trigger: 'dead-ball',
    shape: 'person',
    shapeVariant: 'face-guard',
    pickup: 'full',
    throwerGuard: 'mirror',
    denied: ['best-handler'],
    onBall: 'not-visible',
    handler: 'weak',
    traps: [trap(0.25, 0.95, { cue: 'dead-dribble' })],
    leftOpen: [],
    goalie: 'home',
    outcome: 'lost-dead',
  },
  // 12: a trap between sideline and middle lane, at no named spot
  {
    trigger: 'dead-ball',
    shape: 'other-zone',
    shapeVariant: '2-1-2',
    pickup: 'three-quarter',
    throwerGuard: 'off',
    denied: ['middle'],
    onBall: 'sagged',
    handler: 'strong',
    traps: [trap(0.2, 0.27, { cue: 'on-reversal', result: 'foul' })],
    leftOpen: ['middle'],
    outcome: 'foul-drawn',
  },
  // 13
  {
    trigger: 'made-basket',
    shape: 'other-zone',
    pickup: 'full',
    shownShape: 'other-zone',
    outcome: 'lost-dead',
  },
  // 14: not pressed, so that nothing of it but the fake counts
  {
    trigger: 'made-basket',
    shape: 'fake',
    throwerGuard: 'mirror',
    denied: ['near'],
    onBall: 'contained',
    handler: 'weak',
    traps: [],
    leftOpen: ['middle'],
    goalie: 'home',
    shownShape: '1-2-1-1',
    outcome: 'through',
  },
  // 15 to 18
  { trigger: 'made-free-throw', shape: 'fake', outcome: 'lost-dead' },
  { trigger: 'dead-ball', shape: 'dropped-back', outcome: 'through' },
  { trigger: 'break', shape: 'dropped-back' },
  { trigger: 'live', shape: 'dropped-back', crossedAt: 7.5, outcome: 'lost-live' },
  // 19
  {
    trigger: 'made-basket',
    shape: null,
    throwerGuard: 'mirror',
    denied: ['near'],
    traps: [],
    outcome: 'through',
  },
  // 20
  {
    trigger: 'made-basket',
    shape: '1-2-1-1',
    pickup: 'full',
    throwerGuard: 'mirror',
    denied: ['near', 'pass-back'],
    onBall: 'pressured',
    traps: [trap(0, 0, { cue: 'on-catch', result: 'passed-out' })],
    goalie: 'left-early',
    shownShape: '1-2-1-1',
  },
]

/** A row of the set as a whole body of a scouted game. */
export const twentyBody = (scoutedGameId: string, index: number): PossessionInput => ({
  trigger: 'made-basket',
  number: index + 1,
  ...TWENTY[index],
  scoutedGameId,
})

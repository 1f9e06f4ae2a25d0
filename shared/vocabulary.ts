/**
 * Every closed list of the trade: the value that is stored, the label on screen and what it means.
 * Field values are RECORD.md section 1; definitions are the trade's (common practice, no source).
 */
export interface Term<T extends string = string> {
  readonly value: T
  /** Sentence case, as it stands inside a sentence. */
  readonly label: string
  readonly definition: string
}

/** Keeps a list's own values as its type. */
export const terms = <const T extends readonly Term[]>(list: T): T => list

/** The values of a list as a non-empty tuple, the form zod enumerations want. */
export function valuesOf<T extends string>(list: readonly Term<T>[]): [T, ...T[]] {
  const [first, ...rest] = list.map((term) => term.value)
  if (first === undefined) throw new Error('a closed list needs at least one term')
  return [first, ...rest]
}

/** The label of a value; the value itself when it is not in the list, so that old rows still read. */
export function labelOf(list: readonly Term[], value: string): string {
  return list.find((term) => term.value === value)?.label ?? value
}

export const TRIGGERS = terms([
  {
    value: 'made-basket',
    label: 'made basket',
    definition: 'The other team has just scored from the field.',
  },
  {
    value: 'made-free-throw',
    label: 'made free throw',
    definition: 'The last free throw of a set has just gone in.',
  },
  {
    value: 'dead-ball',
    label: 'dead ball',
    definition: 'A throw-in from endline or sideline after a whistle.',
  },
  {
    value: 'break',
    label: 'break',
    definition: 'The first ball after a time-out or at the start of a period.',
  },
  { value: 'live', label: 'live ball', definition: 'A rebound or a steal; nobody throws in.' },
])
export type Trigger = (typeof TRIGGERS)[number]['value']

/** Shapes as logged; `parent` is set on a film value that refines a quick one. */
export const SHAPES = terms([
  { value: 'person', label: 'person', definition: 'Each defender takes a player.' },
  {
    value: '1-2-1-1',
    label: '1-2-1-1',
    definition: 'One on the thrower, two wings, one middle, one safety.',
  },
  { value: '2-2-1', label: '2-2-1', definition: 'Two up, two behind them, one safety; shows a sideline.' },
  { value: '1-3-1', label: '1-3-1', definition: 'One up, three across near half, one safety.' },
  { value: 'other-zone', label: 'other zone', definition: 'Any other zone shape.' },
  {
    value: 'fake',
    label: 'showed it and left',
    definition: 'They show the press and leave before the first pass.',
  },
  { value: 'dropped-back', label: 'dropped back', definition: 'They wait behind half court; no press.' },
])
export type Shape = (typeof SHAPES)[number]['value']

export const SHAPE_VARIANTS = terms([
  { value: 'straight', label: 'straight', definition: 'One on one, no help comes.', parent: 'person' },
  { value: 'deny', label: 'deny', definition: 'Between ball and receivers.', parent: 'person' },
  {
    value: 'switch',
    label: 'switch',
    definition: 'They exchange at screens or crossings.',
    parent: 'person',
  },
  {
    value: 'jump-switch',
    label: 'jump-switch',
    definition: 'A second defender jumps the dribbler, the first leaves for the open player.',
    parent: 'person',
  },
  {
    value: 'jump-trap',
    label: 'jump-trap',
    definition: 'A second defender jumps the dribbler and both stay.',
    parent: 'person',
  },
  {
    value: 'fake-jump',
    label: 'fake jump',
    definition: 'A stunt at the dribbler, then recover.',
    parent: 'person',
  },
  {
    value: 'face-guard',
    label: 'face-guard',
    definition: 'The best handler is denied, back to the ball.',
    parent: 'person',
  },
  {
    value: 'centre-field',
    label: 'centre-field',
    definition: 'Nobody on the thrower; that defender is the spare.',
    parent: 'person',
  },
  {
    value: 'double-receiver',
    label: 'double the receiver',
    definition: 'The spare doubles the main receiver before or on the catch.',
    parent: 'person',
  },
  {
    value: '2-1-2',
    label: '2-1-2',
    definition: 'Only the middle player springs traps.',
    parent: 'other-zone',
  },
  { value: '1-2-2', label: '1-2-2', definition: 'Picks a side, traps at half.', parent: 'other-zone' },
  { value: '1-1-3', label: '1-1-3', definition: 'Slows the ball, protects.', parent: 'other-zone' },
  { value: 'match-up', label: 'match-up', definition: 'A zone that guards persons.', parent: 'other-zone' },
])
export type ShapeVariant = (typeof SHAPE_VARIANTS)[number]['value']

/** Shapes that are not a press; every other shape counts as pressed (RECORD.md section 1). */
export const NOT_PRESSED: readonly Shape[] = ['fake', 'dropped-back']

export const PICKUPS = terms([
  { value: 'full', label: 'full court', definition: 'First within 2 m of ball or thrower short of x .20.' },
  {
    value: 'three-quarter',
    label: 'three-quarter',
    definition: 'First within 2 m of the ball from x .20 to .40.',
  },
  { value: 'half', label: 'half court', definition: 'First within 2 m of the ball from x .40 to .62.' },
])
export type Pickup = (typeof PICKUPS)[number]['value']

export const OUTCOMES = terms([
  {
    value: 'through-with-numbers',
    label: 'through, with numbers',
    definition: 'Over half with more attackers.',
  },
  {
    value: 'through',
    label: 'through',
    definition: 'Over half with the ball and kept five seconds past it.',
  },
  { value: 'foul-drawn', label: 'fouled before half', definition: 'The press fouled before half court.' },
  { value: 'lost-live', label: 'lost, live', definition: 'The press took the ball and play ran on.' },
  { value: 'lost-dead', label: 'lost, dead', definition: 'The ball was lost with a whistle.' },
  { value: 'count', label: 'count called', definition: 'The throw-in or backcourt count ran out.' },
  { value: 'stopped', label: 'stopped', definition: 'Any other whistle; left out of the rates.' },
])
export type Outcome = (typeof OUTCOMES)[number]['value']

/** Success of a pressed possession, from the offence's side (RECORD.md section 3). */
export const SUCCESSES: readonly Outcome[] = ['through', 'through-with-numbers', 'foul-drawn']

export const OUTCOME_PLACES = terms([
  { value: 'entry', label: 'on the throw-in', definition: 'Before the first touch in court.' },
  { value: 'backcourt', label: 'in the backcourt', definition: 'After the first touch, before half.' },
  { value: 'past-half', label: 'just past half', definition: 'Within five seconds of crossing.' },
])
export type OutcomePlace = (typeof OUTCOME_PLACES)[number]['value']

/** Looked for on film and could not be seen; never enters a denominator. */
export const NOT_VISIBLE = 'not-visible'

export const THROWER_GUARDS = terms([
  { value: 'none', label: 'nobody on the thrower', definition: 'The thrower is left free.' },
  {
    value: 'mirror',
    label: 'mirrors the thrower',
    definition: 'A defender jumps with the ball at the line.',
  },
  { value: 'off', label: 'stands off the thrower', definition: 'A defender a step or two off the line.' },
])
export type ThrowerGuard = (typeof THROWER_GUARDS)[number]['value']

export const DENIED = terms([
  { value: 'near', label: 'the near receiver', definition: 'The nearest catch is taken away.' },
  { value: 'far', label: 'the far receiver', definition: 'The far-side catch is taken away.' },
  { value: 'middle', label: 'the middle', definition: 'The catch in the middle is taken away.' },
  { value: 'pass-back', label: 'the pass back', definition: 'The return to the thrower is taken away.' },
  {
    value: 'best-handler',
    label: 'the best handler',
    definition: 'The trusted dribbler is kept off the ball.',
  },
])
export type Denied = (typeof DENIED)[number]['value']

export const LANES = terms([
  { value: 'middle', label: 'the middle', definition: 'Between the lanes, short of half.' },
  { value: 'sideline', label: 'the sideline', definition: 'Up the ball-side line.' },
  { value: 'long', label: 'the long pass', definition: 'Over the press.' },
  { value: 'pass-back', label: 'the pass back', definition: 'To the player behind the ball.' },
  { value: 'far-side', label: 'the far side', definition: 'Across the court.' },
])
export type Lane = (typeof LANES)[number]['value']

export const ON_BALL = terms([
  { value: 'pressured', label: 'pressured', definition: 'Up on the ball, turning the dribbler.' },
  { value: 'contained', label: 'contained', definition: 'In front, no risk taken.' },
  { value: 'sagged', label: 'sagged', definition: 'Off the ball, the dribble invited.' },
])
export type OnBall = (typeof ON_BALL)[number]['value']

export const HANDLERS = terms([
  { value: 'strong', label: 'a strong handler', definition: 'A trusted dribbler had it.' },
  { value: 'weak', label: 'a weak handler', definition: 'They had it where they wanted it.' },
  { value: 'unknown', label: 'an unknown handler', definition: 'Not known to the scout.' },
])
export type Handler = (typeof HANDLERS)[number]['value']

export const TRAP_CUES = terms([
  { value: 'on-catch', label: 'on the catch', definition: 'Two arrive as the pass is caught.' },
  { value: 'first-dribble', label: 'on the first dribble', definition: 'Two arrive as the ball goes down.' },
  { value: 'turned-back', label: 'on the turned back', definition: 'Two arrive as the dribbler spins.' },
  {
    value: 'dead-dribble',
    label: 'on the dead dribble',
    definition: 'Two arrive once the ball is picked up.',
  },
  { value: 'head-down', label: 'on the dropped head', definition: 'Two arrive as the eyes go down.' },
  { value: 'on-reversal', label: 'on the reversal', definition: 'Two arrive as the ball changes sides.' },
  { value: 'on-crossing', label: 'on the crossing', definition: 'Two arrive at the half-court line.' },
])
export type TrapCue = (typeof TRAP_CUES)[number]['value']

export const TRAP_RESULTS = terms([
  { value: 'passed-out', label: 'passed out', definition: 'The ball got out by a pass.' },
  { value: 'dribbled-out', label: 'dribbled out', definition: 'The ball got out by the dribble.' },
  { value: 'lost', label: 'lost', definition: 'The ball was lost in the trap.' },
  { value: 'foul', label: 'foul', definition: 'A whistle on the trappers.' },
  { value: 'held', label: 'held', definition: 'A held ball.' },
])
export type TrapResult = (typeof TRAP_RESULTS)[number]['value']

/** A first trap that was got out of; the denominator of "trap again". */
export const GOT_OUT: readonly TrapResult[] = ['passed-out', 'dribbled-out']

export const GOALIES = terms([
  { value: 'home', label: 'stayed home', definition: 'The safety waited in front of the basket.' },
  { value: 'left-early', label: 'left early', definition: 'The safety came up before the long pass.' },
])

export const GRADES = terms([
  { value: 'none', label: 'nothing yet', definition: 'Nothing counted.' },
  { value: 'sighting', label: 'sighting', definition: 'Fewer than 5 counted.' },
  { value: 'hint', label: 'hint', definition: '5 or more counted; one game never passes a hint.' },
  { value: 'lean', label: 'lean', definition: '10 or more, over two games or more.' },
  { value: 'firm', label: 'firm', definition: '20 or more, over two games or more.' },
])
export type Grade = (typeof GRADES)[number]['value']

export const CLAIMS = terms([
  { value: 'usually', label: 'usually', definition: 'The 80 in 100 lower bound is past half.' },
  { value: 'rarely', label: 'rarely', definition: 'The 80 in 100 upper bound is under half.' },
  { value: 'unclear', label: 'unclear', definition: 'Neither.' },
])
export type Claim = (typeof CLAIMS)[number]['value']

export const TEAM_ROLES = terms([
  {
    value: 'head-coach',
    label: 'head coach',
    definition: 'Picks, signs off, sets the rules, runs the team.',
  },
  {
    value: 'assistant-coach',
    label: 'assistant coach',
    definition: 'Scouts, logs, reads; suggests, does not pick.',
  },
  { value: 'player', label: 'player', definition: 'Opens what has been handed out.' },
])
export type TeamRole = (typeof TEAM_ROLES)[number]['value']

export const ROLES = ['1', '2', '3', '4', '5'] as const
/** A place in a counter's five, not a shirt number. */
export type Role = (typeof ROLES)[number]

export const STATIONS = terms([
  { value: 'scout', label: 'Scout', definition: 'Watch and log.' },
  { value: 'read', label: 'Read', definition: 'Decide what is habit.' },
  { value: 'choose', label: 'Choose', definition: 'Pick the counter.' },
  { value: 'teach', label: 'Teach', definition: 'Put it in the players’ hands.' },
  { value: 'review', label: 'Review', definition: 'Know whether it worked.' },
])
export type Station = (typeof STATIONS)[number]['value']

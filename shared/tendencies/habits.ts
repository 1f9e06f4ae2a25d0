import { SPOT_NAMES } from '../court/trapSpots'
import { FORCED_SIDES } from '../filmWords'
import {
  DENIED,
  LANES,
  NOT_PRESSED,
  SHAPES,
  SHAPE_VARIANTS,
  TRAP_CUES,
  labelOf,
  type Shape,
} from '../vocabulary'

/**
 * Every habit that is counted (RECORD.md section 3): its key, what stands on screen, what its n counts
 * and whose ink it wears. The SQL that counts it lives in server/database/counting/.
 */
export interface Habit {
  /** Stable key, e.g. `press`, `shape:2-2-1`, `trap-at:coffin-corner:left`. Rules name habits by it. */
  key: string
  group: 'press' | 'shape' | 'entry' | 'ball' | 'trap' | 'behind' | 'result'
  /** "They …", sentence case without the subject. */
  label: string
  /** What n counts, for the line under a view in which n differs. */
  nCounts: string
  ink: 'their' | 'our'
  /** A share of their rows given that they pressed; pooled over triggers. */
  givenPressed: boolean
}

const habit = (
  key: string,
  group: Habit['group'],
  label: string,
  nCounts: string,
  ink: Habit['ink'] = 'their',
  givenPressed = true,
): Habit => ({ key, group, label, nCounts, ink, givenPressed })

const SPOT_LABELS: Record<string, string> = {
  'coffin-corner': 'deep corner',
  'early-sideline': 'early sideline',
  'short-of-half': 'sideline short of half',
  'just-over-half': 'sideline just over half',
  'front-wing': 'front wing',
  'front-corner': 'front corner',
  'middle-lane': 'middle lane',
  other: 'elsewhere',
}

/** "left deep corner", "middle lane": a spot as it stands inside a sentence. */
export function spotLabel(spot: string, side: string): string {
  const label = SPOT_LABELS[spot] ?? spot
  return side === 'left' || side === 'right' ? `${side} ${label}` : label
}

/** Spots that one is in; the others lie on a line. */
const INSIDE = ['coffin-corner', 'front-wing', 'front-corner', 'middle-lane']

/** Where a trap is, as a sentence has it: "in the left deep corner", "on an early sideline", "elsewhere". */
export function spotPhrase(spot: string, side: string): string {
  const label = spotLabel(spot, side)
  if (spot === 'other') return label
  const article = side !== 'any' ? 'the' : /^[aeiou]/.test(label) ? 'an' : 'a'
  return `${INSIDE.includes(spot) ? 'in' : 'on'} ${article} ${label}`
}

const trapHabits = SPOT_NAMES.flatMap((spot): Habit[] => {
  const n = 'pressed, traps logged'
  if (spot === 'other') return []
  if (spot === 'middle-lane')
    return [habit('trap-at:middle-lane:middle', 'trap', `Trap ${spotPhrase(spot, 'middle')}`, n)]
  return [
    habit(`trap-at:${spot}:any`, 'trap', `Trap ${spotPhrase(spot, 'any')}`, n),
    ...(['left', 'right'] as const).map((side) =>
      habit(`trap-at:${spot}:${side}`, 'trap', `Trap ${spotPhrase(spot, side)}`, n),
    ),
  ]
})

/** How a shape stands after "Press", where its label alone would not read. */
const SHAPE_PHRASES: Partial<Record<Shape, string>> = {
  person: 'person to person',
  'other-zone': 'in another zone',
}

export const HABITS: readonly Habit[] = [
  habit('press', 'press', 'Press', 'covered rows with a shape', 'their', false),
  habit('fake', 'press', 'Show a press and leave', 'covered rows with a shape', 'their', false),
  habit('pickup:full', 'press', 'Pick up full court', 'pressed, pick-up logged'),
  ...SHAPES.filter((shape) => !NOT_PRESSED.includes(shape.value)).map((shape) =>
    habit(
      `shape:${shape.value}`,
      'shape',
      `Press ${SHAPE_PHRASES[shape.value] ?? `in a ${shape.label}`}`,
      'pressed',
    ),
  ),
  ...SHAPE_VARIANTS.map((variant) =>
    habit(`variant:${variant.value}`, 'shape', `Play it as ${variant.label}`, 'pressed, the variant told'),
  ),
  habit('mirror', 'entry', 'Mirror the thrower', 'pressed after a throw-in, the thrower’s guard seen'),
  habit(
    'thrower-free',
    'entry',
    'Leave the thrower free',
    'pressed after a throw-in, the thrower’s guard seen',
  ),
  ...DENIED.map((term) =>
    habit(`deny:${term.value}`, 'entry', `Deny ${term.label}`, 'pressed, denials logged'),
  ),
  habit('sag', 'ball', 'Sag on a weak handler', 'pressed, a weak handler had it, the ball seen'),
  ...FORCED_SIDES.map((side) =>
    habit(`forced:${side.value}`, 'ball', `Turn the ball ${side.label}`, 'pressed, the forced side seen'),
  ),
  habit('light', 'ball', 'Contain and deny nobody', 'pressed, the ball seen, denials logged'),
  habit('all-out', 'ball', 'Pressure and deny two or more', 'pressed, the ball seen, denials logged'),
  habit('disguise', 'press', 'Show one shape and play another', 'pressed, the shown shape logged'),
  habit('trap', 'trap', 'Trap', 'pressed, traps logged'),
  ...trapHabits,
  ...TRAP_CUES.map((cue) =>
    habit(`cue:${cue.value}`, 'trap', `First trap ${cue.label}`, 'trapped, the cue seen'),
  ),
  habit('trap-again', 'trap', 'Trap again', 'first trap got out of'),
  ...LANES.map((lane) =>
    habit(
      `leave-open:${lane.value}`,
      'behind',
      `Leave ${lane.label} open on the trap`,
      'trapped, open lanes logged',
      'our',
    ),
  ),
  habit('safety-leaves-early', 'behind', 'Safety leaves early', 'trapped, the safety seen'),
  habit('safety-home', 'behind', 'Safety stays home', 'trapped, the safety seen'),
  habit(
    'slow-crossing',
    'result',
    'Slow the crossing past three quarters of the count',
    'pressed, over half, the crossing timed',
  ),
  habit('others-through', 'result', 'Let others through', 'pressed in scouted games, not stopped', 'our'),
]

const BY_KEY = new Map(HABITS.map((entry) => [entry.key, entry]))

/** The habit of a key, or undefined for a key that no longer exists. */
export const habitOf = (key: string): Habit | undefined => BY_KEY.get(key)

/** "1-2-1-1", for a shape value in a sentence. */
export const shapeLabel = (shape: string): string => labelOf(SHAPES, shape)

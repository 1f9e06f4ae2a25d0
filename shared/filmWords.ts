import { terms } from './vocabulary'

/** Closed lists of the film fields (RECORD.md section 1); definitions are common practice, no source. */
export const FORCED_SIDES = terms([
  { value: 'left', label: 'to the left', definition: 'The dribbler is turned to the left sideline.' },
  { value: 'right', label: 'to the right', definition: 'The dribbler is turned to the right sideline.' },
  { value: 'middle', label: 'to the middle', definition: 'The dribbler is turned inside.' },
])

/** What they play once the press is beaten or over. */
export const FALLBACKS = terms([
  { value: 'person', label: 'person', definition: 'Each takes a player.' },
  { value: '2-3', label: '2-3', definition: 'Two up, three along the baseline.' },
  { value: '1-2-2', label: '1-2-2', definition: 'One up, two and two behind.' },
  { value: '1-3-1', label: '1-3-1', definition: 'One up, three across, one behind.' },
  { value: 'match-up', label: 'match-up', definition: 'A zone that guards persons.' },
  { value: 'still-trapping', label: 'still trapping', definition: 'They go on trapping past half.' },
])

/** How the trip ended for the offence once it was over half, or where it never got there. */
export const FINISHES = terms([
  { value: 'lay-up', label: 'lay-up', definition: 'A shot at the basket.' },
  { value: 'open-shot', label: 'open shot', definition: 'A shot with nobody near.' },
  { value: 'hard-shot', label: 'contested shot', definition: 'A shot with a hand in the face.' },
  { value: 'free-throws', label: 'free throws', definition: 'Fouled in the act, or in the bonus.' },
  { value: 'set-up', label: 'pulled out', definition: 'Refused, and set up.' },
  { value: 'no-shot', label: 'no shot', definition: 'Control ended without one.' },
])
export type Finish = (typeof FINISHES)[number]['value']

/** What one of theirs does in the press, by shirt number. */
export const PRESS_JOBS = terms([
  { value: 'mirror', label: 'on the thrower', definition: 'Jumps with the ball at the line.' },
  { value: 'trapper', label: 'traps', definition: 'One of the two who come to the ball.' },
  { value: 'thief', label: 'steals', definition: 'Waits in the lane for the pass.' },
  { value: 'safety', label: 'safety', definition: 'Last one back.' },
  { value: 'handler', label: 'handles', definition: 'Brings their own ball up.' },
  { value: 'foul-trouble', label: 'fouls', definition: 'Reaches; is often in trouble.' },
])

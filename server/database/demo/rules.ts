import type { FactCondition, HabitCondition, RuleBody } from '@shared/rules/schemas'

/**
 * The rules a new team starts with: thirteen of DOMAIN.md section 4, by its numbers. All of it is common
 * practice, no source, and the head coach may change every line. A rule's first demand carries its
 * strength (S strong, M medium, L light); what it asks besides is one step lighter, so that one rule never
 * counts as several. Thresholds are one half, the grade is lean, except in the starred rules.
 */
const above = (habit: string): HabitCondition => ({ habit, is: 'above', threshold: 0.5, grade: 'lean' })
const seen = (habit: string): HabitCondition => ({ habit, is: 'seen', threshold: 0.5, grade: 'sighting' })
const atMost = (fact: FactCondition['fact'], value: number): FactCondition => ({ fact, is: 'at-most', value })

const plain = { unless: null, unlessBecause: '', starred: false, on: true }

export const DEMO_RULES: (RuleBody & { key: string })[] = [
  {
    ...plain,
    key: 'rule-2',
    number: 2,
    title: 'All denied, thrower guarded: throw over the top',
    when: { all: [above('deny:near'), above('deny:far'), above('mirror')] },
    then: [{ effect: 'want', trait: 'over-the-top', strength: 'strong' }],
    because: 'With a defender on the thrower and every near catch denied, nobody is spare behind them.',
    unless: { any: [above('safety-home'), atMost('longArms', 0)] },
    unlessBecause: 'Their safety waits for that ball, or nobody available throws that far.',
  },
  {
    ...plain,
    key: 'rule-6',
    number: 6,
    title: 'Two come on the catch: catch off the lines',
    when: above('cue:on-catch'),
    then: [
      { effect: 'want', trait: 'catch-off-lines', strength: 'strong' },
      { effect: 'want', trait: 'return-to-thrower', strength: 'medium' },
    ],
    because: 'Two metres off the line, and with the pass back at once, the trap is not set yet.',
  },
  {
    ...plain,
    key: 'rule-10',
    number: 10,
    title: 'They trap in the deep corner: no entry there',
    when: seen('trap-at:coffin-corner:any'),
    then: [{ effect: 'ban', trait: 'corner-entry' }],
    because: 'They have trapped in the deep corner, and two lines help them there.',
    starred: true,
  },
  {
    ...plain,
    key: 'rule-11',
    number: 11,
    title: '1-2-1-1 traps the first pass: past their wing',
    when: { all: [above('shape:1-2-1-1'), above('cue:on-catch')] },
    then: [
      { effect: 'want', trait: 'sideline-entry', strength: 'strong' },
      { effect: 'want', trait: 'middle-entry', strength: 'medium' },
    ],
    because: 'When the wing leaves to trap, the line behind is open, and after it the middle.',
  },
  {
    ...plain,
    key: 'rule-14',
    number: 14,
    title: '2-2-1: fill the middle',
    when: above('shape:2-2-1'),
    then: [
      { effect: 'want', trait: 'middle-entry', strength: 'strong' },
      { effect: 'want', trait: 'valve-behind', strength: 'medium' },
      { effect: 'want', trait: 'far-diagonal', strength: 'medium' },
    ],
    because: 'Between their two lines the middle is open, and the far diagonal behind it.',
    unless: atMost('middlePlayers', 0),
    unlessBecause: 'Nobody available decides safely in the middle.',
  },
  {
    ...plain,
    key: 'rule-17',
    number: 17,
    title: '1-3-1: two guards up, then the far side',
    when: above('shape:1-3-1'),
    then: [
      { effect: 'want', trait: 'two-guard-front', strength: 'strong' },
      { effect: 'want', trait: 'over-the-top', strength: 'medium' },
      { effect: 'want', trait: 'far-side-reversal', strength: 'medium' },
    ],
    because: 'One point cannot guard two, and over the point the far corner is late.',
    unless: atMost('longArms', 0),
    unlessBecause: 'Nobody available throws the pass across.',
  },
  {
    ...plain,
    key: 'rule-20',
    number: 20,
    title: 'Trap just over half: stop short or cross inside',
    when: above('trap-at:just-over-half:any'),
    then: [
      { effect: 'want', trait: 'valve-behind', strength: 'strong' },
      { effect: 'want', trait: 'middle-entry', strength: 'medium' },
      { effect: 'warn', text: 'With the count nearly out, cross all the same, four metres inside the line.' },
    ],
    because: 'Past half two lines and no way back help them: draw two short of it, or cross in the middle.',
  },
  {
    ...plain,
    key: 'rule-25',
    number: 25,
    title: 'Jump-trap: clear the path, stay behind',
    when: above('variant:jump-trap'),
    then: [
      { effect: 'want', trait: 'clear-path', strength: 'strong' },
      { effect: 'want', trait: 'valve-behind', strength: 'medium' },
      { effect: 'want', trait: 'middle-entry', strength: 'medium' },
    ],
    because: 'A teammate near the dribbler brings the second defender along.',
  },
  {
    ...plain,
    key: 'rule-28',
    number: 28,
    title: 'They trap a turned back: no spin',
    when: seen('cue:turned-back'),
    then: [{ effect: 'warn', text: 'Never spin with the ball: retreat, face them, change in front.' }],
    because: 'They have come on a turned back, when the dribbler cannot see the second defender.',
    starred: true,
  },
  {
    ...plain,
    key: 'rule-30',
    number: 30,
    title: 'They sag on a weak handler: take the bait away',
    when: above('sag'),
    then: [{ effect: 'want', trait: 'screening-handler', strength: 'medium' }],
    because: 'They leave the weak handler free to have the ball there: let that player screen or stay deep.',
  },
  {
    ...plain,
    key: 'rule-47',
    number: 47,
    title: 'One handler: a big as second outlet',
    when: atMost('handlers', 1),
    then: [
      { effect: 'want', trait: 'big-outlet', strength: 'strong' },
      { effect: 'avoid', trait: 'clear-out', strength: 'strong' },
    ],
    because: 'With one trusted handler they can double the ball and wait.',
  },
  {
    ...plain,
    key: 'rule-48',
    number: 48,
    title: 'No long arm: the deep player is a decoy',
    when: atMost('longArms', 0),
    then: [
      { effect: 'avoid', trait: 'deep-first-look', strength: 'strong' },
      { effect: 'warn', text: 'Nobody available throws long: the deep player only draws a defender.' },
    ],
    because: 'A long pass that floats is the easiest to steal.',
  },
  {
    ...plain,
    key: 'rule-56',
    number: 56,
    title: 'Fewer than five presses seen: we do not know',
    when: atMost('pressedRows', 4),
    then: [
      { effect: 'warn', text: 'We do not know yet how they press. Start from the answer to any press.' },
    ],
    because: 'Under five presses nothing is a habit yet.',
  },
]

import { above, atLeast, atMost, below, plain, seen, type DemoRule } from './terms'

/** DOMAIN.md section 4, rules 32 to 42: what they show, where it ends and when it comes. */
export const READ_RULES: DemoRule[] = [
  {
    ...plain,
    key: 'rule-32',
    number: 32,
    title: 'They disguise it: the answer to any press',
    // The habit is named so that its count and its possessions stand behind the reason.
    when: { all: [seen('disguise'), atLeast('disguised', 2)] },
    then: [
      { effect: 'want', trait: 'universal', strength: 'medium' },
      { effect: 'warn', text: 'Call the answer by their first pass, not by how they stand.' },
    ],
    because: 'They have shown one shape and played another, so how they stand tells us little.',
  },
  {
    ...plain,
    key: 'rule-33',
    number: 33,
    title: 'They only show it: walk, and call early',
    when: above('fake', 0.7),
    then: [{ effect: 'warn', text: 'Walk it up and call the set early; mind the shot clock.' }],
    because: 'They leave before the first pass, and hurry is all that the show can win them.',
  },
  {
    ...plain,
    key: 'rule-34',
    number: 34,
    title: 'They slow the crossing: in early, pass ahead',
    when: above('slow-crossing'),
    then: [
      { effect: 'want', trait: 'quick-entry', strength: 'medium' },
      { effect: 'warn', text: 'Get it in early, and pass ahead before the first dribble.' },
    ],
    because: 'Against them three quarters of the count are gone before half, and then one mistake is a call.',
  },
  {
    ...plain,
    key: 'rule-36',
    number: 36,
    title: 'Safety leaves early: somebody fast and deep',
    when: above('safety-leaves-early'),
    then: [
      { effect: 'want', trait: 'long-threat', strength: 'strong' },
      { effect: 'warn', text: 'Throw long only while at least six of ten long passes land in practice.' },
    ],
    because: 'Behind a safety who comes up nobody is home.',
    unless: { any: [atMost('longArms', 0), atMost('sprinters', 0)] },
    unlessBecause: 'Nobody available throws that far, or nobody available runs that fast.',
  },
  {
    ...plain,
    key: 'rule-37',
    number: 37,
    title: 'Safety stays home: finish three against two',
    when: above('safety-home'),
    then: [{ effect: 'warn', text: 'Over half do not throw long: finish three against two.' }],
    because: 'The safety takes the long pass away and is one of two who defend the basket.',
  },
  {
    ...plain,
    key: 'rule-39',
    number: 39,
    title: 'They trap once: one safe pass, then attack',
    when: below('trap-again'),
    then: [
      { effect: 'want', trait: 'valve-behind', strength: 'medium' },
      { effect: 'warn', text: 'One safe pass out of the trap, then attack at once.' },
    ],
    because: 'After the first trap they run back, and two of them are behind the ball.',
  },
  {
    ...plain,
    key: 'rule-40',
    number: 40,
    title: 'They trap past half: keep the shape across',
    when: {
      any: [
        above('trap-at:just-over-half:any'),
        above('trap-at:front-wing:any'),
        above('trap-at:front-corner:any'),
      ],
    },
    then: [{ effect: 'warn', text: 'Half court is not the end: keep the shape until their trap is beaten.' }],
    because: 'Their trap comes past half, just when the five let go of their places.',
  },
  {
    ...plain,
    key: 'rule-41',
    number: 41,
    title: 'After free throws: call it before the last one',
    when: atLeast('pressedAfterFreeThrow', 1),
    then: [{ effect: 'warn', text: 'Call the press break before their last free throw.' }],
    because: 'They have pressed after a made free throw, when everybody has time to stand right.',
    starred: true,
  },
  {
    ...plain,
    key: 'rule-42',
    number: 42,
    title: 'After a break: agree on the call in the huddle',
    when: atLeast('pressedAfterBreak', 1),
    then: [{ effect: 'warn', text: 'Agree on the call in the huddle, before play goes on.' }],
    because: 'They have pressed on the first ball after a time-out or a new period.',
    starred: true,
  },
]

import { atLeast, atMost, exactly, plain, type DemoRule } from './terms'

/** DOMAIN.md section 4, rules 47 to 57: our own squad, the rule set and how much we know. */
export const OWN_RULES: DemoRule[] = [
  {
    ...plain,
    key: 'rule-46',
    number: 46,
    title: 'Late time-out moves the ball up: weigh it',
    when: exactly('timeOutAdvance', 1),
    then: [
      {
        effect: 'warn',
        text: 'Late in the game a time-out moves the throw-in up: weigh it against the break.',
      },
    ],
    because: 'Under these rules the coach may have the throw-in past half after a late time-out.',
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
    key: 'rule-50',
    number: 50,
    title: 'Seven or fewer: pass, and spare their legs',
    when: atMost('available', 7),
    then: [
      { effect: 'avoid', trait: 'clear-out', strength: 'medium' },
      { effect: 'warn', text: 'Seven or fewer are available: fewer live repetitions this week.' },
    ],
    because: 'A pass tires nobody; one who dribbles through a press all evening is spent by the end.',
  },
  {
    ...plain,
    key: 'rule-51',
    number: 51,
    title: 'Eight seconds: change sides once',
    when: atMost('backcourtCount', 8),
    then: [{ effect: 'warn', text: 'The count is eight seconds: change sides once, then go.' }],
    because: 'A second change of sides costs more than eight seconds leave.',
  },
  {
    ...plain,
    key: 'rule-51-ten',
    number: 51,
    title: 'Ten seconds: changing sides twice fits',
    when: atLeast('backcourtCount', 10),
    then: [{ effect: 'warn', text: 'The count is ten seconds: changing sides twice fits.' }],
    because: 'Ten seconds leave time for a second change of sides.',
  },
  {
    ...plain,
    key: 'rule-52',
    number: 52,
    title: 'Screen from behind: one step of room',
    when: atLeast('blindScreens', 1),
    then: [
      { effect: 'warn', text: 'The book has a screen from behind: leave that defender one step of room.' },
    ],
    because: 'Who cannot see a screen must have room to stop, or it is our foul and their injury.',
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
  {
    ...plain,
    key: 'rule-57',
    number: 57,
    title: 'Old film: believe it one word less',
    when: atLeast('filmDays', 29),
    then: [
      {
        effect: 'warn',
        text: 'Their newest film is over four weeks old: read every lean as a hint, every hint as a sighting.',
      },
    ],
    because: 'A team changes its press within a month.',
  },
]

import type { Condition, FactCondition, FactName, HabitCondition } from '@shared/rules/schemas'
import { habitOf } from '@shared/tendencies/habits'
import { GRADES, labelOf } from '@shared/vocabulary'

/** One question of a condition as it stands in a sentence: who, what, and how sure it must be. */
export interface Clause {
  /** "they", "their safety", "we"; empty where the words carry their own. */
  subject: string
  words: string
  /** "usually, from a lean up"; empty for a fact, which is certain. */
  sure: string
  /** Whose doing it is. */
  ink: 'their' | 'our'
}

/** A question and how it is joined to the one before. */
export interface Joined {
  clause: Clause
  joined: 'and' | 'or'
}

const COUNT_WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten']
const number = (value: number): string => COUNT_WORDS[value] ?? String(value)

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1)

/** How a habit reads after its subject, where its label has another subject or would not read. */
function habitWords(key: string): Pick<Clause, 'subject' | 'words'> {
  const label = habitOf(key)?.label
  if (label === undefined) return { subject: 'they', words: `do what is no longer counted (${key})` }
  if (key === 'variant:straight') return { subject: 'they', words: 'play it straight' }
  if (key === 'variant:switch') return { subject: 'they', words: 'switch' }
  if (key.startsWith('cue:')) return { subject: 'they', words: label.replace(/^First trap/, 'first trap') }
  if (label.startsWith('Safety ')) return { subject: 'their safety', words: label.slice('Safety '.length) }
  return { subject: 'they', words: lowerFirst(label) }
}

/** "more than 7 times in 10"; one half is the plain word. */
const share = (threshold: number): string => `${Number((threshold * 10).toFixed(1))} times in 10`

/** How sure a rule wants to be of a habit. A starred rule acts on one sighting. */
export function sureWords(asked: HabitCondition, starred: boolean): string {
  if (asked.is === 'seen' || (starred && asked.is === 'above')) return 'on one sighting'
  const grade = labelOf(GRADES, asked.grade)
  const from = asked.grade === 'none' ? 'whatever is counted' : `from a ${grade} up`
  if (asked.threshold === 0.5) return `${asked.is === 'above' ? 'usually' : 'rarely'}, ${from}`
  return `${asked.is === 'above' ? 'more' : 'less'} than ${share(asked.threshold)}, ${from}`
}

/** "one player or none" for at most 1, and so on, with the thing counted in both numbers. */
function amount({ is, value }: FactCondition, one: string, many: string): string {
  const thing = value === 1 ? one : many
  if (value === 0) return is === 'at-least' ? `any number of ${many}` : `no ${one}`
  if (is === 'at-most') return `at most ${number(value)} ${thing}`
  return is === 'at-least' ? `at least ${number(value)} ${thing}` : `just ${number(value)} ${thing}`
}

const ourPlayers = (rest: string) => (fact: FactCondition) => ({
  subject: 'we',
  words: `have ${amount(fact, 'player', 'players')} ${rest}`,
})

const done = (what: string) => (fact: FactCondition) => {
  const { is, value } = fact
  if (is !== 'at-least' && value === 0) return { subject: 'they', words: `have not ${what}` }
  if (is === 'at-least' && value <= 1) return { subject: 'they', words: `have ${what}` }
  return { subject: 'they', words: `have ${what} ${amount(fact, 'time', 'times')}` }
}

const size = ({ is, value }: FactCondition, unit: string): string => {
  const count = `${number(value)} ${unit}`
  return is === 'equal' ? count : `${count} or ${is === 'at-least' ? 'more' : 'less'}`
}

type FactWords = (fact: FactCondition) => Pick<Clause, 'subject' | 'words'>

const FACT_WORDS: Record<FactName, FactWords> = {
  pressedRows: (fact) => ({
    subject: '',
    words: `${amount(fact, 'press of theirs is', 'presses of theirs are')} counted`,
  }),
  handlers: ourPlayers('who can handle under pressure'),
  longArms: ourPlayers('who can throw long'),
  middlePlayers: ourPlayers('who can decide in the middle'),
  available: ourPlayers('available'),
  dribblingThrowers: ourPlayers('who can throw in and dribble'),
  bestHandlers: ourPlayers('who can win one on one with the ball'),
  otherLongArms: ourPlayers('who can throw long besides our best handler'),
  sprinters: ourPlayers('who can sprint'),
  backcourtCount: (fact) => ({ subject: 'the count', words: `is ${size(fact, 'seconds')}` }),
  timeOutWhileThrowing: ({ value }) => ({
    subject: 'we',
    words: value === 0 ? 'get no time-out while we throw in' : 'get a time-out while we throw in',
  }),
  pressedAfterScore: done('pressed after a basket or a free throw'),
  pressedAfterFreeThrow: done('pressed after a made free throw'),
  pressedAfterDeadBall: done('pressed after a whistle'),
  pressedAfterBreak: done('pressed after a time-out or at the start of a period'),
  disguised: done('disguised it'),
  ownThrowInCounts: (fact) => ({
    subject: 'we',
    words:
      fact.is === 'at-least' && fact.value <= 1
        ? 'had five called on a throw-in'
        : `had five called on ${amount(fact, 'throw-in', 'throw-ins')}`,
  }),
  filmDays: (fact) => ({ subject: 'their newest film', words: `is ${size(fact, 'days old')}` }),
  theirStealsInMiddle: (fact) => ({
    subject: 'one of theirs',
    words: `has taken ${amount(fact, 'pass', 'passes')} in the middle`,
  }),
  ourStealsInMiddle: (fact) => ({
    subject: 'we',
    words: `have lost ${amount(fact, 'pass', 'passes')} in the middle`,
  }),
  timeOutAdvance: ({ value }) => ({
    subject: 'a late time-out',
    words: value === 0 ? 'leaves the throw-in where it is' : 'moves the throw-in past half',
  }),
  blindScreens: (fact) => ({
    subject: 'our book',
    words:
      fact.is === 'at-least' && fact.value <= 1
        ? 'has a screen from behind'
        : `has ${amount(fact, 'counter', 'counters')} with a screen from behind`,
  }),
}

const THEIR_FACTS: readonly FactName[] = [
  'pressedRows',
  'pressedAfterScore',
  'pressedAfterFreeThrow',
  'pressedAfterDeadBall',
  'pressedAfterBreak',
  'disguised',
  'theirStealsInMiddle',
  'filmDays',
]

function clauseOf(leaf: HabitCondition | FactCondition, starred: boolean): Clause {
  if ('habit' in leaf) return { ...habitWords(leaf.habit), sure: sureWords(leaf, starred), ink: 'their' }
  const theirs = THEIR_FACTS.includes(leaf.fact)
  return {
    ...FACT_WORDS[leaf.fact](leaf),
    sure: starred && theirs ? 'on one sighting' : '',
    ink: theirs ? 'their' : 'our',
  }
}

/** The questions of a condition in order; a group inside a group reads on in the same line. */
export function clausesOf(condition: Condition, starred = false): Joined[] {
  if ('all' in condition || 'any' in condition) {
    const [parts, joined] =
      'all' in condition ? [condition.all, 'and' as const] : [condition.any, 'or' as const]
    return parts.flatMap((part) =>
      clausesOf(part, starred).map((each, index) => (index === 0 ? { ...each, joined } : each)),
    )
  }
  return [{ clause: clauseOf(condition, starred), joined: 'and' }]
}

const leavesOf = (condition: Condition): (HabitCondition | FactCondition)[] => {
  if ('all' in condition) return condition.all.flatMap(leavesOf)
  return 'any' in condition ? condition.any.flatMap(leavesOf) : [condition]
}

/** Keys of the habits that a condition asks about, each once, in the order written. */
export const habitsIn = (condition: Condition): string[] => [
  ...new Set(leavesOf(condition).flatMap((leaf) => ('habit' in leaf ? [leaf.habit] : []))),
]

/** The facts that a condition asks about, each once, in the order written. */
export const factsIn = (condition: Condition): FactName[] => [
  ...new Set(leavesOf(condition).flatMap((leaf) => ('fact' in leaf ? [leaf.fact] : []))),
]

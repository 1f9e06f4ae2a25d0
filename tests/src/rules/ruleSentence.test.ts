import { describe, expect, it } from 'vitest'
import { FACTS, type Condition, type RuleRow } from '@shared/rules/schemas'
import { HABITS } from '@shared/tendencies/habits'
import { clausesOf, habitsIn } from '@/views/rules/conditionWords'
import { ruleSentence, textOf, unlessSentence } from '@/views/rules/ruleSentence'
import { above, rule } from './rules'

const reads = (changes: Partial<RuleRow>) => textOf(ruleSentence(rule(changes)))
const ifs = (when: Condition, starred = false) => reads({ when, starred }).split(', want')[0]
const below = (habit: string) => ({ habit, is: 'below', threshold: 0.5, grade: 'lean' }) as const

describe('a rule as a sentence', () => {
  it('says if, how sure, what, how much and why', () => {
    expect(reads({})).toBe(
      'If they press in a 2-2-1, usually, from a lean up, want middle entry, strongly, and valve behind, clearly, ' +
        'because the middle is open.',
    )
  })

  it('says a subject and how sure once while they stay, and the last joined', () => {
    expect(ifs({ all: [above('deny:near'), above('deny:far'), above('mirror')] })).toBe(
      'If they deny the near receiver, deny the far receiver and mirror the thrower, usually, from a lean up',
    )
    expect(ifs({ any: [above('deny:best-handler'), above('variant:face-guard')] })).toBe(
      'If they deny the best handler or play it as face-guard, usually, from a lean up',
    )
  })

  it('says again what changes', () => {
    expect(ifs({ all: [above('variant:1-2-2'), below('pickup:full')] })).toBe(
      'If they play it as 1-2-2, usually, from a lean up, and pick up full court, rarely, from a lean up',
    )
    expect(ifs({ all: [above('shape:2-2-1'), above('safety-leaves-early')] })).toBe(
      'If they press in a 2-2-1 and their safety leaves early, usually, from a lean up',
    )
  })

  it('tells a threshold and a grade of its own', () => {
    expect(ifs(above('fake', 0.7, 'firm'))).toBe(
      'If they show a press and leave, more than 7 times in 10, from a firm up',
    )
  })

  it('tells the star', () => {
    expect(ifs(above('cue:turned-back'), true)).toBe('If they first trap on the turned back, on one sighting')
    const score = { fact: 'pressedAfterFreeThrow', is: 'at-least', value: 1 } as const
    expect(ifs(score, true)).toBe('If they have pressed after a made free throw, on one sighting')
    expect(ifs(score)).toBe('If they have pressed after a made free throw')
  })

  it('says facts of our own in our ink, without how sure', () => {
    const when = { fact: 'handlers', is: 'at-most', value: 1 } as const
    expect(ifs(when)).toBe('If we have at most one player who can handle under pressure')
    expect(ruleSentence(rule({ when })).find(({ text }) => text.startsWith('have'))?.kind).toBe('our')
    expect(ifs({ fact: 'filmDays', is: 'at-least', value: 29 })).toBe(
      'If their newest film is 29 days old or more',
    )
    expect(ifs({ fact: 'longArms', is: 'at-most', value: 0 })).toBe('If we have no player who can throw long')
  })

  it('bans, avoids and speaks', () => {
    expect(
      reads({
        then: [
          { effect: 'avoid', trait: 'clear-out', strength: 'light' },
          { effect: 'ban', trait: 'corner-entry' },
          { effect: 'warn', text: 'Never spin.' },
        ],
      }),
    ).toContain('avoid clear-out, a little, leave out corner entry, and say “Never spin”, because')
  })

  it('knows which demand a strength belongs to', () => {
    const strengths = ruleSentence(
      rule({ then: [{ effect: 'warn', text: 'Look.' }, ...rule().then] }),
    ).filter((part) => part.kind === 'strength')
    expect(strengths).toEqual([
      { kind: 'strength', text: 'strongly', strength: 'strong', demand: 1 },
      { kind: 'strength', text: 'clearly', strength: 'medium', demand: 2 },
    ])
  })

  it('says below it what silences it, and nothing where nothing does', () => {
    const unless: Condition = { any: [above('safety-home'), { fact: 'longArms', is: 'at-most', value: 0 }] }
    expect(textOf(unlessSentence({ unless, unlessBecause: 'The safety waits.' }))).toBe(
      'Silent if their safety stays home, usually, from a lean up, or we have no player who can throw long: the safety waits.',
    )
    expect(unlessSentence({ unless: null, unlessBecause: '' })).toEqual([])
  })

  it.each(HABITS.map(({ key }) => key))('reads %s in small letters, whatever its label', (key) => {
    const [only] = clausesOf(above(key))
    expect(only?.clause.words).toMatch(/^[a-z]/)
    expect(only?.clause.words).not.toMatch(/no longer counted/)
  })

  it.each(
    FACTS.flatMap((fact) => (['equal', 'at-least', 'at-most'] as const).map((is) => [fact, is] as const)),
  )('has words for %s, %s', (fact, is) => {
    for (const value of [0, 1, 7])
      expect(textOf(ruleSentence(rule({ when: { fact, is, value } })))).not.toMatch(/undefined|NaN| {2}/)
  })

  it('still reads a habit that is gone', () => {
    expect(ifs(above('gone'))).toContain('no longer counted (gone)')
  })
})

describe('habitsIn', () => {
  it('finds each habit once, however deep', () => {
    const when: Condition = {
      all: [
        above('trap'),
        { any: [above('mirror'), above('trap')] },
        { fact: 'handlers', is: 'equal', value: 1 },
      ],
    }
    expect(habitsIn(when)).toEqual(['trap', 'mirror'])
  })
})

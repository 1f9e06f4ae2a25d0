import { describe, expect, it } from 'vitest'
import type { Choice, Choices, Reason } from '@shared/choices/schemas'
import type { Tendency } from '@shared/tendencies/schemas'
import { rulesNow } from '@/views/rules/ruleNow'
import { emptyWords, headSentence, inOrder, shownRules } from '@/views/rules/ruleList'
import { above, rule } from './rules'

const ID = '00000000-0000-4000-8000-0000000000'
const id = (last: number) => `${ID}${String(last).padStart(2, '0')}`
const quiet: Choices = {
  gameId: id(90),
  opponentId: id(91),
  unknown: false,
  base: { k: 7, n: 10, mean: 0.7 },
  mostly: null,
  others: { k: 0, n: 0 },
  choices: [],
  leftOut: [],
  silenced: [],
  warnings: [],
}
const choice = (changes: Partial<Choice>) =>
  ({ counterId: id(80), rank: 1, reasons: [], warnings: [], ...changes }) as unknown as Choice
const tendency = (key: string, k: number, n: number, thin = false) =>
  ({ key, k, n, thin }) as unknown as Tendency

const situations = [
  { trigger: 'all', pressed: 16, n: 40 },
  { trigger: 'made-basket', pressed: 9, n: 20 },
  { trigger: 'made-free-throw', pressed: 4, n: 5 },
] as const

const at = (row: ReturnType<typeof rule>, choices: Partial<Choices>, counts: Tendency[] = []) =>
  rulesNow([row], { ...quiet, ...choices }, { tendencies: counts, situations: [...situations] }).get(row.id)

describe('what a rule says now', () => {
  const row = rule()

  it.each<[string, Partial<Choices>]>([
    ['a reason', { choices: [choice({ reasons: [{ ruleId: row.id } as Reason] })] }],
    ['a warning beside a counter', { choices: [choice({ warnings: [{ ruleId: row.id, text: '' }] })] }],
    ['a warning for all', { warnings: [{ ruleId: row.id, text: '' }] }],
    ['a counter left out', { leftOut: [{ counterId: id(1), reason: '', ruleId: row.id }] }],
  ])('speaks when it is heard in %s', (_, choices) => {
    expect(at(row, choices)?.state).toBe('speaks')
  })

  it('is not heard through another rule, nor through a counter left out for its roles', () => {
    expect(at(row, { warnings: [{ ruleId: id(2), text: '' }] })).toMatchObject({
      state: 'quiet',
      words: 'Not now',
    })
    expect(at(row, { leftOut: [{ counterId: id(1), reason: '', ruleId: null }] })?.state).toBe('quiet')
  })

  it('says why it is kept silent', () => {
    const now = at(row, { silenced: [{ ruleId: row.id, because: 'Nobody decides there.' }] })
    expect(now).toMatchObject({ state: 'silent', words: 'Kept silent: Nobody decides there.' })
  })

  it('does not claim to know of a rule that only takes away', () => {
    const ban = rule({ then: [{ effect: 'ban', trait: 'corner-entry' }] })
    expect(at(ban, {})?.words).toBe('Touches no counter now')
  })

  it('is off when it is off, whatever an older order says', () => {
    expect(at(rule({ on: false }), { warnings: [{ ruleId: row.id, text: '' }] })?.state).toBe('off')
  })

  it('gives k of n of every habit it asks about, in its order', () => {
    const two = rule({ when: { all: [above('mirror'), above('deny:near')] } })
    const counts = [tendency('deny:near', 5, 20), tendency('mirror', 2, 3, true), tendency('trap', 1, 1)]
    expect(at(two, {}, counts)?.counts.map(({ key, k, n, thin }) => [key, k, n, thin])).toEqual([
      ['mirror', 2, 3, true],
      ['deny:near', 5, 20, false],
    ])
  })
})

describe('counts behind a fact', () => {
  it('are presses of all rows after that trigger; a fact of our own has none', () => {
    const after = (fact: 'pressedAfterScore' | 'pressedAfterFreeThrow' | 'handlers') =>
      at(rule({ when: { fact, is: 'at-least', value: 1 } }), {})?.counts.map(({ k, n }) => [k, n])
    expect(after('pressedAfterScore')).toEqual([[13, 25]])
    expect(after('pressedAfterFreeThrow')).toEqual([[4, 5]])
    expect(after('handlers')).toEqual([])
  })
})

describe('the list', () => {
  const rows = [rule(), rule({ id: id(20), number: 20, on: false }), rule({ id: id(6), number: 6 })]
  const now = rulesNow(
    rows,
    { ...quiet, warnings: [{ ruleId: id(6), text: '' }] },
    { tendencies: [], situations: [...situations] },
  )

  it('is in order of numbers, the team’s own last', () => {
    const own = rule({ id: id(1), number: null })
    expect(inOrder([own, ...rows]).map(({ number }) => number)).toEqual([6, 14, 20, null])
  })

  it('shows all, those that speak or those that are off', () => {
    const numbers = (shown: 'all' | 'now' | 'off') => shownRules(rows, now, shown).map(({ number }) => number)
    expect([numbers('all'), numbers('now'), numbers('off')]).toEqual([[14, 20, 6], [6], [20]])
    expect(shownRules(rows, null, 'now')).toEqual([])
  })

  it('says why a choice of them is empty', () => {
    expect(emptyWords('off', true).title).toBe('Every rule is on')
    expect(emptyWords('now', true).title).toBe('No rule speaks now')
    expect(emptyWords('now', false).title).toBe('No game ahead')
  })

  it('is told in a sentence, with the next game only where there is one', () => {
    expect(headSentence(rows, now, 'Port Selby Gulls', 'Fri 20 March')).toMatch(
      /^3 rules, 2 on\. 1 speaks now for Port Selby Gulls, Fri 20 March\. They /,
    )
    expect(headSentence([rule()], null, '', '')).toMatch(/^1 rule, all on\. They /)
  })
})

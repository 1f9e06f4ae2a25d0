import { describe, it, expect } from 'vitest'
import { Choices } from '@shared/choices/schemas'
import { chooseCounters, isUnknown, type ChooseInput } from '@server/engine/choose'
import { counter, player, read, roles, rule, six, type Counts } from './builders'

const known: Counts = {
  press: [24, 30],
  'shape:2-2-1': [18, 24],
  'shape:person': [6, 24],
  'others-through': [13, 22],
}

const choose = (changes: Partial<ChooseInput> = {}) =>
  chooseCounters({
    tendencies: read(known),
    rules: [],
    counters: [counter('a'), counter('b')],
    squad: six(),
    pack: { key: 'fiba', backcourtCount: 8 },
    own: { k: 0, n: 0 },
    ...changes,
  })
const order = async (changes: Partial<ChooseInput>) =>
  (await choose(changes)).choices.map((choice) => choice.counterId)

const shape = { habit: 'shape:2-2-1', is: 'above', threshold: 0.5, grade: 'lean' } as const

describe('demands', () => {
  const wants = rule('wants', {
    number: 14,
    when: shape,
    then: [{ effect: 'want', trait: 'middle-entry', strength: 'strong' }],
  })
  const avoids = rule('avoids', { then: [{ effect: 'avoid', trait: 'clear-out', strength: 'medium' }] })

  it('speak for what is wanted and offered, against what is wanted and missing', async () => {
    const { choices } = await choose({
      rules: [wants],
      counters: [counter('without'), counter('with', { traits: ['middle-entry'] })],
    })
    const [first, second] = choices
    expect(first?.counterId).toBe('with')
    expect(first?.reasons[0]).toMatchObject({
      ruleId: 'wants',
      ruleNumber: 14,
      habitKey: 'shape:2-2-1',
      k: 18,
      n: 24,
      games: 2,
      asked: 'wants middle entry',
      sign: 1,
      strength: 'strong',
      thin: false,
    })
    expect(second?.reasons[0]?.sign).toBe(-1)
    expect(second?.reasons[0]?.weight).toBeCloseTo(-(first?.reasons[0]?.weight ?? 0), 12)
    expect(first?.reasons[0]?.weight).toBeCloseTo(0.7 * (first?.reasons[0]?.credence ?? 0), 12)
    expect(first?.expected?.mean).toBeGreaterThan(0.7)
    expect(second?.expected?.mean).toBeLessThan(0.7)
  })

  it('speak against what is unwanted and offered, and not for what is unwanted and missing', async () => {
    const { choices } = await choose({
      rules: [avoids],
      counters: [counter('with', { traits: ['clear-out'] }), counter('without')],
    })
    expect(choices.map((choice) => choice.counterId)).toEqual(['without', 'with'])
    expect(choices[0]?.reasons).toEqual([])
    expect(choices[0]?.prior).toBeCloseTo(0.7, 12)
    expect(choices[1]?.reasons[0]).toMatchObject({
      asked: 'avoids clear-out',
      sign: -1,
      weight: -0.4,
      habitKey: null,
      k: null,
    })
  })

  it('are listed the heaviest first and add up to the prior', async () => {
    const { choices } = await choose({
      rules: [
        avoids,
        wants,
        rule('light', { then: [{ effect: 'want', trait: 'universal', strength: 'light' }] }),
      ],
      counters: [counter('a', { traits: ['clear-out', 'middle-entry', 'universal'] })],
    })
    const [only] = choices
    const weights = only?.reasons.map((reason) => reason.weight) ?? []
    expect(only?.reasons.map((reason) => reason.ruleId)).toEqual(['wants', 'avoids', 'light'])
    const sum = weights.reduce((total, weight) => total + weight, 0)
    expect(only?.prior).toBeCloseTo(1 / (1 + Math.exp(-(Math.log(0.7 / 0.3) + sum))), 12)
  })

  it('of a rule that is silenced do not count, and the silence is told', async () => {
    const silent = {
      ...wants,
      unless: { fact: 'handlers', is: 'at-least', value: 1 } as const,
      unlessBecause: 'No.',
    }
    const chosen = await choose({ rules: [silent], counters: [counter('a')] })
    expect(chosen.choices[0]?.reasons).toEqual([])
    expect(chosen.silenced).toEqual([{ ruleId: 'wants', because: 'No.' }])
  })

  it('weigh as the settings say', async () => {
    const { choices } = await choose({
      rules: [avoids],
      counters: [counter('a', { traits: ['clear-out'] })],
      settings: { strengths: { light: 0.1, medium: 1, strong: 2 } },
    })
    expect(choices[0]?.reasons[0]?.weight).toBe(-1)
  })
})

describe('left out', () => {
  it('is a counter that a rule bans, with the rule’s reason', async () => {
    const ban = rule('ban', {
      when: { habit: 'trap-at:coffin-corner:any', is: 'seen', threshold: 0.5, grade: 'lean' },
      then: [{ effect: 'ban', trait: 'corner-entry' }],
      starred: true,
      because: 'They trap there.',
    })
    const counters = [counter('corner', { traits: ['corner-entry'] }), counter('b')]
    const seen = await choose({
      rules: [ban],
      counters,
      tendencies: read({ ...known, 'trap-at:coffin-corner:any': [1, 24] }),
    })
    expect(seen.choices.map((choice) => choice.counterId)).toEqual(['b'])
    expect(seen.leftOut).toEqual([{ counterId: 'corner', reason: 'They trap there.', ruleId: 'ban' }])
    const unseen = await choose({ rules: [ban], counters })
    expect(unseen.leftOut).toEqual([])
  })

  it('is a counter with a role that nobody available can fill', async () => {
    const asks = roles({ '3': [{ skill: 'long-arm', level: 3 }] })
    const squad = [...six({ 'long-arm': 1 }), player('arm', { 'long-arm': 3 }, false)]
    const { leftOut, choices } = await choose({
      squad,
      counters: [counter('long', { roles: asks }), counter('b')],
    })
    expect(leftOut).toEqual([
      { counterId: 'long', reason: 'Nobody available can fill role 3, role 3.', ruleId: null },
    ])
    expect(choices.map((choice) => choice.counterId)).toEqual(['b'])
  })

  it('is none for want of players while no squad is written down: its places stay empty', async () => {
    const needs = [{ skill: 'handle' as const, level: 3 }]
    const { leftOut, choices } = await choose({
      counters: [counter('a', { roles: roles({ '1': needs }) })],
      squad: [],
    })
    expect(leftOut).toEqual([])
    expect(choices[0]?.squadTerm).toBe(0)
    expect(choices[0]?.roles.map(({ squadPlayerId }) => squadPlayerId)).toEqual([
      null,
      null,
      null,
      null,
      null,
    ])
    const out = await choose({
      counters: [counter('a', { roles: roles({ '1': needs }) })],
      squad: [player('p', {}, false)],
    })
    expect(out.leftOut).toHaveLength(1)
  })

  it('is a counter that is not for the game’s rule set', async () => {
    const { leftOut } = await choose({ counters: [counter('a', { rulePacks: ['nba', 'ncaa'] })] })
    expect(leftOut).toMatchObject([{ counterId: 'a', ruleId: null }])
  })
})

describe('our own record', () => {
  it('against the shape they show most counts most, and is told as counted', async () => {
    const tried = (at: string) => counter(at, { record: [{ shape: at, k: 9, n: 9 }] })
    const chosen = await choose({ counters: [tried('person'), tried('2-2-1')] })
    expect(chosen.mostly).toEqual({ shape: '2-2-1', k: 18, n: 24 })
    expect(chosen.others).toEqual({ k: 13, n: 22 })
    expect(chosen.choices.map((choice) => choice.counterId)).toEqual(['2-2-1', 'person'])
    expect(chosen.choices[0]).toMatchObject({ record: { k: 9, n: 9 }, recordShare: 9 / 17 })
    expect(chosen.choices[1]).toMatchObject({ record: { k: 0, n: 0 }, recordShare: 2.25 / 10.25 })
  })

  it('against pressure moves every prior', async () => {
    const poor = await choose({ own: { k: 5, n: 30 } })
    expect(poor.base).toEqual({ k: 5, n: 30, mean: expect.closeTo(12 / 40, 12) })
    expect(poor.choices[0]?.prior).toBeCloseTo(0.3, 12)
  })

  it('with a success more never ranks a counter lower', async () => {
    for (let k = 0; k < 8; k += 1) {
      const expected = async (got: number) => {
        const { choices } = await choose({
          counters: [counter('a', { record: [{ shape: '2-2-1', k: got, n: 8 }] }), counter('b')],
        })
        const found = choices.find((choice) => choice.counterId === 'a')
        return { mean: found?.expected?.mean ?? 0, rank: found?.rank ?? 9 }
      }
      const [before, after] = [await expected(k), await expected(k + 1)]
      expect(after.mean).toBeGreaterThan(before.mean)
      expect(after.rank).toBeLessThanOrEqual(before.rank)
    }
  })
})

describe('order', () => {
  it('puts a counter under ten live reps last and says it is not game-ready', async () => {
    const raw = counter('raw', { liveReps: 9, record: [{ shape: '2-2-1', k: 20, n: 20 }] })
    const { choices } = await choose({ counters: [raw, counter('b', { liveReps: 10 })] })
    expect(choices.map((choice) => [choice.counterId, choice.gameReady])).toEqual([
      ['b', true],
      ['raw', false],
    ])
  })

  it('settles a tie by the fewest new actions', async () => {
    const counters = [counter('a', { newActions: 2 }), counter('b', { newActions: 1 })]
    expect(await order({ counters })).toEqual(['b', 'a'])
  })

  it('counts a squad that fills the roles badly against a counter', async () => {
    const asks = roles({ '1': [{ skill: 'handle', level: 3 }], '2': [{ skill: 'decide', level: 3 }] })
    const { choices } = await choose({ counters: [counter('hard', { roles: asks }), counter('easy')] })
    expect(choices.map((choice) => choice.counterId)).toEqual(['easy', 'hard'])
    // two of five roles at 2/3: mean fit 13/15, of which half is the most that may be missing
    expect(choices[1]?.squadTerm).toBeCloseTo(-(2 / 15) / 0.5, 12)
    expect(choices[1]?.expected?.mean).toBeLessThan(choices[0]?.expected?.mean ?? 0)
  })
})

describe('nothing known', () => {
  const counters = [
    counter('tried', { record: [{ shape: '2-2-1', k: 9, n: 9 }] }),
    counter('any', { traits: ['universal'], newActions: 4 }),
  ]

  it.each<[string, Counts]>([
    ['no rows at all', {}],
    ['no pressed rows', { press: [0, 30] }],
    ['sightings only', { press: [4, 30], 'shape:2-2-1': [4, 4], 'trap-at:coffin-corner:any': [1, 4] }],
  ])('%s: the answer to any press first, and no number', async (_, counts) => {
    const chosen = await choose({ tendencies: read(counts), counters })
    expect(chosen.unknown).toBe(true)
    expect(chosen.choices.map((choice) => choice.counterId)).toEqual(['any', 'tried'])
    for (const choice of chosen.choices)
      expect(choice).toMatchObject({ expected: null, prior: null, recordShare: 0 })
  })

  it('ends with the fifth pressed row', async () => {
    expect(isUnknown(read({ press: [4, 9], 'shape:2-2-1': [4, 4] }))).toBe(true)
    expect(isUnknown(read({ press: [5, 9], 'shape:2-2-1': [4, 5] }))).toBe(false)
  })

  it('still bans on one sighting', async () => {
    const ban = rule('ban', {
      when: { habit: 'trap', is: 'seen', threshold: 0.5, grade: 'lean' },
      then: [{ effect: 'ban', trait: 'universal' }],
      starred: true,
    })
    const tendencies = read({ press: [2, 3], trap: [1, 2] })
    expect((await choose({ tendencies, counters, rules: [ban] })).leftOut).toHaveLength(1)
  })
})

describe('warnings', () => {
  it('stand beside the counters a rule speaks against, or once for all', async () => {
    const warn = { effect: 'warn', text: 'Only a decoy.' } as const
    const beside = rule('beside', {
      then: [{ effect: 'avoid', trait: 'long-threat', strength: 'light' }, warn],
    })
    const once = rule('once', { then: [{ effect: 'warn', text: 'Never spin.' }] })
    const chosen = await choose({
      rules: [beside, once],
      counters: [counter('a'), counter('long', { traits: ['long-threat'] })],
    })
    expect(chosen.warnings).toEqual([{ ruleId: 'once', text: 'Never spin.' }])
    const warned = chosen.choices.map((choice) => [choice.counterId, choice.warnings])
    expect(Object.fromEntries(warned)).toEqual({
      a: [],
      long: [{ ruleId: 'beside', text: 'Only a decoy.' }],
    })
  })
})

describe('the answer', () => {
  it('has the shape that both sides agreed', async () => {
    const id = (digit: number) => `00000000-0000-4000-8000-00000000000${digit}`
    const squad = [1, 2, 3, 4, 5, 6].map((digit) => player(id(digit)))
    const chosen = await choose({
      squad,
      rules: [rule(id(7), { number: 1 })],
      counters: [counter(id(8)), counter(id(9), { rulePacks: ['nba'] })],
    })
    expect(Choices.parse({ gameId: id(1), opponentId: id(2), ...chosen })).toMatchObject({
      choices: [{ rank: 1 }],
    })
  })

  it('is the same every time, and leaves what it was given alone', async () => {
    const input = { counters: [counter('a'), counter('b')], rules: [rule('r')], squad: six() }
    const before = structuredClone(input)
    expect(await choose(input)).toEqual(await choose(input))
    expect(input).toEqual(before)
  })
})

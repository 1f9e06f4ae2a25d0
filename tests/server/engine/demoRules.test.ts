import { describe, it, expect } from 'vitest'
import { DEMO_RULES } from '@server/database/demo/rules'
import { factsOf, type EnginePlayer } from '@server/engine/facts'
import { reasonsFor, warningsForAll } from '@server/engine/reasons'
import { runRules } from '@server/engine/rules'
import { ENGINE_DEFAULTS } from '@server/engine/settings'
import type { Trait } from '@shared/vocabulary'
import { player, read, six, type Counts } from './builders'

const rules = DEMO_RULES.map((body) => ({ ...body, id: body.key }))

interface Case {
  counts?: Counts
  squad?: EnginePlayer[]
  pressedRows?: number
}

async function run({ counts = {}, squad = six(), pressedRows = 30 }: Case) {
  const { fired, silenced } = await runRules(
    rules,
    read(counts),
    factsOf({ squad, pressedRows, backcourtCount: 8 }),
  )
  return {
    rules: fired,
    fired: fired.map((one) => one.rule.number),
    silenced: silenced.map((one) => one.rule.number),
  }
}

/** Six of whom only the first so many have the skill under pressure. */
const onlySome = (skill: 'handle' | 'long-arm' | 'decide', many: number) =>
  ['a', 'b', 'c', 'd', 'e', 'f'].map((id, index) => player(id, { [skill]: index < many ? 2 : 1 }))

const usual = [8, 10] as const
const unclear = [7, 10] as const

describe('each rule of the demo fires on its facts and not just short of them', () => {
  it.each<[number, Case, Case]>([
    [
      2,
      { counts: { 'deny:near': usual, 'deny:far': usual, mirror: usual } },
      { counts: { 'deny:near': usual, 'deny:far': usual, mirror: unclear } },
    ],
    [6, { counts: { 'cue:on-catch': usual } }, { counts: { 'cue:on-catch': unclear } }],
    [
      10,
      { counts: { 'trap-at:coffin-corner:any': [1, 3] } },
      { counts: { 'trap-at:coffin-corner:any': [0, 30], 'trap-at:early-sideline:any': usual } },
    ],
    [
      11,
      { counts: { 'shape:1-2-1-1': usual, 'cue:on-catch': usual } },
      { counts: { 'shape:1-2-1-1': usual, 'cue:first-dribble': usual } },
    ],
    [14, { counts: { 'shape:2-2-1': usual } }, { counts: { 'shape:2-2-1': [8, 9] } }],
    [17, { counts: { 'shape:1-3-1': usual } }, { counts: { 'shape:1-3-1': unclear } }],
    [
      20,
      { counts: { 'trap-at:just-over-half:any': usual } },
      { counts: { 'trap-at:short-of-half:any': usual, 'trap-at:just-over-half:any': unclear } },
    ],
    [25, { counts: { 'variant:jump-trap': usual } }, { counts: { 'variant:jump-switch': usual } }],
    [28, { counts: { 'cue:turned-back': [1, 12] } }, { counts: { 'cue:turned-back': [0, 12] } }],
    [30, { counts: { sag: usual } }, { counts: { sag: unclear } }],
    [47, { squad: onlySome('handle', 1) }, { squad: onlySome('handle', 2) }],
    [48, { squad: onlySome('long-arm', 0) }, { squad: onlySome('long-arm', 1) }],
    [56, { pressedRows: 4 }, { pressedRows: 5 }],
  ])('rule %i', async (number, on, off) => {
    expect((await run(on)).fired).toContain(number)
    const not = await run(off)
    expect(not.fired).not.toContain(number)
    expect(not.silenced).not.toContain(number)
  })

  it('says nothing about an opponent of whom enough is known and nothing is usual', async () => {
    expect(await run({ counts: { press: [20, 40], 'shape:person': [6, 12] } })).toMatchObject({
      fired: [],
      silenced: [],
    })
  })
})

describe('contra-facts of the demo rules', () => {
  const denied: Counts = { 'deny:near': usual, 'deny:far': usual, mirror: usual }

  it.each<[number, string, Case]>([
    [2, 'their safety stays home', { counts: { ...denied, 'safety-home': usual } }],
    [2, 'nobody throws long', { counts: denied, squad: onlySome('long-arm', 0) }],
    [14, 'nobody decides in the middle', { counts: { 'shape:2-2-1': usual }, squad: onlySome('decide', 0) }],
    [17, 'nobody throws across', { counts: { 'shape:1-3-1': usual }, squad: onlySome('long-arm', 0) }],
  ])('rule %i is silent when %s', async (number, _, on) => {
    const result = await run(on)
    expect(result.silenced).toContain(number)
    expect(result.fired).not.toContain(number)
  })

  it('rule 2 speaks when the safety’s habit is unclear', async () => {
    expect((await run({ counts: { ...denied, 'safety-home': unclear } })).fired).toContain(2)
  })
})

describe('what the demo rules ask', () => {
  const speaks = async (traits: Trait[], on: Case) =>
    reasonsFor(traits, (await run(on)).rules, ENGINE_DEFAULTS.strengths)

  it('a 2-2-1 wants the middle most, then the valve and the far diagonal', async () => {
    const reasons = await speaks(['middle-entry', 'far-diagonal'], { counts: { 'shape:2-2-1': [18, 20] } })
    expect(reasons.map((reason) => [reason.asked, reason.sign, reason.strength])).toEqual([
      ['wants middle entry', 1, 'strong'],
      ['wants valve behind', -1, 'medium'],
      ['wants far diagonal', 1, 'medium'],
    ])
    expect(reasons[0]?.credence).toBeGreaterThan(0.95)
  })

  it('one handler speaks against the clear-out, with full credence', async () => {
    const reasons = await speaks(['clear-out', 'big-outlet'], { squad: onlySome('handle', 1) })
    expect(reasons.map((reason) => [reason.asked, reason.weight])).toEqual([
      ['wants big as second outlet', 0.7],
      ['avoids clear-out', -0.7],
    ])
  })

  it('a turned back that was trapped and an unknown press are said once for all', async () => {
    const { rules: fired } = await run({ counts: { 'cue:turned-back': [1, 2] }, pressedRows: 2 })
    expect(warningsForAll(fired).map((warning) => warning.ruleId)).toEqual(['rule-28', 'rule-56'])
  })
})

import { describe, it, expect } from 'vitest'
import { DEMO_RULES } from '@server/database/demo/rules'
import { factsOf, type EnginePlayer, type GivenFacts } from '@server/engine/facts'
import { reasonsFor, warningsForAll } from '@server/engine/reasons'
import { runRules } from '@server/engine/rules'
import { ENGINE_DEFAULTS } from '@server/engine/settings'
import type { Skill, Trait } from '@shared/counterWords'
import { player, read, type Counts } from './builders'

const rules = DEMO_RULES.map((body) => ({ ...body, id: body.key }))

interface Case {
  counts?: Counts
  squad?: EnginePlayer[]
  pressedRows?: number
  backcourtCount?: number
  given?: Partial<GivenFacts>
}

// Nine seconds is no rule set's: rules about the count keep out of the other cases.
async function run({ counts = {}, squad = eight, pressedRows = 30, backcourtCount = 9, given }: Case) {
  const { fired, silenced } = await runRules(
    rules,
    read(counts),
    factsOf({ squad, pressedRows, backcourtCount, given }),
  )
  return {
    rules: fired,
    fired: fired.map((one) => one.rule.number),
    silenced: silenced.map((one) => one.rule.number),
  }
}

const NAMES = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h']
const eight = NAMES.map((id) => player(id))

/** Eight of whom only the first so many have the skill under pressure. */
const onlySome = (skill: Skill, many: number, has = 2) =>
  NAMES.map((id, index) => player(id, { [skill]: index < many ? has : 1 }))

const usual = [8, 10] as const
const unclear = [7, 10] as const
const rare = [2, 10] as const
const lessRare = [3, 10] as const
/** Somebody handles best of all. */
const oneBest = onlySome('handle', 1, 3)

describe('each rule of the demo fires on its facts and not just short of them', () => {
  it.each<[number, Case, Case]>([
    [
      1,
      { counts: { 'deny:near': usual, 'deny:far': usual, 'thrower-free': usual } },
      { counts: { 'deny:near': usual, 'deny:far': unclear, 'thrower-free': usual } },
    ],
    [
      2,
      { counts: { 'deny:near': usual, 'deny:far': usual, mirror: usual } },
      { counts: { 'deny:near': usual, 'deny:far': usual, mirror: unclear } },
    ],
    [
      3,
      { counts: { 'deny:near': usual, mirror: usual }, given: { pressedAfterScore: 1 } },
      { counts: { 'deny:near': usual, mirror: usual }, given: { pressedAfterScore: 0 } },
    ],
    [
      4,
      { counts: { 'deny:near': usual }, given: { pressedAfterDeadBall: 1 } },
      { counts: { 'deny:near': usual }, given: { pressedAfterDeadBall: 0 } },
    ],
    [5, { counts: { 'deny:best-handler': usual } }, { counts: { 'deny:best-handler': unclear } }],
    [5, { counts: { 'variant:face-guard': usual } }, { counts: { 'variant:deny': usual } }],
    [8, { given: { ownThrowInCounts: 1 } }, { given: { ownThrowInCounts: 0 } }],
    [
      9,
      { counts: { mirror: rare, 'deny:near': rare, 'deny:far': rare } },
      { counts: { mirror: rare, 'deny:near': rare, 'deny:far': lessRare } },
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
    [
      12,
      { counts: { 'shape:1-2-1-1': usual, 'cue:first-dribble': usual } },
      { counts: { 'shape:2-2-1': usual, 'cue:first-dribble': usual } },
    ],
    [
      15,
      { counts: { 'shape:2-2-1': usual, 'safety-leaves-early': usual } },
      { counts: { 'shape:2-2-1': usual, 'safety-leaves-early': unclear } },
    ],
    [16, { counts: { 'variant:2-1-2': usual } }, { counts: { 'variant:2-1-2': unclear } }],
    [
      18,
      { counts: { 'variant:1-2-2': usual, 'pickup:full': rare } },
      { counts: { 'variant:1-2-2': usual, 'pickup:full': lessRare } },
    ],
    [19, { counts: { 'variant:1-1-3': usual } }, { counts: { 'variant:1-1-3': unclear } }],
    [
      21,
      { counts: { 'trap-at:front-corner:any': usual } },
      { counts: { 'trap-at:coffin-corner:any': usual, 'trap-at:front-corner:any': unclear } },
    ],
    [22, { counts: { 'cue:on-reversal': usual } }, { counts: { 'cue:on-reversal': unclear } }],
    [24, { counts: { 'variant:jump-switch': usual } }, { counts: { 'variant:jump-trap': usual } }],
    [
      26,
      { counts: { 'variant:straight': usual }, squad: oneBest },
      { counts: { 'variant:straight': usual }, squad: eight },
    ],
    [27, { counts: { 'variant:switch': usual } }, { counts: { 'variant:switch': unclear } }],
    [29, { counts: { 'cue:dead-dribble': [1, 12] } }, { counts: { 'cue:dead-dribble': [0, 12] } }],
    [
      32,
      { counts: { disguise: [2, 7] }, given: { disguised: 2 } },
      { counts: { disguise: [1, 7] }, given: { disguised: 1 } },
    ],
    [33, { counts: { fake: [16, 19] } }, { counts: { fake: [15, 19] } }],
    [34, { counts: { 'slow-crossing': usual } }, { counts: { 'slow-crossing': unclear } }],
    [36, { counts: { 'safety-leaves-early': usual } }, { counts: { 'safety-leaves-early': unclear } }],
    [37, { counts: { 'safety-home': usual } }, { counts: { 'safety-home': unclear } }],
    [39, { counts: { 'trap-again': rare } }, { counts: { 'trap-again': lessRare } }],
    [40, { counts: { 'trap-at:front-wing:any': usual } }, { counts: { 'trap-at:short-of-half:any': usual } }],
    [41, { given: { pressedAfterFreeThrow: 1 } }, { given: { pressedAfterFreeThrow: 0 } }],
    [42, { given: { pressedAfterBreak: 1 } }, { given: { pressedAfterBreak: 0 } }],
    [50, { squad: eight.slice(1) }, { squad: eight }],
    [51, { backcourtCount: 8 }, { backcourtCount: 9 }],
    [51, { backcourtCount: 10 }, { backcourtCount: 9 }],
    [52, { given: { blindScreens: 1 } }, { given: { blindScreens: 0 } }],
    [57, { given: { filmDays: 29 } }, { given: { filmDays: 28 } }],
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
    [
      1,
      'nobody who throws in dribbles',
      {
        counts: { 'deny:near': usual, 'deny:far': usual, 'thrower-free': usual },
        squad: NAMES.map((id) => player(id, { handle: 0 })),
      },
    ],
    [
      5,
      'our best handler is our only long arm',
      {
        counts: { 'deny:best-handler': usual },
        squad: NAMES.map((id, at) => player(id, at === 0 ? { handle: 3 } : { 'long-arm': 1 })),
      },
    ],
    [
      8,
      'the rule set gives the thrower’s team no time-out',
      { given: { ownThrowInCounts: 1, timeOutWhileThrowing: 0 } },
    ],
    [
      15,
      'nobody throws that far',
      { counts: { 'shape:2-2-1': usual, 'safety-leaves-early': usual }, squad: onlySome('long-arm', 0) },
    ],
    [22, 'there are eight seconds', { counts: { 'cue:on-reversal': usual }, backcourtCount: 8 }],
    [
      26,
      'they trap more than two times in ten',
      { counts: { 'variant:straight': usual, trap: [5, 10] }, squad: oneBest },
    ],
    [36, 'nobody sprints', { counts: { 'safety-leaves-early': usual }, squad: onlySome('sprint', 0) }],
    [17, 'nobody throws across', { counts: { 'shape:1-3-1': usual }, squad: onlySome('long-arm', 0) }],
  ])('rule %i is silent when %s', async (number, _, on) => {
    const result = await run(on)
    expect(result.silenced).toContain(number)
    // Of the two rules 8 only the one about the time-out has a contra-fact.
    if (number !== 8) expect(result.fired).not.toContain(number)
  })

  it('rule 26 speaks when they trap a little', async () => {
    const on: Case = { counts: { 'variant:straight': usual, trap: [3, 10] }, squad: oneBest }
    expect((await run(on)).fired).toContain(26)
  })

  it('rule 8 asks for the time-out where there is one', async () => {
    const on: Case = { given: { ownThrowInCounts: 1, timeOutWhileThrowing: 1 } }
    expect((await run(on)).rules.map((one) => one.rule.id)).toEqual(['rule-8', 'rule-8-time-out'])
  })

  it('no rule speaks on a fact without an answer', async () => {
    expect((await run({})).fired).toEqual([])
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

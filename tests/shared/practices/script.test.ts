import { describe, expect, it } from 'vitest'
import {
  interleave,
  layReps,
  proposeScript,
  SCRIPT_SETTINGS,
  shareOut,
  type ScriptFacts,
} from '@shared/practices/script'
import { Script } from '@shared/practices/schemas'
import type { Shape } from '@shared/vocabulary'

const looks: ScriptFacts['looks'] = [
  { shape: '1-2-1-1', k: 11 },
  { shape: '2-2-1', k: 5 },
  { shape: 'person', k: 10 },
  { shape: 'dropped-back', k: 12 },
]
const facts = (more: Partial<ScriptFacts> = {}): ScriptFacts => ({
  minutes: 40,
  looks,
  changeUp: true,
  blindScreens: [],
  out: [],
  shortTurns: [],
  ...more,
})
const threeRunning = (order: readonly Shape[]) =>
  order.some((shape, at) => shape === order[at + 1] && shape === order[at + 2])

describe('sharing out', () => {
  it('follows the counts and adds up', () => {
    const shared = shareOut(looks, 32)
    expect(shared.map(({ shape, proposed }) => [shape, proposed])).toEqual([
      ['dropped-back', 10],
      ['1-2-1-1', 9],
      ['person', 9],
      ['2-2-1', 4],
    ])
    expect(shared.every(({ n }) => n === 38)).toBe(true)
  })

  it('gives no look under two, drops looks that never came, and keeps the four that came most', () => {
    const shared = shareOut(
      [
        { shape: 'person', k: 60 },
        { shape: '1-3-1', k: 1 },
        { shape: '2-2-1', k: 0 },
      ],
      20,
    )
    expect(shared.map(({ shape, proposed }) => [shape, proposed])).toEqual([
      ['person', 18],
      ['1-3-1', 2],
    ])
    const five = (['person', '1-2-1-1', '2-2-1', '1-3-1', 'fake'] as const).map((shape, at) => ({
      shape,
      k: 9 - at,
    }))
    expect(shareOut(five, 20)).toHaveLength(SCRIPT_SETTINGS.looks)
    expect(shareOut([], 20)).toEqual([])
  })
})

describe('the order', () => {
  it('has every rep, and no look three times running wherever that can be helped', () => {
    const shapes = ['person', '1-2-1-1', '2-2-1', '1-3-1'] as const
    for (let a = 0; a <= 9; a++)
      for (let b = 0; b <= 6; b++)
        for (let c = 0; c <= 4; c++) {
          const wanted = [a, b, c, 1].map((reps, at) => ({ shape: shapes[at] ?? 'person', reps }))
          const order = interleave(wanted)
          for (const { shape, reps } of wanted)
            expect(order.filter((one) => one === shape)).toHaveLength(reps)
          const most = Math.max(a, b, c, 1)
          const can = most <= 2 * (a + b + c + 1 - most + 1)
          expect([a, b, c, threeRunning(order)]).toEqual([a, b, c, can ? false : expect.any(Boolean)])
        }
  })
})

describe('a script', () => {
  it('fills its minutes with parts that get harder and ticks inside their parts', () => {
    for (const minutes of [10, 17, 40, 75, 120]) {
      const script = Script.parse(proposeScript(facts({ minutes })))
      expect(script.parts.reduce((sum, part) => sum + part.minutes, 0)).toBe(minutes)
      expect(script.parts.map(({ kind }) => kind)).toEqual([
        'talk',
        'walk',
        'overload',
        'drink',
        'live',
        'talk',
      ])
      for (const rep of script.reps) {
        const part = script.parts.find(({ kind }) => kind === rep.kind)
        expect(part && rep.at >= part.from && rep.at <= part.from + part.minutes).toBe(true)
      }
      const times = script.reps.map(({ at }) => at)
      expect(times).toEqual([...times].sort((a, b) => a - b))
      const asked = script.looks.reduce((sum, { proposed }) => sum + proposed, 0)
      expect(script.reps).toHaveLength(asked)
      expect(threeRunning(script.reps.map(({ shape }) => shape))).toBe(false)
    }
  })

  it('caps overloaded and live reps however long it is', () => {
    const { reps } = proposeScript(facts({ minutes: 240 }))
    const of = (kind: string) => reps.filter((rep) => rep.kind === kind).length
    expect(of('overload')).toBeLessThanOrEqual(SCRIPT_SETTINGS.most.overload)
    expect(of('live')).toBeLessThanOrEqual(SCRIPT_SETTINGS.most.live)
  })

  it('has the other call in every fifth rep of a look, and not at all without a change-up', () => {
    const { reps } = proposeScript(facts())
    for (const { shape } of looks) {
      const own = reps.filter((rep) => rep.shape === shape)
      expect(own.filter(({ call }) => call === 'changeUp')).toHaveLength(Math.floor((own.length + 2) / 5))
    }
    expect(reps.some(({ call }) => call === 'changeUp')).toBe(true)
    expect(proposeScript(facts({ changeUp: false })).reps.some(({ call }) => call === 'changeUp')).toBe(false)
  })

  it('warns of blind screens where they are walked and of tired ones where it goes live, else of nothing', () => {
    expect(proposeScript(facts()).cautions).toEqual([])
    const script = proposeScript(
      facts({ blindScreens: [{ counter: 'Ladder', step: 2 }], out: ['Ada', 'Bea'], shortTurns: ['Hanne'] }),
    )
    const [walk, live] = [script.parts[1]?.from, script.parts[4]?.from]
    expect(script.cautions.map(({ at, title }) => [at, title])).toEqual([
      [walk, 'Blind screen, step 2.'],
      [live, 'Tired legs.'],
      [walk, '2 are out.'],
      [live, 'Short turns.'],
    ])
    expect(script.cautions[2]?.text).toContain('Ada and Bea do not take part.')
  })

  it('lays its ticks anew when a look is changed by hand', () => {
    const script = proposeScript(facts())
    const changed = script.looks.map((look) =>
      look.shape === 'dropped-back' ? { ...look, changed: 4 } : look,
    )
    const { reps } = layReps({ ...script, looks: changed, changeUp: true })
    expect(reps.filter(({ shape }) => shape === 'dropped-back')).toHaveLength(4)
    expect(reps).toHaveLength(script.reps.length - 6)
  })

  it('without a single count has parts and no reps', () => {
    expect(proposeScript(facts({ looks: [] })).reps).toEqual([])
  })
})

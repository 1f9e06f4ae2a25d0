import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { HABITS } from '@shared/tendencies/habits'
import type { Evidence, Tendency } from '@shared/tendencies/schemas'
import { teamUrl } from '../../support/fixture'
import { created, newOpponent, newScoutedGame } from '../../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../../support/testApp'
import { TWENTY, twentyBody } from '../../support/twenty'

/** Rows of the set by number: those in n, those in k, and why (RECORD.md section 3). */
interface Known {
  n: number[]
  k: number[]
  why: string
}

const PRESSED = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 20]
const without = (rows: number[], ...out: number[]) => rows.filter((row) => !out.includes(row))
const SHAPED = [...without(PRESSED, 20), 14, 15, 16, 17, 18, 20]
const SHAPE = 'every pressed row has a shape'
const PERSON = 'pressed; in 9 they played person but nobody told how'
const ZONE = 'pressed; in 13 they played another zone but nobody told which'
const THROWER = [1, 2, 3, 4, 5, 10, 11, 12, 20]
const THROWER_WHY = 'pressed after a throw-in, guard seen: 7 and 8 live, 6 not visible, 9 and 13 not logged'
const DENIED = [1, 2, 3, 5, 7, 8, 10, 11, 12, 20]
const DENIED_WHY = 'pressed, denials logged, none counts as logged: 4, 9, 13 not logged, 6 not visible'
const WEAK = 'weak handler, ball seen: 6 and 11 not visible, 2, 5, 7, 8, 12 not weak, 20 not logged'
const BALL = [1, 2, 3, 5, 7, 8, 10, 12, 20]
const BALL_WHY = 'pressed, ball seen and denials logged: without those, 4 can say neither'
const TRAPS = [1, 2, 3, 5, 7, 8, 9, 10, 11, 12, 20]
const TRAPS_WHY = 'pressed, traps logged, none counts as logged: 4 and 13 not logged, 6 not visible'
const CUE = [1, 2, 5, 8, 11, 12, 20]
const CUE_WHY = 'trapped, the first trap’s cue seen: 7 not visible; later traps do not count'
const OPEN = [1, 2, 7, 8, 11, 12]
const OPEN_WHY = 'trapped, open lanes logged, none counts as logged: 3 no trap, 5 not visible, 20 not logged'
const SAFETY = [1, 2, 7, 11, 20]
const SAFETY_WHY = 'trapped, safety seen: 3 no trap, 5 not visible, 8 and 12 not logged'

const FORCED = [1, 2, 3, 7, 8]
const FORCED_WHY = 'pressed, the forced side seen: 6 not visible, the others not logged; 16 is no press'

const at = (k: number[]): Known => ({ n: TRAPS, k, why: TRAPS_WHY })
const cue = (k: number[]): Known => ({ n: CUE, k, why: CUE_WHY })
const open = (k: number[]): Known => ({ n: OPEN, k, why: OPEN_WHY })
const deny = (k: number[]): Known => ({ n: DENIED, k, why: DENIED_WHY })
const person = (k: number[]): Known => ({ n: without(PRESSED, 9), k, why: PERSON })
const zone = (k: number[]): Known => ({ n: without(PRESSED, 13), k, why: ZONE })
const shape = (k: number[]): Known => ({ n: PRESSED, k, why: SHAPE })

const KNOWN: Record<string, Known> = {
  press: { n: SHAPED, k: PRESSED, why: 'rows with a shape: 19 has none' },
  fake: { n: SHAPED, k: [14, 15], why: 'rows with a shape: 19 has none' },
  'pickup:full': {
    n: without(PRESSED, 6, 9),
    k: [1, 2, 8, 10, 11, 13, 20],
    why: 'pressed, pick-up logged: 6 not visible, 9 not logged',
  },
  'shape:person': shape([8, 9, 10, 11]),
  'shape:1-2-1-1': shape([1, 2, 3, 20]),
  'shape:2-2-1': shape([4, 5, 6]),
  'shape:1-3-1': shape([7]),
  'shape:other-zone': shape([12, 13]),
  'variant:straight': person([10]),
  'variant:deny': person([8]),
  'variant:switch': person([]),
  'variant:jump-switch': person([]),
  'variant:jump-trap': person([]),
  'variant:fake-jump': person([]),
  'variant:face-guard': person([11]),
  'variant:centre-field': person([]),
  'variant:double-receiver': person([]),
  'variant:2-1-2': zone([12]),
  'variant:1-2-2': zone([]),
  'variant:1-1-3': zone([]),
  'variant:match-up': zone([]),
  mirror: { n: THROWER, k: [1, 2, 11, 20], why: THROWER_WHY },
  'thrower-free': { n: THROWER, k: [4, 5, 10], why: THROWER_WHY },
  'deny:near': deny([1, 8, 20]),
  'deny:far': deny([3, 8]),
  'deny:middle': deny([5, 8, 12]),
  'deny:pass-back': deny([1, 20]),
  'deny:best-handler': deny([7, 11]),
  sag: { n: [1, 3, 4, 10], k: [3, 4], why: WEAK },
  'forced:left': { n: FORCED, k: [2, 3, 8], why: FORCED_WHY },
  'forced:right': { n: FORCED, k: [1], why: FORCED_WHY },
  'forced:middle': { n: FORCED, k: [7], why: FORCED_WHY },
  light: { n: BALL, k: [2, 10], why: `${BALL_WHY}; in 5 they contained but denied the middle` },
  'all-out': { n: BALL, k: [1, 8, 20], why: `${BALL_WHY}; in 7 they denied only one` },
  disguise: { n: [1, 2, 5, 13, 20], k: [2, 5], why: 'pressed, shown shape logged: 14 was a fake' },
  trap: { n: TRAPS, k: [1, 2, 5, 7, 8, 11, 12, 20], why: TRAPS_WHY },
  'trap-at:coffin-corner:any': at([1, 2, 20]),
  'trap-at:coffin-corner:left': at([2, 20]),
  'trap-at:coffin-corner:right': at([1]),
  'trap-at:early-sideline:any': at([11]),
  'trap-at:early-sideline:left': at([]),
  'trap-at:early-sideline:right': at([11]),
  'trap-at:short-of-half:any': at([5]),
  'trap-at:short-of-half:left': at([5]),
  'trap-at:short-of-half:right': at([]),
  // The second trap of 1; x = .5 in 7 is past half already.
  'trap-at:just-over-half:any': at([1, 7]),
  'trap-at:just-over-half:left': at([1]),
  'trap-at:just-over-half:right': at([7]),
  'trap-at:front-wing:any': at([8]),
  'trap-at:front-wing:left': at([8]),
  'trap-at:front-wing:right': at([]),
  'trap-at:front-corner:any': at([8]),
  'trap-at:front-corner:left': at([]),
  'trap-at:front-corner:right': at([8]),
  'trap-at:middle-lane:middle': at([8]),
  'cue:on-catch': cue([1, 2, 20]),
  'cue:first-dribble': cue([5]),
  'cue:turned-back': cue([8]),
  'cue:dead-dribble': cue([11]),
  'cue:head-down': cue([]),
  'cue:on-reversal': cue([12]),
  'cue:on-crossing': cue([]),
  'trap-again': {
    n: [1, 2, 8, 20],
    k: [1, 8],
    why: 'first trap passed or dribbled out of: 5 held, 7 lost, 12 foul, 11 not logged',
  },
  'leave-open:middle': open([1, 2, 12]),
  'leave-open:sideline': open([8]),
  'leave-open:long': open([2]),
  'leave-open:pass-back': open([7]),
  'leave-open:far-side': open([]),
  'safety-leaves-early': { n: SAFETY, k: [2, 7, 20], why: SAFETY_WHY },
  'safety-home': { n: SAFETY, k: [1, 11], why: SAFETY_WHY },
  'slow-crossing': {
    n: [2, 3],
    k: [3],
    why: 'pressed and the crossing timed, past 6 of 8 seconds: 2 took just 6, 18 was not pressed',
  },
  'others-through': {
    n: without(PRESSED, 5, 9, 20),
    k: [2, 3, 4, 6, 10, 12],
    why: 'pressed, not stopped (5) and the outcome logged (9 and 20 are not)',
  },
}

let test: TestApp
let scout: Agent
let opponent: string
let read: { tendencies: Tendency[]; counted: number; notCovered: number }

beforeAll(async () => {
  test = await startTestApp()
  scout = await test.as('assistant')
  opponent = await newOpponent(scout)
  const game = await newScoutedGame(scout, opponent)
  for (const index of TWENTY.keys()) await created(scout, 'possessions', twentyBody(game, index))
  read = (await scout.get(teamUrl(`/opponents/${opponent}/tendencies`))).body
}, 30_000)
afterAll(() => test.stop())

describe('twenty possessions with known answers', () => {
  it('has an answer for every habit, and no other', () => {
    expect(Object.keys(KNOWN).sort()).toEqual(HABITS.map(({ key }) => key).sort())
    expect(TWENTY).toHaveLength(20)
    expect([read.counted, read.notCovered]).toEqual([20, 0])
  })

  describe.each(HABITS.map(({ key }) => key))('%s', (key) => {
    const { n = [], k = [], why = '' } = KNOWN[key] ?? {}

    it(`is ${k.length} of ${n.length}: ${why}`, () => {
      const found = read.tendencies.find((tendency) => tendency.key === key)
      expect(found).toMatchObject({ k: k.length, n: n.length, games: 1, rate: k.length / n.length })
    })

    it('shows exactly these rows as its evidence', async () => {
      const url = teamUrl(`/opponents/${opponent}/evidence?habit=${key}&limit=200`)
      const { rows, total } = (await scout.get(url)).body as Evidence
      const numbers = (list: Evidence['rows']) =>
        list.map(({ possession }) => possession.number).sort((a, b) => a - b)
      expect(total).toBe(n.length)
      expect(numbers(rows)).toEqual(n)
      expect(numbers(rows.filter(({ counted }) => counted))).toEqual(k)
    })
  })
})

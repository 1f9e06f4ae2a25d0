import { z } from 'zod'

export const RulePackKey = z.enum(['fiba', 'nfhs84', 'nfhs94', 'ncaa', 'nba'])
export type RulePackKey = z.infer<typeof RulePackKey>

/** One international foot, exactly. */
export const FOOT = 0.3048
/** One inch, exactly. */
export const INCH = 0.0254

/** What starts the backcourt count after a throw-in: the first legal touch in court, or control. */
export type CountStart = 'touch' | 'control'

/**
 * A rule set as far as a press is concerned: the court's lines and the counts. Lengths in metres,
 * counts in seconds. Sources: CHECKS.md 'Court and time'; what is marked 'from memory' there or here
 * has no source at hand and is a default.
 */
export interface RulePack {
  key: RulePackKey
  /** The book, as a coach names it. */
  name: string
  /** Short, for a line under a game: "8-second rules". */
  label: string
  court: { length: number; width: number }
  /** Far edge of the free-throw line from the endline. */
  freeThrowLine: number
  laneWidth: number
  /** Also the radius of the half circle on the free-throw line. */
  centreCircle: number
  threePoint: {
    radius: number
    /** Straight lines in the corner, from the near sideline. */
    cornerInset: number
  }
  /** Centre of the basket from the endline. */
  basket: number
  /** Face of the board from the endline; board width and ring radius are from memory. */
  board: { face: number; width: number }
  ringRadius: number
  /** Outer edge of the no-charge half circle round the basket; null where there is none. */
  noCharge: number | null
  throwInSeconds: number
  backcourtSeconds: number
  /** From memory for every book. */
  countStarts: CountStart
  closelyGuarded: { seconds: number; within: number; where: 'anywhere' | 'frontcourt' } | null
  /** Whether the thrower's team gets a time-out once the thrower has the ball. From memory. */
  timeOutWhileThrowing: boolean
  /** Whether a time-out late in the game lets the coach have the throw-in moved past half (DOMAIN.md section 6; from memory where it is silent). */
  timeOutAdvance: boolean
  /** From memory. */
  periods: { count: number; minutes: number; overtimeMinutes: number }
}

const ft = (feet: number, inches = 0): number => feet * FOOT + inches * INCH

/** What the four books written in feet share. */
const IMPERIAL = {
  freeThrowLine: ft(19),
  centreCircle: ft(6),
  basket: ft(0, 63),
  board: { face: ft(4), width: ft(6) },
  ringRadius: ft(0, 9),
  throwInSeconds: 5,
} as const

const NFHS = {
  ...IMPERIAL,
  laneWidth: ft(12),
  // Straight from the endline to the basket's centre (R1-4), so it leaves the arc as a tangent: the
  // corner line is one radius from the middle of the court.
  threePoint: { radius: ft(19, 9), cornerInset: ft(25) - ft(19, 9) },
  noCharge: null,
  backcourtSeconds: 10,
  countStarts: 'control',
  closelyGuarded: { seconds: 5, within: ft(6), where: 'frontcourt' },
  timeOutWhileThrowing: true,
  timeOutAdvance: false,
  periods: { count: 4, minutes: 8, overtimeMinutes: 4 },
} as const

export const RULE_PACKS: Readonly<Record<RulePackKey, RulePack>> = {
  fiba: {
    key: 'fiba',
    name: 'FIBA',
    label: '8-second rules',
    court: { length: 28, width: 15 },
    freeThrowLine: 5.8,
    laneWidth: 4.9,
    centreCircle: 1.8,
    threePoint: { radius: 6.75, cornerInset: 0.9 },
    basket: 1.575,
    board: { face: 1.2, width: 1.8 },
    ringRadius: 0.225,
    noCharge: 1.3,
    throwInSeconds: 5,
    backcourtSeconds: 8,
    // Art. 28: control in the backcourt, or a touch there after a throw-in (from memory).
    countStarts: 'touch',
    closelyGuarded: { seconds: 5, within: 1, where: 'anywhere' },
    timeOutWhileThrowing: false,
    // In the last two minutes of the fourth period and of overtime.
    timeOutAdvance: true,
    periods: { count: 4, minutes: 10, overtimeMinutes: 5 },
  },
  nfhs84: {
    key: 'nfhs84',
    name: 'NFHS, 84 ft',
    label: '10-second rules, 84 ft',
    court: { length: ft(84), width: ft(50) },
    ...NFHS,
  },
  nfhs94: {
    key: 'nfhs94',
    name: 'NFHS, 94 ft',
    label: '10-second rules, 94 ft',
    court: { length: ft(94), width: ft(50) },
    ...NFHS,
  },
  ncaa: {
    key: 'ncaa',
    name: 'NCAA',
    label: '10-second rules, college',
    court: { length: ft(94), width: ft(50) },
    ...IMPERIAL,
    laneWidth: ft(12),
    threePoint: { radius: ft(22, 1.75), cornerInset: ft(0, 40.125) },
    noCharge: ft(4),
    // Throw-in count from memory.
    backcourtSeconds: 10,
    countStarts: 'touch',
    closelyGuarded: { seconds: 5, within: ft(6), where: 'frontcourt' },
    timeOutWhileThrowing: true,
    // The women may, in the last minute; the men, whose halves stand here, may not.
    timeOutAdvance: false,
    // Halves, as the men play; the women play four of ten.
    periods: { count: 2, minutes: 20, overtimeMinutes: 5 },
  },
  nba: {
    key: 'nba',
    name: 'NBA',
    label: '8-second rules, 94 ft',
    court: { length: ft(94), width: ft(50) },
    ...IMPERIAL,
    laneWidth: ft(16),
    threePoint: { radius: ft(23, 9), cornerInset: ft(3) },
    noCharge: ft(4),
    // Throw-in count, and that nothing is closely guarded, from memory.
    backcourtSeconds: 8,
    countStarts: 'touch',
    closelyGuarded: null,
    timeOutWhileThrowing: true,
    timeOutAdvance: true,
    periods: { count: 4, minutes: 12, overtimeMinutes: 5 },
  },
}

/** The rule set of a key. */
export const rulePack = (key: RulePackKey): RulePack => RULE_PACKS[key]

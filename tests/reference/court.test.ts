import { describe, expect, it } from 'vitest'
import { FOOT, INCH, rulePack, type RulePackKey } from '@shared/court/rulePacks'
import {
  arcHalfAngle,
  arcMeetsLine,
  diagonal,
  freeThrowToBasket,
  freeThrowToBoard,
} from '@shared/court/relations'

/** Courts and counts against CHECKS.md 'Court and time'. Each row names where its value was read. */
const feet = (metres: number) => metres / FOOT
const inches = (metres: number) => metres / INCH
const IMPERIAL: RulePackKey[] = ['nfhs84', 'nfhs94', 'ncaa', 'nba']

describe('court sizes', () => {
  it('FIBA 2024: 28 x 15 m (secondary source, Official Basketball Rules)', () => {
    expect(rulePack('fiba').court).toEqual({ length: 28, width: 15 })
  })
  it('NFHS R1-1: ideal 84 x 50 ft, at most 94 x 50 ft (secondary source)', () => {
    expect(feet(rulePack('nfhs84').court.length)).toBeCloseTo(84, 9)
    expect(feet(rulePack('nfhs94').court.length)).toBeCloseTo(94, 9)
  })
  it('NCAA 2019 diagram and NBA: 94 x 50 ft (secondary sources)', () => {
    for (const key of ['ncaa', 'nba'] as const) expect(feet(rulePack(key).court.length)).toBeCloseTo(94, 9)
    for (const key of IMPERIAL) expect(feet(rulePack(key).court.width)).toBeCloseTo(50, 9)
  })
})

describe('lines', () => {
  it('free-throw line, far edge: 5.80 m FIBA, 19 ft in the US (as commonly published; NCAA secondary source)', () => {
    expect(rulePack('fiba').freeThrowLine).toBe(5.8)
    for (const key of IMPERIAL) expect(feet(rulePack(key).freeThrowLine)).toBeCloseTo(19, 9)
  })
  it('free-throw line to board face: 4.60 m FIBA (derived), 15 ft in the US (NBA 1-I-c, secondary source)', () => {
    expect(freeThrowToBoard(rulePack('fiba'))).toBeCloseTo(4.6, 9)
    for (const key of IMPERIAL) expect(feet(freeThrowToBoard(rulePack(key)))).toBeCloseTo(15, 9)
  })
  it('free-throw line to basket centre: 4.225 m FIBA, 13.75 ft US (own arithmetic)', () => {
    expect(freeThrowToBasket(rulePack('fiba'))).toBeCloseTo(4.225, 9)
    for (const key of IMPERIAL) expect(feet(freeThrowToBasket(rulePack(key)))).toBeCloseTo(13.75, 9)
  })
  it('three-point radius: 6.75 m · 19 ft 9 in (R1-4) · 22 ft 1 3/4 in · 23 ft 9 in (1-I-d)', () => {
    expect(rulePack('fiba').threePoint.radius).toBe(6.75)
    expect(inches(rulePack('nfhs84').threePoint.radius)).toBeCloseTo(237, 9)
    expect(inches(rulePack('nfhs94').threePoint.radius)).toBeCloseTo(237, 9)
    expect(inches(rulePack('ncaa').threePoint.radius)).toBeCloseTo(265.75, 9)
    expect(inches(rulePack('nba').threePoint.radius)).toBeCloseTo(285, 9)
  })
  it('corner line: .90 m inside FIBA (as commonly published) · 40 1/8 in NCAA · 3 ft NBA (secondary sources)', () => {
    expect(rulePack('fiba').threePoint.cornerInset).toBe(0.9)
    expect(inches(rulePack('ncaa').threePoint.cornerInset)).toBeCloseTo(40.125, 9)
    expect(feet(rulePack('nba').threePoint.cornerInset)).toBeCloseTo(3, 9)
  })
  it('NFHS R1-4: the straight runs 63 in from the endline, so to the basket’s centre (secondary source)', () => {
    for (const key of ['nfhs84', 'nfhs94'] as const)
      expect(inches(arcMeetsLine(rulePack(key)))).toBeCloseTo(63, 6)
  })
  it('lane: 4.90 m · 12 ft · 12 ft · 16 ft (as commonly published; NCAA secondary source)', () => {
    expect(rulePack('fiba').laneWidth).toBe(4.9)
    for (const key of ['nfhs84', 'nfhs94', 'ncaa'] as const)
      expect(feet(rulePack(key).laneWidth)).toBeCloseTo(12, 9)
    expect(feet(rulePack('nba').laneWidth)).toBeCloseTo(16, 9)
  })
  it('no-charge arc: 1.30 m · none · 4 ft · 4 ft (as commonly published; NCAA secondary source)', () => {
    expect(rulePack('fiba').noCharge).toBe(1.3)
    expect(rulePack('nfhs84').noCharge).toBeNull()
    expect(rulePack('nfhs94').noCharge).toBeNull()
    for (const key of ['ncaa', 'nba'] as const) expect(feet(rulePack(key).noCharge ?? 0)).toBeCloseTo(4, 9)
  })
  it('basket centre: 1.575 m · 63 in (secondary sources; NBA as commonly published)', () => {
    expect(rulePack('fiba').basket).toBe(1.575)
    for (const key of IMPERIAL) expect(inches(rulePack(key).basket)).toBeCloseTo(63, 9)
  })
  it('centre circle: 1.80 m · 6 ft (R1-3; FIBA and NBA as commonly published)', () => {
    expect(rulePack('fiba').centreCircle).toBe(1.8)
    for (const key of IMPERIAL) expect(feet(rulePack(key).centreCircle)).toBeCloseTo(6, 9)
  })
})

describe('relations between lines (own arithmetic, recomputed)', () => {
  it('FIBA: the arc meets its line 2.9901 m from the endline, half-angle 77.8985 degrees', () => {
    expect(arcMeetsLine(rulePack('fiba'))).toBeCloseTo(2.9901, 4)
    expect(arcHalfAngle(rulePack('fiba'))).toBeCloseTo(77.8985, 4)
  })
  it('NBA: 14.1978 ft, half-angle 67.8676 degrees', () => {
    expect(feet(arcMeetsLine(rulePack('nba')))).toBeCloseTo(14.1978, 4)
    expect(arcHalfAngle(rulePack('nba'))).toBeCloseTo(67.8676, 4)
  })
  it('NCAA: 9.8808 ft, within .25 in of the 9 ft 10 3/8 in that the 2019 diagram prints', () => {
    expect(feet(arcMeetsLine(rulePack('ncaa')))).toBeCloseTo(9.8808, 3)
    expect(Math.abs(inches(arcMeetsLine(rulePack('ncaa'))) - 118.375)).toBeLessThan(0.25)
  })
  it('diagonals: 31.7648 m, 97.7548 ft on 84 ft, 106.4707 ft on 94 ft', () => {
    expect(diagonal(rulePack('fiba'))).toBeCloseTo(31.7648, 4)
    expect(feet(diagonal(rulePack('nfhs84')))).toBeCloseTo(97.7548, 4)
    expect(feet(diagonal(rulePack('nba')))).toBeCloseTo(106.4707, 4)
  })
})

describe('counts', () => {
  it('backcourt: 8 s FIBA (Art. 28) and NBA (as commonly published), 10 s NFHS (9-8) and NCAA (secondary sources)', () => {
    const seconds = (key: RulePackKey) => rulePack(key).backcourtSeconds
    expect([seconds('fiba'), seconds('nba')]).toEqual([8, 8])
    expect([seconds('nfhs84'), seconds('nfhs94'), seconds('ncaa')]).toEqual([10, 10, 10])
  })
  it('throw-in: 5 s everywhere (FIBA 17.3.1, NFHS 7-6-2 and 9-2-4 secondary sources; NCAA and NBA from memory)', () => {
    for (const key of ['fiba', ...IMPERIAL] as const) expect(rulePack(key).throwInSeconds).toBe(5)
  })
  it('closely guarded: FIBA 5 s within 1 m (Art. 27) · NFHS and NCAA 5 s within 6 ft in the frontcourt · NBA none (from memory)', () => {
    expect(rulePack('fiba').closelyGuarded).toEqual({ seconds: 5, within: 1, where: 'anywhere' })
    for (const key of ['nfhs84', 'nfhs94', 'ncaa'] as const) {
      const rule = rulePack(key).closelyGuarded
      expect(rule).toMatchObject({ seconds: 5, where: 'frontcourt' })
      expect(feet(rule?.within ?? 0)).toBeCloseTo(6, 9)
    }
    expect(rulePack('nba').closelyGuarded).toBeNull()
  })
  it('FIBA gives no time-out once the thrower has the ball (from memory; DOMAIN.md section 4, rule 8)', () => {
    expect(rulePack('fiba').timeOutWhileThrowing).toBe(false)
  })
})

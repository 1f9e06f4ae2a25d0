import { describe, expect, it } from 'vitest'
import { courtLines } from '@shared/court/courtLines'
import { toMetres } from '@shared/court/frame'
import { penOf } from '@shared/court/pen'
import { FOOT, INCH, RulePackKey, rulePack } from '@shared/court/rulePacks'
import {
  arcHalfAngle,
  arcMeetsLine,
  diagonal,
  freeThrowToBasket,
  freeThrowToBoard,
} from '@shared/court/relations'
import { pathsOf } from '../shared/court/sceneParts'

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
    for (const key of ['nfhs94', 'ncaa', 'nba'] as const)
      expect(feet(diagonal(rulePack(key)))).toBeCloseTo(106.4707, 4)
  })
})

describe('what is drawn is what the books say', () => {
  /** The numbers of every path of a court's drawing, by the letters before them. */
  const drawn = (key: RulePackKey) => {
    const pack = rulePack(key)
    const paths = pathsOf([courtLines(pack, penOf(26))]).map(({ d }) => d)
    const arcs = paths.flatMap((d) => [...d.matchAll(/A([\d.]+) /g)].map(([, r]) => Number(r)))
    return { pack, paths, arcs }
  }

  it.each(RulePackKey.options)('%s: circles, arcs and rings with their radii, each at both ends', (key) => {
    const { pack, arcs } = drawn(key)
    const count = (radius: number) => arcs.filter((r) => Math.abs(r - radius) < 1e-3).length
    // A whole circle is two arcs: the centre circle, and a half circle on each free-throw line.
    expect(count(pack.centreCircle)).toBe(4)
    expect(count(pack.threePoint.radius)).toBe(2)
    expect(count(pack.ringRadius)).toBe(4)
    if (pack.noCharge !== null) expect(count(pack.noCharge)).toBe(2)
    expect(arcs).toHaveLength(10 + (pack.noCharge === null ? 0 : 2))
  })

  it.each(RulePackKey.options)(
    '%s: the three-point arc leaves its straight lines on the arc itself',
    (key) => {
      const { pack, paths } = drawn(key)
      const threes = paths.filter((d) => d.includes(`A${Math.round(pack.threePoint.radius * 1e4) / 1e4} `))
      expect(threes).toHaveLength(2)
      threes.forEach((d, end) => {
        const [, inset = NaN, meets = NaN] = (d.match(/-?[\d.]+/g) ?? []).map(Number)
        const basket = end === 0 ? pack.basket : pack.court.length - pack.basket
        expect(inset).toBeCloseTo(pack.threePoint.cornerInset, 3)
        expect(Math.hypot(meets - basket, inset - pack.court.width / 2)).toBeCloseTo(
          pack.threePoint.radius,
          3,
        )
      })
    },
  )

  it.each(RulePackKey.options)(
    '%s: lane, free-throw line, board and half-court line in their places',
    (key) => {
      const { pack, paths } = drawn(key)
      const { length, width } = pack.court
      const at = (value: number) => String(Math.round(value * 1e4) / 1e4)
      const edges = [(width - pack.laneWidth) / 2, (width + pack.laneWidth) / 2].map(at)
      for (const line of [pack.freeThrowLine, length - pack.freeThrowLine])
        expect(paths.some((d) => d.includes(`${edges[0]}H${at(line)}V${edges[1]}`))).toBe(true)
      for (const face of [pack.board.face, length - pack.board.face])
        expect(
          paths.some((d) => d.startsWith(`M${at(face)} ${at((width - pack.board.width) / 2)}L${at(face)} `)),
        ).toBe(true)
      expect(paths).toContain(`M${at(length / 2)} 0L${at(length / 2)} ${at(width)}`)
      expect(paths).toContain(`M0 0H${at(length)}V${at(width)}H0Z`)
    },
  )

  it('a diagram keeps its meaning on every court: the foul line is the foul line', () => {
    for (const key of RulePackKey.options) {
      const pack = rulePack(key)
      expect(toMetres(pack, { x: 0.207, y: 0.5 }).x).toBeCloseTo(pack.freeThrowLine, 9)
      expect(toMetres(pack, { x: 0.5, y: 0.5 }).x).toBeCloseTo(pack.court.length / 2, 9)
    }
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
  it('the backcourt count starts at the touch in FIBA, NCAA and NBA and at control in NFHS (from memory)', () => {
    for (const key of ['fiba', 'ncaa', 'nba'] as const) expect(rulePack(key).countStarts).toBe('touch')
    for (const key of ['nfhs84', 'nfhs94'] as const) expect(rulePack(key).countStarts).toBe('control')
  })
  it('FIBA gives no time-out once the thrower has the ball (from memory; DOMAIN.md section 4, rule 8)', () => {
    expect(rulePack('fiba').timeOutWhileThrowing).toBe(false)
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { courtLines } from '@shared/court/courtLines'
import { inMetres, mirrorPlace, toMetres, toPlace } from '@shared/court/frame'
import { OwnCourt, customPack, ownCourtFaults } from '@shared/court/ownCourt'
import { inside } from '@shared/court/path'
import { penOf } from '@shared/court/pen'
import { arcMeetsLine } from '@shared/court/relations'
import { RulePackKey, rulePack } from '@shared/court/rulePacks'
import { anyPack, anyPlace } from './arbitraries'
import { READABLE, pathsOf } from './sceneParts'

const fiba = rulePack('fiba')
const number = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const maybe = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined })

/** Whatever the schema lets in. */
const anyOwn = fc
  .record({
    length: maybe(number(12, 30)),
    width: maybe(number(7, 16)),
    freeThrowLine: maybe(number(2, 8)),
    laneWidth: maybe(number(1.5, 6)),
    threePoint: maybe(number(2, 8)),
    throwInSeconds: maybe(fc.integer({ min: 3, max: 10 })),
    backcourtSeconds: maybe(fc.integer({ min: 5, max: 30 })),
  })
  .map((own) => OwnCourt.parse(own))

const anyCourt = fc.oneof(
  anyPack,
  fc.tuple(anyPack, anyOwn).map(([base, own]) => customPack(base, own)),
)

describe('customPack', () => {
  it('is the book itself where nothing is changed', () => {
    for (const key of RulePackKey.options)
      for (const own of [{}, null]) expect(customPack(rulePack(key), own)).toBe(rulePack(key))
  })

  it('takes a team’s own sides and counts, and keeps the book’s key', () => {
    const own = customPack(rulePack('nfhs84'), {
      length: 22,
      width: 12,
      backcourtSeconds: 12,
      throwInSeconds: 6,
    })
    expect(own).toMatchObject({
      key: 'nfhs84',
      court: { length: 22, width: 12 },
      backcourtSeconds: 12,
      throwInSeconds: 6,
      countStarts: 'control',
    })
  })

  it('scales a youth court’s markings by the side that shrank more', () => {
    const youth = customPack(fiba, { length: 14, width: 12 })
    expect(youth.freeThrowLine).toBeCloseTo(2.9, 9)
    expect(youth.laneWidth).toBeCloseTo(2.45, 9)
    expect(youth.threePoint.radius).toBeCloseTo(3.375, 9)
    expect(arcMeetsLine(youth)).toBeCloseTo(arcMeetsLine(fiba) / 2, 9)
    expect(customPack(fiba, { length: 30, width: 16 }).laneWidth).toBe(fiba.laneWidth)
  })

  it('makes a court that can be drawn whatever it is given: landmarks in order, every line on it', () => {
    fc.assert(
      fc.property(anyPack, anyOwn, (base, own) => {
        const pack = customPack(base, own)
        const { length, width } = pack.court
        expect(pack.freeThrowLine).toBeGreaterThan(pack.basket)
        expect(pack.freeThrowLine).toBeLessThan(length / 2)
        expect(pack.laneWidth).toBeLessThan(width)
        expect(pack.threePoint.cornerInset).toBeGreaterThanOrEqual(-1e-9)
        expect(arcMeetsLine(pack)).toBeLessThan(length)
        for (const { d } of pathsOf([courtLines(pack, penOf(20))])) {
          expect(d).toMatch(READABLE)
          expect(d).not.toContain('NaN')
        }
        expect(
          inside(
            { x: pack.board.face, y: (width - pack.board.width) / 2, width: 0, height: pack.board.width },
            { x: 0, y: 0, width: length, height: width },
          ),
        ).toBe(true)
      }),
    )
  })

  it('refuses a hall that is none', () => {
    for (const wrong of [
      { length: 11.9 },
      { length: 31 },
      { width: 6 },
      { backcourtSeconds: 3 },
      { height: 3 },
    ])
      expect(OwnCourt.safeParse(wrong).success).toBe(false)
    expect(OwnCourt.safeParse({ length: 12, width: 7 }).success).toBe(true)
  })

  it('says what does not fit together, and names the field', () => {
    expect(ownCourtFaults(fiba, { length: 28 })).toEqual([])
    expect(ownCourtFaults(fiba, { length: 12, freeThrowLine: 5.8 })).toMatchObject([
      { field: 'freeThrowLine' },
    ])
    expect(ownCourtFaults(fiba, { width: 7, laneWidth: 6 })[0]).toMatchObject({ field: 'laneWidth' })
  })
})

describe('a place from court to court', () => {
  it('comes back to within a centimetre, through any two courts', () => {
    fc.assert(
      fc.property(anyCourt, anyCourt, anyPlace, (a, b, place) => {
        const here = toMetres(a, place)
        const there = toMetres(b, toPlace(a, here))
        const back = toMetres(a, toPlace(b, there))
        expect(Math.hypot(back.x - here.x, back.y - here.y)).toBeLessThan(0.01)
      }),
    )
  })

  it('keeps its meaning: who stands on the foul line, a lane edge or half court does so on the other', () => {
    fc.assert(
      fc.property(anyCourt, anyCourt, (a, b) => {
        const line = (pack: typeof a) => [
          { x: pack.freeThrowLine, y: (pack.court.width - pack.laneWidth) / 2 },
          { x: pack.court.length / 2, y: pack.court.width / 2 },
          { x: pack.court.length - pack.freeThrowLine, y: (pack.court.width + pack.laneWidth) / 2 },
        ]
        const [ours, theirs] = [line(a), line(b)]
        ours.forEach((point, i) => {
          const there = toMetres(b, toPlace(a, inMetres(point.x, point.y)))
          expect(Math.hypot(there.x - theirs[i]!.x, there.y - theirs[i]!.y)).toBeLessThan(1e-6)
        })
      }),
    )
  })

  it('mirrored twice is the same, on any court', () => {
    fc.assert(
      fc.property(anyCourt, anyPlace, (pack, place) => {
        const twice = toMetres(pack, mirrorPlace(mirrorPlace(place)))
        const once = toMetres(pack, place)
        expect(Math.hypot(twice.x - once.x, twice.y - once.y)).toBeLessThan(1e-9)
      }),
    )
  })
})

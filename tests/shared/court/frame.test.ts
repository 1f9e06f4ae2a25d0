import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inMetres, mirrorPlace, mirrorPoint, toMetres, toPlace, type InFractions } from '@shared/court/frame'
import { RulePackKey, rulePack } from '@shared/court/rulePacks'
import { anyPack, anyPlace } from './arbitraries'

describe('the landmark frame', () => {
  it('comes back to the same place on every court', () => {
    fc.assert(
      fc.property(anyPack, anyPlace, (pack, place) => {
        const back = toPlace(pack, toMetres(pack, place))
        expect(Math.abs(back.x - place.x)).toBeLessThan(1e-9)
        expect(Math.abs(back.y - place.y)).toBeLessThan(1e-9)
      }),
    )
  })

  it('comes back to the same point, in metres', () => {
    fc.assert(
      fc.property(anyPack, anyPlace, (pack, { x, y }) => {
        const point = inMetres(x * pack.court.length, y * pack.court.width)
        const back = toMetres(pack, toPlace(pack, point))
        expect(Math.hypot(back.x - point.x, back.y - point.y)).toBeLessThan(1e-9)
      }),
    )
  })

  it.each(RulePackKey.options)('keeps landmarks on their lines: %s', (key) => {
    const pack = rulePack(key)
    const { length, width } = pack.court
    expect(toMetres(pack, { x: 0, y: 0 })).toEqual({ x: 0, y: 0 })
    expect(toMetres(pack, { x: 0.207, y: 0.337 }).x).toBeCloseTo(pack.freeThrowLine, 12)
    expect(toMetres(pack, { x: 0.207, y: 0.337 }).y).toBeCloseTo((width - pack.laneWidth) / 2, 12)
    expect(toMetres(pack, { x: 0.5, y: 0.5 }).x).toBeCloseTo(length / 2, 12)
    expect(toMetres(pack, { x: 0.5, y: 0.5 }).y).toBeCloseTo(width / 2, 12)
    expect(toMetres(pack, { x: 0.793, y: 0.663 }).x).toBeCloseTo(length - pack.freeThrowLine, 12)
    expect(toMetres(pack, { x: 1, y: 1 }).x).toBeCloseTo(length, 12)
    expect(toMetres(pack, { x: 1, y: 1 }).y).toBeCloseTo(width, 12)
  })

  it('goes on out of bounds at the slope of the first piece', () => {
    const pack = rulePack('nfhs84')
    const slope = pack.freeThrowLine / 0.207
    expect(toMetres(pack, { x: -0.03, y: 0.5 }).x).toBeCloseTo(-0.03 * slope, 12)
  })

  it('never folds: further up court stays further up court', () => {
    fc.assert(
      fc.property(anyPack, anyPlace, anyPlace, (pack, a, b) => {
        fc.pre(a.x < b.x - 1e-9)
        expect(toMetres(pack, a).x).toBeLessThan(toMetres(pack, b).x)
      }),
    )
  })

  it('mirrors twice to itself, and mirrors a point as it mirrors a place', () => {
    fc.assert(
      fc.property(anyPack, anyPlace, (pack, place) => {
        const twice = mirrorPlace(mirrorPlace(place))
        expect(Math.abs(twice.y - place.y)).toBeLessThan(1e-12)
        expect(twice.x).toBe(place.x)
        const mirrored = toMetres(pack, mirrorPlace(place))
        const other = mirrorPoint(pack, toMetres(pack, place))
        expect(Math.abs(mirrored.y - other.y)).toBeLessThan(1e-9)
      }),
    )
  })

  it('lets nobody mix metres with fractions', () => {
    const pack = rulePack('fiba')
    const point = inMetres(5.8, 7.5)
    // @ts-expect-error metres are no place on the stored court
    const wrong: InFractions = point
    // @ts-expect-error a stored place is not in metres
    toPlace(pack, { x: 0.2, y: 0.5 })
    expect(wrong).toBe(point)
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { customPack } from '@shared/court/ownCourt'
import { inside, grown, overlaps, type Box } from '@shared/court/path'
import { pressScene } from '@shared/court/pressScene'
import { rulePack, type RulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import type { Crop } from '@shared/court/view'
import { anyPack, anyPress } from './arbitraries'
import { groupOf, pathsOf, textsOf, typeBox } from './sceneParts'

/** The whole court, half of it, and a phone's share of it. */
const anyCrop: fc.Arbitrary<(pack: RulePack) => Crop> = fc.oneof(
  fc.constant(() => 'full' as const),
  fc.constant(() => 'half' as const),
  fc.double({ min: 0.2, max: 1, noNaN: true }).map((share) => (pack: RulePack) => ({
    toX: share * pack.court.length,
  })),
)

/** Ticks anywhere, or bunched as a press bunches them. */
const anyTicks = fc
  .oneof(
    fc.array(fc.double({ min: -0.05, max: 1.02, noNaN: true }), { maxLength: 10 }),
    fc
      .tuple(
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        fc.array(fc.double({ min: 0, max: 0.03, noNaN: true }), { maxLength: 10 }),
      )
      .map(([from, gains]) => gains.map((gain) => from + gain)),
  )
  .map((xs) => xs.map((x, i) => ({ second: i + 1, x })))

/** The books' courts, and a youth court as small as one may be. */
const anyHall = fc
  .tuple(anyPress, fc.boolean())
  .map(([press, youth]) =>
    youth ? { ...press, pack: customPack(press.pack, { length: 12, width: 7, throwInSeconds: 10 }) } : press,
  )

const anySetting = fc.tuple(anyHall, anyCrop, anyTicks, fc.boolean(), fc.constantFrom(1, 1.2))

function apart(boxes: readonly Box[], view: Scene['view']): void {
  boxes.forEach((box, i) => {
    expect(inside(box, grown(view, 1e-6)), 'a label leaves the drawing').toBe(true)
    for (const other of boxes.slice(i + 1)) expect(overlaps(grown(box, -1e-6), other)).toBe(false)
  })
}

describe('the words of a press court', () => {
  it('never cross each other or the edge, whatever is counted and however much court is shown', () => {
    fc.assert(
      fc.property(anySetting, ([options, crop, ballBySecond, throwInRuler, type]) => {
        const scene = pressScene({ ...options, crop: crop(options.pack), ballBySecond, throwInRuler, type })
        apart(textsOf(scene.nodes).map(typeBox), scene.view)
      }),
      { numRuns: 150 },
    )
  })

  it('keep their letters apart on a lettered court', () => {
    fc.assert(
      fc.property(anySetting, ([options, crop]) => {
        const zones = options.zones.map((zone, i) => ({ ...zone, letter: 'ABCDEFGHIJKLM'[i] ?? 'Z' }))
        const scene = pressScene({ ...options, zones, labels: 'letters', crop: crop(options.pack) })
        apart(textsOf(groupOf(scene, 'letters')?.nodes ?? []).map(typeBox), scene.view)
      }),
      { numRuns: 60 },
    )
  })

  it('name only what a crop shows', () => {
    fc.assert(
      fc.property(anyPack, fc.double({ min: 14, max: 40, noNaN: true }), (pack, pxPerMetre) => {
        const zones = [{ spot: 'front-corner', side: 'left', k: 3, n: 4, thin: false }] as const
        const words = (crop: Crop) =>
          textsOf(groupOf(pressScene({ pack, pxPerMetre, zones, crop }), 'labels')?.nodes ?? []).map(
            ({ text }) => text,
          )
        expect(words('full')).toContain('3 of 4')
        expect(words('half')).toEqual([])
      }),
    )
  })

  it('leave a count without its words, or out, only where a crop has no room for it', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        const words = (crop: Crop) =>
          textsOf(groupOf(pressScene({ ...options, crop }), 'labels')?.nodes ?? []).filter(({ text }) =>
            text.includes(' of '),
          ).length
        const marks =
          options.zones.length + options.denied.length + (options.pickup ? 1 : 0) + (options.room ? 1 : 0)
        expect(words('full')).toBe(marks)
        expect(words('half')).toBeLessThanOrEqual(marks)
      }),
      { numRuns: 40 },
    )
  })

  it('say where the ball is held up, in their ink, with a bar and a bracket', () => {
    const ballBySecond = [0.09, 0.1, 0.12, 0.36].map((x, i) => ({ second: i + 1, x }))
    const ruler = groupOf(
      pressScene({ pack: rulePack('fiba'), pxPerMetre: 30, zones: [], ballBySecond }),
      'ruler',
    )!
    expect(ruler.label).toBe('over half by 8 seconds; held from 1 to 3 seconds')
    expect(textsOf(ruler.nodes).find(({ ink }) => ink === 'their')?.text).toBe('held, 1 s to 3 s')
    expect(pathsOf(ruler.nodes).filter(({ stroke }) => stroke === 'their')).toHaveLength(2)
  })

  it('put each second’s number by its own tick, also where some lie off the crop', () => {
    const scene = pressScene({
      pack: rulePack('fiba'),
      pxPerMetre: 30,
      zones: [],
      crop: 'half',
      ballBySecond: [
        { second: 1, x: -0.02 },
        { second: 2, x: 0.2 },
        { second: 3, x: 0.4 },
        { second: 4, x: 0.9 },
      ],
    })
    const numbers = textsOf(groupOf(scene, 'ruler')?.nodes ?? []).filter(({ text }) => /^\d+$/.test(text))
    expect(numbers.map(({ text }) => text)).toEqual(['2', '3'])
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { labelSize } from '@shared/court/labels'
import { overlaps, type Box } from '@shared/court/path'
import { pressScale, pressScene } from '@shared/court/pressScene'
import { rulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import { shapeSpots } from '@shared/court/shapeSpots'
import { CAP_HEIGHT } from '@shared/court/textWidth'
import { anyPress } from './arbitraries'
import { READABLE, groupOf, groupsOf, pathsOf, textsOf } from './sceneParts'

const fiba = rulePack('fiba')
const zones = [
  { spot: 'coffin-corner', side: 'left', k: 2, n: 11, thin: false },
  { spot: 'coffin-corner', side: 'right', k: 5, n: 11, thin: false },
  { spot: 'just-over-half', side: 'right', k: 3, n: 9, thin: false },
] as const
const full = { at: 'full', k: 10, n: 11, thin: false } as const
const middle = { lane: 'middle', k: 5, n: 7, thin: false } as const

const TICKS = [0.08, 0.1, 0.11, 0.4].map((x, i) => ({ second: i + 1, x }))

/** The boxes of the labels as they were set. */
function labelBoxes(scene: Scene): Box[] {
  return groupsOf(scene)
    .filter(({ id }) => id.startsWith('label-'))
    .map((group) => {
      const lines = textsOf(group.nodes)
      const size = labelSize({ lines })
      const [first] = lines
      const x = first?.x ?? NaN
      const left =
        first?.anchor === 'middle' ? x - size.width / 2 : first?.anchor === 'end' ? x - size.width : x
      return { x: left, y: (first?.y ?? NaN) - (first?.size ?? 0) * CAP_HEIGHT, ...size }
    })
}

describe('pressScene', () => {
  it('never sets one label over another', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        const boxes = labelBoxes(pressScene(options))
        boxes.forEach((box, i) => {
          for (const other of boxes.slice(i + 1)) expect(overlaps(box, other)).toBe(false)
        })
      }),
      { numRuns: 120 },
    )
  })

  it('keeps every label on the court, one for each mark', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        const boxes = labelBoxes(pressScene(options))
        const marks =
          options.zones.length + options.denied.length + (options.pickup ? 1 : 0) + (options.room ? 1 : 0)
        expect(boxes).toHaveLength(marks)
        for (const box of boxes) {
          expect(box.x).toBeGreaterThanOrEqual(-1e-6)
          expect(box.y).toBeGreaterThanOrEqual(-1e-6)
          expect(box.x + box.width).toBeLessThanOrEqual(options.pack.court.length + 1e-6)
          expect(box.y + box.height).toBeLessThanOrEqual(options.pack.court.width + 1e-6)
        }
      }),
      { numRuns: 80 },
    )
  })

  it('is the same drawing for the same counts', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        expect(pressScene(options)).toEqual(pressScene(options))
      }),
      { numRuns: 20 },
    )
  })

  it('writes path data that both renderers read, and names each part once', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        const scene = pressScene({ ...options, throwInRuler: true, ballBySecond: TICKS })
        for (const { d } of pathsOf(scene.nodes)) expect(d).toMatch(READABLE)
        const ids = groupsOf(scene).map(({ id }) => id)
        expect(new Set(ids).size).toBe(ids.length)
      }),
      { numRuns: 60 },
    )
  })

  it('closes the hatch the more often they trap', () => {
    const scene = pressScene({ pack: fiba, pxPerMetre: 27, zones })
    const lines = (id: string) =>
      pathsOf(groupOf(scene, id)?.nodes ?? [])
        .find(({ d }) => d.split('M').length > 5)
        ?.d.split('M').length ?? 0
    expect(lines('trap-zone-coffin-corner-right')).toBeGreaterThan(lines('trap-zone-coffin-corner-left') * 2)
  })

  it('dashes a thin zone, opens its hatch and says so', () => {
    const thin = { ...zones[1], thin: true }
    const scene = pressScene({ pack: fiba, pxPerMetre: 27, zones: [thin] })
    const group = groupOf(scene, 'trap-zone-coffin-corner-right')
    expect(pathsOf(group?.nodes ?? []).some(({ dash }) => dash !== undefined)).toBe(true)
    expect(group?.label).toContain('thin')
    expect(textsOf(groupOf(scene, 'labels')?.nodes ?? []).map(({ text }) => text)).toContain('thin')
  })

  it('points the teeth of the front at the ball and leaves them hollow when thin', () => {
    const teeth = (thin: boolean) =>
      pathsOf(
        groupOf(pressScene({ pack: fiba, pxPerMetre: 27, zones, pickup: { ...full, thin } }), 'pickup-front')
          ?.nodes ?? [],
      ).filter(({ d }) => d.endsWith('Z'))
    for (const { d, fill } of teeth(false)) {
      const [x0 = NaN, , tip = NaN] = (d.match(/-?[\d.]+/g) ?? []).map(Number)
      expect(tip).toBeLessThan(x0)
      expect(fill).toBe('their')
    }
    expect(teeth(true).every(({ fill }) => fill === 'floor')).toBe(true)
    expect(teeth(true).length).toBeGreaterThan(2)
  })

  it('letters the marks instead of counting them', () => {
    const scene = pressScene({
      pack: fiba,
      pxPerMetre: 23,
      labels: 'letters',
      zones: zones.map((zone, i) => ({ ...zone, letter: i < 2 ? 'A' : 'B' })),
      room: { ...middle, letter: 'C' },
    })
    const words = textsOf(scene.nodes).map(({ text }) => text)
    expect(words).toEqual(expect.arrayContaining(['A', 'B', 'C']))
    expect(words.some((word) => word.includes(' of '))).toBe(false)
  })

  it('says the deadline of its own rule set', () => {
    const words = (key: 'fiba' | 'nfhs84') =>
      textsOf(pressScene({ pack: rulePack(key), pxPerMetre: 27, zones: [] }).nodes).map(({ text }) => text)
    expect(words('fiba')).toContain('over half by 8 s')
    expect(words('nfhs84')).toContain('over half by 10 s')
  })

  it('says in words what it shows', () => {
    const scene = pressScene({ pack: fiba, pxPerMetre: 27, zones, pickup: full, room: middle })
    expect(scene.description).toBe(
      'They pick up, 10 of 11; trap in the right deep corner, 5 of 11; trap in the right sideline just over half, 3 of 9; trap in the left deep corner, 2 of 11. The middle is left open, 5 of 7.',
    )
  })

  it('is as wide as it was fitted to', () => {
    const options = { pack: fiba, throwInRuler: true, pickup: full }
    for (const width of [358, 825]) {
      const px = pressScale(options, width)
      expect(pressScene({ ...options, zones, pxPerMetre: px }).view.width * px).toBeCloseTo(width, 6)
    }
  })

  it('turns a shape with the ball', () => {
    const right = shapeSpots('2-2-1')
    expect(right).toHaveLength(5)
    expect(shapeSpots('1-2-1-1', 'left')[0]?.y).toBeCloseTo(0.4)
    expect(shapeSpots('person')).toEqual([])
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { rulePack } from '@shared/court/rulePacks'
import { stripScene } from '@shared/court/stripScene'
import { anyPress } from './arbitraries'
import { READABLE, groupOf, groupsOf, pathsOf, textsOf } from './sceneParts'

const pack = rulePack('fiba')
const corner = { spot: 'coffin-corner', side: 'left', k: 2, n: 11, thin: false } as const
const full = { at: 'full', k: 10, n: 11, thin: false } as const

describe('stripScene', () => {
  it('keeps the court’s own x axis, so that rows compare', () => {
    fc.assert(
      fc.property(anyPress, (options) => {
        const scene = stripScene({ ...options, pxPerMetre: 14.8 })
        expect(scene.view.x).toBe(0)
        expect(scene.view.width).toBe(options.pack.court.length)
        for (const { d } of pathsOf(scene.nodes)) expect(d).toMatch(READABLE)
        for (const { y } of textsOf(scene.nodes)) expect(y).toBeLessThan(scene.view.height)
        const ids = groupsOf(scene).map(({ id }) => id)
        expect(new Set(ids).size).toBe(ids.length)
      }),
      { numRuns: 60 },
    )
  })

  const teeth = (scene: ReturnType<typeof stripScene>) =>
    pathsOf(groupOf(scene, 'strip-front')?.nodes ?? [])
      .at(-1)
      ?.d.split('Z').length ?? 0

  it('draws the front in the middle lane alone where the corners are traps', () => {
    expect(teeth(stripScene({ pack, zones: [], pickup: full }))).toBe(4)
    expect(teeth(stripScene({ pack, zones: [corner], pickup: full }))).toBe(2)
  })

  it('prints every count', () => {
    const words = textsOf(
      stripScene({ pack, zones: [corner], room: { lane: 'middle', k: 5, n: 7, thin: false } }).nodes,
    )
    expect(words.map(({ text }) => text)).toEqual(['2 of 11', '5 of 7'])
  })

  it('says what is missing when nothing was counted, and draws no mark', () => {
    const scene = stripScene({ pack, zones: [corner], pickup: full, nothing: 'Nobody has counted it yet.' })
    expect(textsOf(scene.nodes).map(({ text }) => text)).toEqual(['Nobody has counted it yet.'])
    expect(groupOf(scene, 'strip-front')).toBeUndefined()
    expect(scene.description).toBe('Nobody has counted it yet.')
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { applyEdit } from '@shared/court/edit/edits'
import { walkDiagram } from '@shared/court/diagramWalk'
import { toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { anyDiagram, anyPack, anyZones } from './arbitraries'
import { ACROSS } from './diagrams'
import { READABLE, allNodes, discCentre, groupOf, groupsOf, pathsOf, textsOf, typeBox } from './sceneParts'

const fiba = rulePack('fiba')
const scale = fc.double({ min: 4, max: 60, noNaN: true })

describe('counterScene', () => {
  it('draws whatever the schema lets in, in path data that both renderers read, each part named once', () => {
    fc.assert(
      fc.property(
        anyDiagram,
        anyPack,
        scale,
        anyZones,
        fc.integer({ min: -1, max: 12 }),
        (diagram, pack, px, zones, step) => {
          for (const shown of [step, 'all'] as const) {
            const scene = counterScene({ diagram, pack, pxPerMetre: px, step: shown, zones, ruler: true })
            for (const path of pathsOf(scene.nodes)) expect(path.d).toMatch(READABLE)
            for (const text of textsOf(scene.nodes))
              expect(Number.isFinite(text.x + text.y + text.size)).toBe(true)
            expect(scene.view.width).toBeGreaterThan(0)
            expect(scene.description).not.toBe('')
            const ids = groupsOf(scene).map(({ id }) => id)
            expect(new Set(ids).size).toBe(ids.length)
          }
        },
      ),
      { numRuns: 150 },
    )
  })

  it('draws every token at its place', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, scale, (diagram, pack, px) => {
        walkDiagram(diagram).forEach(({ before }, step) => {
          const scene = counterScene({ diagram, pack, pxPerMetre: px, step })
          for (const [role, place] of before.ours) {
            const token = groupOf(scene, `token-${role}`)
            expect(token).toBeDefined()
            if (!token) continue
            const at = discCentre(token)
            const wanted = toMetres(pack, place)
            expect(Math.hypot(at.x - wanted.x, at.y - wanted.y)).toBeLessThan(1e-3)
          }
        })
      }),
      { numRuns: 60 },
    )
  })

  it('keeps every token in view', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, scale, (diagram, pack, px) => {
        const { view, ...scene } = counterScene({ diagram, pack, pxPerMetre: px, step: 0 })
        for (const group of groupsOf({ view, ...scene }).filter(({ id }) => id.startsWith('token-'))) {
          const at = discCentre(group)
          expect(at.x).toBeGreaterThanOrEqual(view.x)
          expect(at.x).toBeLessThanOrEqual(view.x + view.width)
          expect(at.y).toBeGreaterThanOrEqual(view.y)
          expect(at.y).toBeLessThanOrEqual(view.y + view.height)
        }
      }),
      { numRuns: 60 },
    )
  })

  const solid = (scene: ReturnType<typeof counterScene>, id: string) =>
    pathsOf(groupOf(scene, id)?.nodes ?? []).some(({ fill, stroke }) => fill === 'our' && stroke === 'our')

  it('fills who is on the ball’s way, or the reader alone', () => {
    const step = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step: 2 })
    expect(['1', '2', '3', '4', '5'].filter((role) => solid(step, `token-${role}`))).toEqual(['1', '2'])
    const mine = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step: 2, you: '4' })
    expect(['1', '2', '3', '4', '5'].filter((role) => solid(mine, `token-${role}`))).toEqual(['4'])
  })

  it('shows the whole way with each carrier where the ball is caught', () => {
    const scene = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 15, step: 'all' })
    const caught = { '5': [-0.03, 0.68], '1': [0.13, 0.66], '2': [0.36, 0.5], '3': [0.86, 0.76] } as const
    for (const [role, [x, y]] of Object.entries(caught)) {
      const token = groupOf(scene, `token-${role}`)
      expect(token && discCentre(token).x).toBeCloseTo(toMetres(fiba, { x, y }).x, 3)
      expect(solid(scene, `token-${role}`)).toBe(true)
    }
    // Four never has it: an open token where it starts, and a line.
    expect(groupOf(scene, 'token-4')).toBeUndefined()
    expect(groupsOf(scene).some(({ id }) => id.startsWith('start-4'))).toBe(true)
    expect(groupsOf(scene).some(({ id }) => id.endsWith('-4') && id.startsWith('walk-'))).toBe(true)
  })

  it('puts no number in a token under 7 px', () => {
    const words = (px: number) =>
      textsOf(counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: px, step: 'all' }).nodes).length
    expect(words(6)).toBe(0)
    expect(words(15)).toBeGreaterThan(0)
  })

  it('shows last step as ghosts for whoever has moved', () => {
    const ghosts = (step: number) =>
      groupOf(counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step }), 'ghosts')?.nodes.length
    expect(ghosts(0)).toBe(0)
    expect(ghosts(1)).toBe(2)
  })

  it('is as wide as it was fitted to', () => {
    for (const crop of ['full', 'half', { toX: 18.75 }] as const)
      for (const width of [180, 433, 1000]) {
        const options = { diagram: ACROSS, pack: fiba, step: 1, crop }
        const px = counterScale(options, width)
        expect(counterScene({ ...options, pxPerMetre: px }).view.width * px).toBeCloseTo(width, 0)
      }
  })

  it('draws a screen with a bar, a pass dashed, and nothing of theirs when they are left out', () => {
    const scene = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step: 1 })
    expect(pathsOf(groupOf(scene, 'move-1-2')?.nodes ?? []).some(({ dash }) => dash !== undefined)).toBe(true)
    expect(pathsOf(groupOf(scene, 'move-1-0')?.nodes ?? []).some(({ fill }) => fill === 'our')).toBe(false)
    expect(allNodes(groupOf(scene, 'theirs')?.nodes ?? []).length).toBeGreaterThan(0)
    const without = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step: 1, defenders: false })
    expect(groupOf(without, 'theirs')?.nodes).toEqual([])
  })

  it('writes the words of a step on its court alone, whole by an endline, and not over the whole way', () => {
    const texts = ['wait', 'go when she turns away']
    const diagram = texts.reduce(
      (one, text, i) => applyEdit(one, { do: 'add-word', step: 1, text, at: { x: 0.4 * i, y: 0.3 } }),
      ACROSS,
    )
    const shown = (step: number | 'all', pxPerMetre = 30) =>
      counterScene({ diagram, pack: fiba, pxPerMetre, step })
    const nodes = textsOf(groupOf(shown(1), 'written')?.nodes ?? [])
    expect(nodes.map(({ text, ink, halo }) => [text, ink, halo?.ink])).toEqual(
      texts.map((text) => [text, 'graphite', 'floor']),
    )
    const [wait, go] = nodes.map((node) => {
      const box = typeBox(node)
      return { left: box.x, middle: box.x + box.width / 2 }
    })
    expect(wait?.left).toBeCloseTo(0)
    expect(go?.middle).toBeCloseTo(toMetres(fiba, { x: 0.4, y: 0.3 }).x)
    expect(shown(1).description).toMatch(/Written on the court: ‘wait’ at .* and ‘go when she turns away’ at/)
    for (const step of [0, 2, 'all'] as const) {
      expect(groupOf(shown(step), 'written')).toBeUndefined()
      expect(textsOf(shown(step).nodes).some(({ text }) => texts.includes(text))).toBe(false)
    }
    expect(groupOf(shown(1, 4), 'written')).toBeUndefined()
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { applyEdit } from '@shared/court/edit/edits'
import { inside, grown, overlaps } from '@shared/court/path'
import { rulePack } from '@shared/court/rulePacks'
import { walkScene } from '@shared/court/walkScene'
import { standingAt } from '@shared/court/walk/standing'
import { drawnBySecond } from '@shared/court/walk/stations'
import { timeline } from '@shared/court/walk/timeline'
import { passWindows, verdictsOf } from '@shared/court/walk/windows'
import { anyDiagram, anyPack, anyZones } from './arbitraries'
import { ACROSS } from './diagrams'
import { READABLE, discCentre, groupOf, groupsOf, pathsOf, textsOf, typeBox } from './sceneParts'

const fiba = rulePack('fiba')
const across = timeline(ACROSS, fiba)
const scale = fc.double({ min: 6, max: 50, noNaN: true })
const moment = fc.double({ min: 0, max: 20, noNaN: true })

describe('walkScene', () => {
  it('draws whatever the schema lets in at any moment, in the view of the still drawing', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, scale, anyZones, moment, (diagram, pack, pxPerMetre, zones, at) => {
        const line = timeline(diagram, pack)
        const standing = standingAt(line, at)
        const options = {
          diagram,
          pack,
          pxPerMetre,
          zones,
          ruler: true,
          throwInRuler: true,
          ballBySecond: drawnBySecond(line),
        }
        const scene = walkScene({ ...options, standing, step: 0 })
        for (const { d } of pathsOf(scene.nodes)) expect(d).toMatch(READABLE)
        const ids = groupsOf(scene).map(({ id }) => id)
        expect(new Set(ids).size).toBe(ids.length)
        expect(scene.view).toEqual(counterScene({ ...options, step: 0 }).view)
        for (const [role, place] of standing.ours) {
          const token = discCentre(groupOf(scene, `token-${role}`)!)
          expect(Math.hypot(token.x - place.x, token.y - place.y)).toBeLessThan(1e-3)
        }
      }),
      { numRuns: 80 },
    )
  })

  it('splits into what stands still and what moves, nothing lost', () => {
    const options = {
      diagram: ACROSS,
      pack: fiba,
      pxPerMetre: 30,
      standing: standingAt(across, 2),
      step: 1,
      ruler: true,
    }
    const ids = (part: 'all' | 'ground' | 'moving') =>
      walkScene({ ...options, part }).nodes.map((node) => node.kind === 'group' && node.id)
    expect([...ids('ground'), ...ids('moving')].sort()).toEqual([...ids('all')].sort())
    const later = { ...options, standing: standingAt(across, 4) }
    expect(walkScene({ ...later, part: 'ground' }).nodes).toEqual(
      walkScene({ ...options, part: 'ground' }).nodes,
    )
  })

  it('fills who has the ball, or both ends of a pass in the air', () => {
    const solid = (seconds: number, you?: '4') => {
      const scene = walkScene({
        diagram: ACROSS,
        pack: fiba,
        pxPerMetre: 30,
        standing: standingAt(across, seconds),
        you,
      })
      return ['1', '2', '3', '4', '5'].filter((role) =>
        pathsOf(groupOf(scene, `token-${role}`)!.nodes).some(
          ({ fill, stroke }) => fill === 'our' && stroke === 'our',
        ),
      )
    }
    expect(solid(0)).toEqual(['5'])
    expect(solid((across.release!.seconds + across.touch!.seconds) / 2)).toEqual(['1', '5'])
    expect(solid(across.touch!.seconds)).toEqual(['1'])
    expect(solid(0, '4')).toEqual(['4'])
  })

  it('says where the ball is', () => {
    const words = (seconds: number) =>
      walkScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, standing: standingAt(across, seconds) })
        .description
    expect(words(0)).toBe('5 has the ball.')
    expect(words(across.release!.seconds + 0.01)).toBe('The ball is on its way from 5 to 1.')
  })
})

describe('whether a pass is on, drawn', () => {
  const windows = new Map([
    ['1-2', 'closed'],
    ['2-2', 'tight'],
    ['3-2', 'open'],
  ] as const)
  const pass = (step: number, marks = windows as ReadonlyMap<string, 'open' | 'tight' | 'closed'>) => {
    const scene = counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step, windows: marks })
    const dashed = pathsOf(groupOf(scene, `move-${step}-2`)!.nodes).find(({ dash }) => dash)!
    return { width: dashed.strokeWidth!, gap: dashed.dash![1]! / dashed.dash![0]!, scene }
  }

  it('tells open, tight and closed apart by weight, by gap and by a word, all in one ink', () => {
    const [closed, tight, open] = [pass(1), pass(2), pass(3)]
    expect(open.width).toBeGreaterThan(tight.width * 1.2)
    expect(tight.width).toBeGreaterThan(closed.width * 1.2)
    expect(closed.gap).toBeGreaterThan(tight.gap * 1.5)
    expect(tight.gap).toBeGreaterThan(open.gap * 1.5)
    for (const [step, drawn] of [closed, tight, open].entries()) {
      const words = textsOf(groupOf(drawn.scene, 'verdicts')!.nodes).map(({ text, ink }) => [text, ink])
      expect(words).toEqual([[['closed', 'tight', 'open'][step], 'our']])
    }
  })

  it('is not drawn where it is not asked for', () => {
    expect(
      groupOf(counterScene({ diagram: ACROSS, pack: fiba, pxPerMetre: 30, step: 1 }), 'verdicts'),
    ).toBeUndefined()
  })

  it('never sets its words over each other or past the edge', () => {
    fc.assert(
      fc.property(
        anyDiagram,
        anyPack,
        fc.double({ min: 12, max: 40, noNaN: true }),
        (diagram, pack, pxPerMetre) => {
          const marks = verdictsOf(passWindows(timeline(diagram, pack)))
          for (const step of ['all', 0] as const) {
            const scene = counterScene({ diagram, pack, pxPerMetre, step, windows: marks, ruler: true })
            const boxes = textsOf(groupOf(scene, 'verdicts')?.nodes ?? []).map(typeBox)
            boxes.forEach((box, i) => {
              expect(inside(box, grown(scene.view, 1e-6))).toBe(true)
              for (const other of boxes.slice(i + 1)) expect(overlaps(grown(box, -1e-6), other)).toBe(false)
            })
          }
        },
      ),
      { numRuns: 60 },
    )
  })
})

describe('a counter over an opponent', () => {
  it('carries their pick-up under our way, thin where it is thin', () => {
    const front = (thin: boolean) =>
      groupOf(
        counterScene({
          diagram: ACROSS,
          pack: fiba,
          pxPerMetre: 30,
          step: 1,
          pickup: { at: 'full', k: 10, n: 11, thin },
        }),
        'pickup-front',
      )!
    expect(front(false).label).toBe('pick up: 10 of 11')
    expect(pathsOf(front(true).nodes).some(({ dash }) => dash)).toBe(true)
  })

  it('is as wide as it was fitted to, ruler and throw-in and all', () => {
    const options = {
      diagram: ACROSS,
      pack: fiba,
      step: 1,
      ruler: true,
      throwInRuler: true,
      ballBySecond: drawnBySecond(across),
    }
    for (const width of [390, 900]) {
      const px = counterScale(options, width)
      const { view } = counterScene({ ...options, pxPerMetre: px })
      expect(view.width * px).toBeCloseTo(width, 0)
    }
  })

  it('has the words of the step that is walked on its ground', () => {
    const diagram = applyEdit(ACROSS, { do: 'add-word', step: 1, text: 'go', at: { x: 0.3, y: 0.3 } })
    const said = (step: number | null, part: 'ground' | 'moving') =>
      textsOf(
        walkScene({ diagram, pack: fiba, pxPerMetre: 30, standing: standingAt(across, 0), step, part }).nodes,
      ).filter(({ text }) => text === 'go').length
    expect([said(1, 'ground'), said(1, 'moving'), said(0, 'ground'), said(null, 'ground')]).toEqual([
      1, 0, 0, 0,
    ])
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { toMetres } from '@shared/court/frame'
import { customPack } from '@shared/court/ownCourt'
import { rulePack } from '@shared/court/rulePacks'
import { diagramFaults } from '@shared/court/diagramFaults'
import { clockAt, countFaults, countsAt } from '@shared/court/walk/counts'
import { DEFAULT_WALK } from '@shared/court/walk/settings'
import { standingAt } from '@shared/court/walk/standing'
import { timeline } from '@shared/court/walk/timeline'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { anyDiagram, anyPack } from '../arbitraries'
import { ACROSS, changed } from '../diagrams'

const fiba = rulePack('fiba')
const across = timeline(ACROSS, fiba)

describe('the two counts', () => {
  it('stop the throw-in’s when the ball leaves the hand and start the other at the first touch', () => {
    const { release, touch, countStart, overHalf } = across
    expect(release).toMatchObject({ step: 1, move: 2 })
    expect(touch!.seconds).toBeGreaterThan(release!.seconds)
    expect(touch!.at).toEqual(toMetres(fiba, { x: 0.13, y: 0.66 }))
    expect(countStart).toBe(touch!.seconds)
    expect(overHalf).toMatchObject({ step: 3, move: 0 })
    expect(overHalf!.at.x).toBeCloseTo(14, 6)
  })

  it('find the moment at which the dribble passes half, not its end', () => {
    const { overHalf } = across
    const ball = standingAt(across, overHalf!.seconds).ball.at
    expect(ball.x).toBeCloseTo(fiba.court.length / 2, 3)
    expect(overHalf!.seconds).toBeLessThan(across.steps[3]!.end)
  })

  it('wait for control where the book says control', () => {
    const nfhs = timeline(ACROSS, rulePack('nfhs84'))
    expect(nfhs.countStart! - nfhs.touch!.seconds).toBeCloseTo(DEFAULT_WALK.controlAfterTouch, 9)
    const ncaa = timeline(ACROSS, rulePack('ncaa'))
    expect(ncaa.countStart).toBe(ncaa.touch!.seconds)
  })

  it('do not count the backcourt when the ball is first touched past half', () => {
    const over = timeline(
      changed((raw) => {
        raw.steps = [
          {
            title: 'Over the top',
            moves: [
              { kind: 'cut', who: '4', to: { x: 0.6, y: 0.2 }, bend: 0, beat: 0 },
              { kind: 'pass', from: '5', to: '4', flight: 'lob', throwIn: true, beat: 0 },
            ],
          },
        ]
      }),
      fiba,
    )
    expect(over.countStart).toBeNull()
    expect(over.overHalf!.seconds).toBe(over.touch!.seconds)
    expect(countsAt(over).backcourt).toEqual({ limit: 8, taken: null, left: 8, done: false })
  })

  it('add up: what is gone and what is left make the limit, at every moment', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, fc.double({ min: 0, max: 30, noNaN: true }), (diagram, pack, at) => {
        const line = timeline(diagram, pack)
        for (const { limit, taken, left } of Object.values(countsAt(line, at)))
          expect((taken ?? 0) + left).toBeCloseTo(limit, 9)
        const clock = clockAt(line, at)
        if (clock.left !== null) {
          const limit = clock.runs === 'throw-in' ? pack.throwInSeconds : pack.backcourtSeconds
          expect(clock.gone + clock.left).toBeCloseTo(limit, 9)
        }
      }),
      { numRuns: 100 },
    )
  })

  it('run one clock at a time, each in its turn', () => {
    const { release, touch, overHalf, duration } = across
    expect(clockAt(across, 0)).toMatchObject({ runs: 'throw-in', gone: 0, left: 5 })
    expect(clockAt(across, (release!.seconds + touch!.seconds) / 2).runs).toBe('none')
    expect(clockAt(across, touch!.seconds + 1)).toMatchObject({ runs: 'backcourt' })
    expect(clockAt(across, touch!.seconds + 1).left).toBeCloseTo(7, 9)
    expect(clockAt(across, touch!.seconds + 1).t).toBeCloseTo(1, 9)
    expect(clockAt(across, overHalf!.seconds + 0.1).runs).toBe('none')
    expect(clockAt(across, duration).left).toBeNull()
  })
})

describe('counts that run out', () => {
  const slow = { ...DEFAULT_WALK, beatGap: 2 }

  it('are none in a drawing that can be run', () => {
    expect(countFaults(across)).toEqual([])
  })

  it('name the throw-in, its seconds and where the thrower is', () => {
    const late = timeline(ACROSS, fiba, { ...DEFAULT_WALK, screenWait: 2, ourTopSpeed: 3 })
    const fault = countFaults(late).find(({ message }) => message.startsWith('Thrown in'))
    expect(fault).toMatchObject({ step: 1, move: 2 })
    expect(fault?.place?.x).toBeCloseTo(-0.03, 9)
    expect(fault?.message).toBe(
      `Thrown in after ${late.release!.seconds.toFixed(1)} s; the count is 5. Throw sooner, or leave out what comes before.`,
    )
  })

  it('name the move in whose time the backcourt count ends, and where the ball is then', () => {
    const short = customPack(fiba, { backcourtSeconds: 5 })
    const line = timeline(ACROSS, short, slow)
    const [fault] = countFaults(line).filter(({ message }) => message.startsWith('Over half'))
    expect(line.overHalf!.seconds - line.countStart!).toBeGreaterThan(5)
    expect(fault).toBeDefined()
    const at = toMetres(short, fault!.place!)
    const ball = standingAt(line, line.countStart! + 5).ball.at
    expect(Math.hypot(at.x - ball.x, at.y - ball.y)).toBeLessThan(1e-9)
  })

  it('name a ball that the drawing leaves short of half past its count', () => {
    const stays = changed((raw) => {
      raw.steps[3]!.moves = [{ kind: 'dribble', who: '2', to: { x: 0.45, y: 0.5 }, bend: 0, beat: 0 }]
    })
    expect(countFaults(timeline(stays, fiba))).toEqual([])
    const [fault] = countFaults(
      timeline(stays, customPack(fiba, { backcourtSeconds: 5 }), { ...slow, ourTopSpeed: 3 }),
    )
    expect(fault?.message).toMatch(/^(Still short of half|Thrown in)/)
  })

  it.each(DEMO_COUNTERS.map((counter) => [counter.name, counter] as const))(
    'are none in %s on any book that it names, nor any other fault',
    (_name, counter) => {
      for (const key of counter.rulePacks) {
        expect(diagramFaults(counter.diagram, rulePack(key)), key).toEqual([])
        expect(countFaults(timeline(counter.diagram, rulePack(key))), key).toEqual([])
      }
    },
  )
})

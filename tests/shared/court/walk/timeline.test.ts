import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { walkDiagram } from '@shared/court/diagramWalk'
import { inMetres, toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { DEFAULT_WALK } from '@shared/court/walk/settings'
import { sprintSeconds } from '@shared/court/walk/sprint'
import { standingAt } from '@shared/court/walk/standing'
import { drawnBySecond, stationsOf } from '@shared/court/walk/stations'
import { timeline, type Timeline } from '@shared/court/walk/timeline'
import { anyDiagram, anyPack } from '../arbitraries'
import { ACROSS, changed } from '../diagrams'

const fiba = rulePack('fiba')
const across = timeline(ACROSS, fiba)
const moveOf = (line: Timeline, step: number, index: number) => {
  const found = line.moves.find((move) => move.step === step && move.index === index)
  if (!found) throw new Error(`no move ${step}-${index}`)
  return found
}
const apart = (a: { x: number; y: number }, b: { x: number; y: number }) => Math.hypot(a.x - b.x, a.y - b.y)

describe('timeline', () => {
  it('times a cut by a sprint from rest', () => {
    const cut = moveOf(
      timeline(
        changed(
          (raw) =>
            (raw.steps[0]!.moves = [{ kind: 'cut', who: '4', to: { x: 0.5, y: 0.12 }, bend: 0, beat: 0 }]),
        ),
        fiba,
      ),
      0,
      0,
    )
    const far = apart(toMetres(fiba, { x: 0.22, y: 0.12 }), toMetres(fiba, { x: 0.5, y: 0.12 }))
    expect(cut.length).toBeCloseTo(far, 9)
    expect(cut.end - cut.start).toBeCloseTo(sprintSeconds({ topSpeed: 7.5, runUp: 1 }, far), 9)
  })

  it('dribbles at a share of the top speed, and runs as the squad’s own player does', () => {
    const dribble = moveOf(across, 3, 0)
    expect(dribble.end - dribble.start).toBeCloseTo(
      sprintSeconds({ topSpeed: 7.5 * DEFAULT_WALK.dribbleShare, runUp: 1 }, dribble.length),
      9,
    )
    const quick = { topSpeed: 9, runUp: 0.8 }
    const own = moveOf(timeline(ACROSS, fiba, { ...DEFAULT_WALK, runners: { '2': quick } }), 3, 0)
    expect(own.end - own.start).toBeCloseTo(
      sprintSeconds({ ...quick, topSpeed: 9 * DEFAULT_WALK.dribbleShare }, own.length),
      9,
    )
  })

  it('lets a pass come when its receiver does, and the ball with it', () => {
    const [cut, pass] = [moveOf(across, 1, 1), moveOf(across, 1, 2)]
    expect(pass.end).toBeCloseTo(cut.end, 9)
    expect(pass.end - pass.start).toBeCloseTo(pass.length / DEFAULT_WALK.straightSpeed, 9)
    expect(standingAt(across, pass.start + 0.01).ball.flight).toMatchObject({ by: '5', to: '1' })
    expect(standingAt(across, pass.end).ball).toMatchObject({ holder: '1', flight: null })
  })

  it('starts whoever is screened for once the screen has stood', () => {
    const [screen, cut] = [moveOf(across, 1, 0), moveOf(across, 1, 1)]
    expect(cut.start).toBeCloseTo(screen.end + DEFAULT_WALK.screenWait, 9)
  })

  it('waits for nobody whom a step does not need: the sprint of step 1 goes on', () => {
    const [first, second] = across.steps
    expect(second!.start).toBeCloseTo(DEFAULT_WALK.beatGap, 9)
    expect(first!.end).toBeGreaterThan(second!.start)
  })

  it('passes the ball on only after it was caught', () => {
    expect(moveOf(across, 2, 2).start).toBeGreaterThanOrEqual(
      moveOf(across, 1, 2).end + DEFAULT_WALK.beatGap - 1e-9,
    )
  })

  it('lets a passer cut in the same beat only after the ball has left', () => {
    const giveAndGo = timeline(
      changed((raw) =>
        raw.steps[2]!.moves.push({ kind: 'cut', who: '1', to: { x: 0.4, y: 0.8 }, bend: 0, beat: 0 }),
      ),
      fiba,
    )
    expect(moveOf(giveAndGo, 2, 3).start).toBeGreaterThanOrEqual(moveOf(giveAndGo, 2, 2).start)
  })

  it('walks whatever the schema lets in: times never go back, all players end where the drawing ends', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, (diagram, pack) => {
        const line = timeline(diagram, pack)
        expect(Number.isFinite(line.duration)).toBe(true)
        for (const { start, end } of line.moves) expect(end).toBeGreaterThanOrEqual(start)
        line.steps
          .slice(1)
          .forEach(({ start }, i) => expect(start).toBeGreaterThanOrEqual(line.steps[i]!.start))
        line.flights
          .slice(1)
          .forEach(({ start }, i) => expect(start).toBeGreaterThanOrEqual(line.flights[i]!.end - 1e-9))
        const end = standingAt(line, line.duration)
        const last = walkDiagram(diagram).at(-1)!.after
        for (const [role, place] of last.ours)
          expect(apart(end.ours.get(role)!, toMetres(pack, place))).toBeLessThan(1e-6)
        for (const [id, place] of last.theirs)
          expect(apart(end.theirs.get(id)!, toMetres(pack, place))).toBeLessThan(1e-6)
        expect(end.ball.holder).toBe(last.ball)
      }),
      { numRuns: 120 },
    )
  })

  it('takes as long mirrored', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, (diagram, pack) => {
        const flip = <T extends { y: number }>(place: T): T => ({ ...place, y: 1 - place.y })
        const mirrored = {
          ...diagram,
          start: {
            ...diagram.start,
            ours: diagram.start.ours.map((one) => ({ ...one, at: flip(one.at) })),
            theirs: diagram.start.theirs.map((one) => ({ ...one, at: flip(one.at) })),
          },
          steps: diagram.steps.map((step) => ({
            ...step,
            moves: step.moves.map((move) =>
              move.kind === 'pass'
                ? move
                : { ...move, to: flip(move.to), ...('bend' in move ? { bend: -move.bend } : {}) },
            ),
          })),
        }
        expect(timeline(mirrored, pack).duration).toBeCloseTo(timeline(diagram, pack).duration, 6)
      }),
      { numRuns: 60 },
    )
  })
})

describe('standingAt', () => {
  it('moves nobody faster than anybody sprints, and lets nobody jump', () => {
    const step = 1 / 60
    let before = standingAt(across, 0)
    for (let t = step; t < across.duration; t += step) {
      const now = standingAt(across, t)
      for (const [role, at] of now.ours)
        expect(apart(at, before.ours.get(role)!)).toBeLessThan(DEFAULT_WALK.ourTopSpeed * step * 1.05)
      expect(apart(now.ball.at, before.ball.at)).toBeLessThan(DEFAULT_WALK.straightSpeed * step * 1.05)
      before = now
    }
  })

  it('follows the bend of a cut', () => {
    const cut = moveOf(across, 0, 0)
    const on = standingAt(across, (cut.start + cut.end) / 2).ours.get('4')!
    const chord =
      (cut.to.y - cut.from.y) * (on.x - cut.from.x) - (cut.to.x - cut.from.x) * (on.y - cut.from.y)
    expect(Math.abs(chord) / apart(cut.from, cut.to)).toBeGreaterThan(0.3)
  })

  it('stands still before the start and past the end', () => {
    expect(standingAt(across, -5)).toEqual(standingAt(across, 0))
    expect(standingAt(across, NaN)).toEqual(standingAt(across, 0))
    expect(standingAt(across, 99).ours).toEqual(standingAt(across, across.duration).ours)
  })

  it('is quick: a second of frames in far less than a frame each', () => {
    const began = performance.now()
    for (let i = 0; i < 600; i += 1) standingAt(across, (across.duration * i) / 600)
    expect((performance.now() - began) / 600).toBeLessThan(2)
  })
})

describe('stations', () => {
  it('stand on the throw-in’s count until the ball is in, then where the ball is', () => {
    const stations = stationsOf(across)
    expect(stations.map(({ throwInShare }) => throwInShare !== null)).toEqual([true, true, false, false])
    expect(stations[0]?.throwInShare).toBe(0)
    expect(stations[2]!.ball).toEqual(standingAt(across, stations[2]!.seconds).ball.at)
    expect(stations[2]!.t).toBeGreaterThan(0)
  })

  it('tick each second from the first touch', () => {
    const ticks = drawnBySecond(across)
    expect(ticks[0]?.second).toBe(1)
    expect(ticks).toHaveLength(Math.floor(across.duration - across.touch!.seconds))
    const at = standingAt(across, across.touch!.seconds + 2).ball.at
    expect(toMetres(fiba, { x: ticks[1]!.x, y: 0.5 }).x).toBeCloseTo(at.x, 9)
    expect(inMetres(at.x, 0).x).toBeGreaterThan(0)
  })
})

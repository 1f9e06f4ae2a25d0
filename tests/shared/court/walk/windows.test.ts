import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import { laneWindow, type Defender, type Verdict } from '@shared/court/walk/laneWindow'
import { passFlight } from '@shared/court/walk/passFlight'
import { DEFAULT_WALK } from '@shared/court/walk/settings'
import { catchesInSpots, waitsInSpots } from '@shared/court/walk/spotCatches'
import { timeline } from '@shared/court/walk/timeline'
import { passWindows, verdictsOf } from '@shared/court/walk/windows'
import { anyDiagram, anyPack, anyZones } from '../arbitraries'
import { ACROSS, changed } from '../diagrams'

const fiba = rulePack('fiba')
const OPENNESS: Record<Verdict, number> = { closed: 0, tight: 1, open: 2 }
const anyPoint = fc
  .record({ x: fc.double({ min: -1, max: 28, noNaN: true }), y: fc.double({ min: 0, max: 15, noNaN: true }) })
  .map(({ x, y }) => inMetres(x, y))
const anyDefenders = fc
  .array(anyPoint, { maxLength: 5 })
  .map((places) => places.map((at, i): Defender => ({ id: `X${i + 1}` as Defender['id'], at })))
const anyFlight = fc.constantFrom('straight' as const, 'lob' as const, 'bounce' as const)

/** A straight pass of 10 m along the x axis, 1 s in the air. */
const lane = { from: inMetres(0, 0), at: inMetres(10, 0), flight: { seconds: 1, heightAt: null } }
const one = (x: number, y: number): Defender[] => [{ id: 'X3', at: inMetres(x, y) }]

describe('laneWindow', () => {
  it('is open with none of theirs about', () => {
    fc.assert(
      fc.property(anyPoint, anyPoint, anyFlight, (from, at, kind) => {
        const flight = passFlight(kind, Math.hypot(at.x - from.x, at.y - from.y), DEFAULT_WALK)
        expect(laneWindow({ from, at, flight }, [], DEFAULT_WALK)).toMatchObject({
          verdict: 'open',
          threat: null,
        })
      }),
    )
  })

  it('is closed with somebody on the way of a straight pass, past the passer’s own guard', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 1, noNaN: true }), (share) => {
        expect(laneWindow(lane, one(10 * share, 0), DEFAULT_WALK).verdict).toBe('closed')
      }),
    )
  })

  it('needs reach and what closes in the time that is left after reacting', () => {
    const window = laneWindow(lane, one(10, 6), DEFAULT_WALK)
    expect(window.threat?.needs).toBeCloseTo(0.9 + 4 * (1 - 0.25), 9)
    expect(window.threat).toMatchObject({ id: 'X3', where: 'catch' })
    expect(window.threat?.has).toBeCloseTo(6, 9)
    expect(window.verdict).toBe('open')
    expect(laneWindow(lane, one(10, 3.5), DEFAULT_WALK).verdict).toBe('tight')
    expect(laneWindow(lane, one(10, 2), DEFAULT_WALK).verdict).toBe('closed')
  })

  it('goes over whoever cannot reach it, but not at the catch', () => {
    const lob = { ...lane, flight: passFlight('lob', 10, DEFAULT_WALK) }
    expect(lob.flight.heightAt!(0.5)).toBeGreaterThan(DEFAULT_WALK.reachHeight)
    const settings = { ...DEFAULT_WALK, closingSpeed: 0 }
    expect(laneWindow(lob, one(5, 0), settings).verdict).toBe('open')
    expect(laneWindow(lane, one(5, 0), settings).verdict).toBe('closed')
    expect(laneWindow(lob, one(10, 0), settings).verdict).toBe('closed')
  })

  it('does not count the guard on the passer', () => {
    const window = laneWindow(lane, one(1, 0), DEFAULT_WALK)
    expect(window).toMatchObject({ verdict: 'open', guards: ['X3'], threat: null })
  })

  it('is never more open for a slower flight', () => {
    fc.assert(
      fc.property(
        anyPoint,
        anyPoint,
        anyDefenders,
        fc.double({ min: 0.05, max: 3, noNaN: true }),
        fc.double({ min: 1, max: 4, noNaN: true }),
        (from, at, theirs, seconds, slower) => {
          const verdict = (time: number) =>
            laneWindow({ from, at, flight: { seconds: time, heightAt: null } }, theirs, DEFAULT_WALK).verdict
          expect(OPENNESS[verdict(seconds * slower)]).toBeLessThanOrEqual(OPENNESS[verdict(seconds)])
        },
      ),
      { numRuns: 200 },
    )
  })

  it('is never more open for one more of theirs, nor for quicker ones', () => {
    fc.assert(
      fc.property(anyPoint, anyPoint, anyDefenders, anyFlight, (from, at, theirs, kind) => {
        const flight = passFlight(kind, Math.hypot(at.x - from.x, at.y - from.y), DEFAULT_WALK)
        const openness = (defenders: Defender[], settings = DEFAULT_WALK) =>
          OPENNESS[laneWindow({ from, at, flight }, defenders, settings).verdict]
        expect(openness(theirs)).toBeLessThanOrEqual(openness(theirs.slice(1)))
        expect(openness(theirs, { ...DEFAULT_WALK, closingSpeed: 6 })).toBeLessThanOrEqual(openness(theirs))
        expect(openness(theirs, { ...DEFAULT_WALK, reaction: 0.1 })).toBeLessThanOrEqual(openness(theirs))
      }),
      { numRuns: 120 },
    )
  })

  it('is the same mirrored', () => {
    fc.assert(
      fc.property(anyPoint, anyPoint, anyDefenders, (from, at, theirs) => {
        const flip = (point: { x: number; y: number }) => inMetres(point.x, -point.y)
        const flight = { seconds: 0.8, heightAt: null }
        const as = laneWindow({ from, at, flight }, theirs, DEFAULT_WALK)
        const mirrored = laneWindow(
          { from: flip(from), at: flip(at), flight },
          theirs.map((defender) => ({ ...defender, at: flip(defender.at) })),
          DEFAULT_WALK,
        )
        expect(mirrored).toEqual(as)
      }),
      { numRuns: 60 },
    )
  })
})

describe('passWindows', () => {
  it('has one for every pass, with its length and flight, in the order they are let go', () => {
    const windows = passWindows(timeline(ACROSS, fiba))
    expect(windows.map(({ by, to, throwIn }) => `${by}${to}${throwIn ? '!' : ''}`)).toEqual([
      '51!',
      '12',
      '23',
    ])
    for (const { length, seconds } of windows)
      expect(length / seconds).toBeCloseTo(DEFAULT_WALK.straightSpeed, 6)
    expect(verdictsOf(windows).get('1-2')).toBe(windows[0]!.verdict)
  })

  it('meets theirs where they are when the pass is let go, not where they began', () => {
    const lurks = changed((raw) => {
      raw.steps[1]!.moves.push({ kind: 'theirs', who: 'X4', to: { x: 0.36, y: 0.6 }, bend: 0, beat: 0 })
    })
    const second = passWindows(timeline(lurks, fiba))[1]!
    expect(second.nearestCatch?.id).toBe('X4')
    expect(second.verdict).not.toBe('open')
  })

  it('says when it is on in strides of the settings', () => {
    const drawn = changed((raw) => {
      raw.start.theirs = [{ id: 'X3', at: { x: 0.22, y: 0.9 } }]
    })
    const [first] = passWindows(timeline(drawn, fiba))
    expect(first!.words).toMatch(
      /^(Open: on while|On when|Closed\. On when) X3 is (one|two|three) strides? behind/,
    )
    const none = changed((raw) => {
      raw.start.theirs = []
    })
    expect(passWindows(timeline(none, fiba))[0]!.words).toBe('Open: none of theirs stands near.')
  })

  it('puts every verdict into words that need no number', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, (diagram, pack) => {
        for (const { verdict, words } of passWindows(timeline(diagram, pack))) {
          if (verdict === 'tight') expect(words).toMatch(/^On when X\d is /)
          if (verdict === 'open') expect(words).toMatch(/^Open/)
          if (verdict === 'closed') expect(words).toMatch(/^Closed/)
          expect(words).not.toMatch(/NaN|Infinity|undefined|%/)
        }
      }),
      { numRuns: 80 },
    )
  })
})

describe('catches in their spots', () => {
  const zone = { spot: 'coffin-corner', side: 'right', k: 5, n: 11, thin: false } as const

  it('are pointed out with who, where and how often', () => {
    const corner = changed((raw) => {
      const cut = raw.steps[1]!.moves[1]
      if (cut?.kind === 'cut') cut.to = { x: 0.1, y: 0.9 }
    })
    expect(catchesInSpots(corner, [zone])).toEqual([
      {
        kind: 'catches',
        step: 1,
        move: 2,
        role: '1',
        place: { x: 0.1, y: 0.9 },
        zone,
        words: '1 catches in the right deep corner, where they trap 5 of 11.',
      },
    ])
    expect(catchesInSpots(corner, [{ ...zone, side: 'left' }])).toEqual([])
    expect(catchesInSpots(corner, [{ ...zone, k: 0 }])).toEqual([])
    expect(catchesInSpots(ACROSS, [zone])).toEqual([])
  })

  it('tell who waits in one, once', () => {
    const wing = { spot: 'just-over-half', side: 'right', k: 3, n: 9, thin: true } as const
    const waits = waitsInSpots(ACROSS, [wing])
    expect(waits).toHaveLength(1)
    expect(waits[0]).toMatchObject({ role: '3', step: 0, move: null })
    expect(waits[0]!.words).toBe(
      '3 waits in the right sideline just over half, where they trap 3 of 9 (thin).',
    )
  })

  it('mirror with the drawing', () => {
    fc.assert(
      fc.property(anyDiagram, anyZones, (diagram, zones) => {
        const sides = { left: 'right', right: 'left', middle: 'middle' } as const
        const flipped = {
          ...diagram,
          start: {
            ...diagram.start,
            ours: diagram.start.ours.map((each) => ({ ...each, at: { x: each.at.x, y: 1 - each.at.y } })),
          },
          steps: diagram.steps.map((step) => ({
            ...step,
            moves: step.moves.map((move) =>
              move.kind === 'pass' ? move : { ...move, to: { x: move.to.x, y: 1 - move.to.y } },
            ),
          })),
        }
        const other = zones.map((each) => ({ ...each, side: sides[each.side] }))
        const found = (drawn: typeof diagram, theirs: typeof zones) =>
          catchesInSpots(drawn, theirs).map(({ step, move, role }) => `${step}-${move}-${role}`)
        expect(found(flipped, other)).toEqual(found(diagram, zones))
      }),
      { numRuns: 60 },
    )
  })
})

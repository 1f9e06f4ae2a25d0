import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { diagramFaults } from '@shared/court/diagramFaults'
import { rulePack } from '@shared/court/rulePacks'
import { anyDiagram, anyPack } from './arbitraries'
import { ACROSS, changed } from './diagrams'
import type { Diagram } from '@shared/court/diagram'

const fiba = rulePack('fiba')
const messages = (diagram: Diagram) => diagramFaults(diagram, fiba).map(({ message }) => message)

describe('diagramFaults', () => {
  it('finds nothing in a diagram that can be run', () => {
    expect(diagramFaults(ACROSS, fiba)).toEqual([])
  })

  it.each<[string, (raw: Diagram) => void, string]>([
    [
      'a pass from somebody without the ball',
      (raw) =>
        raw.steps[2]?.moves.push({
          kind: 'pass',
          from: '4',
          to: '3',
          flight: 'straight',
          throwIn: false,
          beat: 1,
        }),
      '4 passes, but 2 has the ball.',
    ],
    [
      'a dribble by somebody without the ball',
      (raw) =>
        raw.steps[0]?.moves.push({ kind: 'dribble', who: '4', to: { x: 0.6, y: 0.2 }, bend: 0, beat: 1 }),
      '4 dribbles, but 5 has the ball.',
    ],
    [
      'two with one number',
      (raw) => {
        const one = raw.start.ours[4]
        if (one) one.role = '1'
      },
      'Two of ours have the number 1.',
    ],
    [
      'four of theirs',
      (raw) => raw.start.theirs.pop(),
      'Only 4 of theirs stand on the court. Draw all five.',
    ],
    [
      'a ball that nobody holds',
      (raw) => {
        raw.start.ours = raw.start.ours.map((one) => (one.role === '5' ? { ...one, role: '4' } : one))
      },
      'The ball starts with 5, who is not in the drawing.',
    ],
    [
      'a throw-in from inside the court',
      (raw) => {
        raw.start.ours = raw.start.ours.map((one) =>
          one.role === '5' ? { ...one, at: { x: 0.02, y: 0.7 } } : one,
        )
      },
      '5 throws in from inside the court. Put 5 behind the line.',
    ],
    [
      'a second throw-in',
      (raw) => {
        const pass = raw.steps[2]?.moves[2]
        if (pass?.kind === 'pass') pass.throwIn = true
      },
      'The ball is already in play. Only the first pass is a throw-in.',
    ],
    [
      'a first pass that is no throw-in',
      (raw) => {
        const pass = raw.steps[1]?.moves[2]
        if (pass?.kind === 'pass') pass.throwIn = false
      },
      'The first pass of the trip is the throw-in. Mark it as one.',
    ],
    [
      'a move by one of theirs who is not there',
      (raw) => {
        raw.start.theirs = raw.start.theirs.filter(({ id }) => id !== 'X5')
        raw.steps[0]?.moves.push({ kind: 'theirs', who: 'X5', to: { x: 0.5, y: 0.5 }, bend: 0, beat: 0 })
      },
      'X5 moves but does not stand in the drawing.',
    ],
    [
      'a screen for somebody who stands still',
      (raw) =>
        raw.steps[0]?.moves.push({
          kind: 'screen',
          who: '1',
          to: { x: 0.2, y: 0.5 },
          for: '5',
          blind: false,
          beat: 0,
        }),
      '1 screens for 5, but 5 does not move after it.',
    ],
    [
      'a cut with the ball in hand',
      (raw) => raw.steps[2]?.moves.push({ kind: 'cut', who: '2', to: { x: 0.5, y: 0.5 }, bend: 0, beat: 3 }),
      '2 has the ball and moves. Make it a dribble, or pass first.',
    ],
    [
      'the ball taken back over half',
      (raw) =>
        raw.steps[3]?.moves.push({ kind: 'dribble', who: '3', to: { x: 0.4, y: 0.5 }, bend: 0, beat: 2 }),
      'The ball goes back over half court.',
    ],
    [
      'two on one spot',
      (raw) => {
        raw.start.ours = raw.start.ours.map((one) =>
          one.role === '3' ? { ...one, at: { x: 0.221, y: 0.62 } } : one,
        )
      },
      '2 and 3 stand on the same spot.',
    ],
  ])('finds %s', (_name, change, message) => {
    expect(messages(changed(change))).toContain(message)
  })

  it('lets the thrower run the line with the ball', () => {
    const run = changed((raw) =>
      raw.steps[0]?.moves.push({ kind: 'cut', who: '5', to: { x: -0.03, y: 0.5 }, bend: 0, beat: 0 }),
    )
    expect(diagramFaults(run, fiba)).toEqual([])
  })

  it('points at the step and the move', () => {
    const wrong = changed((raw) => {
      const pass = raw.steps[2]?.moves[2]
      if (pass?.kind === 'pass') pass.from = '4'
    })
    expect(diagramFaults(wrong, fiba)[0]).toMatchObject({ step: 2, move: 2 })
  })

  it('reads whatever the schema lets in, in the order of the steps', () => {
    fc.assert(
      fc.property(anyDiagram, anyPack, (diagram, pack) => {
        const steps = diagramFaults(diagram, pack).map(({ step }) => step)
        expect(steps).toEqual([...steps].sort((a, b) => a - b))
      }),
    )
  })
})

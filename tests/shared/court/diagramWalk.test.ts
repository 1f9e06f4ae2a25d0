import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { stateAt, walkDiagram } from '@shared/court/diagramWalk'
import { ACROSS, changed } from './diagrams'
import { anyDiagram } from './arbitraries'

describe('walking a diagram', () => {
  it('gives the ball to whoever is passed to, at the place where that player has come to', () => {
    const step = stateAt(ACROSS, 1)
    expect(step.before.ball).toBe('5')
    expect(step.after.ball).toBe('1')
    const pass = step.moves.find(({ move }) => move.kind === 'pass')
    expect(pass?.from).toEqual({ x: -0.03, y: 0.68 })
    expect(pass?.to).toEqual({ x: 0.13, y: 0.66 })
  })

  it('carries the ball with the dribble and passes from its end', () => {
    const step = stateAt(ACROSS, 3)
    const pass = step.moves.find(({ move }) => move.kind === 'pass')
    expect(pass?.from).toEqual({ x: 0.59, y: 0.5 })
    expect(step.after.ours.get('2')).toEqual({ x: 0.59, y: 0.5 })
    expect(step.after.ball).toBe('3')
  })

  it('passes from the end of a dribble of the same beat', () => {
    const together = changed((raw) => {
      const pass = raw.steps[3]?.moves[2]
      if (pass) pass.beat = 0
    })
    const pass = stateAt(together, 3).moves.find(({ move }) => move.kind === 'pass')
    expect(pass?.from).toEqual({ x: 0.59, y: 0.5 })
  })

  it('passes from where a passer stood who cuts in the same beat', () => {
    const giveAndGo = changed((raw) => {
      raw.steps[2]?.moves.push({ kind: 'cut', who: '1', to: { x: 0.4, y: 0.8 }, bend: 0, beat: 0 })
    })
    const pass = stateAt(giveAndGo, 2).moves.find(({ move }) => move.kind === 'pass')
    expect(pass?.from).toEqual({ x: 0.13, y: 0.66 })
  })

  it('takes beats in order however they are written', () => {
    const shuffled = changed((raw) => raw.steps[1]?.moves.reverse())
    expect(stateAt(shuffled, 1).after).toEqual(stateAt(ACROSS, 1).after)
    expect(stateAt(shuffled, 1).moves[0]?.move.kind).toBe('screen')
  })

  it('starts each step where the last one ended, whatever is drawn', () => {
    fc.assert(
      fc.property(anyDiagram, (diagram) => {
        const steps = walkDiagram(diagram)
        expect(steps).toHaveLength(diagram.steps.length)
        steps.slice(1).forEach((step, i) => expect(step.before).toEqual(steps[i]?.after))
      }),
    )
  })

  it('reads a step outside the diagram as its first or last', () => {
    expect(stateAt(ACROSS, -3)).toEqual(stateAt(ACROSS, 0))
    expect(stateAt(ACROSS, 99)).toEqual(stateAt(ACROSS, 3))
    expect(stateAt(ACROSS, Number.NaN)).toEqual(stateAt(ACROSS, 0))
  })
})

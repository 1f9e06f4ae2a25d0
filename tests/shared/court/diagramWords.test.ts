import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ballWaySentence, stepSentence } from '@shared/court/diagramWords'
import { anyDiagram } from './arbitraries'
import { ACROSS, changed } from './diagrams'

describe('stepSentence', () => {
  it('says what happens together and what follows', () => {
    expect(stepSentence(ACROSS, 1)).toBe(
      '2 screens for 1, then 1 cuts to the right block and 5 throws in to 1.',
    )
  })

  it('says how the ball flies', () => {
    const lob = changed((raw) => {
      const pass = raw.steps[3]?.moves[2]
      if (pass?.kind === 'pass') pass.flight = 'lob'
    })
    expect(stepSentence(lob, 3)).toContain('2 passes to 3 over the top.')
  })

  it('is one sentence for anything that can be drawn', () => {
    fc.assert(
      fc.property(anyDiagram, (diagram) => {
        diagram.steps.forEach((_step, i) => expect(stepSentence(diagram, i)).toMatch(/^[^.]+\.$/))
        expect(ballWaySentence(diagram)).toMatch(/^[^.]+\.$/)
      }),
    )
  })

  it('follows the ball from the throw-in on', () => {
    expect(ballWaySentence(ACROSS)).toBe(
      '5 throws in to 1, 1 passes to 2, 2 dribbles to the front middle, 2 passes to 3.',
    )
  })
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Diagram, type Move } from '@shared/court/diagram'
import { stateAt } from '@shared/court/diagramWalk'
import { diagramFaults } from '@shared/court/diagramFaults'
import { stepSentence } from '@shared/court/diagramWords'
import { blankDiagram } from '@shared/court/edit/blank'
import { applyEdit } from '@shared/court/edit/edits'
import { DEPTH, drawnFrom, edited, redone, undone, type Drawn } from '@shared/court/edit/history'
import { rulePack } from '@shared/court/rulePacks'
import { anyDiagram } from '../arbitraries'
import { ACROSS } from '../diagrams'
import { anyEdit } from './anyEdit'

const fiba = rulePack('fiba')
const cut = (who: '1' | '2' | '3', x: number): Move => ({
  kind: 'cut',
  who,
  to: { x, y: 0.5 },
  bend: 0,
  beat: 0,
})
const words = (diagram: Diagram, step: number) => stepSentence(diagram, step)
const back = (drawn: Drawn): Drawn => {
  let one = drawn
  while (one.past.length > 0) one = undone(one)
  return one
}

describe('any edit', () => {
  it('of any diagram gives a diagram that its schema takes', () => {
    fc.assert(
      fc.property(anyDiagram, fc.array(anyEdit, { maxLength: 12 }), (diagram, edits) => {
        for (const [i] of edits.entries()) {
          const after = edits.slice(0, i + 1).reduce(applyEdit, diagram)
          expect(Diagram.safeParse(after).error).toBeUndefined()
        }
      }),
      { numRuns: 60 },
    )
  })

  it('is taken back: any sequence undone gives the start, redone its end', () => {
    fc.assert(
      fc.property(anyDiagram, fc.array(anyEdit, { maxLength: 30 }), (diagram, edits) => {
        const end = edits.reduce((drawn, edit) => edited(drawn, edit), drawnFrom(diagram))
        const start = back(end)
        expect(start.present).toEqual(diagram)
        let again = start
        while (again.future.length > 0) again = redone(again)
        expect(again.present).toEqual(end.present)
      }),
      { numRuns: 60 },
    )
  })
})

describe('undo', () => {
  it('is two hundred gestures deep, one entry each, and none for what changes nothing', () => {
    let drawn = drawnFrom(blankDiagram())
    for (let i = 0; i < 250; i += 1)
      drawn = edited(
        drawn,
        { do: 'place', who: '1', at: { x: i / 1000, y: 0.5 } },
        { do: 'mirror' },
        { do: 'mirror' },
      )
    expect(drawn.past).toHaveLength(DEPTH)
    expect(edited(drawn, { do: 'remove-move', step: 0, index: 3 })).toBe(drawn)
    expect(back(drawn).present.start.ours.find((one) => one.role === '1')?.at.x).toBeCloseTo(0.049)
  })

  it('forgets what was undone once something else is drawn', () => {
    const drawn = edited(undone(edited(drawnFrom(ACROSS), { do: 'mirror' })), { do: 'add-step', after: 0 })
    expect(redone(drawn)).toBe(drawn)
  })
})

describe('mirroring', () => {
  it('twice is the same', () => {
    fc.assert(
      fc.property(anyDiagram, (diagram) => {
        const held = applyEdit(applyEdit(diagram, { do: 'mirror' }), { do: 'mirror' })
        expect(applyEdit(applyEdit(held, { do: 'mirror' }), { do: 'mirror' })).toEqual(held)
      }),
    )
    expect(applyEdit(applyEdit(ACROSS, { do: 'mirror' }), { do: 'mirror' })).toEqual(ACROSS)
  })
})

describe('steps', () => {
  it('start where the last one ended, also in another order', () => {
    const longer = applyEdit(ACROSS, { do: 'add-step', after: 1 })
    expect(longer.steps).toHaveLength(ACROSS.steps.length + 1)
    expect(stateAt(longer, 2).before).toEqual(stateAt(ACROSS, 1).after)
    const turned = applyEdit(ACROSS, { do: 'order-step', step: 1, by: -1 })
    expect(turned.steps.map(({ title }) => title).slice(0, 2)).toEqual(['Guard screens guard', 'Sprint'])
    expect(stateAt(turned, 1).before).toEqual(stateAt(turned, 0).after)
  })

  it('are twelve at most and one at least, and a copy is its own', () => {
    let diagram = blankDiagram()
    expect(applyEdit(diagram, { do: 'remove-step', step: 0 })).toBe(diagram)
    for (let i = 0; i < 15; i += 1) diagram = applyEdit(diagram, { do: 'duplicate-step', step: 0 })
    expect(diagram.steps).toHaveLength(12)
    const moved = applyEdit(diagram, { do: 'add-move', step: 1, move: cut('1', 0.4) })
    expect(moved.steps[0]?.moves).toEqual([])
  })

  it('take their first sentence as their title until they get one', () => {
    const drawn = applyEdit(blankDiagram(), { do: 'add-move', step: 0, move: cut('1', 0.34) })
    expect(drawn.steps[0]?.title).toBe('1 cuts to the middle')
    const named = applyEdit(drawn, { do: 'title', step: 0, title: ' Flash ' })
    expect(applyEdit(named, { do: 'aim', step: 0, index: 0, to: { x: 0.9, y: 0.5 } }).steps[0]?.title).toBe(
      'Flash',
    )
    expect(applyEdit(named, { do: 'title', step: 0, title: '  ' })).toBe(named)
  })
})

describe('moves', () => {
  it('happen together where nobody is busy, and one after another where somebody is', () => {
    const together = [cut('1', 0.3), cut('2', 0.4), cut('1', 0.6)].reduce(
      (diagram, move) => applyEdit(diagram, { do: 'add-move', step: 0, move }),
      blankDiagram(),
    )
    expect(together.steps[0]?.moves.map(({ beat }) => beat)).toEqual([0, 0, 1])
    const parted = applyEdit(together, { do: 'join-move', step: 0, index: 1, then: true })
    expect(words(parted, 0)).toMatch(/^1 cuts .*, then 2 cuts .*, then 1 cuts/)
    const turned = applyEdit(parted, { do: 'order-move', step: 0, index: 1, by: -1 })
    expect(words(turned, 0)).toMatch(/^2 cuts .*, then 1 cuts .*, then 1 cuts/)
    const fewer = applyEdit(parted, { do: 'remove-move', step: 0, index: 0 })
    expect(fewer.steps[0]?.moves.map(({ beat }) => beat)).toEqual([0, 1])
  })
})

describe('who throws in', () => {
  it('changes numbers with who did, so that the play stays without faults', () => {
    expect(diagramFaults(ACROSS, fiba)).toEqual([])
    const other = applyEdit(ACROSS, { do: 'thrower', role: '4' })
    expect(diagramFaults(other, fiba)).toEqual([])
    expect(other.start.ball).toBe('4')
    expect(stateAt(other, 0).before.ours.get('4')).toEqual(stateAt(ACROSS, 0).before.ours.get('5'))
  })
})

it('a defender leaves with what that defender did', () => {
  const moving = applyEdit(ACROSS, {
    do: 'add-move',
    step: 0,
    move: { kind: 'theirs', who: 'X5', to: { x: 0.7, y: 0.5 }, bend: 0, beat: 0 },
  })
  const gone = applyEdit(moving, { do: 'remove-defender', id: 'X5' })
  expect(diagramFaults(gone, fiba).map(({ message }) => message)).toEqual([
    'Only 4 of theirs stand on the court. Draw all five.',
  ])
  const back = applyEdit(gone, { do: 'add-defender', id: 'X5', at: { x: 0.62, y: 0.5 } })
  expect(diagramFaults(back, fiba)).toEqual([])
})

import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { counterFile, readCounter } from '@shared/counters/counterFile'
import { CounterDraft } from '@shared/counters/schemas'
import type { Diagram, Move } from '@shared/court/diagram'
import { stepInWords, stepSentence } from '@shared/court/diagramWords'
import { applyEdit, type Edit } from '@shared/court/edit/edits'
import { drawnFrom, edited, undone } from '@shared/court/edit/history'
import { mendDiagram } from '@shared/court/edit/mendDiagram'
import { Reading } from '@shared/court/edit/reading'
import { anyDiagram } from '../arbitraries'
import { ACROSS, changed } from '../diagrams'

const ELBOW = { x: 0.22, y: 0.3 }
const add = (text: string, step = 1): Edit => ({ do: 'add-word', step, text, at: ELBOW })
const wordsOf = (diagram: Diagram, step = 1) => diagram.steps[step]?.words
const WRITTEN = applyEdit(ACROSS, add('go'))
const mended = (words: unknown) => {
  const reading = new Reading()
  const raw = { ...ACROSS, steps: [{ title: 'One', moves: [], words }] }
  return { words: mendDiagram(raw, reading)?.steps[0]?.words, said: reading.mended, refused: reading.refused }
}

describe('a word on the court', () => {
  it('is written on one line, three to a step at most, and not where it is empty', () => {
    expect(wordsOf(applyEdit(ACROSS, add('  wait \n for it  ')))).toEqual([
      { text: 'wait for it', at: ELBOW },
    ])
    expect(wordsOf(applyEdit(ACROSS, add('n'.repeat(30))))?.[0]?.text).toHaveLength(24)
    expect(applyEdit(ACROSS, add('  '))).toBe(ACROSS)
    const full = ['one', 'two', 'three'].reduce((diagram, text) => applyEdit(diagram, add(text)), ACROSS)
    expect(applyEdit(full, add('four'))).toBe(full)
  })

  it('gets another text and another place, and leaves the step as it was', () => {
    const said = applyEdit(WRITTEN, { do: 'change-word', step: 1, index: 0, text: 'now' })
    const moved = applyEdit(said, { do: 'move-word', step: 1, index: 0, at: { x: 3, y: 0.5 } })
    expect(wordsOf(moved)).toEqual([{ text: 'now', at: { x: 1.02, y: 0.5 } }])
    expect(applyEdit(moved, { do: 'remove-word', step: 1, index: 0 })).toEqual(ACROSS)
    expect(applyEdit(moved, { do: 'change-word', step: 1, index: 0, text: ' ' })).toBe(moved)
    expect(applyEdit(moved, { do: 'remove-word', step: 1, index: 1 })).toBe(moved)
  })

  it('is one gesture to take back', () => {
    const drawn = edited(drawnFrom(ACROSS), add('go'))
    expect(drawn.past).toHaveLength(1)
    expect(undone(drawn).present).toEqual(ACROSS)
  })

  it('stays through whatever is done with its step', () => {
    const cut: Move = { kind: 'cut', who: '4', to: { x: 0.6, y: 0.5 }, bend: 0, beat: 0 }
    const edits: Edit[] = [
      { do: 'add-move', step: 1, move: cut },
      { do: 'change-move', step: 1, index: 0, move: cut },
      { do: 'remove-move', step: 1, index: 0 },
      { do: 'title', step: 1, title: 'Other' },
      { do: 'thrower', role: '4' },
      { do: 'remove-defender', id: 'X5' },
      { do: 'duplicate-step', step: 1 },
    ]
    for (const edit of edits) expect(wordsOf(applyEdit(WRITTEN, edit))).toEqual([{ text: 'go', at: ELBOW }])
    const copied = applyEdit(WRITTEN, { do: 'duplicate-step', step: 1 })
    const apart = applyEdit(copied, { do: 'change-word', step: 2, index: 0, text: 'now' })
    expect([1, 2].map((step) => wordsOf(apart, step)?.[0]?.text)).toEqual(['go', 'now'])
  })

  it('changes sides with the play', () => {
    expect(wordsOf(applyEdit(WRITTEN, { do: 'mirror' }))).toEqual([{ text: 'go', at: { x: 0.22, y: 0.7 } }])
  })

  it('ends the sentences of its step', () => {
    expect(stepInWords(WRITTEN, 1)).toBe(
      `${stepSentence(ACROSS, 1)} Written on the court: ‘go’ at the left elbow.`,
    )
    expect(stepInWords(WRITTEN, 0)).toBe(stepSentence(WRITTEN, 0))
  })
})

describe('a drawing from outside', () => {
  it('keeps its words', () => {
    expect(mended([{ text: 'go', at: ELBOW }])).toEqual({
      words: [{ text: 'go', at: ELBOW }],
      said: [],
      refused: [],
    })
    expect(mended(undefined)).toEqual({ words: undefined, said: [], refused: [] })
  })

  it('is read as it was written, whatever is on it', () => {
    fc.assert(
      fc.property(anyDiagram, (diagram) => {
        const once = mendDiagram(diagram, new Reading())
        if (once) expect(mendDiagram(once, new Reading())).toEqual(once)
        const reading = new Reading()
        const alone = changed((raw) => {
          raw.steps = diagram.steps.map((step) => ({ ...step, moves: [] }))
        })
        const texts = (one: Diagram | null) => one?.steps.map(({ words }) => words?.map(({ at }) => at))
        expect(texts(mendDiagram(alone, reading))).toEqual(texts(alone))
        expect(reading.mended).toEqual([])
      }),
    )
  })

  it('loses what is no word, and says so', () => {
    for (const none of [7, 'go', [{ text: '  ', at: ELBOW }], [{ text: 'go', at: { x: 9, y: 0 } }], [null]])
      expect(mended(none)).toEqual({
        words: undefined,
        said: ['Step 1: something written on the court could not be read and was left out.'],
        refused: [],
      })
  })

  it('has long words cut, far ones moved in and a fourth left out, and says so', () => {
    const { words, said } = mended([
      { text: 'w'.repeat(30), at: { x: 1.2, y: 0.5 } },
      ...['a', 'b', 'c'].map((text) => ({ text, at: ELBOW })),
    ])
    expect(words?.map(({ text }) => text)).toEqual(['w'.repeat(24), 'a', 'b'])
    expect(words?.[0]?.at).toEqual({ x: 1.02, y: 0.5 })
    expect(said).toEqual([
      'Step 1: a word on the court was cut to 24 characters.',
      'Step 1: a word was written too far off the court and was moved in.',
      'Step 1: of the words on the court the first 3 are kept.',
    ])
  })

  it('goes out as a file and comes back with them', () => {
    const body = readCounter({ name: 'Across', diagram: WRITTEN })
    const file = counterFile(CounterDraft.parse(body), new Date(0))
    const reading = new Reading()
    expect(readCounter(JSON.parse(JSON.stringify(file)), reading)?.diagram).toEqual(WRITTEN)
    expect(reading.mended.filter((sentence) => sentence.includes('court'))).toEqual([])
  })
})

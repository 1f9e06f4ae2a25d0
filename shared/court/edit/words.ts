import type { Diagram, Place, Step, Word } from '../diagram'
import { heldPlace, WORD, WORDS } from './bounds'
import { withStep } from './moves'

/** Text as it may stand on the court: one line, cut to its room. */
const heldText = (text: string): string => text.replace(/\s+/g, ' ').trim().slice(0, WORD).trim()

/** A step with other words; one without any keeps no empty list. */
function withWords({ words: _before, ...step }: Step, words: readonly Word[]): Step {
  return words.length === 0 ? step : { ...step, words: [...words] }
}

const changeOne = (diagram: Diagram, step: number, index: number, change: (word: Word) => Word | null) =>
  withStep(diagram, step, (one) => {
    const words = one.words ?? []
    const word = words[index]
    const next = word && change(word)
    return next ? withWords(one, words.with(index, next)) : null
  })

/** Writes a word on the court. Empty text is not taken, nor a fourth word. */
export function addWord(diagram: Diagram, step: number, text: string, at: Place): Diagram {
  const held = heldText(text)
  return withStep(diagram, step, (one) => {
    const words = one.words ?? []
    if (held === '' || words.length >= WORDS) return null
    return withWords(one, [...words, { text: held, at: heldPlace(at) }])
  })
}

/** Another text in the same place; an empty one is not taken. */
export function changeWord(diagram: Diagram, step: number, index: number, text: string): Diagram {
  const held = heldText(text)
  return changeOne(diagram, step, index, (word) =>
    held === '' || held === word.text ? null : { ...word, text: held },
  )
}

export const moveWord = (diagram: Diagram, step: number, index: number, at: Place): Diagram =>
  changeOne(diagram, step, index, (word) => ({ ...word, at: heldPlace(at) }))

export function removeWord(diagram: Diagram, step: number, index: number): Diagram {
  return withStep(diagram, step, (one) => {
    const words = one.words ?? []
    return words[index] ? withWords(one, words.toSpliced(index, 1)) : null
  })
}

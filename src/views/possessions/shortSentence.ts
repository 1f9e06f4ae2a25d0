import { labelOf, NOT_VISIBLE, OUTCOMES, TRIGGERS, type Pickup, type Shape } from '@shared/vocabulary'
import { isPressed, trapsOf, type Draft } from './draft'
import type { Ink } from './parts'
import { capital, SHAPE_WORDS, TRIGGER_LEAD, trapWords } from './words'

/** A run of words in one ink; without ink it is what stands between. */
export interface Run {
  text: string
  ink: Ink | null
}

const PICKUP_SHORT: Record<Pickup, string> = { full: 'full', 'three-quarter': 'three-quarter', half: 'half' }
const SHAPE_SHORT: Partial<Record<Shape, string>> = { person: 'person', 'other-zone': 'other zone' }

/** A possession as a line of a list: "After a dead ball, three-quarter, 2-2-1, no trap. Through." */
export function shortSentence(draft: Draft): Run[] {
  const runs: Run[] = []
  const text = (words: string) => void runs.push({ text: words, ink: null })
  const said = (words: string, ink: Ink = 'their') => void runs.push({ text: words, ink })
  if (draft.trigger !== null) {
    text(TRIGGER_LEAD[draft.trigger])
    said(labelOf(TRIGGERS, draft.trigger), 'plain')
  }
  const { shape } = draft
  if (shape === null) {
    text(', ')
    said('not seen', 'plain')
  } else if (!isPressed(draft)) {
    text(' they ')
    said(SHAPE_WORDS[shape].word, 'plain')
  } else {
    if (draft.pickup !== null && draft.pickup !== NOT_VISIBLE) {
      text(', ')
      said(PICKUP_SHORT[draft.pickup])
    }
    text(', ')
    said(draft.shapeVariant ?? SHAPE_SHORT[shape] ?? shape)
    shortTraps(draft, text, said)
  }
  text('.')
  if (draft.outcome !== null) {
    text(' ')
    said(`${capital(labelOf(OUTCOMES, draft.outcome))}.`, 'plain')
  }
  return runs
}

function shortTraps(draft: Draft, text: (words: string) => void, said: (words: string) => void): void {
  if (draft.traps === null) return
  const traps = trapsOf(draft)
  if (draft.traps === NOT_VISIBLE) return text(', traps not seen')
  if (traps.length === 0) return text(', no trap')
  text(traps.length === 1 ? ', trap ' : ', traps ')
  traps.forEach((trap, index) => {
    if (index > 0) text(index === traps.length - 1 ? ' and ' : ', ')
    said(trapWords(trap).word)
  })
}

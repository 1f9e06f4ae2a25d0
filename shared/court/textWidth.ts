import type { Cut } from './scene'

/**
 * How wide a line of type is, before anything draws it: advance widths of Archivo Narrow Bold in em, so
 * that the estimate is at least as wide as what the screen and the PDF set. For keeping labels apart.
 */
const WIDTHS: readonly [RegExp, number][] = [
  [/[ .,:;!|'’iIjl]/, 0.235],
  [/[frt()-]/, 0.31],
  [/[mMW]/, 0.73],
  [/[w]/, 0.64],
  [/[A-Z]/, 0.6],
  [/[0-9ackesxyzvLFJ]/, 0.46],
]
const OTHER = 0.51

/** The other cuts against the narrow one. */
const STRETCH: Record<Cut, number> = { label: 1.06, count: 1, text: 1.28, name: 1.45 }

/** Width of a line of text in the unit of `size`. */
export function textWidth(text: string, size: number, cut: Cut): number {
  let em = 0
  for (const letter of text) em += WIDTHS.find(([letters]) => letters.test(letter))?.[1] ?? OTHER
  return em * STRETCH[cut] * size
}

/** Height of a capital or a figure above the baseline, in em. */
export const CAP_HEIGHT = 0.69
/** How far letters hang below the baseline, in em. */
export const DESCENT = 0.21

import type { Word } from './diagram'
import { toMetres, type InMetres } from './frame'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, TextNode } from './scene'
import type { TokenSize } from './tokens'
import { CAP_HEIGHT, textWidth } from './textWidth'

/** Px. */
const TYPE = 13
const CASING = 3

/** The room a word takes, metres. */
export const wordSize = (text: string, pen: Pen): { width: number; height: number } => ({
  width: textWidth(text, pen.px(TYPE), 'label'),
  height: pen.px(TYPE) * CAP_HEIGHT,
})

/** The middle of a word as it is drawn, metres: one by an end of the court stays whole between the endlines. */
export function wordPoint({ text, at }: Word, pack: RulePack, pen: Pen): InMetres {
  const point = toMetres(pack, at)
  const half = wordSize(text, pen).width / 2
  const { length } = pack.court
  return length < 2 * half ? point : { ...point, x: Math.min(length - half, Math.max(half, point.x)) }
}

/** A word on the court, its middle at a point in metres. */
export const wordNode = (text: string, at: InMetres, pen: Pen): TextNode => ({
  kind: 'text',
  x: at.x,
  y: at.y + wordSize(text, pen).height / 2,
  text,
  size: pen.px(TYPE),
  cut: 'label',
  weight: 600,
  anchor: 'middle',
  ink: 'graphite',
  halo: { ink: 'floor', width: pen.px(CASING) },
})

/** What is written on the court in a step. Nothing on a thumbnail, where a number has no room either. */
export function written(
  words: readonly Word[] | undefined,
  { pack, pen, size }: { pack: RulePack; pen: Pen; size: TokenSize },
): GroupNode[] {
  if (!words || words.length === 0 || size.dot) return []
  const nodes = words.map((word) => wordNode(word.text, wordPoint(word, pack, pen), pen))
  return [{ kind: 'group', id: 'written', nodes }]
}

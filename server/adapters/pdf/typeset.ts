import type PDFDocument from 'pdfkit'
import type { Ink } from '@shared/court/scene'
import type { FontName } from './fonts'
import { PRINT_INKS } from './printInks'

export type Page = InstanceType<typeof PDFDocument>

export interface Style {
  font: FontName
  /** Points. */
  size: number
  ink: Ink
  /** Width of the letters against the cut's own; names are set wide. */
  stretch?: number
  /** Between letters, in em. */
  tracking?: number
}

/** A stretch of text in one style; runs of a paragraph follow each other with their own spaces. */
export interface Run {
  text: string
  style: Style
}

interface Word extends Run {
  /** A space stands before it. */
  spaced: boolean
}

export interface Line {
  words: Word[]
  width: number
}

/** Text broken into lines, ready to be drawn. */
export interface Paragraph {
  lines: Line[]
  /** From the top of the first line's capitals to under the last line's letters. */
  height: number
  leading: number
  /** Of the tallest run. */
  size: number
}

/** Capitals over the baseline and letters under it, in em of the face. */
const CAP = 0.69
const UNDER = 0.21

const options = (style: Style) => ({
  lineBreak: false,
  horizontalScaling: (style.stretch ?? 1) * 100,
  characterSpacing: (style.tracking ?? 0) * style.size,
})

/** Widths in em by font and word. A face opens anew with every document and measuring in it is slow. */
const EMS = new Map<string, number>()
/** Words kept; past it the memory starts anew. */
const MOST_WORDS = 20_000

function emsOf(doc: Page, text: string, font: FontName): number {
  const key = `${font} ${text}`
  const known = EMS.get(key)
  if (known !== undefined) return known
  if (EMS.size >= MOST_WORDS) EMS.clear()
  const ems = doc.font(font).fontSize(1).widthOfString(text)
  EMS.set(key, ems)
  return ems
}

/** Width of a text in one line, points. */
export function widthOf(doc: Page, text: string, style: Style): number {
  const spacing = (style.tracking ?? 0) * style.size * Math.max(0, text.length - 1)
  return (emsOf(doc, text, style.font) * style.size + spacing) * (style.stretch ?? 1)
}

/**
 * Breaks runs into lines of at most `width`, at spaces only; a word that is wider than a line is cut
 * between letters, so that nothing leaves the page. `leading` is in em.
 */
export function paragraph(doc: Page, runs: readonly Run[], width: number, leading = 1.26): Paragraph {
  const size = Math.max(...runs.map((run) => run.style.size))
  const lines: Line[] = []
  let line: Line = { words: [], width: 0 }
  const space = (word: Word) => (word.spaced && line.words.length > 0 ? spaceWidth(doc, word.style) : 0)
  for (const word of wordsOf(doc, runs, width)) {
    const wide = widthOf(doc, word.text, word.style)
    if (line.words.length > 0 && word.spaced && line.width + space(word) + wide > width + 0.01) {
      lines.push(line)
      line = { words: [], width: 0 }
    }
    line.width += space(word) + wide
    line.words.push(word)
  }
  if (line.words.length > 0) lines.push(line)
  const height = lines.length === 0 ? 0 : size * (CAP + UNDER) + (lines.length - 1) * size * leading
  return { lines, height, leading: size * leading, size }
}

/** A space between two words, with the tracking on both its sides. */
const spaceWidth = (doc: Page, style: Style): number =>
  widthOf(doc, ' ', style) + 2 * (style.tracking ?? 0) * style.size * (style.stretch ?? 1)

function wordsOf(doc: Page, runs: readonly Run[], width: number): Word[] {
  const words: Word[] = []
  let open = false
  for (const { text, style } of runs) {
    for (const part of text.split(/(\s+)/)) {
      if (part === '') continue
      if (/^\s+$/.test(part)) {
        open = true
        continue
      }
      pieces(doc, part, style, width).forEach((piece, index) =>
        words.push({ text: piece, style, spaced: open || index > 0 }),
      )
      open = false
    }
  }
  return words
}

function pieces(doc: Page, word: string, style: Style, width: number): string[] {
  if (widthOf(doc, word, style) <= width) return [word]
  const parts: string[] = []
  let part = ''
  for (const letter of word) {
    if (part !== '' && widthOf(doc, part + letter, style) > width) {
      parts.push(part)
      part = ''
    }
    part += letter
  }
  return [...parts, part]
}

/** Draws a paragraph with the capitals of its first line at `y`; lines align left or end at `x + width`. */
export function drawParagraph(
  doc: Page,
  text: Paragraph,
  x: number,
  y: number,
  end?: { width: number },
): void {
  text.lines.forEach((line, index) => {
    const baseline = y + text.size * CAP + index * text.leading
    let at = end ? x + end.width - line.width : x
    for (const run of joined(line.words)) {
      doc.font(run.style.font).fontSize(run.style.size).fillColor(PRINT_INKS[run.style.ink])
      doc.text(run.text, at, baseline, { ...options(run.style), baseline: 'alphabetic' })
      at += widthOf(doc, run.text, run.style)
    }
  })
}

/** Neighbours of one style are drawn in one go, with the spaces that a reader of the text needs. */
function joined(words: readonly Word[]): Run[] {
  const runs: Run[] = []
  for (const [index, word] of words.entries()) {
    const text = index > 0 && word.spaced ? ` ${word.text}` : word.text
    const last = runs.at(-1)
    if (last?.style === word.style) last.text += text
    else runs.push({ text, style: word.style })
  }
  // Unseen, but without it a reading voice runs the last word of a line into the next.
  const last = runs.at(-1)
  if (last) last.text += ' '
  return runs
}

/** The largest size, from `most` down to `least` in half points, at which a text stands in one line. */
export function fitted(doc: Page, text: string, style: Style, width: number, least: number): Style {
  for (let size = style.size; size > least; size -= 0.5) {
    const tried = { ...style, size }
    if (widthOf(doc, text, tried) <= width) return tried
  }
  return { ...style, size: least }
}

/** A straight rule across, points. */
export function rule(
  doc: Page,
  x: number,
  y: number,
  width: number,
  weight: number,
  ink: string = PRINT_INKS.graphite,
): void {
  doc.save()
  doc
    .lineWidth(weight)
    .strokeColor(ink)
    .moveTo(x, y)
    .lineTo(x + width, y)
    .stroke()
  doc.restore()
}

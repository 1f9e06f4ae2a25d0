import type { SheetContent } from '@shared/sheets/content'
import { overtopMark } from './overtopMark'
import { PRINT_INKS } from './printInks'
import { STYLES, type Sizes } from './sheetSizes'
import { artifact, tagged, type Tag } from './tags'
import { drawParagraph, fitted, paragraph, rule, widthOf, type Page, type Run } from './typeset'

/** A part of the page: its height, and how it is drawn with its top at y. */
export interface Block {
  height: number
  draw(y: number, tree: Tag): void
}

/** Left edge and width of what is printed, points. */
export interface Column {
  x: number
  width: number
}

/** Their name and when we meet them, over a thick rule. */
export function headerBlock(
  doc: Page,
  page: Pick<SheetContent, 'title' | 'when'>,
  { x, width }: Column,
  sizes: Sizes,
): Block {
  const whenStyle = STYLES.label(Math.min(sizes.body, 14) * 0.93)
  const whenWidth = widthOf(doc, page.when, whenStyle)
  const beside = width - whenWidth - 18
  const wide = STYLES.name(sizes.name)
  const one = fitted(doc, page.title, wide, beside, sizes.name * 0.78)
  const fits = widthOf(doc, page.title, one) <= beside
  const name = fits
    ? paragraph(doc, [{ text: page.title, style: one }], width)
    : nameAlone(doc, page.title, width, sizes)
  const when = paragraph(doc, [{ text: page.when, style: whenStyle }], width)
  const under = fits ? 0 : when.height + 7
  return {
    height: name.height + under + 9,
    draw(y, tree) {
      tagged(doc, tree, 'H1', () => drawParagraph(doc, name, x, y))
      const lift = one.size * 0.69 - whenStyle.size * 0.69
      const whenY = fits ? y + lift : y + name.height + 6
      tagged(doc, tree, 'P', () => drawParagraph(doc, when, x, whenY, fits ? { width } : undefined))
      artifact(doc, () => rule(doc, x, y + name.height + under + 7.5, width, 3))
    },
  }
}

const nameAlone = (doc: Page, title: string, width: number, sizes: Sizes) =>
  paragraph(
    doc,
    [{ text: title, style: fitted(doc, title, STYLES.name(sizes.name), width, sizes.name * 0.71) }],
    width,
    1.06,
  )

/** Up to three points side by side: letter, sentence, count. */
export function linesBlock(doc: Page, page: SheetContent, { x, width }: Column, sizes: Sizes): Block {
  const gap = 14
  const indent = sizes.letter * 2 + 5
  const size = Math.min(sizes.body, 14)
  if (page.unknown !== null) {
    const words = paragraph(doc, [{ text: page.unknown, style: STYLES.text(size) }], width)
    return {
      height: words.height,
      draw: (y, tree) => tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, y)),
    }
  }
  const column = (width - gap * (page.lines.length - 1)) / page.lines.length
  const points = page.lines.map((line) => ({
    letter: line.letter,
    words: paragraph(
      doc,
      [
        { text: line.lead, style: STYLES.text(size) },
        { text: line.strong, style: STYLES.strong(size) },
      ],
      column - indent,
      1.24,
    ),
    count: paragraph(doc, [{ text: line.count, style: STYLES.count(sizes.count, line.ink) }], column),
  }))
  const top = Math.max(0, sizes.letter - (size * 0.69) / 2)
  const heightOf = (point: (typeof points)[number]) => top + point.words.height + 4 + point.count.height
  return {
    height: Math.max(...points.map(heightOf)),
    draw(y, tree) {
      const list = doc.struct('L')
      tree.add(list)
      points.forEach((point, index) => {
        const left = x + index * (column + gap)
        const item = doc.struct('LI')
        list.add(item)
        tagged(doc, item, 'Lbl', () =>
          letterDisc(doc, point.letter, left + sizes.letter, y + sizes.letter, sizes.letter),
        )
        tagged(doc, item, 'LBody', () => {
          drawParagraph(doc, point.words, left + indent, y + top)
          drawParagraph(doc, point.count, left + indent, y + top + point.words.height + 4)
        })
        item.end()
      })
      list.end()
    },
  }
}

/** The same points under each other, counts at the right edge; for the fuller page. */
export function pointRows(
  doc: Page,
  page: Pick<SheetContent, 'lines' | 'unknown'>,
  { x, width }: Column,
  sizes: Sizes,
): Block {
  const indent = sizes.letter * 2 + 6
  const said =
    page.unknown === null
      ? page.lines.map(({ letter, lead, strong, count, ink }) => {
          const number = { text: count, style: STYLES.count(sizes.count, ink) }
          const room = widthOf(doc, count, number.style) + 10
          const runs = [
            { text: lead, style: STYLES.text(sizes.body) },
            { text: strong, style: STYLES.strong(sizes.body) },
          ]
          return {
            letter,
            words: paragraph(doc, runs, width - indent - room, 1.22),
            count: paragraph(doc, [number], width),
          }
        })
      : []
  const unknown = page.unknown
  if (unknown !== null) {
    const words = paragraph(doc, [{ text: unknown, style: STYLES.text(sizes.body) }], width)
    return {
      height: words.height,
      draw: (y, tree) => tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, y)),
    }
  }
  const pad = sizes.body * 0.62
  const heightOf = ({ words }: (typeof said)[number]) => Math.max(words.height, 2 * sizes.letter) + 2 * pad
  return {
    height: said.reduce((sum, point) => sum + heightOf(point), 0),
    draw(y, tree) {
      let top = y
      for (const point of said) {
        const at = top
        artifact(doc, () => rule(doc, x, at, width, 0.75, PRINT_INKS['court-line']))
        tagged(doc, tree, 'P', () => {
          letterDisc(doc, point.letter, x + sizes.letter, at + pad + sizes.letter, sizes.letter)
          drawParagraph(doc, point.words, x + indent, at + pad + sizes.letter - sizes.body * 0.345)
          drawParagraph(doc, point.count, x, at + pad + sizes.letter - sizes.count * 0.345, { width })
        })
        top += heightOf(point)
      }
    },
  }
}

function letterDisc(doc: Page, letter: string, x: number, y: number, r: number): void {
  const style = { ...STYLES.strong(r * 1.25), ink: 'paper' as const }
  doc.circle(x, y, r).fill(PRINT_INKS.graphite)
  drawParagraph(
    doc,
    paragraph(doc, [{ text: letter, style }], r * 4),
    x - widthOf(doc, letter, style) / 2,
    y - style.size * 0.345,
  )
}

/** The other call in a line, under a rule of its own; nothing when there is none. */
export function otherBlock(doc: Page, page: SheetContent, { x, width }: Column, sizes: Sizes): Block | null {
  if (!page.other) return null
  const size = Math.max(sizes.body, sizes.body >= 14 ? 15 : 0)
  const runs: Run[] = [
    { text: `${page.other.lead} `, style: { ...STYLES.strong(size), ink: 'our' } },
    { text: page.other.line, style: STYLES.text(size) },
  ]
  const words = paragraph(doc, runs, width)
  return {
    height: words.height + 10,
    draw(y, tree) {
      artifact(doc, () => rule(doc, x, y, width, 1.5))
      tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, y + 10))
    },
  }
}

/** The loudest lines: as many beside each other as fit. */
export function keysBlock(
  doc: Page,
  page: Pick<SheetContent, 'keys'>,
  { x, width }: Column,
  sizes: Sizes,
): Block | null {
  if (page.keys.length === 0) return null
  const style = STYLES.key(sizes.key)
  const gap = 22
  const rows: { text: string; width: number }[][] = []
  for (const text of page.keys) {
    const key = { text, width: widthOf(doc, text, style) }
    const row = rows.at(-1)
    const taken = row?.reduce((sum, one) => sum + one.width + gap, 0) ?? Infinity
    if (row && taken + key.width <= width) row.push(key)
    else rows.push([key])
  }
  const set = rows.map((row) =>
    row.map((key) => ({ ...key, words: paragraph(doc, [{ text: key.text, style }], width, 1.15) })),
  )
  const heights = set.map((row) => Math.max(...row.map(({ words }) => words.height)))
  const between = sizes.key * 0.34
  return {
    height: 12 + heights.reduce((sum, height) => sum + height, 0) + between * (rows.length - 1),
    draw(y, tree) {
      artifact(doc, () => rule(doc, x, y, width, 3))
      let top = y + 12
      set.forEach((row, index) => {
        const free = width - row.reduce((sum, key) => sum + key.width, 0)
        let at = x
        for (const { words, width: own } of row) {
          const left = at
          tagged(doc, tree, 'P', () => drawParagraph(doc, words, left, top))
          at += own + (row.length > 1 ? free / (row.length - 1) : 0)
        }
        top += (heights[index] ?? 0) + between
      })
    },
  }
}

/** Number of the sheet, whose it is, and that it comes back. */
export function footBlock(
  doc: Page,
  page: Pick<SheetContent, 'foot'>,
  { x, width }: Column,
  sizes: Sizes,
): Block {
  const { sheet, owner, back } = page.foot
  const left = paragraph(
    doc,
    [{ text: owner ? `${sheet} ${owner.name}, ${owner.jersey}.` : sheet, style: STYLES.text(sizes.foot) }],
    width * 0.7,
  )
  const right = paragraph(doc, [{ text: back, style: STYLES.strong(sizes.foot * 1.1) }], width)
  return {
    height: 8 + left.height,
    draw(y, tree) {
      artifact(doc, () => {
        rule(doc, x, y, width, 0.75, PRINT_INKS['court-line'])
        overtopMark(doc, x, y + 8.5, sizes.foot * 0.92)
      })
      tagged(doc, tree, 'P', () => drawParagraph(doc, left, x + sizes.foot * 1.9, y + 8))
      tagged(doc, tree, 'P', () => drawParagraph(doc, right, x, y + 8 - sizes.foot * 0.07, { width }))
    },
  }
}

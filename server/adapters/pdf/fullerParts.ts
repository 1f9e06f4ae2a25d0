import type { FullerContent } from '@shared/sheets/fuller'
import { PRINT_INKS } from './printInks'
import type { Block, Column } from './sheetBlocks'
import { STYLES, type Sizes } from './sheetSizes'
import { tagged } from './tags'
import { drawParagraph, paragraph, widthOf, type Page } from './typeset'

export interface Text {
  doc: Page
  sizes: Sizes
}

/** A heading over a part. */
export function headed({ doc, sizes }: Text, heading: string, column: Column, block: Block): Block {
  const style = { ...STYLES.head(sizes.head), ink: heading === 'What they do' ? 'graphite' : 'our' } as const
  const words = paragraph(doc, [{ text: heading, style }], column.width, 1.12)
  return {
    height: words.height + 7 + block.height,
    draw(y, tree) {
      tagged(doc, tree, 'H2', () => drawParagraph(doc, words, column.x, y))
      block.draw(y + words.height + 7, tree)
    },
  }
}

/** A sentence with its number before it. */
export function numbered({ doc, sizes }: Text, number: number, text: string, { x, width }: Column): Block {
  const indent = sizes.body * 1.4
  const figure = paragraph(doc, [{ text: String(number), style: STYLES.strong(sizes.body) }], indent)
  const words = paragraph(doc, [{ text, style: STYLES.text(sizes.body) }], width - indent, 1.2)
  return {
    height: words.height,
    draw: (y, tree) =>
      tagged(doc, tree, 'P', () => {
        drawParagraph(doc, figure, x, y)
        drawParagraph(doc, words, x + indent, y)
      }),
  }
}

export function loose({ doc, sizes }: Text, text: string, { x, width }: Column): Block {
  const words = paragraph(doc, [{ text, style: STYLES.text(sizes.body) }], width, 1.22)
  return {
    height: words.height,
    draw: (y, tree) => tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, y)),
  }
}

/** Who has which role: token, first name, number. The reader's own is solid. */
export function fiveRow({ doc, sizes }: Text, five: FullerContent['five'], { x, width }: Column): Block {
  const r = sizes.body * 0.95
  const column = width / Math.max(1, five.length)
  const said = five.map(({ name, jersey }) =>
    paragraph(
      doc,
      name === null
        ? [{ text: ' ', style: STYLES.text(sizes.body) }]
        : [
            { text: name, style: STYLES.strong(sizes.body) },
            { text: ` no. ${jersey}`, style: STYLES.text(sizes.body * 0.95) },
          ],
      column - 2 * r - 10,
      1.15,
    ),
  )
  return {
    height: Math.max(2 * r, ...said.map((words) => words.height)),
    draw: (y, tree) =>
      five.forEach(({ role, own }, index) => {
        const words = said[index]
        if (!words) return
        const left = x + index * column
        tagged(doc, tree, 'P', () => {
          ring(doc, role, left + r, y + r, r, own)
          drawParagraph(doc, words, left + 2 * r + 7, y + Math.max(0, r - sizes.body * 0.345))
        })
      }),
  }
}

function ring(doc: Page, role: string, x: number, y: number, r: number, own: boolean): void {
  const style = { ...STYLES.count(r * 1.3, 'our'), ink: own ? 'paper' : 'our' } as const
  doc.save()
  doc.lineWidth(1.5).circle(x, y, r - 0.75)
  if (own) doc.fill(PRINT_INKS.our)
  else doc.stroke(PRINT_INKS.our)
  doc.restore()
  drawParagraph(
    doc,
    paragraph(doc, [{ text: role, style }], r * 4),
    x - widthOf(doc, role, style) / 2,
    y - style.size * 0.345,
  )
}

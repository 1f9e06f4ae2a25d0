import type { Scene } from '@shared/court/scene'
import type { SheetContent, SheetReader } from '@shared/sheets/content'
import { drawScene, sceneHeight } from './drawScene'
import { PRINT_INKS } from './printInks'
import type { Block, Column } from './sheetBlocks'
import { STYLES, type Sizes } from './sheetSizes'
import { artifact, tagged } from './tags'
import { drawParagraph, paragraph, rule, widthOf, type Page } from './typeset'

/** A drawing; in the middle of its column, or at its left edge, where it is narrower. */
export function figureBlock(
  doc: Page,
  scene: Scene,
  column: Column,
  width: number,
  place: 'middle' | 'left' = 'middle',
): Block {
  const height = sceneHeight(scene, width)
  const x = place === 'left' ? column.x : column.x + (column.width - width) / 2
  return {
    height,
    draw: (y, tree) =>
      tagged(doc, tree, 'Figure', () => drawScene(doc, scene, { x, y, width }), scene.description),
  }
}

/** The name of the call over its drawing. */
export function wayHeading(doc: Page, page: SheetContent, column: Column, sizes: Sizes): Block {
  const words = paragraph(
    doc,
    [{ text: page.way.heading, style: STYLES.head(sizes.head) }],
    column.width,
    1.12,
  )
  return {
    height: words.height + 8,
    draw: (y, tree) => tagged(doc, tree, 'H2', () => drawParagraph(doc, words, column.x, y)),
  }
}

/** Whom the sheet speaks to, and what to do. */
export function readerBlock(doc: Page, page: SheetContent, column: Column, sizes: Sizes): Block {
  const { reader } = page
  return reader.kind === 'one' ? oneBlock(doc, reader, column, sizes) : fiveBlock(doc, reader, column, sizes)
}

type One = Extract<SheetReader, { kind: 'one' }>
type Five = Extract<SheetReader, { kind: 'five' }>

function oneBlock(doc: Page, reader: One, { x, width }: Column, sizes: Sizes): Block {
  const r = sizes.token
  const indent = 2 * r + 12
  const style = STYLES.head(sizes.head * 1.06)
  const heading = [`${reader.name},`, reader.rest].filter((text) => text !== ',')
  const said = heading.map((text) => paragraph(doc, [{ text, style }], width - indent, 1.12))
  const saidHeight = said.reduce((sum, words) => sum + words.height, 0) + (said.length - 1) * style.size * 0.2
  const head = Math.max(2 * r, saidHeight)
  const jobs = reader.jobs.map((text) => paragraph(doc, [{ text, style: STYLES.text(sizes.body) }], width))
  const pad = sizes.body * 0.72
  const jobsHeight = jobs.reduce((sum, words) => sum + words.height + 2 * pad, 0)
  return {
    height: head + pad + jobsHeight - pad,
    draw(y, tree) {
      artifact(doc, () => token(doc, reader.role, x + r, y + head / 2, r))
      tagged(doc, tree, 'H2', () => {
        let top = y + (head - saidHeight) / 2
        for (const words of said) {
          drawParagraph(doc, words, x + indent, top)
          top += words.height + style.size * 0.2
        }
      })
      let top = y + head + pad
      for (const words of jobs) {
        const at = top
        artifact(doc, () => rule(doc, x, at, width, 0.75, PRINT_INKS['court-line']))
        tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, at + pad))
        top += words.height + 2 * pad
      }
    },
  }
}

function fiveBlock(doc: Page, reader: Five, { x, width }: Column, sizes: Sizes): Block {
  const r = sizes.body * 0.72
  const indent = 2 * r + 8
  const heading = paragraph(doc, [{ text: reader.heading, style: STYLES.head(sizes.head) }], width)
  const rows = reader.rows.map(({ role, name, job }) => ({
    role,
    words: paragraph(
      doc,
      [
        ...(name === null ? [] : [{ text: `${name}. `, style: STYLES.strong(sizes.body) }]),
        { text: job, style: STYLES.text(sizes.body) },
      ],
      width - indent,
      1.2,
    ),
  }))
  const pad = sizes.body * 0.4
  const lift = Math.max(0, r - sizes.body * 0.345)
  const heightOf = ({ words }: (typeof rows)[number]) => Math.max(words.height + lift, 2 * r) + 2 * pad
  return {
    height: heading.height + 8 + rows.reduce((sum, row) => sum + heightOf(row), 0) - pad,
    draw(y, tree) {
      tagged(doc, tree, 'H2', () => drawParagraph(doc, heading, x, y))
      let top = y + heading.height + 8
      for (const row of rows) {
        const at = top
        artifact(doc, () => rule(doc, x, at, width, 0.75, PRINT_INKS['court-line']))
        tagged(doc, tree, 'P', () => {
          token(doc, row.role, x + r, at + pad + r, r)
          drawParagraph(doc, row.words, x + indent, at + pad + lift)
        })
        top += heightOf(row)
      }
    },
  }
}

/** The reader's own role as it is drawn on the court: solid, our ink. */
function token(doc: Page, role: string, x: number, y: number, r: number): void {
  const style = { ...STYLES.count(r * 1.28, 'our'), ink: 'paper' as const }
  doc.circle(x, y, r).fill(PRINT_INKS.our)
  drawParagraph(
    doc,
    paragraph(doc, [{ text: role, style }], r * 4),
    x - widthOf(doc, role, style) / 2,
    y - style.size * 0.345,
  )
}

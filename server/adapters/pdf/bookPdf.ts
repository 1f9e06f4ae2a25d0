import type { CounterBody } from '@shared/counters/schemas'
import type { RulePack } from '@shared/court/rulePacks'
import { countWords } from '@shared/court/walk/countWords'
import { timeline } from '@shared/court/walk/timeline'
import type { Paper } from '@shared/sheets/schemas'
import { FAMILIES } from '@shared/counterWords'
import { labelOf } from '@shared/vocabulary'
import { column, footLine, linesUnder, rolesUnder, stepScenes, stepsBlock } from './bookBlocks'
import { openFile, plainTitle } from './openFile'
import type { Block } from './sheetBlocks'
import type { Frame } from './sheetLayout'
import { STYLES } from './sheetSizes'
import { artifact, tagged, type Tag } from './tags'
import { drawParagraph, fitted, paragraph, rule, widthOf, type Page } from './typeset'

/** One page of the book: a counter and the court it is drawn on. */
export interface BookPage {
  counter: CounterBody
  pack: RulePack
}

/** Sizes to try, the roomiest first; past the last with sentences only titles stand over the drawings. */
const BODIES = [10.5, 10, 9.5, 9, 8.5] as const
const COLUMNS = [2, 3, 4, 6] as const
const GAP = 12
const APART = 22
/** The left column's share: roles need more room than looks. */
const LEFT = 0.54

/**
 * The book of counters, one page each: steps drawn and said, roles, looks, what to tell them, counts. Tagged, fonts
 * embedded, no player's name. Gives way to other requests between two pages.
 * @param owner whose book it is, at the foot
 * @returns the whole PDF file
 */
export async function bookPdf(pages: readonly BookPage[], paper: Paper, owner: string): Promise<Buffer> {
  const title = plainTitle(
    pages.length === 1 ? (pages[0]?.counter.name ?? 'Counter') : `The book of counters, ${owner}`,
  )
  const { doc, file, frame, tree, nextPage } = openFile(title, paper)
  for (const [index, page] of pages.entries()) {
    if (index > 0) {
      nextPage()
      await new Promise((next) => setImmediate(next))
    }
    const number = pages.length === 1 ? '' : `${index + 1} of ${pages.length}`
    drawPage(doc, page, frame, footLine(doc, owner, number, frame), tree)
  }
  tree.end()
  doc.end()
  return file
}

function drawPage(doc: Page, page: BookPage, frame: Frame, foot: Block, tree: Tag): void {
  const head = heading(doc, page.counter, frame)
  const room = frame.height - head.height - foot.height - 3 * GAP
  const { steps, words } = fitting(doc, page, frame, room)
  head.draw(frame.y, tree)
  const top = frame.y + head.height + GAP
  steps.draw(top, tree)
  words.draw(top + steps.height + GAP, tree)
  foot.draw(frame.y + frame.height - foot.height, tree)
}

/** The largest drawings and type at which both parts fit; at the very last, the smallest of all. */
function fitting(doc: Page, page: BookPage, frame: Frame, room: number): { steps: Block; words: Block } {
  const { counter, pack } = page
  const sceneOf = stepScenes(counter.diagram, pack)
  const wordsOf = new Map(BODIES.map((body) => [body, wordsBlock(doc, page, frame, body)]))
  let last: { steps: Block; words: Block } | null = null
  for (const sentences of [true, false])
    for (const columns of COLUMNS)
      for (const body of BODIES) {
        const words = wordsOf.get(body)
        if (!words || words.height >= room) continue
        const steps = stepsBlock(doc, counter.diagram, sceneOf, frame, { columns, body, sentences })
        last = { steps, words }
        if (steps.height + words.height <= room) return last
      }
  return (
    last ?? {
      steps: stepsBlock(doc, counter.diagram, sceneOf, frame, { columns: 6, body: 8.5, sentences: false }),
      words: wordsBlock(doc, page, frame, 8.5),
    }
  )
}

function heading(doc: Page, counter: CounterBody, { x, width }: Frame): Block {
  const call = counter.call === '' ? '' : `called “${counter.call}”`
  const callStyle = STYLES.label(12)
  const beside = width - (call === '' ? 0 : widthOf(doc, call, callStyle) + 18)
  const style = { ...fitted(doc, counter.name, STYLES.name(26), beside, 15), ink: 'our' as const }
  const name = paragraph(doc, [{ text: counter.name, style }], beside, 1.06)
  const about = paragraph(
    doc,
    [{ text: `${labelOf(FAMILIES, counter.family)}. ${counter.alignment}`, style: STYLES.text(11) }],
    width,
  )
  return {
    height: name.height + 7 + about.height + 6,
    draw(y, tree) {
      tagged(doc, tree, 'H1', () => drawParagraph(doc, name, x, y))
      if (call !== '')
        tagged(doc, tree, 'P', () =>
          drawParagraph(
            doc,
            paragraph(doc, [{ text: call, style: callStyle }], width),
            x,
            y + (style.size - callStyle.size) * 0.69,
            { width },
          ),
        )
      tagged(doc, tree, 'P', () => drawParagraph(doc, about, x, y + name.height + 7))
      artifact(doc, () => rule(doc, x, y + name.height + 7 + about.height + 6, width, 2))
    },
  }
}

function wordsBlock(doc: Page, { counter, pack }: BookPage, frame: Frame, body: number): Block {
  const left = { x: frame.x, width: frame.width * LEFT - APART / 2 }
  const right = { x: frame.x + left.width + APART, width: frame.width - left.width - APART }
  const text = STYLES.text(body)
  const strong = STYLES.strong(body)
  const plain = (lines: readonly string[]) => lines.map((line) => [{ text: line, style: text }])
  const under = (name: string, lines: Parameters<typeof linesUnder>[2], place: typeof left) =>
    linesUnder(doc, name, lines, place, body)
  const counts = countWords(timeline(counter.diagram, pack))
  const there = (block: Block | null): block is Block => block !== null
  const gap = body * 0.9
  const one = column(
    [
      rolesUnder(doc, counter.roles, left, body),
      under('The counts', plain([...counts, `On ${pack.name}.`]).slice(0, 4), left),
    ].filter(there),
    gap,
  )
  const other = column(
    [
      under(
        'Looks, in order',
        counter.looks.map((look, index) => [
          { text: `${index + 1}. `, style: strong },
          { text: look, style: text },
        ]),
        right,
      ),
      under(
        'Tell them',
        [...plain(counter.teachingPoints), ...counter.donts.map((dont) => [{ text: dont, style: strong }])],
        right,
      ),
      under('Take care', plain(counter.cautions), right),
    ].filter(there),
    gap,
  )
  return {
    height: Math.max(one.height, other.height),
    draw(y, tree) {
      one.draw(y, tree)
      other.draw(y, tree)
    },
  }
}

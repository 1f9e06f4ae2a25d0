import type { Scene } from '@shared/court/scene'
import { pressDrawing, wayDrawing } from '@shared/sheets/drawings'
import { FULLER_BUDGET, type FullerContent } from '@shared/sheets/fuller'
import type { FrozenPlan } from '@shared/sheets/schemas'
import { fiveRow, headed, loose, numbered, type Text } from './fullerParts'
import { footBlock, headerBlock, keysBlock, pointRows, type Block, type Column } from './sheetBlocks'
import { figureBlock } from './sheetParts'
import type { Frame } from './sheetLayout'
import { sizesFor } from './sheetSizes'
import { SheetTooFull } from './sheetTooFull'
import { artifact, type Tag } from './tags'
import { rule, type Page } from './typeset'

const BODIES = [11.5, 11, 10.5, 10, FULLER_BUDGET.bodyPt] as const
const SHRINKS = [1, 0.96, 0.92, 0.88, 0.84, 0.8, 0.76, 0.72, 0.68] as const
const GAP = 8
const WIDEST_GAP = 18
const COLUMN_GAP = 22
/** CSS px in a point. */
const PX = 4 / 3

/**
 * The fuller page: what they do, what we do in four steps, who, the looks in order, the change-up and the keys.
 * Drawings give way before type does.
 * @throws SheetTooFull under 9.5 pt
 */
export function layOutFuller(
  doc: Page,
  page: FullerContent,
  plan: FrozenPlan,
  frame: Frame,
): (tree: Tag) => void {
  for (const body of BODIES)
    for (const shrink of SHRINKS) {
      const parts = partsOf(doc, page, plan, frame, body, shrink)
      const left = frame.height - parts.reduce((sum, part) => sum + part.height, 0) - GAP * (parts.length - 1)
      if (left >= 0) return (tree) => drawDown(parts, frame, left, tree)
    }
  throw new SheetTooFull(FULLER_BUDGET.bodyPt)
}

function partsOf(
  doc: Page,
  page: FullerContent,
  plan: FrozenPlan,
  frame: Frame,
  body: number,
  shrink: number,
): Block[] {
  const sizes = sizesFor(body)
  const [left, right] = halves(frame, 0.6)
  const text: Text = { doc, sizes }
  const press = pressDrawing(plan, { width: left.width * shrink * PX, labels: 'letters', medium: 'paper' })
  const keys = keysBlock(doc, { ...page, keys: page.keys }, frame, sizes)
  return [
    headerBlock(doc, page, frame, { ...sizes, name: 25 }),
    beside(
      figureBlock(doc, press, left, left.width * shrink, 'left'),
      headed(text, 'What they do', right, pointRows(doc, page, right, sizes)),
    ),
    ruled(doc, frame, headed(text, page.way.heading, frame, steps(doc, page, plan, frame, text, shrink))),
    ruled(doc, frame, fiveRow(text, page.five, frame)),
    ...lower(doc, page, plan, frame, text, shrink),
    ...(keys ? [keys] : []),
    footBlock(doc, page, frame, sizes),
  ]
}

/** Two steps beside each other, then the other two. */
function steps(
  doc: Page,
  page: FullerContent,
  plan: FrozenPlan,
  frame: Frame,
  text: Text,
  shrink: number,
): Block {
  const columns = halves(frame, 0.5)
  const cell = ({ index, number, title, solid }: FullerContent['way']['steps'][number], column: Column) => {
    const width = column.width * shrink
    const scene = wayDrawing(
      plan,
      { counter: 'firstCall', you: solid, step: index },
      { width: width * PX, crop: 'full', medium: 'paper' },
    )
    return stacked([numbered(text, number, title, column), figureBlock(doc, scene, column, width, 'left')], 5)
  }
  const rows: Block[] = []
  for (let at = 0; at < page.way.steps.length; at += 2) {
    const cells = page.way.steps
      .slice(at, at + 2)
      .map((step, index) => cell(step, columns[index] ?? columns[0]))
    rows.push(cells.reduce((one, next) => beside(one, next)))
  }
  return stacked(rows, 7)
}

function lower(
  doc: Page,
  page: FullerContent,
  plan: FrozenPlan,
  frame: Frame,
  text: Text,
  shrink: number,
): Block[] {
  const [left, right] = halves(frame, 0.5)
  const looks =
    page.looks.length > 0
      ? headed(
          text,
          'Look, in this order',
          left,
          stacked(
            page.looks.map((look, index) => numbered(text, index + 1, look, left)),
            5,
          ),
        )
      : null
  const other = page.changeUp && changeUpBlock(doc, page.changeUp, plan, looks ? right : frame, text, shrink)
  if (looks && other) return [ruled(doc, frame, beside(looks, other))]
  return [looks, other].filter((block) => block !== null).map((block) => ruled(doc, frame, block))
}

function changeUpBlock(
  doc: Page,
  { heading, text: words }: NonNullable<FullerContent['changeUp']>,
  plan: FrozenPlan,
  column: Column,
  text: Text,
  shrink: number,
): Block {
  const width = Math.min(column.width, 240) * 0.8 * shrink
  const scene: Scene = wayDrawing(
    plan,
    { counter: 'changeUp', you: null, step: 'all' },
    { width: width * PX, crop: 'full', medium: 'paper' },
  )
  return headed(
    text,
    heading,
    column,
    stacked([loose(text, words, column), figureBlock(doc, scene, column, width, 'left')], 5),
  )
}

function halves({ x, width }: Column, share: number): [Column, Column] {
  const left = (width - COLUMN_GAP) * share
  return [
    { x, width: left },
    { x: x + left + COLUMN_GAP, width: width - COLUMN_GAP - left },
  ]
}

const beside = (one: Block, next: Block): Block => ({
  height: Math.max(one.height, next.height),
  draw(y, tree) {
    one.draw(y, tree)
    next.draw(y, tree)
  },
})

const stacked = (blocks: readonly Block[], gap: number): Block => ({
  height: blocks.reduce((sum, block) => sum + block.height, 0) + gap * Math.max(0, blocks.length - 1),
  draw(y, tree) {
    let top = y
    for (const block of blocks) {
      block.draw(top, tree)
      top += block.height + gap
    }
  },
})

const ruled = (doc: Page, { x, width }: Column, block: Block): Block => ({
  height: block.height + 9,
  draw(y, tree) {
    artifact(doc, () => rule(doc, x, y, width, 1.5))
    block.draw(y + 9, tree)
  },
})

/** Room that is left goes between the parts; the foot stands at the bottom. */
function drawDown(parts: readonly Block[], frame: Frame, left: number, tree: Tag): void {
  const gap = Math.min(WIDEST_GAP, GAP + left / (parts.length - 1))
  let y = frame.y
  parts.forEach((part, index) => {
    part.draw(index === parts.length - 1 ? frame.y + frame.height - part.height : y, tree)
    y += part.height + gap
  })
}

import type { Scene } from '@shared/court/scene'
import type { SheetContent } from '@shared/sheets/content'
import { pressDrawing, wayCrop, wayDrawing } from '@shared/sheets/drawings'
import type { FrozenPlan } from '@shared/sheets/schemas'
import {
  footBlock,
  headerBlock,
  keysBlock,
  linesBlock,
  otherBlock,
  type Block,
  type Column,
} from './sheetBlocks'
import { figureBlock, readerBlock, wayHeading } from './sheetParts'
import { BODIES, SHRINKS, SMALLEST_BODY, sizesFor, type Sizes } from './sheetSizes'
import { SheetTooFull } from './sheetTooFull'
import { artifact, type Tag } from './tags'
import { rule, type Page } from './typeset'

/** What may be printed on, points. */
export interface Frame extends Column {
  y: number
  height: number
}

const GAP = 9
/** The most that a gap grows when there is room left. */
const WIDEST_GAP = 26
const COLUMN_GAP = 24
/** CSS px in a point. */
const PX = 4 / 3

/**
 * Finds the largest type, and with it the largest drawings, at which everything stands on one page, and
 * returns its drawing. Drawings give way before type does.
 * @throws SheetTooFull when not even the smallest type does
 */
export function layOut(doc: Page, page: SheetContent, plan: FrozenPlan, frame: Frame): (tree: Tag) => void {
  const scenes = new Scenes(page, plan, frame.width)
  for (const body of BODIES) {
    const texts = textBlocks(doc, page, scenes, frame, sizesFor(body))
    for (const shrink of SHRINKS) {
      const press = scenes.press(shrink)
      const way = scenes.way(shrink)
      const parts = [
        texts.header,
        figureBlock(doc, press, frame, frame.width * shrink),
        texts.lines,
        pairBlock(doc, frame, texts, figureBlock(doc, way, texts.left, texts.left.width * shrink, 'left')),
        texts.other,
        texts.keys,
        texts.foot,
      ].filter((part) => part !== null)
      const left = frame.height - parts.reduce((sum, part) => sum + part.height, 0) - GAP * (parts.length - 1)
      if (left >= 0) return (tree) => drawDown(parts, frame, left, tree)
    }
  }
  throw new SheetTooFull(SMALLEST_BODY)
}

interface Texts {
  header: Block
  lines: Block
  heading: Block
  reader: Block
  other: Block | null
  keys: Block | null
  foot: Block
  left: Column
  right: Column
}

function textBlocks(doc: Page, page: SheetContent, scenes: Scenes, frame: Frame, sizes: Sizes): Texts {
  const left = { x: frame.x, width: scenes.leftWidth }
  const right = { x: frame.x + left.width + COLUMN_GAP, width: frame.width - left.width - COLUMN_GAP }
  return {
    header: headerBlock(doc, page, frame, sizes),
    lines: linesBlock(doc, page, frame, sizes),
    heading: wayHeading(doc, page, left, sizes),
    reader: readerBlock(doc, page, right, sizes),
    other: otherBlock(doc, page, frame, sizes),
    keys: keysBlock(doc, page, frame, sizes),
    foot: footBlock(doc, page, frame, sizes),
    left,
    right,
  }
}

/** Under a rule: the call with its drawing, and beside it whoever reads. */
function pairBlock(doc: Page, frame: Frame, { heading, reader }: Texts, figure: Block): Block {
  const top = 11
  return {
    height: top + Math.max(heading.height + figure.height, reader.height),
    draw(y, tree) {
      artifact(doc, () => rule(doc, frame.x, y, frame.width, 1.5))
      heading.draw(y + top, tree)
      figure.draw(y + top + heading.height, tree)
      reader.draw(y + top, tree)
    },
  }
}

/** Room that is left goes between the parts; the foot stands at the bottom. */
function drawDown(parts: readonly Block[], frame: Frame, left: number, tree: Tag): void {
  const gap = Math.min(WIDEST_GAP, GAP + left / (parts.length - 1))
  let y = frame.y
  parts.forEach((part, index) => {
    const last = index === parts.length - 1
    part.draw(last ? frame.y + frame.height - part.height : y, tree)
    y += part.height + gap
  })
}

/** Both drawings at the sizes that are tried, each made once. */
class Scenes {
  readonly leftWidth: number
  private readonly made = new Map<string, Scene>()

  constructor(
    private readonly page: SheetContent,
    private readonly plan: FrozenPlan,
    private readonly width: number,
  ) {
    this.leftWidth = width * (this.crop === 'full' ? 0.56 : 0.515)
  }

  press(shrink: number): Scene {
    return this.once(`press ${shrink}`, () =>
      pressDrawing(this.plan, { width: this.width * shrink * PX, labels: 'letters', medium: 'paper' }),
    )
  }

  way(shrink: number): Scene {
    return this.once(`way ${shrink}`, () =>
      wayDrawing(this.plan, this.page.way, {
        width: this.leftWidth * shrink * PX,
        medium: 'paper',
        crop: this.crop,
      }),
    )
  }

  private get crop() {
    return wayCrop(this.plan, this.page.way)
  }

  private once(key: string, make: () => Scene): Scene {
    const scene = this.made.get(key) ?? make()
    this.made.set(key, scene)
    return scene
  }
}

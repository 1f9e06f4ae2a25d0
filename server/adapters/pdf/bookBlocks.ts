import { counterScale, counterScene } from '@shared/court/counterScene'
import type { Diagram } from '@shared/court/diagram'
import { stepSentence } from '@shared/court/diagramWords'
import type { RulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import { drawScene, sceneHeight } from './drawScene'
import { PRINT_INKS } from './printInks'
import type { Block, Column } from './sheetBlocks'
import { STYLES } from './sheetSizes'
import { artifact, tagged } from './tags'
import { drawParagraph, paragraph, rule, widthOf, type Page, type Run } from './typeset'

/** CSS px in a point. */
const PX = 4 / 3
/** Tokens keep their numbers at every width: the sentences name them. Px. */
const TOKEN = 8
const GAP = { across: 16, down: 9 }
const LEADING = 1.22

/** Blocks under each other. */
export function column(blocks: readonly Block[], gap: number): Block {
  return {
    height: blocks.reduce((sum, block) => sum + block.height, 0) + gap * Math.max(0, blocks.length - 1),
    draw(y, tree) {
      let top = y
      for (const block of blocks) {
        block.draw(top, tree)
        top += block.height + gap
      }
    },
  }
}

/** Drawings of the steps at the widths that are tried, points; each made once. */
export function stepScenes(diagram: Diagram, pack: RulePack): (step: number, width: number) => Scene {
  const made = new Map<string, Scene>()
  return (step, width) => {
    const key = `${step} ${width}`
    const known = made.get(key)
    if (known) return known
    const ground = { diagram, pack, medium: 'paper' as const, tokenRadius: TOKEN }
    const scene = counterScene({ ...ground, step, pxPerMetre: counterScale(ground, width * PX) })
    made.set(key, scene)
    return scene
  }
}

/** Every step with its title, its drawing and, where there is room for them, its sentences. */
export function stepsBlock(
  doc: Page,
  diagram: Diagram,
  sceneOf: (step: number, width: number) => Scene,
  { x, width }: Column,
  { columns, body, sentences }: { columns: number; body: number; sentences: boolean },
): Block {
  const across = (width - GAP.across * (columns - 1)) / columns
  const steps = diagram.steps.map((_, index) =>
    stepBlock(
      doc,
      diagram,
      index,
      sceneOf(index, across),
      { x: x + (index % columns) * (across + GAP.across), width: across },
      body,
      sentences,
    ),
  )
  const rows = Array.from({ length: Math.ceil(steps.length / columns) }, (_, row) => {
    const blocks = steps.slice(row * columns, (row + 1) * columns)
    return {
      height: Math.max(...blocks.map(({ height }) => height)),
      draw: (y, tree) => blocks.forEach((block) => block.draw(y, tree)),
    } satisfies Block
  })
  return column(rows, GAP.down)
}

function stepBlock(
  doc: Page,
  diagram: Diagram,
  index: number,
  scene: Scene,
  { x, width }: Column,
  body: number,
  sentences: boolean,
): Block {
  const title = paragraph(
    doc,
    [
      { text: `${index + 1} `, style: STYLES.count(body * 1.3, 'our') },
      { text: diagram.steps[index]?.title ?? '', style: STYLES.strong(body) },
    ],
    width,
    1.1,
  )
  const said = sentences
    ? paragraph(doc, [{ text: oursIn(diagram, index), style: STYLES.text(body) }], width, LEADING)
    : null
  const drawn = sceneHeight(scene, width)
  return {
    height: title.height + 4 + drawn + (said ? said.height + 4 : 0),
    draw(y, tree) {
      tagged(doc, tree, 'H2', () => drawParagraph(doc, title, x, y))
      const top = y + title.height + 4
      tagged(doc, tree, 'Figure', () => drawScene(doc, scene, { x, y: top, width }), scene.description)
      if (said) tagged(doc, tree, 'P', () => drawParagraph(doc, said, x, top + drawn + 4))
    },
  }
}

/** What ours do in a step; what theirs do is in the drawing. */
function oursIn(diagram: Diagram, index: number): string {
  const step = diagram.steps[index]
  if (!step) return ''
  const moves = step.moves.filter(({ kind }) => kind !== 'theirs')
  return stepSentence({ ...diagram, steps: [{ ...step, moves }] }, 0)
}

/** A heading over lines, each a paragraph of its own; null where there are none. */
export function linesUnder(
  doc: Page,
  heading: string,
  lines: readonly (readonly Run[])[],
  { x, width }: Column,
  body: number,
): Block | null {
  if (lines.length === 0) return null
  const head = paragraph(doc, [{ text: heading, style: STYLES.head(body * 1.15) }], width, 1.1)
  const said = lines.map((runs) => paragraph(doc, runs, width, LEADING))
  const gap = body * 0.35
  const top = 6
  return {
    height: top + head.height + said.reduce((sum, { height }) => sum + gap + height, 0),
    draw(y, tree) {
      artifact(doc, () => rule(doc, x, y, width, 1))
      tagged(doc, tree, 'H2', () => drawParagraph(doc, head, x, y + top))
      let at = y + top + head.height
      for (const words of said) {
        const start = at + gap
        tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, start))
        at = start + words.height
      }
    },
  }
}

/** Roles by number: what each one is and does. Roles only, never whose they are. */
export function rolesUnder(
  doc: Page,
  roles: readonly { role: string; title: string; jobs: readonly string[] }[],
  { x, width }: Column,
  body: number,
): Block {
  const indent = body * 1.7
  const head = paragraph(doc, [{ text: 'Who does what', style: STYLES.head(body * 1.15) }], width, 1.1)
  const number = STYLES.count(body * 1.35, 'our')
  const rows = roles.map(({ role, title, jobs }) => ({
    role,
    words: paragraph(
      doc,
      [
        { text: `${title.charAt(0).toUpperCase()}${title.slice(1)}. `, style: STYLES.strong(body) },
        { text: jobs.join(' '), style: STYLES.text(body) },
      ],
      width - indent,
      LEADING,
    ),
  }))
  const gap = body * 0.5
  const top = 6
  return {
    height: top + head.height + rows.reduce((sum, { words }) => sum + gap + words.height, 0),
    draw(y, tree) {
      artifact(doc, () => rule(doc, x, y, width, 1))
      tagged(doc, tree, 'H2', () => drawParagraph(doc, head, x, y + top))
      let at = y + top + head.height
      for (const { role, words } of rows) {
        const start = at + gap
        tagged(doc, tree, 'P', () => {
          drawParagraph(doc, paragraph(doc, [{ text: role, style: number }], indent * 2), x, start)
          drawParagraph(doc, words, x + indent, start)
        })
        at = start + words.height
      }
    },
  }
}

/** Whose book it is and which page, over a thin rule. */
export function footLine(doc: Page, left: string, right: string, { x, width }: Column): Block {
  const style = STYLES.label(8.5)
  const words = paragraph(doc, [{ text: left, style }], width - widthOf(doc, right, style) - 12)
  const page = paragraph(doc, [{ text: right, style }], width)
  return {
    height: 6 + words.height,
    draw(y, tree) {
      artifact(doc, () => rule(doc, x, y, width, 0.75, PRINT_INKS['court-line']))
      tagged(doc, tree, 'P', () => drawParagraph(doc, words, x, y + 6))
      tagged(doc, tree, 'P', () => drawParagraph(doc, page, x, y + 6, { width }))
    },
  }
}

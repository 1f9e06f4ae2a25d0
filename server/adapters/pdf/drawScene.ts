import type PDFDocument from 'pdfkit'
import type { PathNode, Scene, SceneNode, TextNode } from '@shared/court/scene'
import { fontFor } from './fonts'
import { PRINT_INKS } from './printInks'

type Page = InstanceType<typeof PDFDocument>

/** Where a scene goes on a page: its upper left corner and its width, points. */
export interface SceneBox {
  x: number
  y: number
  width: number
}

/** How metres become points for one drawing. */
interface Frame {
  scale: number
  x(metres: number): number
  y(metres: number): number
}

/** Points of height that a scene takes at a width. */
export const sceneHeight = (scene: Scene, width: number): number =>
  (scene.view.height * width) / scene.view.width

/**
 * Draws a scene into a box of a page, cut at the scene's view, in print inks. Fonts must be registered
 * (registerFonts). Leaves the document's own state as it was, but for font and text position.
 */
export function drawScene(doc: Page, scene: Scene, box: SceneBox): void {
  const { view } = scene
  const scale = box.width / view.width
  const frame: Frame = {
    scale,
    x: (metres) => box.x + (metres - view.x) * scale,
    y: (metres) => box.y + (metres - view.y) * scale,
  }
  doc.save()
  doc.rect(box.x, box.y, box.width, sceneHeight(scene, box.width)).clip()
  for (const node of scene.nodes) drawNode(doc, node, frame)
  doc.restore()
}

function drawNode(doc: Page, node: SceneNode, frame: Frame): void {
  if (node.kind === 'path') drawPath(doc, node, frame)
  else if (node.kind === 'text') drawText(doc, node, frame)
  else for (const child of node.nodes) drawNode(doc, child, frame)
}

function drawPath(doc: Page, node: PathNode, frame: Frame): void {
  const fill = node.fill !== undefined && node.fillOpacity !== 0 ? PRINT_INKS[node.fill] : null
  const stroke = node.stroke !== undefined && (node.strokeWidth ?? 0) > 0 ? PRINT_INKS[node.stroke] : null
  if (node.d === '' || (fill === null && stroke === null)) return
  doc.save()
  doc.transform(frame.scale, 0, 0, frame.scale, frame.x(0), frame.y(0))
  if (stroke !== null) {
    doc.lineWidth(node.strokeWidth ?? 0)
    doc.lineCap(node.cap ?? 'butt')
    doc.lineJoin(node.join ?? 'miter')
    const [on, off] = node.dash ?? []
    if (on !== undefined) doc.dash(on, { space: off ?? on })
  }
  if (fill !== null) doc.fillColor(fill, node.fillOpacity ?? 1)
  if (stroke !== null) doc.strokeColor(stroke, node.strokeOpacity ?? 1)
  doc.path(node.d)
  if (fill !== null && stroke !== null) doc.fillAndStroke()
  else if (fill !== null) doc.fill()
  else doc.stroke()
  doc.restore()
}

function drawText(doc: Page, node: TextNode, frame: Frame): void {
  const size = node.size * frame.scale
  doc.save()
  doc.font(fontFor(node.cut, node.weight)).fontSize(size)
  const width = doc.widthOfString(node.text)
  const share = node.anchor === 'middle' ? 0.5 : node.anchor === 'end' ? 1 : 0
  const [x, y] = [frame.x(node.x) - width * share, frame.y(node.y)]
  const options = { lineBreak: false, baseline: 'alphabetic' } as const
  if (node.halo) {
    doc.lineWidth(node.halo.width * frame.scale).lineJoin('round')
    doc.strokeColor(PRINT_INKS[node.halo.ink])
    doc.text(node.text, x, y, { ...options, stroke: true, fill: false })
  }
  doc.fillColor(PRINT_INKS[node.ink])
  doc.text(node.text, x, y, { ...options, stroke: false, fill: true })
  doc.restore()
}

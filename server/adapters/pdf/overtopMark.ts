import { PRINT_INKS } from './printInks'
import type { Page } from './typeset'

/** The mark's own grid. */
const GRID = { height: 120 }

/** The mark: their cross, our way over the top of it. Upper left corner and height, points. */
export function overtopMark(doc: Page, x: number, y: number, height: number): void {
  doc.save()
  doc.translate(x, y).scale(height / GRID.height)
  doc.lineWidth(19).strokeColor(PRINT_INKS.their)
  doc.path('M65.5 59.5 118.5 112.5 M118.5 59.5 65.5 112.5').stroke()
  doc.strokeColor(PRINT_INKS.our)
  doc.dash(31, { space: 17 }).path('M22 80 C27 28 66 10 108 10.5 C139 11 153 25 162 48').stroke().undash()
  doc.path('M142 44 180 40 162 86Z').fill(PRINT_INKS.our)
  doc.lineWidth(12).circle(23, 98, 16).stroke()
  doc.restore()
}

import { sheetContent } from '@shared/sheets/content'
import { fullerContent } from '@shared/sheets/fuller'
import type { Paper, SheetView } from '@shared/sheets/schemas'
import { openFile, plainTitle } from './openFile'
import { layOutFuller } from './fullerLayout'
import { layOut, type Frame } from './sheetLayout'
import type { Tag } from './tags'
import type { Page } from './typeset'

export interface SheetPdfOptions {
  paper: Paper
  /** Number of this copy, printed at the foot. */
  copy?: number
  /** How many copies there are. */
  copies?: number
}

type Reading = Omit<SheetView, 'budget'>

/**
 * The printed page of a sheet for the reader that the view names (`mine`), or for everybody: always one
 * page, tagged, fonts embedded. First names and numbers only. The fuller page where the view asks for it.
 * @returns the whole PDF file
 * @throws SheetTooFull when it does not fit on one page at the smallest type that may be printed
 */
export const sheetPdf = (view: Reading, { paper, copy, copies }: SheetPdfOptions): Promise<Buffer> =>
  copiesPdf([{ view, copy }], paper, copies)

/**
 * Several copies in one file, a page each with its own number and reader.
 * @param copies how many copies of the sheet there are in all
 * @throws SheetTooFull
 */
export async function copiesPdf(
  pages: readonly { view: Reading; copy?: number }[],
  paper: Paper,
  copies?: number,
): Promise<Buffer> {
  const [first] = pages
  if (!first) throw new Error('a file of copies needs one at least')
  const { title: name, when } = sheetContent(first.view)
  const title = `${plainTitle(name)}, ${when}`
  const { doc, file, frame, tree, nextPage } = openFile(title, paper)
  pages.forEach(({ view, copy }, index) => {
    if (index > 0) nextPage()
    drawing(doc, view, { copy, copies }, frame)(tree)
  })
  tree.end()
  doc.end()
  return file
}

function drawing(
  doc: Page,
  view: Reading,
  number: { copy?: number; copies?: number },
  frame: Frame,
): (tree: Tag) => void {
  return view.fuller
    ? layOutFuller(doc, fullerContent(view, number), view.content, frame)
    : layOut(doc, sheetContent(view, number), view.content, frame)
}

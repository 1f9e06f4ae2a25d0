import PDFDocument from 'pdfkit'
import { sheetContent } from '@shared/sheets/content'
import type { Paper, SheetView } from '@shared/sheets/schemas'
import { registerFonts } from './fonts'
import { layOut } from './sheetLayout'
import { PAPERS } from './sheetSizes'

export interface SheetPdfOptions {
  paper: Paper
  /** Number of this copy, printed at the foot. */
  copy?: number
  /** How many copies there are. */
  copies?: number
}

/**
 * The printed page of a sheet for the reader that the view names (`mine`), or for everybody: always one
 * page, tagged, fonts embedded. First names and numbers only.
 * @returns the whole PDF file
 * @throws SheetTooFull when it does not fit on one page at the smallest type that may be printed
 */
export async function sheetPdf(
  view: Omit<SheetView, 'budget'>,
  { paper, copy, copies }: SheetPdfOptions,
): Promise<Buffer> {
  const page = sheetContent(view, { copy, copies })
  const { size, margin } = PAPERS[paper]
  const [width, height] = size
  const title = `${plain(page.title)}, ${page.when}`
  const doc = new PDFDocument({
    size: [width, height],
    margin: 0,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    info: { Title: title, Author: 'Overtop', Creator: 'Overtop', Producer: 'Overtop' },
  })
  const file = collected(doc)
  registerFonts(doc)
  const draw = layOut(doc, page, view.content, {
    x: margin,
    y: margin,
    width: width - 2 * margin,
    height: height - 2 * margin,
  })
  const tree = doc.struct('Document', { title })
  doc.addStructure(tree)
  draw(tree)
  tree.end()
  doc.end()
  return file
}

/** The title also goes into the file's XML as it is, so it must not hold what XML reads as markup. */
const plain = (text: string): string => text.replace(/&/g, 'and').replace(/[<>]/g, '')

function collected(doc: InstanceType<typeof PDFDocument>): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    doc.on('data', (chunk: Buffer) => chunks.push(chunk))
    doc.on('end', () => resolve(Buffer.concat(chunks)))
    doc.on('error', reject)
  })
}

import PDFDocument from 'pdfkit'
import type { Paper } from '@shared/sheets/schemas'
import { registerFonts } from './fonts'
import { PAPERS } from './sheetSizes'

/** The whole file once the document is ended. */
function collected(doc: InstanceType<typeof PDFDocument>): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    doc.on('data', (chunk: Buffer) => chunks.push(chunk))
    doc.on('end', () => resolve(Buffer.concat(chunks)))
    doc.on('error', reject)
  })
}

/** The title also goes into the file's XML as it is, so it must not hold what XML reads as markup. */
export const plainTitle = (text: string): string => text.replace(/&/g, 'and').replace(/[<>]/g, '')

/**
 * A tagged file in our faces, open on its first page; `frame` is what lies inside the margins, pt, and `tree` what
 * the pages' tags hang on. Whoever opened it ends the tree and the document.
 */
export function openFile(title: string, paper: Paper) {
  const { size, margin } = PAPERS[paper]
  const [width, height] = size
  const page = { size: [width, height] as [number, number], margin: 0 }
  const doc = new PDFDocument({
    ...page,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en',
    displayTitle: true,
    info: { Title: title, Author: 'Overtop', Creator: 'Overtop', Producer: 'Overtop' },
  })
  const file = collected(doc)
  registerFonts(doc)
  const frame = { x: margin, y: margin, width: width - 2 * margin, height: height - 2 * margin }
  const tree = doc.struct('Document', { title })
  doc.addStructure(tree)
  return { doc, file, frame, tree, nextPage: () => doc.addPage(page) }
}

import type PDFDocument from 'pdfkit'

/** The whole file once the document is ended. */
export function collected(doc: InstanceType<typeof PDFDocument>): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    doc.on('data', (chunk: Buffer) => chunks.push(chunk))
    doc.on('end', () => resolve(Buffer.concat(chunks)))
    doc.on('error', reject)
  })
}

/** The title also goes into the file's XML as it is, so it must not hold what XML reads as markup. */
export const plainTitle = (text: string): string => text.replace(/&/g, 'and').replace(/[<>]/g, '')

import { execFileSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import PDFDocument from 'pdfkit'
import sharp from 'sharp'
import { drawScene, sceneHeight } from '@server/adapters/pdf/drawScene'
import { registerFonts } from '@server/adapters/pdf/fonts'
import type { Scene } from '@shared/court/scene'

/** A scene alone on a page of the given width in points, as a PDF. */
export function scenePdf(scene: Scene, width: number): Promise<Buffer> {
  const doc = new PDFDocument({ size: [width, sceneHeight(scene, width)], margin: 0 })
  const parts: Buffer[] = []
  const done = new Promise<Buffer>((resolve, reject) => {
    doc.on('data', (part: Buffer) => parts.push(part))
    doc.on('end', () => resolve(Buffer.concat(parts)))
    doc.on('error', reject)
  })
  registerFonts(doc)
  drawScene(doc, scene, { x: 0, y: 0, width })
  doc.end()
  return done
}

/** The first page of a PDF as a PNG, by poppler: so many dots an inch, or so many pixels wide. */
export function pdfPng(pdf: Buffer, size: { dpi: number } | { width: number }): Buffer {
  const folder = mkdtempSync(join(tmpdir(), 'overtop-draw-'))
  try {
    const file = join(folder, 'drawing.pdf')
    writeFileSync(file, pdf)
    const scale =
      'dpi' in size ? ['-r', String(size.dpi)] : ['-scale-to-x', String(size.width), '-scale-to-y', '-1']
    execFileSync('pdftoppm', ['-png', '-singlefile', ...scale, file, join(folder, 'drawing')])
    return readFileSync(join(folder, 'drawing.png'))
  } finally {
    rmSync(folder, { recursive: true })
  }
}

export interface Pixels {
  data: Buffer
  width: number
  height: number
}

/** A picture as RGB bytes, softened by one pixel where asked. */
export async function pixelsOf(png: Buffer, soft = false): Promise<Pixels> {
  const picture = sharp(png).flatten({ background: '#ffffff' }).toColourspace('srgb')
  const { data, info } = await (soft ? picture.blur(1) : picture).raw().toBuffer({ resolveWithObject: true })
  return { data, width: info.width, height: info.height }
}

/** The share of pixels of which some channel differs by more than `by` of 255; a missing row or column counts. */
export function shareOff(a: Pixels, b: Pixels, by: number): number {
  const [width, height] = [Math.min(a.width, b.width), Math.min(a.height, b.height)]
  const whole = Math.max(a.width, b.width) * Math.max(a.height, b.height)
  let off = whole - width * height
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) {
      const [i, j] = [3 * (y * a.width + x), 3 * (y * b.width + x)]
      const far = [0, 1, 2].some((c) => Math.abs((a.data[i + c] ?? 0) - (b.data[j + c] ?? 0)) > by)
      if (far) off += 1
    }
  return off / whole
}

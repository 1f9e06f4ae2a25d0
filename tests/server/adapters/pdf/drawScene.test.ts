import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import PDFDocument from 'pdfkit'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { pressScale, pressScene } from '@shared/court/pressScene'
import { rulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import { drawScene, sceneHeight } from '@server/adapters/pdf/drawScene'
import { fontFor, registerFonts } from '@server/adapters/pdf/fonts'
import { ACROSS } from '../../../shared/court/diagrams'

const pack = rulePack('fiba')
const PX_PER_PT = 4 / 3
let folder: string

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'court-'))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

async function pageWith(scene: Scene, width: number): Promise<string> {
  const doc = new PDFDocument({ size: [width + 40, 400], margin: 0 })
  const chunks: Buffer[] = []
  doc.on('data', (chunk: Buffer) => chunks.push(chunk))
  const ended = new Promise((resolve) => doc.on('end', resolve))
  registerFonts(doc)
  drawScene(doc, scene, { x: 20, y: 20, width })
  doc.end()
  await ended
  const file = join(folder, `${Math.random()}.pdf`)
  writeFileSync(file, Buffer.concat(chunks))
  return file
}

const press = (width: number): Scene => {
  const options = {
    pack,
    medium: 'paper',
    zones: [
      { spot: 'coffin-corner', side: 'left', k: 2, n: 11, thin: false },
      { spot: 'coffin-corner', side: 'right', k: 6, n: 11, thin: false },
    ],
    room: { lane: 'middle', k: 5, n: 7, thin: false },
  } as const
  return pressScene({ ...options, pxPerMetre: pressScale(options, width * PX_PER_PT) })
}

/** Share of ink in a box of a page, 0 to 1; the box in points. */
async function inkIn(file: string, box: { left: number; top: number; width: number; height: number }) {
  const stem = file.replace(/\.pdf$/, '')
  execFileSync('pdftoppm', ['-r', '144', '-png', '-singlefile', file, stem])
  const scale = 2
  const area = Object.fromEntries(Object.entries(box).map(([key, value]) => [key, Math.round(value * scale)]))
  // Statistics are of the file as it was read, so the box is cut out first.
  const cut = await sharp(`${stem}.png`)
    .extract(area as { left: number; top: number; width: number; height: number })
    .greyscale()
    .png()
    .toBuffer()
  const { channels } = await sharp(cut).stats()
  return 1 - (channels[0]?.mean ?? 255) / 255
}

describe('drawScene', () => {
  it('writes the counts as text that can be read back, in embedded fonts', async () => {
    const file = await pageWith(press(400), 400)
    const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' })
    for (const words of ['2 of 11', '6 of 11', '5 of 7', 'over half by 8 s']) expect(text).toContain(words)
    const fonts = execFileSync('pdffonts', [file], { encoding: 'utf8' }).trim().split('\n').slice(2)
    expect(fonts.length).toBeGreaterThan(0)
    // Columns from the right: object ID (two), unicode map, subset, embedded.
    for (const line of fonts) expect(line.trim().split(/\s+/).at(-5)).toBe('yes')
  })

  it('puts more ink in the corner that they trap more', async () => {
    const scene = press(400)
    const file = await pageWith(scene, 400)
    const scale = 400 / scene.view.width
    const corner = (y: number) => ({
      left: 20 + (0.4 - scene.view.x) * scale,
      top: 20 + (y - scene.view.y) * scale,
      width: 3 * scale,
      height: 2 * scale,
    })
    expect(await inkIn(file, corner(12.4))).toBeGreaterThan((await inkIn(file, corner(0.4))) * 1.5)
  })

  it('cuts at the view: nothing is printed beside a cropped court', async () => {
    const options = { diagram: ACROSS, pack, step: 3, crop: 'half', medium: 'paper' } as const
    const scene = counterScene({ ...options, pxPerMetre: counterScale(options, 300 * PX_PER_PT) })
    const file = await pageWith(scene, 300)
    const height = sceneHeight(scene, 300)
    expect(await inkIn(file, { left: 322, top: 0, width: 16, height: 400 })).toBe(0)
    expect(await inkIn(file, { left: 0, top: 22 + height, width: 340, height: 20 })).toBe(0)
    expect(await inkIn(file, { left: 20, top: 20, width: 300, height })).toBeGreaterThan(0.01)
  })

  it('keeps the proportions of the court', () => {
    const scene = press(400)
    expect(sceneHeight(scene, 400) / 400).toBeCloseTo(scene.view.height / scene.view.width, 9)
  })
})

describe('fontFor', () => {
  it('sets labels and counts narrow, sentences and names wide', () => {
    expect(fontFor('count', 700)).toBe('narrow-700')
    expect(fontFor('label', 800)).toBe('narrow-700')
    expect(fontFor('text', 500)).toBe('archivo-500')
    expect(fontFor('name', 800)).toBe('archivo-800')
  })
})

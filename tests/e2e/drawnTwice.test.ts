import { readFileSync } from 'node:fs'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createSSRApp } from 'vue'
import { renderToString } from 'vue/server-renderer'
import CourtScene from '@/components/court/CourtScene.vue'
import { PRINT_INKS } from '@server/adapters/pdf/printInks'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { pressScale, pressScene } from '@shared/court/pressScene'
import { rulePack } from '@shared/court/rulePacks'
import type { Scene } from '@shared/court/scene'
import { shapeSpots } from '@shared/court/shapeSpots'
import { standingAt } from '@shared/court/walk/standing'
import { drawnBySecond } from '@shared/court/walk/stations'
import { timeline } from '@shared/court/walk/timeline'
import { passWindows, verdictsOf } from '@shared/court/walk/windows'
import { walkScene } from '@shared/court/walkScene'
import { ACROSS } from '../shared/court/diagrams'
import { launchBrowser } from '../support/browser'
import { pdfPng, pixelsOf, scenePdf, shareOff } from '../support/drawings'

const WIDTH = 1600
const fiba = rulePack('fiba')
const zones = [
  { spot: 'coffin-corner', side: 'left', k: 2, n: 11, thin: false },
  { spot: 'coffin-corner', side: 'right', k: 5, n: 11, thin: false },
  { spot: 'just-over-half', side: 'right', k: 3, n: 9, thin: true },
] as const
const line = timeline(ACROSS, fiba)

const SCENES: Record<string, () => Scene> = {
  'their press, counted, with the rulers': () => {
    const options = {
      pack: fiba,
      zones,
      pickup: { at: 'full', k: 10, n: 11, thin: false },
      room: { lane: 'middle', k: 5, n: 7, thin: false },
      denied: [{ lane: 'near', k: 6, n: 8, thin: false }],
      defenders: shapeSpots('1-2-1-1'),
      throwInRuler: true,
      ballBySecond: [0.09, 0.1, 0.12, 0.3, 0.45].map((x, i) => ({ second: i + 1, x })),
    } as const
    return pressScene({ ...options, pxPerMetre: pressScale(options, WIDTH) })
  },
  'a step of a counter over their traps, each pass with its word': () => {
    const options = { diagram: ACROSS, pack: fiba, zones, windows: verdictsOf(passWindows(line)) }
    return counterScene({ ...options, step: 3, pxPerMetre: counterScale(options, WIDTH) })
  },
  'the whole way in one drawing': () => {
    const options = { diagram: ACROSS, pack: rulePack('nba') }
    return counterScene({ ...options, step: 'all', pxPerMetre: counterScale(options, WIDTH) })
  },
  'a moment of the walk on a phone’s half court, lines as heavy as there': () => {
    const options = {
      diagram: ACROSS,
      pack: fiba,
      crop: 'half',
      ruler: true,
      ballBySecond: drawnBySecond(line),
    } as const
    return walkScene({
      ...options,
      step: 2,
      standing: standingAt(line, 4),
      pxPerMetre: counterScale(options, 390),
    })
  },
}

/** The component's own styles, as a page would have them; `scoped` only keeps them from other components. */
const styles = ['CourtScene', 'SceneNodes']
  .map(
    (name) => readFileSync(`src/components/court/${name}.vue`, 'utf8').split(/<style scoped>|<\/style>/)[1],
  )
  .join('')
const face = readFileSync(
  'node_modules/@fontsource-variable/archivo/files/archivo-latin-standard-normal.woff2',
).toString('base64')
const inks = Object.entries(PRINT_INKS)
  .map(([name, colour]) => `--${name}: ${colour};`)
  .join(' ')
const head =
  `<style>@font-face { font-family: 'Archivo Variable'; font-weight: 100 900; font-stretch: 62% 125%; ` +
  `src: url(data:font/woff2;base64,${face}) format('woff2') }` +
  `:root { ${inks} } body { margin: 0; background: #fff } ${styles}</style>`

let browser: Browser
beforeAll(async () => {
  browser = await launchBrowser()
})
afterAll(() => browser.close())

/** The scene as the client's component draws it, in print inks, as Chromium shows it. */
async function onScreen(scene: Scene): Promise<Buffer> {
  const svg = await renderToString(createSSRApp(CourtScene, { scene }))
  const height = Math.round((WIDTH * scene.view.height) / scene.view.width)
  const page = await browser.newPage({ viewport: { width: WIDTH, height } })
  await page.setContent(`<!doctype html>${head}<body>${svg}</body>`)
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
  const png = await page.screenshot()
  await page.close()
  return png
}

describe('one scene drawn twice', () => {
  it.each(Object.entries(SCENES))('%s: SVG and PDF are one picture', async (_name, build) => {
    const scene = build()
    const screen = await pixelsOf(await onScreen(scene), true)
    const paper = await pixelsOf(pdfPng(await scenePdf(scene, 800), { width: WIDTH }), true)
    // One row may be rounded away.
    expect(Math.abs(screen.height - paper.height)).toBeLessThanOrEqual(1)
    expect(shareOff(screen, paper, 64)).toBeLessThanOrEqual(0.01)
  })

  it('would notice a drawing that lies a token’s width aside', async () => {
    const scene = SCENES['the whole way in one drawing']!()
    const paper = await pixelsOf(pdfPng(await scenePdf(scene, 800), { width: WIDTH }), true)
    const aside = { ...scene, view: { ...scene.view, x: scene.view.x + 0.4 } }
    const moved = await pixelsOf(await onScreen(aside), true)
    expect(shareOff(moved, paper, 64)).toBeGreaterThan(0.01)
  })
})

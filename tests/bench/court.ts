import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { join, resolve } from 'node:path'
import vue from '@vitejs/plugin-vue'
import express from 'express'
import type { Page } from 'playwright-core'
import { build } from 'vite'
import { CounterBody } from '@shared/counters/schemas'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { rulePack } from '@shared/court/rulePacks'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { launchBrowser } from '../support/browser'
import { byTurns, line, processor, timingOf } from './measure'

/** A frame of a screen that draws sixty a second, ms. */
const FRAME = 16.7
const STEPS = 12
/** Moves of the pointer, and of the count. */
const MOMENTS = 240
const COUNTERS = 200

const counters = DEMO_COUNTERS.map((counter) => CounterBody.parse(counter))

/** Every step of every counter of the demo, as scenes; the floor copies the same nodes. */
async function scenesBuilt(rounds: number): Promise<string> {
  const pack = rulePack('fiba')
  const draw = () =>
    counters.flatMap(({ diagram }) =>
      diagram.steps.map((_, step) => {
        const options = { diagram, pack, step }
        return counterScene({ ...options, pxPerMetre: counterScale(options, 900) })
      }),
    )
  const scenes = draw()
  const times = await byTurns(
    rounds,
    processor,
    () => Promise.resolve(draw()),
    () => Promise.resolve(structuredClone(scenes)),
  )
  const each = 1000 / (times.ours.median / scenes.length)
  return line(
    `${scenes.length} scenes built, ${each.toFixed(0)} a second`,
    times.ours.median,
    times.floor.median,
    'ms',
  )
}

const PAGE = `import { createApp, h, nextTick } from 'vue'
import { createMemoryHistory, createRouter } from 'vue-router'
import { counterScale, counterScene } from '@shared/court/counterScene'
import { rulePack } from '@shared/court/rulePacks'
import CourtScene from '@/components/court/CourtScene.vue'
import WalkCourt from '@/components/court/WalkCourt.vue'
import { timeline } from '@shared/court/walk/timeline'
import { passWindows, verdictsOf } from '@shared/court/walk/windows'
import BoardCourt from '@/views/board/BoardCourt.vue'
import LibraryTable from '@/views/counters/LibraryTable.vue'

const pack = rulePack('fiba')
const place = () => document.body.appendChild(document.createElement('div'))
const painted = () => new Promise((done) => requestAnimationFrame(() => setTimeout(done)))
const empty = () => document.body.replaceChildren()

window.frames12 = async (diagram, zones, moments) => {
  empty()
  const pickup = { at: 'full', k: 10, n: 11, thin: false }
  const app = createApp(() => h(WalkCourt, { diagram, pack, step: 0, zones, pickup, windows: true }))
  app.mount(place())
  await painted()
  const slider = document.querySelector('[role=slider]')
  const times = []
  for (let i = 0; i < moments; i++) {
    const start = performance.now()
    slider.dispatchEvent(new KeyboardEvent('keydown', { key: i % 80 < 40 ? 'ArrowRight' : 'ArrowLeft', bubbles: true }))
    await nextTick()
    document.body.getBoundingClientRect()
    times.push(performance.now() - start)
    await painted()
  }
  app.unmount()
  return times
}

const pulls = []
let began = 0
// The board draws once a frame: the one callback stands before its own, the other after it.
window.addEventListener('pointermove', () => requestAnimationFrame(() => (began = performance.now())), true)
window.addEventListener('pointermove', () => requestAnimationFrame(async () => {
  await nextTick()
  document.body.getBoundingClientRect()
  pulls.push(performance.now() - began)
}))
window.board12 = async (diagram, zones) => {
  empty()
  const walked = timeline(diagram, pack)
  const windows = verdictsOf(passWindows(walked))
  const props = { diagram, pack, timeline: walked, zones, windows, half: false, station: 5, picked: null }
  createApp(() => h(BoardCourt, props)).mount(place())
  await painted()
  await painted()
  const tokens = [...document.querySelectorAll('[data-token] .round')].map((one) => one.getBoundingClientRect())
  const free = tokens.find((box) => document.elementFromPoint(box.x + box.width / 2, box.y + box.height / 2)?.closest('[data-token]'))
  const { x, y, width, height } = free
  pulls.length = 0
  return { x: x + width / 2, y: y + height / 2 }
}
window.pulled = () => pulls

window.drawn = async (diagrams) => {
  empty()
  const scenes = diagrams.flatMap((diagram) => diagram.steps.map((_, step) => {
    const options = { diagram, pack, step }
    return counterScene({ ...options, pxPerMetre: counterScale(options, 900) })
  }))
  const target = place()
  const start = performance.now()
  const app = createApp(() => scenes.map((scene) => h(CourtScene, { scene })))
  app.mount(target)
  document.body.getBoundingClientRect()
  const ours = performance.now() - start
  const html = target.innerHTML
  app.unmount()
  empty()
  const again = place()
  const from = performance.now()
  again.innerHTML = html
  document.body.getBoundingClientRect()
  return { ours, floor: performance.now() - from, scenes: scenes.length }
}

window.library = async (rows) => {
  empty()
  const router = createRouter({ history: createMemoryHistory(), routes: [{ path: '/:c', component: { render: () => null } }] })
  const props = { rows, whole: true, pack, counterPage: (id) => '/' + id, pickedWords: () => '', walkedWords: () => '3 Mar', mostly: null }
  const start = performance.now()
  const app = createApp(() => h(LibraryTable, props)).use(router)
  app.mount(place())
  await painted()
  const ours = performance.now() - start
  app.unmount()
  empty()
  const from = performance.now()
  const plain = createApp(() => h('table', rows.map((row) => h('tr', [row.name, row.alignment, ...row.record.map(({ k, n }) => k + ' of ' + n), row.liveReps].map((text) => h('td', text))))))
  plain.mount(place())
  await painted()
  const floor = performance.now() - from
  plain.unmount()
  return { ours, floor }
}
`

/** The page's parts in a real browser, from a build of their own. */
async function inBrowser<T>(run: (page: Page) => Promise<T>): Promise<T> {
  const folder = await mkdtemp(resolve('node_modules/.cache/overtop/court-'))
  await writeFile(join(folder, 'index.html'), '<body></body><script type="module" src="/main.ts"></script>')
  await writeFile(join(folder, 'main.ts'), PAGE)
  const out = join(folder, 'dist')
  await build({
    root: folder,
    configFile: false,
    logLevel: 'error',
    plugins: [vue()],
    resolve: { alias: { '@shared': resolve('shared'), '@': resolve('src') } },
    build: { outDir: out },
  })
  const server = express().use(express.static(out)).listen(0, '127.0.0.1')
  await new Promise((ready) => server.once('listening', ready))
  const address = server.address()
  const browser = await launchBrowser()
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } })
    await page.goto(`http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}/`)
    return await run(page)
  } finally {
    await browser.close()
    await new Promise((closed) => server.close(closed))
    await rm(folder, { recursive: true, force: true })
  }
}

interface Bench {
  board12: (diagram: unknown, zones: unknown) => Promise<{ x: number; y: number }>
  pulled: () => number[]
  frames12: (diagram: unknown, zones: unknown, moments: number) => Promise<number[]>
  drawn: (diagrams: unknown) => Promise<{ ours: number; floor: number; scenes: number }>
  library: (rows: unknown) => Promise<{ ours: number; floor: number }>
}

/** A player is pulled about on the board with a real pointer; ms that each frame takes, layout with it. */
async function pullOnBoard(page: Page, diagram: unknown, zones: unknown): Promise<number[]> {
  const from = await page.evaluate(
    ([drawing, traps]) => (window as unknown as Bench).board12(drawing, traps),
    [diagram, zones] as const,
  )
  await page.mouse.move(from.x, from.y)
  await page.mouse.down()
  for (let i = 0; i < MOMENTS; i += 1)
    await page.mouse.move(from.x + 160 * Math.sin(i / 9), from.y + 90 * Math.sin(i / 7))
  if ((await page.locator('.pulling').count()) === 0) throw new Error('nobody is pulled')
  await page.mouse.up()
  return page.evaluate(() => (window as unknown as Bench).pulled())
}

/** Scenes built and drawn, a frame of a long walk with an opponent under it, and a library of two hundred. */
export async function benchCourt(rounds: number): Promise<string[]> {
  const [first] = counters
  if (!first) throw new Error('the demo has no counter')
  const long = {
    ...first.diagram,
    steps: Array.from({ length: STEPS }, (_, i) => first.diagram.steps[i % first.diagram.steps.length]),
  }
  const zones = (['left', 'right'] as const).flatMap((side) =>
    (['coffin-corner', 'just-over-half'] as const).map((spot) => ({ spot, side, k: 5, n: 11, thin: false })),
  )
  const shapes = ['1-2-1-1', '2-2-1', '1-3-1', 'other-zone', 'person']
  const rows = Array.from({ length: COUNTERS }, (_, i) => ({
    ...counters[i % counters.length],
    id: String(i),
    walkedAt: null,
    archivedAt: null,
    draft: false,
    record: shapes.map((shape) => ({ shape, k: i % 7, n: 9 })),
  }))
  const built = await scenesBuilt(rounds)
  const shown = await inBrowser(async (page) => {
    const frames = await page.evaluate(
      ([diagram, traps, moments]) => (window as unknown as Bench).frames12(diagram, traps, moments),
      [long, zones, MOMENTS] as const,
    )
    const pulled = await pullOnBoard(page, long, zones)
    const drawn = []
    const library = []
    for (let round = 0; round < 5; round += 1) {
      drawn.push(
        await page.evaluate(
          (diagrams) => (window as unknown as Bench).drawn(diagrams),
          counters.map(({ diagram }) => diagram),
        ),
      )
      library.push(await page.evaluate((all) => (window as unknown as Bench).library(all), rows))
    }
    return { frames: timingOf(frames.slice(20)), pulled: timingOf(pulled.slice(20)), drawn, library }
  })
  const median = (list: { ours: number; floor: number }[], key: 'ours' | 'floor') =>
    timingOf(list.map((one) => one[key])).median
  const scenes = shown.drawn[0]?.scenes ?? 0
  const ours = median(shown.drawn, 'ours')
  return [
    built,
    line(
      `${scenes} scenes drawn, ${((1000 * scenes) / ours).toFixed(0)} a second`,
      ours,
      median(shown.drawn, 'floor'),
      'ms',
    ),
    line(`frame of a ${STEPS}-step walk with overlays, p95`, shown.frames.p95, FRAME, 'ms'),
    line(`frame of a pull on a ${STEPS}-step drawing with overlays, p95`, shown.pulled.p95, FRAME, 'ms'),
    line(
      `first paint of ${COUNTERS} counters`,
      median(shown.library, 'ours'),
      median(shown.library, 'floor'),
      'ms',
    ),
  ]
}

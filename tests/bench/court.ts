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
  frames12: (diagram: unknown, zones: unknown, moments: number) => Promise<number[]>
  drawn: (diagrams: unknown) => Promise<{ ours: number; floor: number; scenes: number }>
  library: (rows: unknown) => Promise<{ ours: number; floor: number }>
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
      ([diagram, traps]) => (window as unknown as Bench).frames12(diagram, traps, 240),
      [long, zones] as const,
    )
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
    return { frames: timingOf(frames.slice(20)), drawn, library }
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
    line(
      `first paint of ${COUNTERS} counters`,
      median(shown.library, 'ours'),
      median(shown.library, 'floor'),
      'ms',
    ),
  ]
}

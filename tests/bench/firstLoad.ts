import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { join, resolve } from 'node:path'
import { gzipSync } from 'node:zlib'
import vue from '@vitejs/plugin-vue'
import express from 'express'
import { pino } from 'pino'
import { build } from 'vite'
import { serveClient } from '@server/clientFiles'
import { launchBrowser } from '../support/browser'
import { line } from './measure'

/** KiB of JavaScript, gzip, that a real browser asks for until the page is quiet. */
async function loaded(folder: string, path: string): Promise<number> {
  const app = express()
  app.get('/api/session', (_req, res) => void res.status(401).type('application/problem+json').send('{}'))
  serveClient(app, folder, pino({ level: 'silent' }))
  const server = app.listen(0, '127.0.0.1')
  await new Promise((ready) => server.once('listening', ready))
  const address = server.address()
  const browser = await launchBrowser()
  const page = await browser.newPage()
  const scripts: Promise<Buffer>[] = []
  page.on('response', (answer) => {
    if (new URL(answer.url()).pathname.endsWith('.js')) scripts.push(answer.body())
  })
  await page.goto(`http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}${path}`, {
    waitUntil: 'networkidle',
  })
  const sizes = (await Promise.all(scripts)).map((script) => gzipSync(script).length)
  await browser.close()
  await new Promise((closed) => server.close(closed))
  return sizes.reduce((sum, size) => sum + size, 0) / 1024
}

/** An empty page that mounts the packages of the sign-in page: Vue, its router, Pinia, zod. */
async function emptyPage(): Promise<number> {
  const folder = await mkdtemp(resolve('node_modules/.cache/overtop/empty-'))
  await writeFile(
    join(folder, 'index.html'),
    '<div id="app"></div><script type="module" src="/main.ts"></script>',
  )
  await writeFile(
    join(folder, 'main.ts'),
    `import { createApp, h } from 'vue'
import { createPinia, defineStore } from 'pinia'
import { createRouter, createWebHistory, RouterLink, RouterView } from 'vue-router'
import { z } from 'zod'
const Session = z.object({ name: z.string().trim().min(1), at: z.iso.datetime(), role: z.enum(['a', 'b']), id: z.uuid() })
const useStore = defineStore('s', { state: () => ({ ok: Session.safeParse({}).success }) })
const page = { setup: () => { const store = useStore(); return () => h(RouterLink, { to: '/' }, () => String(store.ok)) } }
createApp({ render: () => h(RouterView) })
  .use(createPinia())
  .use(createRouter({ history: createWebHistory(), routes: [{ path: '/', component: page }] }))
  .mount('#app')
`,
  )
  const out = join(folder, 'dist')
  await build({
    root: folder,
    configFile: false,
    logLevel: 'error',
    plugins: [vue()],
    build: { outDir: out },
  })
  const size = await loaded(out, '/')
  await rm(folder, { recursive: true, force: true })
  return size
}

export async function benchFirstLoad(): Promise<string[]> {
  const ours = await loaded(resolve('dist/client'), '/sign-in')
  return [line('first-load JavaScript, gzip', ours, await emptyPage(), 'KiB')]
}

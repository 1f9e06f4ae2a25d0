import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises'
import { join, resolve } from 'node:path'
import { gzipSync } from 'node:zlib'
import vue from '@vitejs/plugin-vue'
import { build } from 'vite'
import { line } from './measure'

/** Scripts that a browser loads before the sign-in page stands: the entry, what it preloads, the page's own. */
async function firstScripts(folder: string, extra: RegExp | null): Promise<number> {
  const html = await readFile(join(folder, 'index.html'), 'utf8')
  const named = [...html.matchAll(/(?:src|href)="\/?(assets\/[^"]+\.js)"/g)].map(([, name = '']) => name)
  const lazy = extra
    ? (await readdir(join(folder, 'assets')))
        .filter((name) => extra.test(name))
        .map((name) => `assets/${name}`)
    : []
  const sizes = await Promise.all(
    [...new Set([...named, ...lazy])].map(
      async (name) => gzipSync(await readFile(join(folder, name))).length,
    ),
  )
  return sizes.reduce((sum, size) => sum + size, 0) / 1024
}

/** An empty page that mounts the same packages: Vue, its router, Pinia and the Element Plus parts of the sign-in page. */
async function emptyPage(): Promise<number> {
  const folder = await mkdtemp(resolve('node_modules/.cache/overtop/empty-'))
  await writeFile(
    join(folder, 'index.html'),
    '<div id="app"></div><script type="module" src="/main.ts"></script>',
  )
  await writeFile(
    join(folder, 'main.ts'),
    `import { createApp, h } from 'vue'
import { createPinia } from 'pinia'
import { createRouter, createWebHistory, RouterView } from 'vue-router'
import { ElInput } from 'element-plus/es/components/input/index.mjs'
import { ElForm, ElFormItem } from 'element-plus/es/components/form/index.mjs'
import { z } from 'zod'
const page = { render: () => h(ElForm, () => h(ElFormItem, () => h(ElInput, { modelValue: z.object({ a: z.string() }).parse({ a: '' }).a }))) }
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
  const size = await firstScripts(out, null)
  await rm(folder, { recursive: true, force: true })
  return size
}

export async function benchFirstLoad(): Promise<string[]> {
  const ours = await firstScripts(resolve('dist/client'), /^SignInView-.*\.js$/)
  return [line('first-load JavaScript, gzip', ours, await emptyPage(), 'KiB')]
}

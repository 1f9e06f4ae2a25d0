import { fileURLToPath, URL } from 'node:url'
import { readdirSync } from 'node:fs'
import vue from '@vitejs/plugin-vue'
import Components from 'unplugin-vue-components/vite'
import { ElementPlusResolver } from 'unplugin-vue-components/resolvers'
import { VitePWA } from 'vite-plugin-pwa'
import { defineConfig, type TestProjectConfiguration } from 'vitest/config'
import { apiInDev } from './server/tooling/apiInDev.ts'

const path = (relative: string) => fileURLToPath(new URL(relative, import.meta.url))

/** Element Plus loads each component's CSS on demand; Vite must know them up front or dev reloads on every first use. */
const elementPlusStyles = () =>
  readdirSync(path('./node_modules/element-plus/es/components'), { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => `element-plus/es/components/${entry.name}/style/css`)

/** The worker that keeps the pages and a player's sheets for a hall without a signal (src/worker). */
const offlineWorker = () =>
  VitePWA({
    strategies: 'injectManifest',
    srcDir: 'src/worker',
    filename: 'serviceWorker.ts',
    injectRegister: false,
    injectManifest: {
      globPatterns: [
        'index.html',
        'assets/*.{js,css}',
        'assets/archivo-latin-standard-*.woff2',
        'favicon.svg',
      ],
    },
    manifest: {
      name: 'Overtop',
      short_name: 'Overtop',
      description: 'Scout a press, pick the counter, put it in the players’ hands.',
      start_url: '/',
      display: 'standalone',
      background_color: '#F8F5EE',
      theme_color: '#F8F5EE',
      icons: [
        { src: '/icon-192.png', sizes: '192x192', type: 'image/png' },
        { src: '/icon-512.png', sizes: '512x512', type: 'image/png' },
        { src: '/icon-maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
      ],
    },
  })

export default defineConfig(({ command, isSsrBuild, mode }) => {
  const testing = mode === 'test'
  return {
    resolve: {
      alias: { '@shared': path('./shared'), '@server': path('./server'), '@': path('./src') },
    },
    plugins: [
      vue(),
      Components({
        dts: false,
        dirs: [],
        resolvers: [ElementPlusResolver({ importStyle: testing ? false : 'css' })],
      }),
      ...(command === 'serve' && !testing ? [apiInDev()] : []),
      ...(command === 'build' && !isSsrBuild ? [offlineWorker()] : []),
    ],
    optimizeDeps: command === 'serve' && !testing ? { include: elementPlusStyles() } : {},
    publicDir: isSsrBuild ? false : 'public',
    build: isSsrBuild
      ? {
          outDir: 'dist/server',
          target: 'node20',
          minify: false,
          sourcemap: true,
          emptyOutDir: true,
          rolldownOptions: { input: ['server/main.ts', 'server/cli.ts'] },
        }
      : { outDir: 'dist/client', emptyOutDir: true },
    test: {
      projects: [
        node('unit', ['tests/shared/**/*.test.ts', 'tests/server/**/*.test.ts']),
        node('reference', ['tests/reference/**/*.test.ts']),
        node('api', ['tests/api/**/*.test.ts'], 30_000),
        node('e2e', ['tests/e2e/**/*.test.ts'], 120_000),
        {
          extends: true,
          test: { name: 'client', environment: 'jsdom', include: ['tests/src/**/*.test.ts'] },
        },
      ],
    },
  }
})

function node(name: string, include: string[], testTimeout = 10_000): TestProjectConfiguration {
  return {
    extends: true,
    test: {
      name,
      include,
      environment: 'node',
      setupFiles: ['tests/support/setup.ts'],
      testTimeout,
      hookTimeout: testTimeout,
    },
  }
}

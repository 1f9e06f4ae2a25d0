/** `npm run bench`: builds the bench as the server is built and runs it under plain Node. */
import { execFileSync } from 'node:child_process'
import { ready } from './ready.mjs'
import { build } from './start.mjs'

await ready()
build()
const out = 'node_modules/.cache/overtop/bench'
execFileSync(
  process.execPath,
  [
    'node_modules/vite/bin/vite.js',
    'build',
    '--logLevel',
    'error',
    '--ssr',
    'tests/bench/main.ts',
    '--outDir',
    out,
  ],
  {
    stdio: 'inherit',
  },
)
execFileSync(process.execPath, [`${out}/main.js`, ...process.argv.slice(2)], { stdio: 'inherit' })

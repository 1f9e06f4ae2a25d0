/** `npm run backup`, `restore`, `first-coach`: runs one command of the built server under plain Node. */
import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { ready } from './ready.mjs'
import { build } from './start.mjs'

const CLI = 'dist/server/cli.js'
const [name = '', ...args] = process.argv.slice(2)

await ready()
// Beside a running server what it was built from stays as it is; only a restore runs without one.
if (name === 'restore' || !existsSync(CLI)) build()
const env = existsSync('.env') ? ['--env-file=.env'] : []
const { status } = spawnSync(process.execPath, [...env, '--enable-source-maps', CLI, name, ...args], {
  stdio: 'inherit',
})
process.exit(status ?? 1)

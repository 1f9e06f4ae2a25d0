/** `npm start`: installs where needed, builds where stale, then runs the built server. */
import { execFileSync, spawn } from 'node:child_process'
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs'
import { createHash } from 'node:crypto'
import { join } from 'node:path'
import { ready } from './ready.mjs'

const STAMP = 'dist/built.sha256'

function* files(path) {
  if (statSync(path).isFile()) yield path
  else for (const name of readdirSync(path).sort()) yield* files(join(path, name))
}

/** One digest of everything that goes into a build; a checkout with other dates does not build again. */
function sources() {
  const hash = createHash('sha256')
  for (const top of [
    'package-lock.json',
    'vite.config.ts',
    'index.html',
    'public',
    'shared',
    'server',
    'src',
  ])
    for (const file of files(top)) hash.update(file).update(readFileSync(file))
  return hash.digest('hex')
}

export function build() {
  const wanted = sources()
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted) return
  console.log('Building ...')
  const vite = 'node_modules/vite/bin/vite.js'
  execFileSync(process.execPath, [vite, 'build', '--logLevel', 'warn'], { stdio: 'inherit' })
  // The server and the commands, as vite.config.ts lists them.
  execFileSync(process.execPath, [vite, 'build', '--ssr', '--logLevel', 'warn'], { stdio: 'inherit' })
  writeFileSync(STAMP, wanted)
}

if (import.meta.url === `file://${process.argv[1]}`) {
  await ready()
  build()
  const env = existsSync('.env') ? ['--env-file=.env'] : []
  const server = spawn(process.execPath, [...env, '--enable-source-maps', 'dist/server/main.js'], {
    stdio: 'inherit',
  })
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal))
  server.on('exit', (code, signal) => process.exit(signal ? 0 : (code ?? 1)))
}

/**
 * What must be there before anything runs, on a machine with Node and npm alone: the compiler tools for
 * better-sqlite3, the packages of the lock file, the Debian programs that tests use. Plain Node, no packages.
 */
import { execFileSync, spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { createHash } from 'node:crypto'

const STAMP = 'node_modules/.cache/overtop/lock.sha256'

export const found = (program) => spawnSync('which', [program], { stdio: 'ignore' }).status === 0
const root = () => process.getuid?.() === 0

/** Installs Debian packages as root; otherwise says in one line what is missing and stops. */
export function debian(packages, why) {
  if (packages.length === 0) return
  if (!root() || !found('apt-get')) {
    console.error(
      `Missing: ${packages.join(', ')} (${why}). Install them, e.g. sudo apt-get install ${packages.join(' ')}`,
    )
    process.exit(1)
  }
  console.log(`Installing ${packages.join(', ')} (${why}) ...`)
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  execFileSync('apt-get', ['update', '-qq'], { stdio: 'inherit', env })
  execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...packages], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env,
  })
}

const lockDigest = () => createHash('sha256').update(readFileSync('package-lock.json')).digest('hex')

/** Installs from the lock file when node_modules was not made from it. */
export async function ready() {
  const wanted = lockDigest()
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted) return
  const tools = { 'g++': 'g++', make: 'make', python3: 'python3' }
  debian(
    Object.keys(tools).filter((program) => !found(program)),
    'to build better-sqlite3',
  )
  console.log('Installing packages from package-lock.json (the first time takes some minutes) ...')
  execFileSync('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], { stdio: 'inherit' })
  mkdirSync('node_modules/.cache/overtop', { recursive: true })
  writeFileSync(STAMP, wanted)
}

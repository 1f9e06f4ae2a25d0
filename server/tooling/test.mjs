/**
 * `npm test`: types, lint, then every test: unit, reference, client, API, browser. Runs all of them whatever
 * fails, and closes with one line that counts: 'N passed, N failed'.
 */
import { spawnSync } from 'node:child_process'
import { mkdirSync, readFileSync, rmSync } from 'node:fs'
import { debian, found, ready } from './ready.mjs'
import { build } from './start.mjs'

const REPORT = 'node_modules/.cache/overtop/tests.json'
const NODE = process.execPath

const PROGRAMS = { chromium: 'chromium', pdftotext: 'poppler-utils', pdftoppm: 'poppler-utils' }

let passed = 0
let failed = 0

/** Runs one command to its end; true when it ended well. */
function run(name, args) {
  console.log(`\n== ${name}`)
  return spawnSync(NODE, args, { stdio: 'inherit' }).status === 0
}

/** A check that is one yes or no. */
function check(name, args) {
  if (run(name, args)) passed += 1
  else failed += 1
}

await ready()
debian(
  [...new Set(Object.entries(PROGRAMS).flatMap(([program, name]) => (found(program) ? [] : [name])))],
  'for the browser and PDF tests',
)

check('types', ['node_modules/vue-tsc/bin/vue-tsc.js', '--build'])
check('lint', ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0'])
check('format', ['node_modules/prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '.'])
try {
  build()
  passed += 1
} catch {
  console.error('The build failed; the browser tests need it.')
  failed += 1
}

mkdirSync('node_modules/.cache/overtop', { recursive: true })
rmSync(REPORT, { force: true })
const filters = process.argv.slice(2)
const whole = run('tests', [
  'node_modules/vitest/vitest.mjs',
  'run',
  '--reporter=default',
  '--reporter=json',
  `--outputFile.json=${REPORT}`,
  ...filters,
])
try {
  const report = JSON.parse(readFileSync(REPORT, 'utf8'))
  passed += report.numPassedTests
  failed += report.numFailedTests
  // A file that cannot be loaded has no tests to count; it failed all the same.
  if (!whole && report.numFailedTests === 0) failed += Math.max(1, report.numFailedTestSuites)
} catch {
  failed += 1
}

console.log(`\n${passed} passed, ${failed} failed`)
process.exit(failed === 0 && passed > 0 ? 0 : 1)

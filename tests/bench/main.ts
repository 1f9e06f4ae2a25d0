import 'reflect-metadata'
import { randomUUID } from 'node:crypto'
import { gameBody, makeFixture, opponentBody, teamUrl } from '../support/fixture'
import { startTestApp } from '../support/testApp'
import { benchCounts } from './counts'
import { benchCourt } from './court'
import { benchFirstLoad } from './firstLoad'
import { benchPaper } from './paper'
import { benchWrites } from './writes'

/** Speed as a ratio against a floor measured in the same run; the aim is 2 x the floor. */
const quick = process.argv.includes('--quick')
const test = await startTestApp()
const fixture = await makeFixture(test)
const head = await test.as('head')

async function opponentOf(rows: number): Promise<{ opponent: string; game: string }> {
  const ids = { opponent: randomUUID(), game: randomUUID() }
  await head.put(teamUrl(`/opponents/${ids.opponent}`)).send(opponentBody(`Opponent of ${rows}`))
  await head.put(teamUrl(`/games/${ids.game}`)).send(gameBody(ids.opponent))
  return ids
}

console.log(`${'what'.padEnd(46)} ${'ours'.padStart(9)} ${'floor'.padStart(9)}`)
const parts: Record<string, () => Promise<string[]>> = {
  writes: () => benchWrites(test, fixture.scoutedGame, quick ? 50 : 400),
  counts: () => benchCounts(test, opponentOf),
  paper: () => benchPaper(test, fixture.sheet, quick ? 5 : 20),
  court: () => benchCourt(quick ? 5 : 20),
  firstLoad: () => benchFirstLoad(),
}
/** `npm run bench -- counts` runs that part alone. */
const wanted = process.argv.slice(2).filter((name) => name in parts)
for (const [name, run] of Object.entries(parts))
  if (wanted.length === 0 || wanted.includes(name)) for (const row of await run()) console.log(row)
await test.stop()

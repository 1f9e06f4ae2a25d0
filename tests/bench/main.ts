import 'reflect-metadata'
import { randomUUID } from 'node:crypto'
import { gameBody, makeFixture, opponentBody, teamUrl } from '../support/fixture'
import { startTestApp } from '../support/testApp'
import { benchCounts } from './counts'
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
for (const lines of [
  () => benchWrites(test, fixture.scoutedGame, quick ? 50 : 400),
  () => benchCounts(test, opponentOf),
  () => benchPaper(test, fixture.sheet, quick ? 5 : 20),
  () => benchFirstLoad(),
])
  for (const row of await lines()) console.log(row)
await test.stop()

import { randomUUID } from 'node:crypto'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { COUNTED_HABITS } from '@server/database/counting/habitSql'
import { Possession } from '@server/database/entities/Possession'
import { ScoutedGame } from '@server/database/entities/ScoutedGame'
import { Trap } from '@server/database/entities/Trap'
import { possessionColumns, scoutedGameColumns, trapColumns } from '@server/database/columnsOf'
import { applyPragmas } from '@server/database/dataSource'
import { PossessionBody } from '@shared/possessions/schemas'
import { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { OUTCOMES, PICKUPS, SHAPES, TRIGGERS } from '@shared/vocabulary'
import { scoutedGameBody } from '../support/fixture'
import { TEAM, teamCookie, type TestApp } from '../support/testApp'
import { serve } from './loopback'
import { byTurns, line, processor } from './measure'

const ROWS_A_GAME = 25

/** A row whose fields follow from its number, so that every run counts the same. */
const drawn = (scoutedGameId: string, index: number): PossessionBody => {
  const pick = <T>(list: readonly { value: T }[], step: number) =>
    list[Math.floor(index * step) % list.length]?.value
  const shape = pick(SHAPES, 0.7)
  const pressed = shape !== 'fake' && shape !== 'dropped-back'
  return PossessionBody.parse({
    scoutedGameId,
    number: (index % 900) + 1,
    period: (index % 4) + 1,
    clock: (index * 37) % 6000,
    margin: (index % 21) - 10,
    trigger: pick(TRIGGERS, 1),
    shape,
    pickup: pressed ? pick(PICKUPS, 0.4) : null,
    outcome: pick(OUTCOMES, 0.9),
    denied: pressed ? ['near', 'pass-back'] : null,
    leftOpen: pressed ? ['middle'] : null,
    onBall: pressed ? 'pressured' : null,
    goalie: pressed ? 'home' : null,
    throwerGuard: pressed ? 'mirror' : null,
    traps: pressed
      ? [
          {
            x: ((index * 13) % 60) / 100,
            y: ((index * 29) % 100) / 100,
            cue: 'on-catch',
            result: 'passed-out',
          },
        ]
      : null,
  })
}

/** Writes rows straight into the tables: what is measured is reading. */
async function fill(test: TestApp, opponentId: string, rows: number): Promise<void> {
  const stamp = test.context.clock().toISOString()
  const meta = (id: string) => ({ id, teamId: TEAM, version: 1, createdAt: stamp, updatedAt: stamp })
  await test.context.db.transaction(async (manager) => {
    let game = ''
    for (let index = 0; index < rows; index++) {
      if (index % ROWS_A_GAME === 0) {
        game = randomUUID()
        const body = ScoutedGameBody.parse(scoutedGameBody(opponentId))
        await manager.insert(ScoutedGame, { ...scoutedGameColumns(body), ...meta(game), scoutId: null })
      }
      const body = drawn(game, index)
      const id = randomUUID()
      await manager.insert(Possession, { ...possessionColumns(body), ...meta(id) })
      const traps = trapColumns(id, body.traps, randomUUID)
      if (traps.length > 0) await manager.insert(Trap, traps)
    }
  })
}

/**
 * The floor of a read: on a connection of its own, a bare GROUP BY over game and trigger for each group of
 * habits, with nothing read out of them.
 */
function bareCounts(test: TestApp, opponentId: string): { run: () => void; close: () => void } {
  const connection = new Database(join(test.dataDir, 'overtop.sqlite'))
  applyPragmas(connection)
  const from = `FROM possessions p JOIN scouted_games s ON s.id = p.scoutedGameId WHERE s.opponentId = ? AND p.deletedAt IS NULL`
  const columns = [
    'shape',
    'shapeVariant',
    'pickup',
    'throwerGuard',
    'denied',
    'leftOpen',
    'onBall',
    'goalie',
    'shownShape',
    'outcome',
  ]
  const statements = [
    ...columns.map((column) => `SELECT s.id, p.trigger, p.${column}, count(*) ${from} GROUP BY 1, 2, 3`),
    `SELECT s.id, p.trigger, t.cue, t.result, round(t.x, 1), round(t.y, 1), count(*)
       FROM traps t JOIN possessions p ON p.id = t.possessionId JOIN scouted_games s ON s.id = p.scoutedGameId
      WHERE s.opponentId = ? GROUP BY 1, 2, 3, 4, 5, 6`,
  ].map((sql) => connection.prepare(sql))
  return {
    run: () => statements.forEach((statement) => statement.all(opponentId)),
    close: () => connection.close(),
  }
}

export async function benchCounts(
  test: TestApp,
  opponentOf: (rows: number) => Promise<{ opponent: string; game: string }>,
): Promise<string[]> {
  const cookie = await teamCookie(test, 'head')
  const { send, close } = await serve(test.app)
  const lines: string[] = [`(${COUNTED_HABITS.length} habits)`]
  for (const rows of [100, 1000, 10_000]) {
    const { opponent, game } = await opponentOf(rows)
    await fill(test, opponent, rows)
    const bare = bareCounts(test, opponent)
    const get = async (path: string) => {
      const status = await send('GET', `/api/teams/${TEAM}${path}`, cookie)
      if (status !== 200) throw new Error(`${path} answered ${status}`)
    }
    const rounds = rows > 5000 ? 10 : 30
    const read = await byTurns(
      rounds,
      processor,
      () => get(`/opponents/${opponent}/tendencies`),
      async () => bare.run(),
    )
    lines.push(line(`tendencies of ${rows} rows`, read.ours.median, read.floor.median, 'ms'))
    const chosen = await byTurns(
      rounds,
      processor,
      () => get(`/games/${game}/choices`),
      async () => bare.run(),
    )
    lines.push(line(`choices from ${rows} rows`, chosen.ours.median, chosen.floor.median, 'ms'))
    bare.close()
  }
  await close()
  return lines
}

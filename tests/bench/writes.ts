import { randomUUID } from 'node:crypto'
import { join } from 'node:path'
import type { Express } from 'express'
import Database from 'better-sqlite3'
import express from 'express'
import { applyPragmas } from '@server/database/dataSource'
import { signInWith } from '@server/http/passport'
import { possessionBody } from '../support/fixture'
import { TEAM, teamCookie, type TestApp } from '../support/testApp'
import { serve } from './loopback'
import { byTurns, line, wall } from './measure'

/**
 * The floor of a possession write: a bare Express route with the same session check, the same row and its
 * trap, the same pragmas, in one transaction; no roles, no schema, no identity, no answer but a status.
 */
function bareApp(test: TestApp): { app: Express; close: () => void } {
  const connection = new Database(join(test.dataDir, 'bare.sqlite'))
  applyPragmas(connection)
  const tables = test.context.db
  const schema = (name: string) => tables.query(`SELECT sql FROM sqlite_master WHERE name = ?`, [name])
  const ready = Promise.all([schema('possessions'), schema('traps')]).then((found) => {
    connection.pragma('foreign_keys = OFF')
    for (const [row] of found as { sql: string }[][]) if (row) connection.exec(row.sql)
  })
  const app = express()
  app.use(express.json())
  app.use(signInWith(test.context).middleware)
  app.put('/possessions/:id', async (req, res) => {
    if (!req.user) return void res.status(401).end()
    await ready
    const { traps, ...body } = req.body as ReturnType<typeof possessionBody>
    const stamp = new Date().toISOString()
    const row: Record<string, unknown> = {
      ...body,
      frame: 1,
      note: '',
      id: req.params.id,
      teamId: TEAM,
      version: 1,
      createdAt: stamp,
      updatedAt: stamp,
      trapsLogged: 'seen',
    }
    const columns = Object.keys(row)
    connection.transaction(() => {
      connection
        .prepare(
          `INSERT INTO possessions (${columns.map((c) => `"${c}"`).join(', ')}) VALUES (${columns.map(() => '?').join(', ')})`,
        )
        .run(...columns.map((column) => row[column]))
      const insertTrap = connection.prepare(
        'INSERT INTO traps (id, possessionId, position, x, y, t, cue, result) VALUES (?, ?, ?, ?, ?, ?, ?, ?)',
      )
      if (Array.isArray(traps))
        traps.forEach((trap, index) =>
          insertTrap.run(
            randomUUID(),
            req.params.id,
            index + 1,
            trap.x,
            trap.y,
            trap.t,
            trap.cue,
            trap.result,
          ),
        )
    })()
    res.status(201).end()
  })
  return { app, close: () => connection.close() }
}

export async function benchWrites(test: TestApp, scoutedGameId: string, rounds: number): Promise<string[]> {
  const cookie = await teamCookie(test, 'assistant')
  const bare = bareApp(test)
  const [ours, floor] = await Promise.all([serve(test.app), serve(bare.app)])
  const body = JSON.stringify(possessionBody(scoutedGameId))
  const expect201 = (status: number) => {
    if (status !== 201) throw new Error(`a write answered ${status}`)
  }
  const times = await byTurns(
    rounds,
    wall,
    async () =>
      expect201(await ours.send('PUT', `/api/teams/${TEAM}/possessions/${randomUUID()}`, cookie, body)),
    async () => expect201(await floor.send('PUT', `/possessions/${randomUUID()}`, cookie, body)),
  )
  await Promise.all([ours.close(), floor.close()])
  bare.close()
  return [
    line('possession write, median', times.ours.median, times.floor.median, 'ms'),
    line('possession write, 95th of 100', times.ours.p95, times.floor.p95, 'ms'),
  ]
}

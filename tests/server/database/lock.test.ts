import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { DataSource } from 'typeorm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { openDatabase } from '@server/database/dataSource'
import { Team } from '@server/database/entities/Team'

let folder: string
let db: DataSource

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'overtop-lock-'))
  db = await openDatabase(join(folder, 'overtop.sqlite'))
})
afterEach(async () => {
  await db.destroy()
  await rm(folder, { recursive: true, force: true })
})

const team = (name: string) => ({
  id: crypto.randomUUID(),
  name,
  squadName: 'U17',
  timeZone: 'UTC',
  season: '2026-27',
  rulePack: 'fiba' as const,
  createdAt: '2026-03-17T09:42:00.000Z',
})

describe('the database file', () => {
  it('is in WAL, written through, with foreign keys and overwriting of what is deleted', async () => {
    const pragma = async (name: string) => Object.values((await db.query(`PRAGMA ${name}`))[0])[0]
    expect(await pragma('journal_mode')).toBe('wal')
    expect(await pragma('synchronous')).toBe(2)
    expect(await pragma('foreign_keys')).toBe(1)
    expect(await pragma('secure_delete')).toBe(1)
    expect(await pragma('busy_timeout')).toBe(5000)
  })

  it('opens again with its rows and no migration left to run', async () => {
    await db.manager.insert(Team, team('Kept'))
    await db.destroy()
    db = await openDatabase(join(folder, 'overtop.sqlite'))
    expect(await db.manager.countBy(Team, { name: 'Kept' })).toBe(1)
    expect(await db.showMigrations()).toBe(false)
  })

  it('refuses a where with nothing in it', async () => {
    await expect(db.manager.findBy(Team, { name: undefined })).rejects.toThrow()
    await expect(db.manager.findBy(Team, { name: null as never })).rejects.toThrow()
  })
})

describe('transactions', () => {
  it('200 in parallel all succeed, each whole', async () => {
    await Promise.all(
      Array.from({ length: 200 }, (_, index) =>
        db.transaction(async (manager) => {
          await manager.insert(Team, team(`A${index}`))
          await new Promise((resolve) => setTimeout(resolve, index % 3))
          await manager.insert(Team, team(`B${index}`))
        }),
      ),
    )
    expect(await db.manager.count(Team)).toBe(400)
  })

  it('a query from outside never lands inside a transaction that is undone', async () => {
    const failing = db.transaction(async (manager) => {
      await manager.insert(Team, team('undone'))
      await new Promise((resolve) => setTimeout(resolve, 20))
      throw new Error('undo')
    })
    const outside = db.manager.insert(Team, team('outside'))
    await expect(failing).rejects.toThrow('undo')
    await outside
    expect((await db.manager.find(Team)).map((row) => row.name)).toEqual(['outside'])
  })

  it('nested ones share the lock and undo on their own', async () => {
    await db.transaction(async (manager) => {
      await manager.insert(Team, team('outer'))
      await manager
        .transaction(async (inner) => {
          await inner.insert(Team, team('inner'))
          throw new Error('undo')
        })
        .catch(() => undefined)
    })
    expect((await db.manager.find(Team)).map((row) => row.name)).toEqual(['outer'])
  })

  it('the lock is handed on after a failure', async () => {
    await expect(db.transaction(() => Promise.reject(new Error('no')))).rejects.toThrow('no')
    await db.transaction((manager) => manager.insert(Team, team('after')))
    expect(await db.manager.count(Team)).toBe(1)
  })

  it('the lock is handed on where SQLite has undone everything by itself, as it does on a full disk', async () => {
    const full = db.transaction(async (manager) => {
      await manager.insert(Team, team('lost'))
      await manager.query('ROLLBACK')
      throw new Error('disk full')
    })
    await expect(full).rejects.toThrow('disk full')
    await db.transaction((manager) => manager.insert(Team, team('after')))
    expect((await db.manager.find(Team)).map((row) => row.name)).toEqual(['after'])
  })
})

describe('migrations', () => {
  it('lead back to an empty database, step by step', async () => {
    // As openDatabase() runs them: a rebuilt table must not be looked for by the rows that refer to it.
    await db.query('PRAGMA foreign_keys = OFF')
    for (let step = (await db.query('SELECT * FROM migrations')).length; step > 0; step--)
      await db.undoLastMigration()
    const left = await db.query(
      "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT IN ('migrations', 'sqlite_sequence')",
    )
    expect(left).toEqual([])
  })

  it('match the entities', async () => {
    const { upQueries } = await db.driver.createSchemaBuilder().log()
    expect(upQueries.map((query) => query.query)).toEqual([])
  })
})

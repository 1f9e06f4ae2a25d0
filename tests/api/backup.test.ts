import { randomUUID } from 'node:crypto'
import { mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { DataSource } from 'typeorm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { LOCK_FILE } from '@server/adapters/folderLock'
import { diskStillFiles } from '@server/adapters/stillFiles'
import { makeBackup } from '@server/backup/makeBackup'
import { pruneBackups } from '@server/backup/prune'
import { restoreBackup } from '@server/backup/restoreBackup'
import { boot } from '@server/boot'
import { createDataSource, openDatabase } from '@server/database/dataSource'
import { Possession } from '@server/database/entities/Possession'
import { Still } from '@server/database/entities/Still'
import { Trap } from '@server/database/entities/Trap'
import { purgeDeleted } from '@server/features/deletion/purge.service'
import { jpeg, makeFixture, possessionBody, teamUrl, type Fixture } from '../support/fixture'
import { startTestApp, TEAM, type TestApp } from '../support/testApp'

const NOW = new Date('2026-03-17T09:42:00Z')

let test: TestApp
let fixture: Fixture
/** Where backups go and where they are restored to, beside the folder of the app. */
let safe: string
let target: string

beforeEach(async () => {
  test = await startTestApp({ now: NOW })
  fixture = await makeFixture(test)
  safe = await mkdtemp(join(tmpdir(), 'overtop-safe-'))
  target = await mkdtemp(join(tmpdir(), 'overtop-target-'))
})
afterEach(async () => {
  await test.stop()
  await rm(safe, { recursive: true, force: true })
  await rm(target, { recursive: true, force: true })
})

const backUp = (now = NOW) => makeBackup(test.dataDir, safe, now)
const restore = (backup: string, more: { replace?: boolean; dataDir?: string; now?: Date } = {}) =>
  restoreBackup({ backup, dataDir: target, replace: false, now: NOW, ...more })

/** A restored database, open for one look. */
async function look<T>(dataDir: string, use: (db: DataSource) => Promise<T>): Promise<T> {
  const db = await openDatabase(join(dataDir, 'overtop.sqlite'))
  try {
    return await use(db)
  } finally {
    await db.destroy()
  }
}

/** Every file below a folder with its bytes. */
async function filesBelow(folder: string): Promise<Map<string, Buffer>> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true })
  const files = new Map<string, Buffer>()
  for (const entry of entries.filter((each) => each.isFile())) {
    const path = join(entry.parentPath, entry.name)
    files.set(path, await readFile(path))
  }
  return files
}
const holds = async (folder: string, text: string) =>
  [...(await filesBelow(folder)).values()].some((bytes) => bytes.includes(text))

const putPossession = async (id: string, number: number, note = '') => {
  const head = await test.as('head')
  const body = possessionBody(fixture.scoutedGame, { number, note })
  const answer = await head.put(teamUrl(`/possessions/${id}`)).send(body)
  expect(answer.status).toBe(201)
}
const putStill = async (possession: string, still: string) => {
  const head = await test.as('head')
  const answer = await head
    .put(teamUrl(`/possessions/${possession}/stills/${still}`))
    .attach('still', await jpeg(), 'trap.jpg')
  expect(answer.status).toBe(201)
}

describe('a backup', () => {
  it('taken while fifty possessions are being written restores to whole ones, with their stills', async () => {
    let written = 0
    const writes = Array.from({ length: 50 }, async (_, index) => {
      const id = randomUUID()
      await putPossession(id, index + 2)
      written += 1
      if (index % 5 === 0) await putStill(id, randomUUID())
    })
    await Promise.any(writes)
    expect(written).toBeLessThan(40)
    const { folder, manifest } = await backUp()
    await Promise.all(writes)
    await restore(folder)

    const live = test.context.db.manager
    await look(target, async ({ manager }) => {
      expect(await manager.query('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }])
      expect(await manager.query('PRAGMA foreign_key_check')).toEqual([])
      const rows = await manager.find(Possession)
      expect(rows.length).toBeGreaterThan(1)
      expect(rows.length).toBe(manifest.rows['possessions'])
      // A row and its trap are one transaction: half of one would be a row without.
      for (const { id } of rows) expect(await manager.countBy(Trap, { possessionId: id })).toBe(1)
      for (const row of rows) expect(row).toEqual(await live.findOneBy(Possession, { id: row.id }))
      const stills = await manager.find(Still)
      expect(stills.length).toBeGreaterThan(0)
      for (const still of stills)
        for (const size of ['full', 'thumbnail'] as const)
          expect(await readFile(diskStillFiles(target).pathOf(still.teamId, still.id, size))).toEqual(
            await readFile(test.context.stillFiles.pathOf(still.teamId, still.id, size)),
          )
    })
    expect(await live.count(Possession)).toBe(51)
  })

  it('lists every file and the rows of every table', async () => {
    const { folder, manifest } = await backUp()
    expect(folder).toBe(join(safe, '2026-03-17T094200Z'))
    const listed = manifest.files.map(({ path }) => join(folder, path))
    expect([...(await filesBelow(folder)).keys()].sort()).toEqual(
      [...listed, join(folder, 'manifest.json')].sort(),
    )
    expect(manifest.files.map(({ path }) => path).sort()).toEqual([
      'overtop.sqlite',
      `stills/${TEAM}/${fixture.still}.jpg`,
      `stills/${TEAM}/${fixture.still}.thumb.jpg`,
    ])
    expect(manifest).toMatchObject({ format: 1, madeAt: NOW.toISOString() })
    expect(manifest.rows).toMatchObject({ teams: 2, possessions: 1, stills: 1, sheets: 1, sessions: 0 })
  })

  it('holds nobody’s session and no secret', async () => {
    const [session] = await test.context.db.query<{ id: string }[]>('SELECT id FROM sessions')
    await writeFile(join(test.dataDir, 'session-secret'), 'the secret of this server')
    const { folder } = await backUp()
    expect(await holds(test.dataDir, String(session?.id))).toBe(true)
    expect(await holds(folder, String(session?.id))).toBe(false)
    expect(await holds(folder, 'the secret of this server')).toBe(false)
  })

  it('made after a possession was deleted for good has nothing of it in its bytes', async () => {
    const [gone, kept] = [randomUUID(), randomUUID()]
    await putPossession(gone, 2, 'their tall one limps')
    await putPossession(kept, 3, 'their short one runs')
    const still = randomUUID()
    await putStill(gone, still)
    const head = await test.as('head')
    expect((await head.delete(teamUrl(`/possessions/${gone}`))).status).toBe(204)
    const later = new Date(NOW.getTime() + 11 * 60_000)
    await purgeDeleted(test.context.db, test.context.stillFiles, later)
    const { folder } = await backUp(later)
    expect(await holds(folder, 'their short one runs')).toBe(true)
    expect(await holds(folder, 'their tall one limps')).toBe(false)
    expect(await holds(folder, gone)).toBe(false)
    expect([...(await filesBelow(folder)).keys()].join()).not.toContain(still)
  })

  it('leaves out a possession whose ten minutes are over, also before the server has swept', async () => {
    const [over, undoable] = [randomUUID(), randomUUID()]
    await putPossession(over, 2, 'their tall one limps')
    await putStill(over, randomUUID())
    await putPossession(undoable, 3, 'their short one runs')
    const head = await test.as('head')
    await head.delete(teamUrl(`/possessions/${over}`))
    test.setNow(new Date(NOW.getTime() + 5 * 60_000))
    await head.delete(teamUrl(`/possessions/${undoable}`))
    const { folder, manifest } = await backUp(new Date(NOW.getTime() + 11 * 60_000))
    expect(await holds(folder, 'their tall one limps')).toBe(false)
    expect(await holds(folder, 'their short one runs')).toBe(true)
    expect(manifest.rows).toMatchObject({ possessions: 2, stills: 1 })
  })

  it('is refused when a still has lost its picture, by name, and leaves nothing half-made', async () => {
    await rm(test.context.stillFiles.pathOf(TEAM, fixture.still, 'thumbnail'))
    await expect(backUp()).rejects.toThrow(
      `Nothing was backed up: still ${fixture.still} has lost its picture.`,
    )
    expect(await readdir(safe)).toEqual([])
  })

  it('leaves out a still that is deleted while it is copied', async () => {
    await rm(test.context.stillFiles.pathOf(TEAM, fixture.still, 'full'))
    const making = backUp()
    setTimeout(() => void test.context.db.manager.delete(Still, { id: fixture.still }), 300)
    const { manifest } = await making
    expect(manifest.rows['stills']).toBe(0)
    await restore(join(safe, '2026-03-17T094200Z'))
  })

  it('of a folder without a database says which setting to look at', async () => {
    await expect(makeBackup(target, safe, NOW)).rejects.toThrow(/Set DATA_DIR/)
  })

  it('of a damaged database is refused, and leaves nothing half-made', async () => {
    await writeFile(
      join(target, 'overtop.sqlite'),
      'not a database at all, but long enough to be read'.repeat(200),
    )
    await expect(makeBackup(target, safe, NOW)).rejects.toThrow()
    expect(await readdir(safe)).toEqual([])
  })

  it('goes once its days are over, and nothing else does', async () => {
    const day = (days: number) => new Date(NOW.getTime() + days * 86_400_000)
    const old = await backUp()
    const young = await backUp(day(20))
    await mkdir(join(safe, '2026-01-01T000000Z'))
    await writeFile(join(safe, '2026-01-01T000000Z', 'holiday.jpg'), 'ours')
    await mkdir(join(safe, '2026-03-16T000000Z.part'))
    const aside = join(test.dataDir, 'before-restore-2026-03-01T000000Z')
    await mkdir(aside)
    const config = { ...test.context.config, backupDays: 30 }
    expect(await pruneBackups(config, day(30), safe)).toEqual([aside, join(safe, '2026-03-16T000000Z.part')])
    expect(await pruneBackups(config, day(31), safe)).toEqual([old.folder])
    expect((await readdir(safe)).sort()).toEqual(
      ['2026-01-01T000000Z', young.folder.slice(safe.length + 1)].sort(),
    )
  })
})

describe('a restore', () => {
  it.each([
    ['a still', (): string => `stills/${TEAM}/${fixture.still}.jpg`],
    ['the database', (): string => 'overtop.sqlite'],
  ])('refuses %s that was changed or is missing, by name, and changes nothing', async (_what, pathOf) => {
    const { folder } = await backUp()
    const file = join(folder, pathOf())
    const bytes = await readFile(file)
    bytes[bytes.length - 1] = (bytes[bytes.length - 1] ?? 0) ^ 1
    await writeFile(file, bytes)
    await expect(restore(folder)).rejects.toThrow(
      `${file} is not what was backed up. Take another backup. Nothing was changed.`,
    )
    await rm(file)
    await expect(restore(folder)).rejects.toThrow(`${file} is missing.`)
    expect(await readdir(target)).toEqual([])
  })

  it('refuses a folder that is no backup', async () => {
    await expect(restore(target)).rejects.toThrow(/is no backup: it has no manifest.json/)
    await expect(restore(join(safe, 'nowhere'))).rejects.toThrow(/is no backup/)
  })

  it('refuses the folder of a running server, and takes it once that has stopped', async () => {
    const { folder } = await backUp()
    const config = { ...test.context.config, dataDir: target }
    const server = await boot(config)
    await expect(restore(folder, { replace: true })).rejects.toThrow(
      `${target} is in use by process ${process.pid}. Stop the server, then restore. Nothing was changed.`,
    )
    await server.close()
    await restore(folder, { replace: true })
    const again = await boot(config)
    expect(await again.context.db.manager.count(Possession)).toBe(1)
    await again.close()
  })

  it('keeps data that is there, and with replace sets it aside whole', async () => {
    const { folder } = await backUp()
    await restore(folder)
    await look(target, (db) => db.query('UPDATE opponents SET name = ?', ['Written since']))
    await writeFile(join(target, 'session-secret'), 'secret')
    const data = async () =>
      [...(await filesBelow(target))].filter(([path]) => path !== join(target, LOCK_FILE))
    const before = await data()
    await expect(restore(folder)).rejects.toThrow(/has data in it. Add --replace/)
    expect(await data()).toEqual(before)

    const { aside } = await restore(folder, { replace: true, now: new Date('2026-03-18T08:00:00Z') })
    expect(aside).toBe(join(target, 'before-restore-2026-03-18T080000Z'))
    const nameIn = (dataDir: string) =>
      look(dataDir, async (db) => (await db.query('SELECT name FROM opponents'))[0].name as string)
    expect(await nameIn(target)).toBe('Port Selby Gulls')
    expect(await nameIn(String(aside))).toBe('Written since')
    expect((await readdir(target)).sort()).toEqual([
      'before-restore-2026-03-18T080000Z',
      'in-use.lock',
      'overtop.sqlite',
      'session-secret',
      'stills',
    ])
    expect((await readdir(join(String(aside), 'stills', TEAM))).sort()).toEqual([
      `${fixture.still}.jpg`,
      `${fixture.still}.thumb.jpg`,
    ])
  })

  it('brings an older database to the newest migration', async () => {
    const older = await mkdtemp(join(tmpdir(), 'overtop-older-'))
    const whole = createDataSource(join(older, 'overtop.sqlite'))
    const [first, ...since] = whole.options.migrations as unknown as (new () => { name: string })[]
    const db = await new DataSource({ ...whole.options, migrations: [first] as never }).initialize()
    await db.runMigrations()
    await db.query(
      `INSERT INTO teams (id, name, squadName, timeZone, season, rulePack, createdAt)
       VALUES (?, 'Herons', 'U17 girls', 'Europe/London', '2025/26', 'fiba', ?)`,
      [TEAM, NOW.toISOString()],
    )
    await db.destroy()
    const { folder, manifest } = await makeBackup(older, safe, NOW)
    expect(manifest.newestMigration).toBe(first && new first().name)
    const { migrated } = await restore(folder)
    expect(migrated).toEqual(since.map((migration) => new migration().name))
    await look(target, async ({ manager }) => {
      expect(await manager.query('SELECT name FROM teams')).toEqual([{ name: 'Herons' }])
    })
    await rm(older, { recursive: true })
  })

  it('refuses a backup of a newer Overtop', async () => {
    await test.context.db.query('INSERT INTO migrations (timestamp, name) VALUES (?, ?)', [
      4_000_000_000_000,
      'FromTheFuture4000000000000',
    ])
    const { folder, manifest } = await backUp()
    expect(manifest.newestMigration).toBe('FromTheFuture4000000000000')
    await expect(restore(folder)).rejects.toThrow(
      'The backup was made by a newer Overtop (FromTheFuture4000000000000). Update this one, then restore.',
    )
    expect(await readdir(target)).toEqual(['in-use.lock'])
  })
})

import 'reflect-metadata'
import { mkdir } from 'node:fs/promises'
import { dirname } from 'node:path'
import type BetterSqlite3 from 'better-sqlite3'
import { DataSource, type MixedList } from 'typeorm'
import { ENTITIES } from './entities/all'
import { lockTransactions } from './lockedQueryRunner'

type MigrationClass = new () => { name?: string; up(): Promise<void>; down(): Promise<void> }
const MIGRATIONS = Object.entries(
  import.meta.glob<Record<string, MigrationClass>>('./migrations/*.ts', { eager: true }),
)
  .sort(([a], [b]) => a.localeCompare(b))
  .flatMap(([, module]) => Object.values(module))

/** Written once here, so that tests, bench and production run with the same pragmas. */
export function applyPragmas(connection: BetterSqlite3.Database): void {
  connection.pragma('journal_mode = WAL')
  connection.pragma('synchronous = FULL')
  connection.pragma('foreign_keys = ON')
  connection.pragma('busy_timeout = 5000')
  // Deleted content is overwritten with zeros: deleting is for real.
  connection.pragma('secure_delete = ON')
}

/** A data source on a file, not yet open. `:memory:` only for writing migrations. */
export function createDataSource(file: string): DataSource {
  return new DataSource({
    type: 'better-sqlite3',
    database: file,
    entities: ENTITIES,
    migrations: MIGRATIONS as unknown as MixedList<string>,
    migrationsTransactionMode: 'each',
    synchronize: false,
    logging: false,
    invalidWhereValuesBehavior: { null: 'throw', undefined: 'throw' },
    prepareDatabase: applyPragmas,
    // More than the product has statements: the long counting ones take milliseconds to prepare.
    statementCacheSize: 500,
  })
}

/**
 * Opens the database and brings it to the newest migration.
 * Foreign keys are off while migrations run: rebuilding a table would otherwise delete its children,
 * and the pragma has no effect inside the transaction that TypeORM opens.
 * @throws when a migration leaves a row without its parent.
 */
export async function openDatabase(file: string): Promise<DataSource> {
  await mkdir(dirname(file), { recursive: true })
  const dataSource = await createDataSource(file).initialize()
  lockTransactions(dataSource)
  await dataSource.query('PRAGMA foreign_keys = OFF')
  await dataSource.runMigrations()
  const orphans: unknown[] = await dataSource.query('PRAGMA foreign_key_check')
  if (orphans.length > 0) throw new Error(`a migration left ${orphans.length} rows without their parent`)
  await dataSource.query('PRAGMA foreign_keys = ON')
  return dataSource
}

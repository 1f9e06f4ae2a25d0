import type { DataSource } from 'typeorm'
import { BetterSqlite3QueryRunner } from 'typeorm/driver/better-sqlite3/BetterSqlite3QueryRunner.js'
import { Lock } from './lock'

type Driver = ConstructorParameters<typeof BetterSqlite3QueryRunner>[0]
type IsolationLevel = Parameters<BetterSqlite3QueryRunner['startTransaction']>[0]

/**
 * TypeORM hands every caller the same runner on the one SQLite connection, so parallel transactions
 * fail ('cannot start a transaction within a transaction') and a stray query would join a stranger's
 * transaction. This runner holds a lock from BEGIN to COMMIT or ROLLBACK; a query outside a
 * transaction takes the lock for itself. Inside a transaction use only the manager it was given.
 */
class LockedQueryRunner extends BetterSqlite3QueryRunner {
  private handOn: (() => void) | null = null

  constructor(
    driver: Driver,
    private readonly lock: Lock,
  ) {
    super(driver)
  }

  override async startTransaction(isolationLevel?: IsolationLevel): Promise<void> {
    this.handOn ??= await this.lock.acquire()
    try {
      await super.startTransaction(isolationLevel)
    } finally {
      this.handOnWhenDone()
    }
  }

  override async commitTransaction(): Promise<void> {
    try {
      await super.commitTransaction()
    } finally {
      this.handOnWhenDone()
    }
  }

  override async rollbackTransaction(): Promise<void> {
    const outermost = this.transactionDepth <= 1
    try {
      await super.rollbackTransaction()
    } finally {
      // A full disk makes SQLite roll back by itself, and the ROLLBACK after it fails: the lock goes on all the
      // same, or nobody would ever have the connection again.
      if (outermost) this.letGo()
      else this.handOnWhenDone()
    }
  }

  override async query(query: string, parameters?: unknown[], useStructuredResult = false): Promise<unknown> {
    if (this.handOn) return super.query(query, parameters, useStructuredResult)
    const release = await this.lock.acquire()
    try {
      return await super.query(query, parameters, useStructuredResult)
    } finally {
      release()
    }
  }

  private handOnWhenDone(): void {
    if (!this.isTransactionActive) this.letGo()
  }

  private letGo(): void {
    this.handOn?.()
    this.handOn = null
  }
}

/** Makes a data source hand out locked runners that share one cache of prepared statements. */
export function lockTransactions(dataSource: DataSource): void {
  const driver = dataSource.driver as Driver
  const lock = new Lock()
  const statements = new Map<string, unknown>()
  driver.createQueryRunner = () =>
    Object.assign(new LockedQueryRunner(driver, lock), { stmtCache: statements })
}

import { Store, type SessionData } from 'express-session'
import type { DataSource } from 'typeorm'
import type { Clock } from '../adapters/clock'
import { StoredSession } from '../database/entities/StoredSession'

type Done = (error?: unknown) => void

/** A session that was read less than this ago is not written again only to move its end. */
const TOUCH_EVERY_MS = 60 * 60 * 1000

/** express-session's rows in the product's own database, so that one backup holds all. */
export class SessionStore extends Store {
  constructor(
    private readonly db: DataSource,
    private readonly clock: Clock,
    private readonly lifeMs: number,
  ) {
    super()
  }

  override get(id: string, done: (error: unknown, session?: SessionData | null) => void): void {
    this.rows()
      .findOneBy({ id })
      .then((row) => {
        const alive = row && row.expiresAt > this.clock().getTime()
        done(null, alive ? (JSON.parse(row.data) as SessionData) : null)
      })
      .catch(done)
  }

  override set(id: string, session: SessionData, done: Done = () => undefined): void {
    const expiresAt = this.clock().getTime() + this.lifeMs
    this.rows()
      .upsert({ id, data: JSON.stringify(session), expiresAt }, ['id'])
      .then(() => done())
      .catch(done)
  }

  override touch(id: string, _session: SessionData, done: Done = () => undefined): void {
    const now = this.clock().getTime()
    this.rows()
      .createQueryBuilder()
      .update()
      .set({ expiresAt: now + this.lifeMs })
      .where('id = :id AND expiresAt < :soon', { id, soon: now + this.lifeMs - TOUCH_EVERY_MS })
      .execute()
      .then(() => done())
      .catch(done)
  }

  override destroy(id: string, done: Done = () => undefined): void {
    this.rows()
      .delete({ id })
      .then(() => done())
      .catch(done)
  }

  /** Takes out every session whose time is up. */
  async sweep(): Promise<void> {
    await this.rows()
      .createQueryBuilder()
      .delete()
      .where('expiresAt <= :now', { now: this.clock().getTime() })
      .execute()
  }

  private rows() {
    return this.db.getRepository(StoredSession)
  }
}

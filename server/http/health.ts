import type { RequestHandler } from 'express'
import type { DataSource } from 'typeorm'

/** 200 when the database answers, 503 when it does not. */
export function health(db: DataSource): RequestHandler {
  return async (_req, res) => {
    const alive = await db.query('SELECT 1').then(
      () => true,
      () => false,
    )
    res.status(alive ? 200 : 503).json({ status: alive ? 'ok' : 'no database' })
  }
}

import type { RowMeta } from '@shared/http/common'
import type { Put } from '../database/putRow'
import type { Reply } from './endpoint'

/** What every row shows of itself. */
export const metaOf = (row: RowMeta): RowMeta => ({
  id: row.id,
  version: row.version,
  createdAt: row.createdAt,
  updatedAt: row.updatedAt,
})

/** 201 for a created row, 200 otherwise, with its ETag. */
export const putReply = <E extends RowMeta, T>(put: Put<E>, body: T): Reply<T> => ({
  status: put.outcome === 'created' ? 201 : 200,
  body,
  version: put.row.version,
})

export const listReply = <T>(rows: T[], total = rows.length): Reply<{ rows: T[]; total: number }> => ({
  status: 200,
  body: { rows, total },
})

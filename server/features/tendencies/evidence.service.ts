import { In, type DataSource } from 'typeorm'
import type { Evidence, EvidenceQuery } from '@shared/tendencies/schemas'
import type { z } from 'zod'
import { evidenceIds } from '../../database/counting/evidenceIds'
import { habitSql } from '../../database/counting/habitSql'
import { Possession } from '../../database/entities/Possession'
import { BadInput } from '../../http/problem'
import { withParts } from '../possessions/loadPossessions'
import { presentPossession } from '../possessions/possessions.presenter'
import { gameLabel } from './tendencies.presenter'

/** The possessions behind one habit of an opponent. @throws BadInput for a habit that is not counted */
export async function readEvidence(
  db: DataSource,
  opponentId: string,
  { habit, limit, offset, ...filter }: z.output<typeof EvidenceQuery>,
): Promise<Evidence> {
  const sql = habitSql(habit)
  if (!sql)
    throw new BadInput([{ field: 'habit', message: 'No such habit is counted. Take one of the list.' }])
  const { rows, total } = await evidenceIds(db.manager, opponentId, sql, filter, { limit, offset })
  const found = await db.getRepository(Possession).findBy({ id: In(rows.map((row) => row.id)) })
  const whole = new Map((await withParts(db.manager, found)).map((entry) => [entry.row.id, entry]))
  return {
    total,
    rows: rows.flatMap((row) => {
      const possession = whole.get(row.id)
      return possession
        ? [
            {
              possession: presentPossession(possession),
              counted: row.counted,
              gameLabel: `${gameLabel(row)}, ${row.day}`,
            },
          ]
        : []
    }),
  }
}

import type { DataSource } from 'typeorm'
import { z } from 'zod'
import { FieldChange } from '@shared/history/schemas'
import { PossessionPatch } from '@shared/possessions/schemas'
import type { PutBackBody } from '@shared/possessions/table'
import { Change } from '../../database/entities/Change'
import { BadInput, Conflict, NotFound } from '../../http/problem'
import { getPossession, patchPossession } from './possessions.service'

const Fields = z.array(FieldChange).catch([])

/** A value that was too long for the history is told by its length only. */
const isLengthOnly = (value: unknown) =>
  typeof value === 'object' && value !== null && 'long' in value && Object.keys(value).length === 1

/**
 * Puts one field of a possession back to what it was before one line of its history. The row is checked as a
 * whole, and the change is a new line of its history.
 * @throws NotFound, BadInput, Conflict, NeedsIfMatch, StaleVersion
 */
export async function putBack(
  db: DataSource,
  write: Parameters<typeof patchPossession>[1],
  { changeId, field }: PutBackBody,
): ReturnType<typeof patchPossession> {
  const { teamId, id } = write
  await getPossession(db.manager, teamId, id)
  const change = await db.manager.findOneBy(Change, { id: changeId, teamId, rowId: id })
  if (!change) throw new NotFound('line', ' in the history of this row')
  const line = Fields.parse(change.fields).find((entry) => entry.field === field)
  if (!line)
    throw new BadInput([
      { field: 'field', message: 'This line did not change that. Take one that it changed.' },
    ])
  if (isLengthOnly(line.from))
    throw new Conflict('What it was before was too long to be kept. Write it anew.')
  const patch = PossessionPatch.safeParse({ [field]: line.from })
  if (!patch.success)
    throw new Conflict('What it was before is no longer a choice here. Choose another value.')
  return patchPossession(db, write, patch.data as PossessionPatch)
}

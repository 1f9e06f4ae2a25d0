import { z } from 'zod'
import { FieldChange, type ChangeRow } from '@shared/history/schemas'
import type { Change } from '../../database/entities/Change'
import { initialsOf } from '../session/session.presenter'

const Fields = z.array(FieldChange)

/** An entry as a caller sees it; one whose fields can no longer be read says only who and when. */
export function presentChange(change: Change): ChangeRow {
  const fields = Fields.safeParse(change.fields)
  return {
    id: change.id,
    kind: change.kind,
    rowId: change.rowId,
    action: change.action,
    who: change.person
      ? { id: change.person.id, name: change.person.name, initials: initialsOf(change.person.name) }
      : null,
    at: change.at,
    batchId: change.batchId,
    fields: fields.success ? fields.data : [],
  }
}

import type { PossessionRow } from '@shared/possessions/schemas'
import { draftOfRow, type Draft } from './draft'
import type { Waiting } from './outbox'

/** A saved possession as the list shows it: the server's, or the one that is kept here and goes before it. */
export interface LogRow {
  id: string
  draft: Draft
  /** The version to base an edit on; null while the server does not know the row. */
  version: number | null
  state: 'sent' | Waiting['state'] | 'sending'
  why: string
  stills: PossessionRow['stills']
}

/** Newest first. */
export function logRows(
  rows: readonly PossessionRow[],
  entries: readonly Waiting[],
  sending: string | null,
): LogRow[] {
  const here = new Map(entries.map((entry) => [entry.id, entry]))
  const stills = new Map(rows.map((row) => [row.id, row.stills]))
  const saved = rows
    .filter((row) => !here.has(row.id))
    .map((row): LogRow => ({
      id: row.id,
      draft: draftOfRow(row),
      version: row.version,
      state: 'sent',
      why: '',
      stills: row.stills,
    }))
  const kept = entries.map((entry): LogRow => ({
    id: entry.id,
    draft: entry.body,
    version: entry.version,
    state: entry.id === sending ? 'sending' : entry.state,
    why: [entry.why, ...entry.fields.map((fault) => fault.message)].filter(Boolean).join(' '),
    stills: stills.get(entry.id) ?? [],
  }))
  return [...saved, ...kept].sort((a, b) => b.draft.number - a.draft.number || (a.id < b.id ? 1 : -1))
}

/** "No signal. 6 kept here, will send later.": what is not on the server, in words; empty when all of it is. */
export function unsentWords(waiting: number, offline: boolean): { full: string; short: string } {
  if (waiting === 0)
    return offline
      ? { full: 'No signal. What you save is kept here.', short: 'no signal' }
      : { full: '', short: '' }
  if (offline)
    return {
      full: `No signal. ${waiting} kept here, will send later`,
      short: `${waiting} kept here, no signal`,
    }
  return { full: `Sending ${waiting}`, short: `sending ${waiting}` }
}

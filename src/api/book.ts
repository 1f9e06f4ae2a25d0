import type { Paper } from '@shared/sheets/schemas'
import { queryText, teamPath } from './http'

/** The printed book, or some counters of it: an address to open. */
export function bookPdfUrl(team: string, paper: Paper, counters: readonly string[] = []): string {
  return `${teamPath(team, 'book')}.pdf${queryText({ paper, counters: [...counters] })}`
}

import {
  CopyList,
  CopyRow,
  LettersMade,
  OpeningList,
  Recalled,
  type CopyChange,
  type SheetChange,
} from '@shared/sheets/handOut'
import { SheetView, type Paper } from '@shared/sheets/schemas'
import { queryText, request, teamPath } from './http'

/** Numbered papers and letters of a sheet. */
export function listCopies(team: string, sheet: string, signal?: AbortSignal): Promise<CopyList> {
  return request('GET', teamPath(team, 'sheets', sheet, 'copies'), CopyList, { signal })
}

/** Makes papers; their numbers are the server's. Hands back all copies of the sheet. */
export function makeCopies(
  team: string,
  sheet: string,
  copies: { id: string; squadPlayerId: string | null }[],
): Promise<CopyList> {
  return request('POST', teamPath(team, 'sheets', sheet, 'copies'), CopyList, { body: { copies } })
}

/** Moves a paper; with a player it is hers from now on. */
export function moveCopy(team: string, copy: string, change: CopyChange, version: number): Promise<CopyRow> {
  return request('PATCH', teamPath(team, 'copies', copy), CopyRow, { body: change, version })
}

/** Address of the papers in one file, a page each; all of them without ids. */
export function copiesPdfUrl(team: string, sheet: string, paper: Paper, ids: readonly string[] = []): string {
  return `${teamPath(team, 'sheets', sheet, 'copies.pdf')}${queryText({ paper, ids })}`
}

export function writeLetters(
  team: string,
  sheet: string,
  to: { players: string[]; members?: string[] },
): Promise<LettersMade> {
  return request('POST', teamPath(team, 'sheets', sheet, 'letters'), LettersMade, { body: to })
}

export function listOpenings(team: string, sheet: string, signal?: AbortSignal): Promise<OpeningList> {
  return request('GET', teamPath(team, 'sheets', sheet, 'openings'), OpeningList, { signal })
}

/** Calls a sheet back for good. */
export function recallSheet(team: string, sheet: string): Promise<Recalled> {
  return request('POST', teamPath(team, 'sheets', sheet, 'recall'), Recalled)
}

export function changeSheet(team: string, sheet: string, change: SheetChange): Promise<SheetView> {
  return request('PATCH', teamPath(team, 'sheets', sheet), SheetView, { body: change })
}

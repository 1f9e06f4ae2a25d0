import { SheetList, SheetView, type Paper } from '@shared/sheets/schemas'
import { queryText, request, teamPath } from './http'

/** Every sheet that the caller may open, newest first. */
export function listSheets(team: string, signal?: AbortSignal): Promise<SheetList> {
  return request('GET', teamPath(team, 'sheets'), SheetList, { signal })
}

export function listGameSheets(team: string, game: string, signal?: AbortSignal): Promise<SheetList> {
  return request('GET', teamPath(team, 'games', game, 'sheets'), SheetList, { signal })
}

export function getSheet(team: string, id: string, signal?: AbortSignal): Promise<SheetView> {
  return request('GET', teamPath(team, 'sheets', id), SheetView, { signal })
}

/** Address of the printed page, for a link: the browser fetches it with the session cookie. */
export function sheetPdfUrl(
  team: string,
  id: string,
  paper: Paper,
  copy: { player?: string; number?: number } = {},
): string {
  return `${teamPath(team, 'sheets', id)}.pdf${queryText({ paper, player: copy.player, copy: copy.number })}`
}

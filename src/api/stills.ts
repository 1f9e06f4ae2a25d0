import { StillRow } from '@shared/possessions/schemas'
import { requestNothing, teamPath, upload, type UploadOptions } from './http'

export interface StillText {
  /** Seconds from the first touch; null when not known. */
  t: number | null
  caption: string
}

/** Sends one picture under an id of the caller's making; the same again changes nothing. */
export function putStill(
  team: string,
  possession: string,
  id: string,
  picture: Blob,
  text: StillText,
  options: UploadOptions = {},
): Promise<StillRow> {
  const form = new FormData()
  // Text first: a server that streams the form knows what the picture is when it comes.
  form.set('t', text.t === null ? '' : String(text.t))
  form.set('caption', text.caption)
  form.set('still', picture)
  return upload(teamPath(team, 'possessions', possession, 'stills', id), form, StillRow, options)
}

export function deleteStill(team: string, possession: string, id: string): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'possessions', possession, 'stills', id))
}

import { StillRow } from '@shared/possessions/schemas'
import type { BlurBody, StillPatch } from '@shared/stills/schemas'
import { request, requestNothing, teamPath, upload, type UploadOptions } from './http'

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

/** Changes the fields given. `current` of a 412 is the present row. */
export function patchStill(
  team: string,
  id: string,
  patch: StillPatch,
  version: number,
  signal?: AbortSignal,
): Promise<StillRow> {
  return request('PATCH', teamPath(team, 'stills', id), StillRow, { body: patch, version, signal })
}

/** Burns parts of the picture away; nobody can undo it. */
export function blurStill(team: string, id: string, body: BlurBody, version: number): Promise<StillRow> {
  return request('POST', teamPath(team, 'stills', id, 'blur'), StillRow, { body, version })
}

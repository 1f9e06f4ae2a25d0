import type { z } from 'zod'
import { Problem } from '@shared/http/common'
import { noteKept } from './kept'
import { ApiProblem, OfflineError, UnreadableAnswer } from './problems'

/** The one place that talks to the server: same origin, session cookie, JSON in and out, faults typed. */

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'
type QueryValue = string | number | boolean | readonly (string | number)[] | null | undefined

export interface RequestOptions {
  signal?: AbortSignal
  /** Lists become comma-separated text; null, undefined and empty lists are left out. */
  query?: Readonly<Record<string, QueryValue>>
  /** Sent as JSON. */
  body?: unknown
  /** The version this edit is based on; sent as `If-Match: "<version>"`. */
  version?: number
}

export interface UploadOptions {
  signal?: AbortSignal
  version?: number
  /** Share of the bytes sent so far, 0 to 1. */
  onProgress?: (share: number) => void
}

let signedOut: () => void = () => undefined

/** Whom to tell when the server says that nobody is signed in (401). One listener: the session. */
export function onSignedOut(listener: () => void): void {
  signedOut = listener
}

/**
 * Asks the server and parses its answer with the schema.
 * @throws ApiProblem for every answer that is not a success; OfflineError without one; UnreadableAnswer when the
 *   answer does not fit the schema; DOMException AbortError when the signal stopped it.
 */
export async function request<S extends z.ZodType>(
  method: Method,
  path: string,
  schema: S,
  options: RequestOptions = {},
): Promise<z.output<S>> {
  const answer = await ask(method, path, options)
  const parsed = parse(schema, readJson(answer.text, path), path)
  if (answer.headers) noteKept(parsed, answer.headers)
  return parsed
}

/** As `request`, for an answer without a body (204). */
export async function requestNothing(
  method: Method,
  path: string,
  options: RequestOptions = {},
): Promise<void> {
  await ask(method, path, options)
}

/** PUTs a multipart form, telling how much of it has gone. Throws as `request` does. */
export async function upload<S extends z.ZodType>(
  path: string,
  form: FormData,
  schema: S,
  options: UploadOptions = {},
): Promise<z.output<S>> {
  const answer = await send(path, form, options)
  if (answer.status < 200 || answer.status > 299) throw faultOf(answer.status, answer.text, path)
  return parse(schema, readJson(answer.text, path), path)
}

interface Answer {
  status: number
  text: string
  headers?: Headers
}

async function ask(method: Method, path: string, options: RequestOptions): Promise<Answer> {
  const headers: Record<string, string> = { Accept: 'application/json' }
  if (options.body !== undefined) headers['Content-Type'] = 'application/json'
  if (options.version !== undefined) headers['If-Match'] = etag(options.version)
  let answer: Answer
  try {
    const response = await fetch(path + queryText(options.query), {
      method,
      headers,
      credentials: 'same-origin',
      ...(options.body === undefined ? {} : { body: JSON.stringify(options.body) }),
      ...(options.signal === undefined ? {} : { signal: options.signal }),
    })
    answer = { status: response.status, text: await response.text(), headers: response.headers }
  } catch (error) {
    // fetch rejects with a TypeError for every way of not getting through, and with the signal's reason on abort.
    if (options.signal?.aborted || !(error instanceof TypeError)) throw error
    throw new OfflineError()
  }
  if (answer.status < 200 || answer.status > 299) throw faultOf(answer.status, answer.text, path)
  return answer
}

/** fetch cannot say how much of a body has gone; XMLHttpRequest can. */
function send(path: string, form: FormData, options: UploadOptions): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const { signal } = options
    const aborted = () => reject(new DOMException('The upload was stopped.', 'AbortError'))
    if (signal?.aborted) return aborted()
    const xhr = new XMLHttpRequest()
    xhr.open('PUT', path)
    xhr.setRequestHeader('Accept', 'application/json')
    if (options.version !== undefined) xhr.setRequestHeader('If-Match', etag(options.version))
    xhr.upload.onprogress = (event) => {
      if (event.lengthComputable && event.total > 0) options.onProgress?.(event.loaded / event.total)
    }
    const stop = () => xhr.abort()
    signal?.addEventListener('abort', stop, { once: true })
    xhr.onloadend = () => signal?.removeEventListener('abort', stop)
    xhr.onload = () => resolve({ status: xhr.status, text: xhr.responseText })
    xhr.onerror = () => reject(new OfflineError())
    xhr.onabort = aborted
    xhr.send(form)
  })
}

function faultOf(status: number, text: string, path: string): Error {
  if (status === 401) signedOut()
  const parsed = Problem.safeParse(jsonOrNull(text))
  if (parsed.success) return new ApiProblem(parsed.data)
  // No problem document: a proxy or a server that is starting answered in its place.
  if (status === 502 || status === 503 || status === 504) return new OfflineError()
  return new ApiProblem({
    type: 'about:blank',
    title: 'The server could not do this',
    status,
    detail: 'The server could not do this. What you see here is kept; try again.',
    instance: path,
  })
}

function parse<S extends z.ZodType>(schema: S, value: unknown, path: string): z.output<S> {
  const parsed = schema.safeParse(value)
  if (!parsed.success) throw new UnreadableAnswer(`${path}: ${parsed.error.issues[0]?.path.join('.') ?? ''}`)
  return parsed.data
}

function readJson(text: string, path: string): unknown {
  const value = jsonOrNull(text)
  if (value === null) throw new UnreadableAnswer(path)
  return value
}

function jsonOrNull(text: string): unknown {
  try {
    return JSON.parse(text) as unknown
  } catch {
    return null
  }
}

const etag = (version: number) => `"${version}"`

/** The query with its question mark, or nothing when every value was left out. */
export function queryText(query: RequestOptions['query'] = {}): string {
  const params = new URLSearchParams()
  for (const [key, value] of Object.entries(query)) {
    if (value === null || value === undefined) continue
    const text = Array.isArray(value) ? value.join(',') : String(value)
    if (text !== '') params.set(key, text)
  }
  const written = params.toString()
  return written === '' ? '' : `?${written}`
}

/** Path below the team: every id is escaped. */
export function teamPath(team: string, ...parts: readonly string[]): string {
  return ['/api/teams', encodeURIComponent(team), ...parts.map(encodeURIComponent)].join('/')
}

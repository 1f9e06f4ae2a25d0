import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { endpointsOf } from '@server/app'
import { ACTIONS } from '@shared/session/schemas'
import { startTestApp, type TestApp } from '../support/testApp'

type Json = Record<string, unknown>
interface Operation extends Json {
  summary: string
  parameters?: { name: string; in: string; required: boolean; schema: Json }[]
  responses: Record<string, { description: string; content?: Record<string, { schema?: Json }> }>
  requestBody?: { content: Record<string, { schema: Json }> }
  'x-action'?: string
}

let test: TestApp
let document: Json & { paths: Record<string, Record<string, Operation>> }
let operations: [string, string, Operation][]

beforeAll(async () => {
  test = await startTestApp({ empty: true })
  document = (await test.anonymous().get('/api/openapi.json')).body
  operations = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]): [string, string, Operation] => [
      path,
      method,
      operation,
    ]),
  )
})
afterAll(() => test.stop())

/** Every object of a JSON document with the pointer that leads to it. */
function* walk(value: unknown, pointer = '#'): Generator<[string, Json]> {
  if (typeof value !== 'object' || value === null) return
  yield [pointer, value as Json]
  for (const [key, child] of Object.entries(value))
    yield* walk(child, `${pointer}/${key.replace(/~/g, '~0').replace(/\//g, '~1')}`)
}

describe('the API’s description', () => {
  it('is OpenAPI 3.1 with what that asks for', () => {
    expect(document.openapi).toMatch(/^3\.1\.\d+$/)
    expect(document.info).toMatchObject({ title: 'Overtop', version: expect.any(String) })
    expect(document.servers).toEqual([{ url: '/api' }])
  })

  it('has every mounted route and no other', () => {
    const mounted = endpointsOf(test.context).map(
      ({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`,
    )
    const accounts = [
      'get /session',
      'post /session',
      'delete /session',
      'get /session/account',
      'put /session/password',
      'put /session/teams/{team}/mail',
      'delete /session/everywhere',
      'post /password-resets',
      'post /password-resets/use',
      'post /invitations/look',
      'post /invitations/accept',
      'post /teams',
      'post /first-coach',
    ]
    expect(operations.map(([path, method]) => `${method} ${path}`).sort()).toEqual(
      [...mounted, ...accounts].sort(),
    )
  })

  it('has every address of the contract for outside checks', () => {
    const below = (path: string) => `/teams/{team}/${path}`
    const addresses = [
      'opponents',
      'opponents/{id}/scouted-games',
      'opponents/{id}/tendencies',
      'scouted-games/{id}/possessions',
      'games/{id}/possessions',
      'counters',
      'rules',
      'squad',
      'games',
      'games/{id}/choices',
      'games/{id}/plan',
      'games/{id}/plan/sign-off',
      'games/{id}/sheets',
      'sheets/{id}.pdf',
    ]
    expect(Object.keys(document.paths)).toEqual(expect.arrayContaining(['/session', ...addresses.map(below)]))
    expect(Object.keys(document.paths[below('possessions/{id}')] ?? {})).toEqual(
      expect.arrayContaining(['put', 'patch', 'delete']),
    )
    const still = document.paths[below('possessions/{id}/stills/{still}')]?.['put']
    const multipart = still?.requestBody?.content['multipart/form-data']?.schema as { properties: Json }
    expect(multipart.properties['still']).toEqual({ type: 'string', format: 'binary' })
  })

  it('every $ref leads to something, and the recursive schemas are among them', () => {
    const pointers = new Map(walk(document))
    const refs = [...pointers].flatMap(([at, { $ref }]) => (typeof $ref === 'string' ? [[at, $ref]] : []))
    expect(refs.length).toBeGreaterThan(50)
    expect(refs.filter(([, ref]) => !pointers.has(String(ref)))).toEqual([])
    expect(refs.some(([, ref]) => ref?.startsWith('#/components/schemas/') && !ref.endsWith('Problem'))).toBe(
      true,
    )
  })

  it('every path parameter is declared once, required, and stands in the path', () => {
    for (const [path, method, { parameters = [] }] of operations) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name).sort()
      const declared = parameters.filter((one) => one.in === 'path')
      expect(declared.map(({ name }) => name).sort(), `${method} ${path}`).toEqual(inPath)
      expect(declared.every(({ required }) => required)).toBe(true)
      const keys = parameters.map((one) => `${one.in} ${one.name}`)
      expect(new Set(keys).size).toBe(keys.length)
      for (const one of parameters) expect(one.schema, `${one.name} of ${path}`).toBeTypeOf('object')
    }
  })

  it('every operation says what it does and answers with a described status, once with success', () => {
    for (const [path, method, operation] of operations) {
      const at = `${method} ${path}`
      expect(operation.summary, at).toMatch(/^[A-Z].{3,}/)
      const statuses = Object.keys(operation.responses)
      expect(
        statuses.some((status) => /^2\d\d$/.test(status)),
        at,
      ).toBe(true)
      for (const [status, response] of Object.entries(operation.responses)) {
        expect(response.description, at).not.toBe('')
        if (/^[45]/.test(status))
          expect(Object.keys(response.content ?? {})).toEqual(['application/problem+json'])
      }
      if (method === 'get' || method === 'delete') expect(operation).not.toHaveProperty('requestBody')
      if (path.startsWith('/teams/'))
        expect(ACTIONS as readonly string[], at).toContain(operation['x-action'])
    }
  })

  it('says what is too large, and that a page may hold no more', () => {
    for (const [path, method, { requestBody, responses }] of operations)
      if (path.startsWith('/teams/'))
        expect('413' in responses, `${method} ${path}`).toBe(requestBody !== undefined)
    expect(document.paths['/teams/{team}/sheets/{id}.pdf']?.['get']?.responses).toHaveProperty('409')
  })

  it('asks for If-Match where a change needs it, and says what a stale or missing one answers', () => {
    for (const [path, method, { parameters = [], responses }] of operations) {
      const has = parameters.some((one) => one.in === 'header' && one.name === 'If-Match')
      const changes = path.startsWith('/teams/') && ['put', 'patch', 'delete'].includes(method)
      const needed = /\/(sign-off|put-back|blur)$/.test(path)
      expect(has, `${method} ${path}`).toBe(changes || needed)
      expect('412' in responses, `${method} ${path}`).toBe(has)
      // A PUT may ask for the version too, where there is no new row to make.
      const asks = '428' in responses
      expect(asks ? has : asks, `${method} ${path}`).toBe(asks)
      if (method === 'patch' || needed) expect(asks, `${method} ${path}`).toBe(true)
    }
  })
})

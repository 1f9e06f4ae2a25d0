import { z } from 'zod'
import { Problem } from '@shared/http/common'
import { Session, SignIn } from '@shared/session/schemas'
import type { Endpoint } from './endpoint'

type Json = Record<string, unknown>

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  }) as Json
  return rest
}

const json = (schema: Json): Json => ({ 'application/json': { schema } })
const problem = (description: string): Json => ({
  description,
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
})

/** Parameters of a path or a query, one by one. */
function parameters(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return []
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as {
    properties?: Json
    required?: string[]
  }
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }))
}

const IF_MATCH: Json = {
  name: 'If-Match',
  in: 'header',
  required: false,
  description: 'The ETag of the version that was changed. Every edit sends it.',
  schema: { type: 'string' },
}

function requestBody(spec: Endpoint): Json | undefined {
  if (!spec.body) return undefined
  const schema = schemaOf(spec.body, 'input')
  if (spec.media?.request && spec.media.field) {
    const properties = {
      ...(schema['properties'] as Json),
      [spec.media.field]: { type: 'string', format: 'binary' },
    }
    const multipart = { ...schema, properties, required: [spec.media.field] }
    return { required: true, content: { [spec.media.request]: { schema: multipart } } }
  }
  return { required: true, content: json(schema) }
}

function responses(spec: Endpoint): Json {
  const success: Json = spec.media?.response
    ? { '200': { description: 'The file', content: { [spec.media.response]: {} } } }
    : spec.response
      ? {
          '200': {
            description: spec.method === 'put' ? 'Changed, or the same again' : 'Done',
            content: json(schemaOf(spec.response, 'output')),
          },
          ...(spec.method === 'put'
            ? { '201': { description: 'Created', content: json(schemaOf(spec.response, 'output')) } }
            : {}),
        }
      : { '204': { description: 'Done' } }
  const edits = spec.method === 'put' || spec.method === 'patch' || spec.method === 'delete'
  return {
    ...success,
    '400': problem('A field is at fault'),
    '401': problem('Not signed in'),
    '403': problem('The role does not include this'),
    '404': problem('No such row in this team'),
    ...(edits
      ? { '409': problem('Stands in the way'), '412': problem('Changed meanwhile; carries the present row') }
      : {}),
  }
}

function operation(spec: Endpoint): Json {
  const edits =
    spec.method === 'put' ||
    spec.method === 'patch' ||
    spec.method === 'delete' ||
    spec.path.endsWith('/sign-off')
  const body = requestBody(spec)
  return {
    summary: spec.summary,
    'x-action': spec.action,
    parameters: [
      ...parameters(spec.params, 'path'),
      ...parameters(spec.query, 'query'),
      ...(edits ? [IF_MATCH] : []),
    ],
    ...(body ? { requestBody: body } : {}),
    responses: responses(spec),
    security: [{ session: [] }],
  }
}

const SESSION_PATHS: Json = {
  '/session': {
    get: {
      summary: 'Who is signed in and what they may do',
      responses: {
        '200': { description: 'Done', content: json(schemaOf(Session, 'output')) },
        '401': problem('Not signed in'),
      },
    },
    post: {
      summary: 'Sign in',
      requestBody: { required: true, content: json(schemaOf(SignIn, 'input')) },
      responses: {
        '201': { description: 'Signed in', content: json(schemaOf(Session, 'output')) },
        '400': problem('A field is at fault'),
        '401': problem('Address and password do not fit'),
        '429': problem('Too many tries'),
      },
    },
    delete: { summary: 'Sign out', responses: { '204': { description: 'Done' } } },
  },
}

/** The API's description in OpenAPI 3.1, from the same values that mount it. */
export function describeApi(endpoints: readonly Endpoint[]): Json {
  const paths: Record<string, Json> = { ...(SESSION_PATHS as Record<string, Json>) }
  for (const spec of endpoints) {
    const path = spec.path.replace(/:(\w+)/g, '{$1}')
    paths[path] = { ...paths[path], [spec.method]: operation(spec) }
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Overtop',
      version: '1',
      description: 'Times are RFC 3339 in UTC. Errors are RFC 9457 problem details.',
    },
    servers: [{ url: '/api' }],
    paths,
    components: {
      schemas: { Problem: schemaOf(Problem, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'overtop' } },
    },
  }
}

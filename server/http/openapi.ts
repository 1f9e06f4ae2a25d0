import type { z } from 'zod'
import { Problem } from '@shared/http/common'
import type { Endpoint } from './endpoint'
import { accountPaths } from './openapiAccounts'
import { joinPaths } from './openapiJoin'
import { json, problem, Schemas, type Json } from './openapiSchemas'

/** Parameters of a path or a query, one by one. */
function parameters(schemas: Schemas, schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return []
  const { properties = {}, required = [] } = schemas.of(schema, 'input') as {
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

function requestBody(schemas: Schemas, spec: Endpoint): Json | undefined {
  if (!spec.body) return undefined
  const schema = schemas.of(spec.body, 'input')
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

function responses(schemas: Schemas, spec: Endpoint): Json {
  const success: Json = spec.media?.response
    ? { '200': { description: 'The file', content: { [spec.media.response]: {} } } }
    : spec.response
      ? {
          '200': {
            description: spec.method === 'put' ? 'Changed, or the same again' : 'Done',
            content: json(schemas.of(spec.response, 'output')),
          },
          ...(spec.method === 'put'
            ? { '201': { description: 'Created', content: json(schemas.of(spec.response, 'output')) } }
            : {}),
        }
      : { '204': { description: 'Done' } }
  return {
    ...success,
    '400': problem('A field is at fault'),
    '401': problem('Not signed in'),
    '403': problem('The role does not include this'),
    '404': problem('No such row in this team'),
    ...(edits(spec)
      ? { '409': problem('Stands in the way'), '412': problem('Changed meanwhile; carries the present row') }
      : {}),
    ...(spec.body ? { '413': problem('Too large') } : {}),
    ...Object.fromEntries(Object.entries(spec.problems ?? {}).map(([status, why]) => [status, problem(why)])),
    ...(spec.method === 'patch' || needsVersion(spec) ? { '428': problem('If-Match is missing') } : {}),
  }
}

/** POSTs that change one row and need its version. */
const needsVersion = ({ path }: Endpoint): boolean => /\/(sign-off|put-back|blur)$/.test(path)

/** What changes a row and so minds its version. */
const edits = (spec: Endpoint): boolean =>
  spec.method === 'put' || spec.method === 'patch' || spec.method === 'delete' || needsVersion(spec)

function operation(schemas: Schemas, spec: Endpoint): Json {
  const body = requestBody(schemas, spec)
  return {
    summary: spec.summary,
    'x-action': spec.action,
    parameters: [
      ...parameters(schemas, spec.params, 'path'),
      ...parameters(schemas, spec.query, 'query'),
      ...(edits(spec) ? [IF_MATCH] : []),
    ],
    ...(body ? { requestBody: body } : {}),
    responses: responses(schemas, spec),
    security: [{ session: [] }],
  }
}

/** The API's description in OpenAPI 3.1, from the same values that mount it. */
export function describeApi(endpoints: readonly Endpoint[]): Json {
  const schemas = new Schemas()
  const paths = { ...accountPaths(schemas), ...joinPaths(schemas) }
  for (const spec of endpoints) {
    const path = spec.path.replace(/:(\w+)/g, '{$1}')
    paths[path] = { ...paths[path], [spec.method]: operation(schemas, spec) }
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
      schemas: { Problem: schemas.of(Problem, 'output'), ...schemas.named },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'overtop' } },
    },
  }
}

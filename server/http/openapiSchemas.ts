import { z } from 'zod'
import { Condition } from '@shared/rules/schemas'

export type Json = Record<string, unknown>
type Io = 'input' | 'output'

/** Schemas that contain themselves stand once among the components, under these names. */
const NAMES = z.registry<{ id: string }>()
NAMES.add(Condition, { id: 'Condition' })

/** Zod's schemas as JSON Schema, and what they refer to by name, gathered for the components. */
export class Schemas {
  readonly named: Json = {}

  of(schema: z.ZodType, io: Io): Json {
    const options = { io, metadata: NAMES, unrepresentable: 'any', target: 'draft-2020-12' } as const
    const { $schema: _dialect, $defs = {}, ...rest } = z.toJSONSchema(schema, options) as Json
    for (const [id, definition] of Object.entries($defs as Json)) {
      if (id.startsWith('__')) throw new Error('a schema that contains itself has no name in the description')
      this.named[nameOf(id, io)] = pointed(definition, io)
    }
    return pointed(rest, io)
  }
}

/** A default makes a field optional in what is sent and sure in what is answered: two schemas. */
const nameOf = (id: string, io: Io): string => (io === 'input' ? `${id}Input` : id)

/** References into a schema's own definitions, turned to the components of the whole description. */
function pointed(schema: unknown, io: Io): Json {
  return JSON.parse(JSON.stringify(schema), (key, value: unknown) => {
    if (key !== '$ref' || typeof value !== 'string') return value
    return `#/components/schemas/${nameOf(value.replace('#/$defs/', ''), io)}`
  }) as Json
}

/** A body of JSON. */
export const json = (schema: Json): Json => ({ 'application/json': { schema } })
/** A refusal, as every route writes it. */
export const problem = (description: string): Json => ({
  description,
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
})

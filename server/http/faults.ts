import type { z } from 'zod'
import type { FieldFault } from './problem'

/** What a field takes, in plain words, per kind of fault; a library's own English never reaches a coach. */
function remedy(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case 'custom':
      return issue.message
    case 'invalid_type':
      return issue.input === undefined
        ? 'This is missing. Fill it in.'
        : `This must be ${kindName(issue.expected)}. Change it.`
    case 'too_small':
      if (issue.origin === 'string')
        return issue.minimum === 1
          ? 'This is empty. Fill it in.'
          : `Use at least ${issue.minimum} characters.`
      if (issue.origin === 'array') return `Give at least ${issue.minimum}.`
      return `The least this can be is ${issue.minimum}.`
    case 'too_big':
      if (issue.origin === 'string') return `Use at most ${issue.maximum} characters.`
      if (issue.origin === 'array') return `Give at most ${issue.maximum}.`
      return `The most this can be is ${issue.maximum}.`
    case 'invalid_value':
      return choices(issue.values, issue.input === undefined)
    case 'unrecognized_keys':
      return `Take out ${issue.keys.join(', ')}: no such field.`
    case 'invalid_format':
      return formatRemedy(issue.format)
    case 'invalid_union':
      return 'This fits none of the forms it may have. Check it against the list of choices.'
    default:
      return 'This cannot be taken as it is. Change it.'
  }
}

const choices = (values: readonly unknown[], missing = false): string =>
  `${missing ? 'This is missing. ' : ''}Choose one of: ${values.map(String).join(', ')}.`

function kindName(expected: string): string {
  const names: Record<string, string> = {
    string: 'text',
    number: 'a number',
    int: 'a whole number',
    boolean: 'true or false',
    array: 'a list',
    object: 'a set of fields',
    date: 'a date',
  }
  return names[expected] ?? 'of another kind'
}

function formatRemedy(format: string): string {
  const remedies: Record<string, string> = {
    uuid: 'This must be a UUID. Make a new one.',
    email: 'This is not a mail address. Write it as name@club.example.',
    datetime: 'This is not a time. Write it as 1985-04-12T23:20:50.52Z.',
    date: 'This is not a day. Write it as 2026-03-20.',
    url: 'This is not an address. Start it with https://.',
  }
  return remedies[format] ?? 'This is not written as it should be. Check it.'
}

/** A form fits in kind when its faults lie deeper inside, or are of size: a list with a wrong entry is a list. */
const fitsInKind = (issues: readonly z.core.$ZodIssue[]): boolean =>
  issues.every(
    ({ code, path }) => path.length > 0 || !['invalid_type', 'invalid_value', 'invalid_union'].includes(code),
  )

/** An issue as field faults. Of several forms, the one that was meant speaks, where that can be told. */
function faultsAt(issue: z.core.$ZodIssue, above: readonly string[]): FieldFault[] {
  const path = [...above, ...issue.path.map(String)]
  const fault = (message: string) => [{ field: path.join('.') || 'body', message }]
  if (issue.code !== 'invalid_union') return fault(remedy(issue))
  const [meant, ...others] = issue.errors.filter(fitsInKind)
  if (meant && others.length === 0) return meant.flatMap((inner) => faultsAt(inner, path))
  const values = issue.errors.flat().map((inner) => (inner.code === 'invalid_value' ? inner.values : null))
  return fault(values.length > 0 && !values.includes(null) ? choices(values.flat()) : remedy(issue))
}

/** zod's issues as field faults; nested fields are written traps.0.x. */
export const faultsOf = (error: z.ZodError, prefix = ''): FieldFault[] =>
  error.issues.flatMap((issue) => faultsAt(issue, prefix ? [prefix] : []))

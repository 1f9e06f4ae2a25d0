import { z } from 'zod'
import type { Diagram } from '../court/diagram'
import { Role } from '../court/diagram'
import { mendDiagram } from '../court/edit/mendDiagram'
import { clamped, fieldsOf, listOf, numberOf, oneOf, Reading, type Fields } from '../court/edit/reading'
import { RulePackKey } from '../court/rulePacks'
import { FAMILIES, SKILLS, TRAITS } from '../counterWords'
import { valuesOf } from '../vocabulary'
import type { CounterBody } from './schemas'
import { CounterDraft } from './schemas'

/** What marks a file as one of ours. */
export const FILE_FORMAT = 'overtop-counter'
export const FILE_VERSION = 1

/**
 * A counter as one JSON file, for another team or for a drawer of its own. It holds what the counter is; what a team
 * has done with it (live reps, practice, record) stays at home.
 */
export const CounterFile = z.object({
  format: z.literal(FILE_FORMAT),
  version: z.literal(FILE_VERSION),
  exportedAt: z.iso.datetime(),
  counter: CounterDraft.omit({ liveReps: true, practice: true, newActions: true }),
})
export type CounterFile = z.infer<typeof CounterFile>

/** What a file would bring, before anything is kept. */
export const CounterPreview = z.object({
  counter: CounterDraft,
  /** What was mended in it, a sentence each. */
  mended: z.array(z.string()),
  faults: z.array(
    z.object({
      step: z.number().int(),
      move: z.number().int().nullable(),
      message: z.string(),
      remedy: z.string(),
      packs: z.array(RulePackKey),
    }),
  ),
})
export type CounterPreview = z.infer<typeof CounterPreview>

export const counterFile = (body: CounterDraft, now: Date): CounterFile => {
  const { liveReps: _reps, practice: _practice, newActions: _new, ...counter } = body
  return { format: FILE_FORMAT, version: FILE_VERSION, exportedAt: now.toISOString(), counter }
}

/**
 * A counter out of any JSON: a file of ours, or its inside alone. Null when it cannot be taken; then `refused` says
 * why. What was changed on the way stands in `mended`.
 */
export function readCounter(raw: unknown, reading = new Reading()): CounterDraft | null {
  const outside = fieldsOf(raw)
  if (outside && 'format' in outside) {
    if (outside['format'] !== FILE_FORMAT || outside['version'] !== FILE_VERSION) {
      reading.refuse('version', 'This file is of a kind or version that is not known here.')
      return null
    }
  }
  const fields = fieldsOf(outside && 'counter' in outside ? outside['counter'] : raw)
  if (!fields) {
    reading.refuse('counter', 'There is no counter in it.')
    return null
  }
  const diagram = mendDiagram(fields['diagram'], reading)
  return diagram ? CounterDraft.parse(cardOf(fields, diagram, reading)) : null
}

function cardOf(fields: Fields, diagram: Diagram, reading: Reading): CounterDraft {
  const text = (field: string, label: string, most: number) => textOf(fields[field], label, most, reading)
  const lines = (field: string, label: string, many: number, most: number) =>
    linesOf(fields[field], label, many, most, reading)
  const family = oneOf(valuesOf(FAMILIES), fields['family'])
  if (!family) reading.mend(`Its family is not one of ours; ${FAMILIES[0].label} stands there now.`)
  const practice = fieldsOf(fields['practice']) ?? {}
  return {
    name: text('name', 'The name', 40),
    family: family ?? FAMILIES[0].value,
    alignment: text('alignment', 'How they stand', 60),
    call: text('call', 'The call', 20),
    signal: text('signal', 'The signal', 40),
    traits: knownOf(fields['traits'], valuesOf(TRAITS), 'Something it offers', reading),
    diagram,
    roles: Role.options.map((role) => roleOf(role, listOf(fields['roles']) ?? [], reading)),
    looks: lines('looks', 'looks', 4, 60),
    teachingPoints: lines('teachingPoints', 'teaching points', 6, 90),
    cautions: lines('cautions', 'cautions', 4, 120),
    donts: lines('donts', 'don’ts', 3, 60),
    rulePacks: knownOf(fields['rulePacks'], RulePackKey.options, 'A rule set', reading),
    liveReps: whole(fields['liveReps'], 9999),
    practice: { k: whole(practice['k'], 1e6), n: whole(practice['n'], 1e6) },
    newActions: whole(fields['newActions'], 20),
  }
}

function textOf(value: unknown, label: string, most: number, reading: Reading): string {
  const text = typeof value === 'string' ? value.trim() : ''
  if (text.length > most) reading.mend(`${label} was cut to ${most} characters.`)
  return text.slice(0, most).trim()
}

function linesOf(value: unknown, label: string, many: number, most: number, reading: Reading): string[] {
  const lines = (listOf(value) ?? []).filter((line) => typeof line === 'string' && line.trim() !== '')
  if (lines.length > many) reading.mend(`Of its ${label} the first ${many} are kept.`)
  return lines.slice(0, many).map((line) => textOf(line, `One of its ${label}`, most, reading))
}

function knownOf<T extends string>(
  value: unknown,
  known: readonly T[],
  label: string,
  reading: Reading,
): T[] {
  const list = listOf(value) ?? []
  const found = list.map((one) => oneOf(known, one)).filter((one) => one !== null)
  if (found.length < list.length) reading.mend(`${label} that we do not know was left out.`)
  return [...new Set(found)]
}

type CounterRole = CounterBody['roles'][number]

/** One role's card; the first entry of a role counts, a missing one is empty. */
function roleOf(role: CounterRole['role'], list: readonly unknown[], reading: Reading): CounterRole {
  const fields = list.map(fieldsOf).find((one) => one && oneOf([role], one['role'])) ?? {}
  const needs = (listOf(fields['needs']) ?? []).flatMap((raw) => {
    const need = fieldsOf(raw)
    const skill = oneOf(valuesOf(SKILLS), need?.['skill'])
    const level = whole(need?.['level'], 3)
    return skill ? [{ skill, level }] : []
  })
  return {
    role,
    title: textOf(fields['title'], `The name of role ${role}`, 40, reading),
    needs: needs.slice(0, 3),
    jobs: linesOf(fields['jobs'], `jobs of ${role}`, 4, 80, reading),
    changeUpLine: textOf(fields['changeUpLine'], `The line of ${role}`, 80, reading),
    keyStep: whole(fields['keyStep'], 11),
  }
}

const whole = (value: unknown, most: number): number => clamped(Math.round(numberOf(value) ?? 0), 0, most) + 0

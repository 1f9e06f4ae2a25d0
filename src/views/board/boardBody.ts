import { CounterDraft, type CounterRow } from '@shared/counters/schemas'
import { blankDiagram } from '@shared/court/edit/blank'
import { Role } from '@shared/court/diagram'
import { stepSentence } from '@shared/court/diagramWords'
import type { Diagram } from '@shared/court/diagram'
import type { RulePackKey } from '@shared/court/rulePacks'
import { FAMILIES } from '@shared/counterWords'

/** Everything about a counter that is said and not drawn. */
export type Card = Omit<CounterDraft, 'diagram'>

/** What a row would be written back as: without what practices logged, which is added when it is read. */
export function bodyOfRow(row: CounterRow): CounterDraft {
  const logged = row.logged ?? { n: 0, counted: 0, k: 0 }
  return CounterDraft.parse({
    ...row,
    liveReps: Math.max(0, row.liveReps - logged.n),
    practice: {
      k: Math.max(0, row.practice.k - logged.k),
      n: Math.max(0, row.practice.n - logged.counted),
    },
  })
}

export function newBody(pack: RulePackKey): CounterDraft {
  return {
    name: '',
    family: FAMILIES[0].value,
    alignment: '',
    call: '',
    signal: '',
    traits: [],
    diagram: blankDiagram(),
    roles: Role.options.map((role) => ({
      role,
      title: '',
      needs: [],
      jobs: [],
      changeUpLine: '',
      keyStep: 0,
    })),
    looks: [],
    teachingPoints: [],
    cautions: [],
    donts: [],
    rulePacks: [pack],
    liveReps: 0,
    practice: { k: 0, n: 0 },
    newActions: 0,
  }
}

/** A body as text that is the same whatever way it was put together: card, then drawing. */
export function textOfBody({ diagram, ...card }: CounterDraft): string {
  const fields = Object.entries(card).sort(([one], [other]) => one.localeCompare(other))
  return JSON.stringify([fields, diagram])
}

/** The same play as a new counter: what was done with the old one stays with it. */
export const copyOf = (row: CounterRow): CounterDraft => ({
  ...bodyOfRow(row),
  name: `${row.name.slice(0, 35)} copy`.trim(),
  call: '',
  signal: '',
  liveReps: 0,
  practice: { k: 0, n: 0 },
})

const POINT = 90
const POINTS = 6

/** What the drawing says of itself, step by step: the first draft of what to tell them. */
export const pointsOfDrawing = (diagram: Diagram): string[] =>
  diagram.steps
    .filter(({ moves }) => moves.some((move) => move.kind !== 'theirs'))
    .map((step) => ({ ...step, moves: step.moves.filter((move) => move.kind !== 'theirs') }))
    .map((step) => stepSentence({ ...diagram, steps: [step] }, 0))
    .map((sentence) => (sentence.length > POINT ? `${sentence.slice(0, POINT - 1).trimEnd()}…` : sentence))
    .slice(0, POINTS)

/** What is left to say before it can go in the book, a sentence each; the drawing's own faults stand beside it. */
export function leftToSay(card: Card, faults: number): string[] {
  return [
    ...(card.name.trim() === '' ? ['Give it a name.'] : []),
    ...(card.looks.length === 0 ? ['Say at least one look.'] : []),
    ...(card.rulePacks.length === 0 ? ['Choose at least one rule set.'] : []),
    ...(faults > 0
      ? [faults === 1 ? 'One fault is left in the drawing.' : `${faults} faults are left in the drawing.`]
      : []),
  ]
}

const LABELS: readonly [keyof CounterDraft, string][] = [
  ['diagram', 'the drawing'],
  ['name', 'the name'],
  ['family', 'the family'],
  ['alignment', 'how they stand'],
  ['call', 'the call'],
  ['signal', 'the signal'],
  ['traits', 'what it offers'],
  ['roles', 'the roles'],
  ['looks', 'the looks'],
  ['teachingPoints', 'what to tell them'],
  ['cautions', 'what to take care of'],
  ['donts', 'the don’ts'],
  ['rulePacks', 'the rule sets'],
  ['liveReps', 'live reps'],
  ['newActions', 'new actions'],
]

/** In what two versions differ, by name. */
export const differences = (one: CounterDraft, other: CounterDraft): string[] =>
  LABELS.filter(([field]) => JSON.stringify(one[field]) !== JSON.stringify(other[field])).map(
    ([, label]) => label,
  )

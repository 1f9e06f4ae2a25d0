import type { Diagram, Move, Place } from '../court/diagram'
import { diagramFaults, type DiagramFault } from '../court/diagramFaults'
import { moveWords } from '../court/diagramWords'
import { rulePack, type RulePackKey } from '../court/rulePacks'
import { countFaults } from '../court/walk/counts'
import { DEFAULT_WALK, type WalkSettings } from '../court/walk/settings'
import { timeline } from '../court/walk/timeline'

/** Something that keeps a counter out of the book. */
export interface CounterFault {
  /** Index of the step. */
  step: number
  /** Index of the move in its step; null when the fault is where they stand. */
  move: number | null
  message: string
  /** What to do about it, where the message does not say. */
  remedy: string
  /** The rule sets on which it is one; none for a fault of the drawing itself. */
  packs: RulePackKey[]
  place?: Place
}

/**
 * What is wrong with a drawing on every rule set it names, in the order it is met: faults of the drawing once, faults
 * of the counts by the rule sets they are found on. A drawing that names none is judged on FIBA's court.
 */
export function counterFaults(
  diagram: Diagram,
  packs: readonly RulePackKey[],
  settings: WalkSettings = DEFAULT_WALK,
): CounterFault[] {
  const found = new Map<string, CounterFault>()
  const judged: readonly RulePackKey[] = packs.length > 0 ? [...new Set(packs)] : ['fiba']
  for (const key of judged) {
    const pack = rulePack(key)
    const add = (fault: DiagramFault, remedy: string) => {
      const name = `${fault.step} ${fault.move} ${fault.message}`
      const known = found.get(name) ?? { ...fault, remedy: saysWhatToDo(fault) ? '' : remedy, packs: [] }
      found.set(name, { ...known, packs: [...known.packs, key] })
    }
    for (const fault of diagramFaults(diagram, pack)) add(fault, remedyOf(fault, diagram))
    for (const fault of countFaults(timeline(diagram, pack, settings))) add(fault, SOONER)
  }
  return [...found.values()]
    .map((fault) => ({ ...fault, packs: fault.packs.length === judged.length ? [] : fault.packs }))
    .sort((a, b) => a.step - b.step || (a.move ?? -1) - (b.move ?? -1))
}

/** Where a fault is, what it is and what to do: "Step 2, 5 passes to 1: ...". */
export function faultSentence(fault: CounterFault, diagram: Diagram): string {
  const move = moveAt(diagram, fault)
  const where = move ? `Step ${fault.step + 1}, ${moveWords(move)}` : `Step ${fault.step + 1}`
  const on = fault.packs.length > 0 ? ` (${fault.packs.map((key) => rulePack(key).name).join(', ')})` : ''
  return `${where}${on}: ${fault.message}${fault.remedy ? ` ${fault.remedy}` : ''}`
}

const moveAt = (diagram: Diagram, { step, move }: DiagramFault): Move | undefined =>
  move === null ? undefined : diagram.steps[step]?.moves[move]

const REMEDIES: Record<Move['kind'], string> = {
  pass: 'Change who passes, or get the ball there first.',
  dribble: 'Change who dribbles, or pass the ball there first.',
  cut: 'Change where it ends, or take the move out.',
  screen: 'Change whom it is for, or let that player move next.',
  theirs: 'Put the defender on the court, or take the move out.',
}

const SOONER = 'Move the ball on sooner, or leave out what comes before.'

/** A message of two sentences says itself what to do. */
const saysWhatToDo = ({ message }: DiagramFault): boolean => /\. \S/.test(message)

function remedyOf(fault: DiagramFault, diagram: Diagram): string {
  const move = moveAt(diagram, fault)
  if (move) return REMEDIES[move.kind]
  if (fault.place) return 'Move one of them.'
  const { ours, ball } = diagram.start
  return ours.some(({ role }) => role === ball) ? 'Draw the pass that throws it in.' : 'Choose who throws in.'
}

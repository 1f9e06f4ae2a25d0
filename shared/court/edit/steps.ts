import type { Diagram, Step } from '../diagram'
import { STEPS, TITLE } from './bounds'
import { NEW_STEP } from './blank'
import { withStep } from './moves'

const withSteps = (diagram: Diagram, steps: Step[]): Diagram =>
  steps.length < 1 || steps.length > STEPS ? diagram : { ...diagram, steps }

/** A new step after another; it starts where that one ended, for where people stand follows from the moves. */
export function addStep(diagram: Diagram, after: number): Diagram {
  const at = Math.min(Math.max(0, after + 1), diagram.steps.length)
  return withSteps(diagram, diagram.steps.toSpliced(at, 0, { title: NEW_STEP, moves: [] }))
}

export function duplicateStep(diagram: Diagram, index: number): Diagram {
  const step = diagram.steps[index]
  return step ? withSteps(diagram, diagram.steps.toSpliced(index + 1, 0, { ...step })) : diagram
}

/** The last step stays: a drawing has one at least. */
export function removeStep(diagram: Diagram, index: number): Diagram {
  return diagram.steps[index] ? withSteps(diagram, diagram.steps.toSpliced(index, 1)) : diagram
}

/** One place earlier (-1) or later (1). */
export function orderStep(diagram: Diagram, index: number, by: -1 | 1): Diagram {
  const [one, other] = [diagram.steps[index], diagram.steps[index + by]]
  if (!one || !other) return diagram
  return { ...diagram, steps: diagram.steps.with(index, other).with(index + by, one) }
}

/** An empty title is not taken. */
export function titleStep(diagram: Diagram, index: number, title: string): Diagram {
  const words = title.replace(/\s+/g, ' ').trim().slice(0, TITLE).trim()
  return withStep(diagram, index, (step) =>
    words === '' || words === step.title ? null : { ...step, title: words },
  )
}

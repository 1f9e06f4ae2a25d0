import type { Diagram } from '../diagram'
import { applyEdit, type Edit } from './edits'

/** How many gestures can be taken back. */
export const DEPTH = 200

/** A drawing with what can be undone (newest last) and redone (next first). */
export interface Drawn {
  past: readonly Diagram[]
  present: Diagram
  future: readonly Diagram[]
}

export const drawnFrom = (diagram: Diagram): Drawn => ({ past: [], present: diagram, future: [] })

/** One gesture: one entry, whatever it is made of. What changes nothing is no entry. */
export function edited(drawn: Drawn, ...edits: readonly Edit[]): Drawn {
  const next = edits.reduce(applyEdit, drawn.present)
  if (next === drawn.present || JSON.stringify(next) === JSON.stringify(drawn.present)) return drawn
  return { past: [...drawn.past, drawn.present].slice(-DEPTH), present: next, future: [] }
}

export function undone(drawn: Drawn): Drawn {
  const present = drawn.past.at(-1)
  if (!present) return drawn
  return { past: drawn.past.slice(0, -1), present, future: [drawn.present, ...drawn.future] }
}

export function redone(drawn: Drawn): Drawn {
  const [present, ...future] = drawn.future
  if (!present) return drawn
  return { past: [...drawn.past, drawn.present].slice(-DEPTH), present, future }
}

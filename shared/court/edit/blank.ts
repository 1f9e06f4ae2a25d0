import type { Diagram } from '../diagram'
import { shapeSpots } from '../shapeSpots'
import { DefenderId } from '../diagram'
import { heldPlace } from './bounds'

/** The title of a step until its first move gives it one. */
export const NEW_STEP = 'New step'

/** Where a new drawing starts: four across the foul line, the fifth with the ball behind the line, a 1-2-1-1. */
export function blankDiagram(): Diagram {
  const ours = [
    { role: '1', at: { x: 0.207, y: 0.36 } },
    { role: '2', at: { x: 0.207, y: 0.64 } },
    { role: '3', at: { x: 0.207, y: 0.88 } },
    { role: '4', at: { x: 0.207, y: 0.12 } },
    { role: '5', at: { x: -0.03, y: 0.64 } },
  ] as const
  const spots = shapeSpots('1-2-1-1')
  return {
    version: 1,
    frame: 1,
    start: {
      ours: ours.map(({ role, at }) => ({ role, at: { ...at } })),
      theirs: DefenderId.options.map((id, i) => ({ id, at: heldPlace(spots[i] ?? { x: 0.3, y: 0.1 * i }) })),
      ball: '5',
    },
    steps: [{ title: NEW_STEP, moves: [] }],
  }
}

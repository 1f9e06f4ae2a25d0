import { habitOf } from '@shared/tendencies/habits'
import type { TendencyRead } from '@shared/tendencies/schemas'
import type { ReadMarks } from './pressFromRead'
import { standingShape } from './pressFromRead'

/**
 * The lines under the court: what each n on it counts (they differ), how the five stand, and which trap spots
 * were counted but not drawn.
 */
export function courtNotes(read: TendencyRead, marks: ReadMarks): string[] {
  const notes: string[] = []
  const first = read.spots.find(({ order, k }) => order === 'first' && k > 0)
  const later = marks.zones.find(({ note }) => note?.startsWith('second'))
  const counts = [
    first && `first traps, ${first.n} ${nCounts('trap')}`,
    later && `second traps, ${later.n} where the ${nCounts('trap-again')}`,
    marks.pickup && `pick-up, ${marks.pickup.n} ${nCounts('pickup:full')}`,
    marks.denied[0] && `denied, ${marks.denied[0].n} ${nCounts(`deny:${marks.denied[0].lane}`)}`,
    marks.room && `left open, ${marks.room.n} ${nCounts(`leave-open:${marks.room.lane}`)}`,
  ].filter((part) => part !== null && part !== undefined)
  if (counts.length > 0) notes.push(`What each count is of: ${counts.join('; ')}.`)
  const shape = standingShape(read.tendencies)
  if (shape) notes.push(`X: where they start in a ${shape.label}, ${shape.k} of ${shape.n} pressed.`)
  const ball = read.ball.filter(({ n }) => n > 1)
  const tracked = Math.max(0, ...ball.map(({ n }) => n))
  if (tracked > 0)
    notes.push(
      `Ticks on the edge: where the ball is after each second, the median of up to ${tracked} tracked.`,
    )
  if (marks.rest.length > 0) notes.push(`Not drawn: ${marks.rest.join(', ')}.`)
  return notes
}

const nCounts = (key: string): string => habitOf(key)?.nCounts ?? ''

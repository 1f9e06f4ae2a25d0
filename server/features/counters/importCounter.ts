import { readCounter, type CounterPreview } from '@shared/counters/counterFile'
import { counterFaults } from '@shared/counters/faults'
import { Reading } from '@shared/court/edit/reading'
import { BadInput } from '../../http/problem'

/**
 * What any JSON would bring as a counter: read, mended where that is safe, judged. Nothing is kept.
 * @throws BadInput where it cannot be taken, each place with the reason
 */
export function previewCounter(raw: unknown): CounterPreview {
  const reading = new Reading()
  const counter = readCounter(raw, reading)
  if (!counter)
    throw new BadInput(reading.refused, 'This file cannot be taken as a counter. Each line says why.')
  const faults = counterFaults(counter.diagram, counter.rulePacks).map(
    ({ step, move, message, remedy, packs }) => ({ step, move, message, remedy, packs }),
  )
  return { counter, mended: reading.mended, faults }
}

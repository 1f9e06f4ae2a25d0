import { countsAt } from './counts'
import type { Timeline } from './timeline'

/** Seconds with one place: "3.4". */
export const tenths = (seconds: number): string => (Math.round(seconds * 10) / 10).toFixed(1)

/** What both counts come to over the whole trip: "Thrown in at 3.0 of 5 s.", "Over half at 3.4 of 8 s." */
export function countWords(timeline: Timeline): string[] {
  const { throwIn, backcourt } = countsAt(timeline)
  const words: string[] = []
  if (throwIn.taken !== null)
    words.push(
      throwIn.done
        ? `Thrown in at ${tenths(throwIn.taken)} of ${throwIn.limit} s.`
        : 'It is never thrown in as drawn.',
    )
  if (backcourt.taken !== null)
    words.push(
      backcourt.done
        ? `Over half at ${tenths(backcourt.taken)} of ${backcourt.limit} s.`
        : `Not over half as drawn: ${tenths(Math.max(0, backcourt.left))} of ${backcourt.limit} s are left at the end.`,
    )
  else if (timeline.touch !== null) words.push('Caught past half: the backcourt count never starts.')
  return words
}

import { clockAt, type ClockReading } from '@shared/court/walk/counts'
import { tenths } from '@shared/court/walk/countWords'
import type { Timeline } from '@shared/court/walk/timeline'

/** "Backcourt, 4.6 s left of 8": what the running clock shows. */
export function clockWords(timeline: Timeline, seconds: number): string {
  const { pack, touch, overHalf } = timeline
  const clock = clockAt(timeline, seconds)
  if (clock.runs === 'throw-in') return `Throw-in, ${leftOf(clock, pack.throwInSeconds)}`
  if (clock.runs === 'backcourt') return `Backcourt, ${leftOf(clock, pack.backcourtSeconds)}`
  if (overHalf !== null && seconds >= overHalf.seconds) return 'Over half'
  return touch !== null && seconds >= touch.seconds ? 'In, the count is not on yet' : 'On its way in'
}

function leftOf({ left }: ClockReading, limit: number): string {
  const seconds = left ?? limit
  return seconds < 0 ? `${tenths(-seconds)} s over the ${limit}` : `${tenths(seconds)} s left of ${limit}`
}

/** A moment for a screen reader: "1.4 s after the first touch, step 3, Backcourt, 6.6 s left of 8". */
export function momentWords(timeline: Timeline, seconds: number, step: number): string {
  const { t } = clockAt(timeline, seconds)
  const when =
    timeline.touch === null || t < 0
      ? `${tenths(seconds)} s of the throw-in`
      : `${tenths(t)} s after the first touch`
  return `${when}, step ${step + 1}, ${clockWords(timeline, seconds)}`
}

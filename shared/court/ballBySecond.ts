/** Where the ball has got to a second: the middle of the possessions that say, and how many do. */
export interface BallSecond {
  /** Whole seconds from the first touch. */
  second: number
  /** Median place along the court, as a fraction (RECORD.md section 2). */
  x: number
  n: number
}

/** What is read of a possession: its track and when it crossed half, either of them null where not logged. */
export interface Tracked {
  track: readonly { t: number; x: number }[] | null
  crossedAt: number | null
}

/**
 * Where the ball is after 1, 2, 3 ... seconds, over many possessions. Between two marks of a track the ball
 * moves evenly; the moment of crossing is one more mark, at half. A possession speaks only for the seconds
 * between its first mark and its last: nothing is guessed past them. A second that nobody speaks for is left out.
 * @param seconds the last second asked for
 */
export function ballBySecond(rows: readonly Tracked[], seconds = 10): BallSecond[] {
  const ways = rows.map(marksOf).filter((marks) => marks.length > 0)
  return Array.from({ length: Math.max(0, Math.floor(seconds)) }, (_, i) => i + 1).flatMap((second) => {
    const xs = ways.flatMap((marks) => placeAt(marks, second) ?? []).sort((a, b) => a - b)
    return xs.length === 0 ? [] : [{ second, x: median(xs), n: xs.length }]
  })
}

/** Slower than this, as a share of the court a second (about 1 m), the ball is held up. */
const HELD_UNDER = 0.04
/** Two seconds in a row are a stretch, one is a catch. */
const HELD_SECONDS = 2

/** The longest stretch of seconds in which the ball hardly comes on, the first of equals; null where there is none. */
export function heldStretch(
  ticks: readonly { second: number; x: number }[],
): { from: number; to: number } | null {
  let best: { from: number; to: number } | null = null
  let from = 0
  ticks.forEach(({ second, x }, i) => {
    const last = ticks[i - 1]
    if (!last || second !== last.second + 1 || Math.abs(x - last.x) >= HELD_UNDER) from = second
    const long = second - from
    if (long >= HELD_SECONDS && (!best || long > best.to - best.from)) best = { from, to: second }
  })
  return best
}

interface Mark {
  t: number
  x: number
}

/** In order of time. Where the track itself has a mark at the crossing, that one counts. */
function marksOf({ track, crossedAt }: Tracked): Mark[] {
  const marks = (track ?? []).map(({ t, x }) => ({ t, x }))
  if (crossedAt !== null && !marks.some(({ t }) => t === crossedAt)) marks.push({ t: crossedAt, x: 0.5 })
  return marks.sort((a, b) => a.t - b.t)
}

function placeAt(marks: readonly Mark[], t: number): number | null {
  const after = marks.findIndex((mark) => mark.t >= t)
  const [a, b] = [marks[after - 1], marks[after]]
  if (!b) return null
  if (b.t === t) return b.x
  return a ? a.x + ((b.x - a.x) * (t - a.t)) / (b.t - a.t) : null
}

/** The middle of sorted values; of an even number the mean of the two in the middle. */
function median(sorted: readonly number[]): number {
  const middle = sorted.length / 2
  const upper = sorted[Math.floor(middle)] ?? 0
  return Number.isInteger(middle) ? ((sorted[middle - 1] ?? upper) + upper) / 2 : upper
}

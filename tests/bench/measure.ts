/** Times of one way, in milliseconds, and what they come to. */
export interface Timing {
  median: number
  p95: number
}

const ordered = (times: number[]) => [...times].sort((a, b) => a - b)
const at = (times: number[], share: number) =>
  times[Math.min(times.length - 1, Math.floor(times.length * share))] ?? 0

export const timingOf = (times: number[]): Timing => {
  const sorted = ordered(times)
  return { median: at(sorted, 0.5), p95: at(sorted, 0.95) }
}

/** Wall clock, ms: where waiting for the disk is part of the work. */
export const wall = (): number => performance.now()
/** Processor time of this process, ms: where the work is computing, and others may share the machine. */
export const processor = (): number => {
  const { user, system } = process.cpuUsage()
  return (user + system) / 1000
}

/**
 * Runs ours and the floor by turns, so that whatever else the machine does falls on both. Rounds before
 * `warmUp` are not counted.
 */
export async function byTurns(
  rounds: number,
  clock: () => number,
  ours: (round: number) => Promise<unknown>,
  floor: (round: number) => Promise<unknown>,
  warmUp = Math.ceil(rounds / 5),
): Promise<{ ours: Timing; floor: Timing }> {
  const times = { ours: [] as number[], floor: [] as number[] }
  for (let round = 0; round < rounds + warmUp; round++)
    for (const [name, run] of [
      ['ours', ours],
      ['floor', floor],
    ] as const) {
      const start = clock()
      await run(round)
      if (round >= warmUp) times[name].push(clock() - start)
    }
  return { ours: timingOf(times.ours), floor: timingOf(times.floor) }
}

/** One line of the table: what, ours, the floor, and how many times the floor. */
export function line(what: string, ours: number, floor: number, unit: string): string {
  const number = (value: number) => (value >= 100 ? value.toFixed(0) : value.toFixed(2)).padStart(9)
  return `${what.padEnd(46)} ${number(ours)} ${number(floor)} ${unit.padEnd(4)} ${(ours / floor).toFixed(2).padStart(6)} x`
}

import type { RulePack } from './rulePacks'

/**
 * Minutes of play since tip-off. `clock` is tenths of a second left in the period; null where not logged:
 * then the period's middle stands in. Periods past the last are overtimes.
 */
export function gameMinute(pack: RulePack, period: number, clock: number | null): number {
  const { count, minutes, overtimeMinutes } = pack.periods
  const full = Math.min(period - 1, count) * minutes + Math.max(0, period - 1 - count) * overtimeMinutes
  const long = period <= count ? minutes : overtimeMinutes
  const left = clock === null ? long / 2 : Math.min(long, Math.max(0, clock / 600))
  return full + long - left
}

/** "Q3", "H2" or "OT1": a period as it stands in a list. */
export function periodLabel(pack: RulePack, period: number): string {
  const { count } = pack.periods
  if (period > count) return `OT${period - count}`
  return `${count === 2 ? 'H' : 'Q'}${period}`
}

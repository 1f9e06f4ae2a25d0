import type { Choice, Choices } from '@shared/choices/schemas'
import { shapeLabel } from '@shared/tendencies/habits'
import type { Interval } from '@shared/tendencies/schemas'

const tenths = (share: number): number => Math.round(share * 10)

/** "8 in 10", for an expected success between 0 and 1. */
export const tenWords = (mean: number): string => `${tenths(mean)} in 10`

/** "Likely 7 to 9 in 10"; both ends on the same tenth read as one. */
export function likelyWords({ low, high }: Interval): string {
  const [from, to] = [tenths(low), tenths(high)]
  return from === to ? `Likely about ${to} in 10` : `Likely ${from} to ${to} in 10`
}

/** Trips of ours under which the record is a sighting (RECORD.md section 4), and the widest range that is not thin. */
const SIGHTING = 5
const WIDE = 0.6

/** An estimate that rests on a sighting of our own or whose range is over 60 points looks thin. */
export function isThinEstimate({ expected, record }: Pick<Choice, 'expected' | 'record'>): boolean {
  if (expected === null) return true
  return record.n < SIGHTING || expected.interval.high - expected.interval.low > WIDE
}

/**
 * What moved an estimate off our record, in trips out of ten, each with its sign. The estimate is
 * `share` parts record and the rest prior (RECORD.md section 5), and the prior's logit is the base's plus
 * the reasons' weights plus the squad term. So leaving the squad term, then the reasons, out of the prior
 * shows what each of them does to the estimate.
 */
export function movedBy(
  { prior, recordShare, squadTerm }: Pick<Choice, 'prior' | 'recordShare' | 'squadTerm'>,
  base: number,
): { reasons: number; squad: number } {
  if (prior === null) return { reasons: 0, squad: 0 }
  // Adding to a logit is multiplying the odds.
  const odds = (base / (1 - base)) * Math.exp(squadTerm)
  const withSquad = odds / (1 + odds)
  const weight = (1 - recordShare) * 10
  return { reasons: weight * (prior - withSquad), squad: weight * (withSquad - base) }
}

const SMALL: readonly string[] = [
  '',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
]

/** An amount of trips to the nearest half: "half a trip", "one trip", "two and a half trips"; empty under a quarter. */
export function tripsWords(amount: number): string {
  const halves = Math.round(Math.abs(amount) * 2)
  const whole = SMALL[Math.floor(halves / 2)] ?? String(Math.floor(halves / 2))
  if (halves === 0) return ''
  if (halves === 1) return 'half a trip'
  if (halves === 2) return 'one trip'
  return halves % 2 === 0 ? `${whole} trips` : `${whole} and a half trips`
}

function moveWords(who: string, amount: number): string {
  const trips = tripsWords(amount)
  if (trips === '') return `${who} change next to nothing`
  return `${who} ${amount > 0 ? 'add' : 'take'} ${trips} in ten`
}

/**
 * How much is record and how much reasons: "Record 13 of 18 against a 1-2-1-1, the reasons add half a trip
 * in ten." The five are named only when roles not well filled change something.
 */
export function recordSentence(choice: Choice, choices: Pick<Choices, 'base' | 'mostly'>): string {
  const { record } = choice
  const against = choices.mostly === null ? '' : ` against ${article(shapeLabel(choices.mostly.shape))}`
  const counted = record.n === 0 ? `Not tried${against}` : `Record ${record.k} of ${record.n}${against}`
  if (choice.expected === null) return `${counted}.`
  const moved = movedBy(choice, choices.base.mean)
  const squad = tripsWords(moved.squad) === '' ? '' : `, ${moveWords('the five', moved.squad)}`
  return `${counted}, ${moveWords('the reasons', moved.reasons)}${squad}.`
}

/** "Six parts of ten are record, four are reasons." */
export function partsWords(recordShare: number): string {
  const record = tenths(recordShare)
  if (record === 0) return 'All of this is reasons.'
  if (record === 10) return 'All of this is record.'
  const first = SMALL[record] ?? ''
  return `${first.charAt(0).toUpperCase()}${first.slice(1)} ${record === 1 ? 'part of ten is' : 'parts of ten are'} record, ${SMALL[10 - record]} ${record === 9 ? 'is' : 'are'} reasons.`
}

/** "31 live reps", "1 live rep". */
export const repsWords = (reps: number): string => `${reps} live ${reps === 1 ? 'rep' : 'reps'}`

/** "a 2-2-1", "a person press", "another zone": a shape as it stands after "against". */
export function article(label: string): string {
  if (label === 'other zone') return 'another zone'
  return label === 'person' ? 'a person press' : `a ${label}`
}

import type { Claim, Grade } from '../vocabulary'
import { wilson } from './wilson'

/** Least rows and least games of a grade (RECORD.md section 4). */
const LEAST = { hint: 5, lean: 10, firm: 20, games: 2 } as const

/** A 95 % range wider than this is thin, as a share. */
const WIDE = 0.6

const ORDER: readonly Grade[] = ['none', 'sighting', 'hint', 'lean', 'firm']

/** How much has been counted: n rows over that many games. One game never passes a hint. */
export function grade(n: number, games: number): Grade {
  if (n <= 0) return 'none'
  if (n < LEAST.hint) return 'sighting'
  if (n < LEAST.lean || games < LEAST.games) return 'hint'
  return n < LEAST.firm ? 'lean' : 'firm'
}

/** Whether a grade is as good as the one needed. */
export function reaches(have: Grade, needed: Grade): boolean {
  return ORDER.indexOf(have) >= ORDER.indexOf(needed)
}

/**
 * Which way k of n points against a threshold (a share): *usually* when the 80 % Wilson lower bound is
 * above it, *rarely* when the upper bound is under 1 minus it, else *unclear*. Under a threshold below one
 * half both can hold; then it is *usually*.
 */
export function claim(k: number, n: number, threshold = 0.5): Claim {
  const range = wilson(k, n, 0.8)
  if (range === null) return 'unclear'
  if (range.low > threshold) return 'usually'
  return range.high < 1 - threshold ? 'rarely' : 'unclear'
}

/** Whether k of n must look thin: a sighting, one game, or a 95 % range over 60 points. */
export function thin(k: number, n: number, games: number): boolean {
  const range = wilson(k, n)
  if (range === null || n < LEAST.hint || games < LEAST.games) return true
  return range.high - range.low > WIDE
}

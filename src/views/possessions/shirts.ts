import { LIMITS } from '@shared/limits'
import { listWords } from './words'

/** Shirt numbers as they are said and as they are typed. */

/** "4", "4 and 11", "4, 7 and 11"; "nobody" for an empty list. */
export const shirtWords = (shirts: readonly number[]): string =>
  shirts.length === 0 ? 'nobody' : listWords(shirts.map(String))

/**
 * Reads "4 11", "4, 7, 11" or "4/11" as shirt numbers, each once and in order; null when one is no shirt number or
 * there are more than `most`.
 */
export function readShirts(text: string, most: number): number[] | null {
  const said = text.trim()
  if (!/^\d+(?:[^\d]+\d+)*$/.test(said)) return null
  const shirts = [...new Set(said.split(/[^\d]+/).map(Number))].sort((a, b) => a - b)
  return shirts.length <= most && shirts.every((shirt) => shirt <= LIMITS.jersey) ? shirts : null
}

/** Reads a whole number of at most `most`; null when it is none. */
export function readCount(text: string, most: number): number | null {
  const parts = /^\s*(\d{1,2})\s*$/.exec(text)
  return parts !== null && Number(parts[1]) <= most ? Number(parts[1]) : null
}

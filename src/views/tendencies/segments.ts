/** A stretch of a sentence in one ink: theirs is what the opponent does, ours is what we can use. */
export interface Segment {
  text: string
  ink: 'plain' | 'their' | 'our'
}

export const plain = (text: string): Segment => ({ text, ink: 'plain' })
export const their = (text: string): Segment => ({ text, ink: 'their' })
export const our = (text: string): Segment => ({ text, ink: 'our' })

/** The sentence without its inks. */
export const textOf = (segments: readonly Segment[]): string => segments.map(({ text }) => text).join('')

/** "a", "a and b", "a, b and c" */
export function listed(words: readonly string[]): string {
  const last = words.at(-1)
  if (last === undefined) return ''
  return words.length === 1 ? last : `${words.slice(0, -1).join(', ')} and ${last}`
}

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
export const small = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)

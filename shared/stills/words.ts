import { z } from 'zod'
import { LIMITS } from '../limits'

/** The words of a text, however they are spaced. */
export const wordsIn = (text: string): string[] => text.split(/\s+/).filter((word) => word !== '')

/** The text without its ninth word and those after it; as typed while it is within. */
export function upToEight(text: string): string {
  return wordsIn(text).length <= LIMITS.stillWords
    ? text
    : wordsIn(text).slice(0, LIMITS.stillWords).join(' ')
}

/** The words on a still: eight at most, so that they can be read at a glance. */
export const Caption = z
  .string()
  .trim()
  .max(80)
  .superRefine((text, ctx) => {
    const over = wordsIn(text).length - LIMITS.stillWords
    if (over > 0)
      ctx.addIssue({
        code: 'custom',
        message: `At most ${LIMITS.stillWords} words stand on a still. Take ${over === 1 ? 'one' : over} out.`,
      })
  })

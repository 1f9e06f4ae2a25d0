import type { LastCall } from '@shared/week/schemas'

/** What happened against what was to be expected, in words. */
export function verdict({ k, expected }: Pick<LastCall, 'k' | 'expected'>): string {
  if (k < expected.low) return 'fewer than expected'
  return k > expected.high ? 'more than expected' : 'as expected'
}

/** "we expected 6 to 9", "we expected 7" */
export const expectedWords = ({ low, high }: LastCall['expected']): string =>
  low === high ? `we expected ${low}` : `we expected ${low} to ${high}`

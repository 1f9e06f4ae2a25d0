/** What a count and its likely range say aloud; the range in hundredths, never with a sign for it. */
export function countWords(
  k: number,
  n: number,
  low: number | null,
  high: number | null,
  thin = false,
): string {
  if (n === 0) return 'nothing counted'
  const range =
    low === null || high === null
      ? ''
      : `, likely between ${Math.round(low * 100)} and ${Math.round(high * 100)} in 100`
  return `${k} of ${n}${range}${thin ? '. Thin' : ''}`
}

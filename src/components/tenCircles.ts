export type Circle = 'full' | 'half' | 'open' | 'faint'

/**
 * Ten circles for an estimate and its range, shares from 0 to 1: full up to the low end, half up to the estimate,
 * open up to the high end, faint beyond. Each end is rounded to the nearest circle.
 */
export function likelyOfTen(mean: number, low: number, high: number): Circle[] {
  const [sure, likely, possible] = [low, mean, high].map((share) => Math.round(share * 10)) as [
    number,
    number,
    number,
  ]
  return Array.from({ length: 10 }, (_, index) =>
    index < sure ? 'full' : index < likely ? 'half' : index < possible ? 'open' : 'faint',
  )
}

/**
 * Pens and type are set in px at a scale (DESIGN.md section 3); a scene is in metres. A pen turns one into
 * the other. A px is 1/96 inch: on paper, px per metre is pt per metre times 4/3.
 */
export interface Pen {
  readonly pxPerMetre: number
  /** Weight factor of court lines and movement. */
  readonly k: number
  /** A length in px as metres: token radii, gaps, type. */
  px(length: number): number
  /** A line's weight in px as metres, lightened on small drawings. */
  line(weight: number): number
}

/** Weight factor at the scales the design names: 1 from 26 px per metre, .92 at 14, .7 at 6. */
const WEIGHTS = [
  [6, 0.7],
  [14, 0.92],
  [26, 1],
] as const

/** The weight factor k of a scale; linear between the scales that are named. */
export function weightFactor(pxPerMetre: number): number {
  for (let i = 0; i < WEIGHTS.length - 1; i += 1) {
    const [[fromScale, from] = [0, 1], [toScale, to] = [1, 1]] = [WEIGHTS[i], WEIGHTS[i + 1]]
    if (pxPerMetre <= fromScale) return from
    if (pxPerMetre < toScale) return from + ((to - from) * (pxPerMetre - fromScale)) / (toScale - fromScale)
  }
  return 1
}

/** The pen of a scale. Scales that are not a positive number draw as 26 px per metre. */
export function penOf(pxPerMetre: number): Pen {
  const scale = Number.isFinite(pxPerMetre) && pxPerMetre > 0 ? pxPerMetre : 26
  const k = weightFactor(scale)
  return {
    pxPerMetre: scale,
    k,
    px: (length) => length / scale,
    line: (weight) => (weight * k) / scale,
  }
}

import type { Shape, ShapeVariant } from '../vocabulary'

/**
 * Where five stand when they show a shape (DOMAIN.md section 1, start spots; common practice, no source),
 * with the ball on the right. Person shapes have no spots of their own.
 */
const SPOTS: Partial<Record<Shape | ShapeVariant, readonly (readonly [number, number])[]>> = {
  '1-2-1-1': [
    [0.02, 0.6],
    [0.2, 0.3],
    [0.2, 0.7],
    [0.42, 0.5],
    [0.62, 0.5],
  ],
  '2-2-1': [
    [0.2, 0.35],
    [0.2, 0.65],
    [0.48, 0.22],
    [0.48, 0.78],
    [0.72, 0.5],
  ],
  '1-3-1': [
    [0.28, 0.5],
    [0.46, 0.15],
    [0.46, 0.5],
    [0.46, 0.85],
    [0.78, 0.5],
  ],
  '2-1-2': [
    [0.36, 0.33],
    [0.36, 0.67],
    [0.5, 0.5],
    [0.72, 0.3],
    [0.72, 0.7],
  ],
  '1-2-2': [
    [0.33, 0.5],
    [0.48, 0.25],
    [0.48, 0.75],
    [0.72, 0.3],
    [0.72, 0.7],
  ],
  '1-1-3': [
    [0.28, 0.5],
    [0.42, 0.5],
    [0.62, 0.2],
    [0.62, 0.5],
    [0.62, 0.8],
  ],
}

/** The start spots of a shape, in fractions of the court; empty where the shape has none. */
export function shapeSpots(
  shape: Shape | ShapeVariant,
  ballSide: 'left' | 'right' = 'right',
): { x: number; y: number }[] {
  return (SPOTS[shape] ?? []).map(([x, y]) => ({ x, y: ballSide === 'right' ? y : 1 - y }))
}

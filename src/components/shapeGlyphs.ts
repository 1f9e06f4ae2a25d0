import type { Shape } from '@shared/vocabulary'

type Five = readonly (readonly [x: number, y: number])[]

/** Where the five stand in a 58 x 34 drawing, from DOMAIN.md section 1's start spots; the ball comes from the left. */
export const GLYPHS: Record<Shape, Five> = {
  person: [
    [7, 21],
    [16, 7],
    [30, 8],
    [21, 28],
    [40, 24],
  ],
  '1-2-1-1': [
    [6, 17],
    [20, 6],
    [20, 28],
    [35, 17],
    [51, 17],
  ],
  '2-2-1': [
    [8, 9],
    [8, 25],
    [27, 6],
    [27, 28],
    [48, 17],
  ],
  '1-3-1': [
    [7, 17],
    [26, 6],
    [26, 17],
    [26, 28],
    [46, 17],
  ],
  'other-zone': [
    [9, 8],
    [9, 26],
    [26, 17],
    [43, 8],
    [43, 26],
  ],
  // They show it and go: the five have gone up court along the arrow.
  fake: [
    [7, 8],
    [7, 26],
    [52, 8],
    [52, 17],
    [52, 26],
  ],
  'dropped-back': [
    [24, 7],
    [24, 27],
    [37, 17],
    [50, 7],
    [50, 27],
  ],
}

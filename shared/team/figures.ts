import { z } from 'zod'

/** A figure of the engine that a head coach may change: its default is RECORD.md's, sections 4 and 5. */
export interface FigureTerm {
  /** Sentence case. */
  label: string
  /** What it does to the order, in one plain sentence. */
  means: string
  unit: string
  value: number
  least: number
  most: number
  step: number
}

const figure = (
  label: string,
  means: string,
  unit: string,
  value: number,
  least: number,
  most: number,
  step: number,
): FigureTerm => ({ label, means, unit, value, least, most, step })

export const FIGURES = {
  halfLifeGames: figure(
    'Games until a row weighs half',
    'Recent games weigh more; a higher figure lets old ones count longer.',
    'games',
    4,
    1,
    20,
    1,
  ),
  icc: figure(
    'How alike rows of one game are',
    'Rows of one evening repeat each other; 0 takes each for itself.',
    '',
    0.05,
    0,
    0.5,
    0.01,
  ),
  light: figure(
    'Weight of “a little”',
    'How far a rule of this strength moves a counter.',
    '',
    0.2,
    0,
    2,
    0.05,
  ),
  medium: figure(
    'Weight of “clearly”',
    'How far a rule of this strength moves a counter.',
    '',
    0.4,
    0,
    2,
    0.05,
  ),
  strong: figure(
    'Weight of “strongly”',
    'How far a rule of this strength moves a counter.',
    '',
    0.7,
    0,
    2,
    0.05,
  ),
  baseRate: figure(
    'Our success before anything is counted',
    'Every estimate starts from here and from our own trips.',
    'in 10',
    7,
    1,
    9,
    0.5,
  ),
  baseTrips: figure(
    'Trips that it is worth',
    'The higher, the longer our own trips take to move it.',
    'trips',
    10,
    1,
    60,
    1,
  ),
  priorTrips: figure(
    'Trips that the reasons are worth',
    'Beside our record with a counter; the higher, the more the rules decide.',
    'trips',
    8,
    1,
    40,
    1,
  ),
  otherShape: figure(
    'A trip against another shape counts',
    'Beside one against the shape they show most, which counts 1.',
    'of a trip',
    0.25,
    0,
    1,
    0.05,
  ),
  practice: figure(
    'A practice trip counts',
    'Beside one in a game, which counts 1.',
    'of a trip',
    0.25,
    0,
    1,
    0.05,
  ),
  leastLiveReps: figure(
    'Live reps until a counter is game-ready',
    'Under it a counter is shown last.',
    'reps',
    10,
    0,
    100,
    1,
  ),
} as const satisfies Record<string, FigureTerm>
export type FigureKey = keyof typeof FIGURES

/** The keys, as a list that keeps their type. */
export const FIGURE_KEYS = Object.keys(FIGURES) as FigureKey[]

/** Figures that were set; what is missing has its default. */
export const Figures = z
  .object(
    Object.fromEntries(
      FIGURE_KEYS.map((key) => [key, z.number().min(FIGURES[key].least).max(FIGURES[key].most).optional()]),
    ) as Record<FigureKey, z.ZodOptional<z.ZodNumber>>,
  )
  .strict()
export type Figures = z.infer<typeof Figures>

/** A figure as it holds: set, or its default. */
export const figureOf = (figures: Figures, key: FigureKey): number => figures[key] ?? FIGURES[key].value

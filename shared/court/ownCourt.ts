import { z } from 'zod'
import type { RulePack } from './rulePacks'

/** Metres and seconds that a hall may have: from the smallest youth court to a little more than the largest. */
const BOUNDS = {
  length: { least: 12, most: 30 },
  width: { least: 7, most: 16 },
  throwIn: { least: 3, most: 10 },
  backcourt: { least: 5, most: 30 },
} as const

const metres = (least: number, most: number) => z.number().min(least).max(most).optional()
const seconds = ({ least, most }: { least: number; most: number }) =>
  z.number().int().min(least).max(most).optional()

/**
 * A team's own court and counts on top of a book's. What is left out is the book's; markings are scaled with
 * the sides, so that a youth court of 12 x 7 m keeps its proportions. Lengths in metres.
 */
export const OwnCourt = z
  .object({
    name: z.string().trim().max(40).optional(),
    length: metres(BOUNDS.length.least, BOUNDS.length.most),
    width: metres(BOUNDS.width.least, BOUNDS.width.most),
    /** Far edge of the free-throw line from the endline. */
    freeThrowLine: metres(2, 8),
    laneWidth: metres(1.5, 6),
    /** Radius of the three-point arc. */
    threePoint: metres(2, 8),
    throwInSeconds: seconds(BOUNDS.throwIn),
    backcourtSeconds: seconds(BOUNDS.backcourt),
    countStarts: z.enum(['touch', 'control']).optional(),
  })
  .strict()
export type OwnCourt = z.infer<typeof OwnCourt>

/** What of a team's own court does not fit together on the book it stands on: the field and the remedy. */
export function ownCourtFaults(base: RulePack, own: OwnCourt): { field: keyof OwnCourt; message: string }[] {
  const { length, width } = sidesOf(base, own)
  const faults: { field: keyof OwnCourt; message: string }[] = []
  if (own.freeThrowLine !== undefined && own.freeThrowLine > length / 2 - CLEAR)
    faults.push({
      field: 'freeThrowLine',
      message: 'The free-throw line lies too near half court. Bring it nearer to the endline.',
    })
  if (own.freeThrowLine !== undefined && own.freeThrowLine <= scaleOf(base, own) * base.basket)
    faults.push({
      field: 'freeThrowLine',
      message: 'The free-throw line lies behind the basket. Bring it further up court.',
    })
  if (own.laneWidth !== undefined && own.laneWidth > width - 2 * CLEAR)
    faults.push({ field: 'laneWidth', message: 'The lane leaves no room at the sides. Make it narrower.' })
  return faults
}

/** Metres that must be left between a line and the next. */
const CLEAR = 1

const sidesOf = (base: RulePack, own: OwnCourt) => ({
  length: own.length ?? base.court.length,
  width: own.width ?? base.court.width,
})

/** The scale of the markings: that of the side that shrank more. A larger court keeps the book's own. */
const scaleOf = (base: RulePack, own: OwnCourt): number => {
  const { length, width } = sidesOf(base, own)
  return Math.min(1, length / base.court.length, width / base.court.width)
}

/**
 * The rule set of a team's own court: a book's, with its sides, markings and counts replaced. It keeps the
 * book's key, under which everything is stored; places are fractions of the landmark court, so that a drawing
 * keeps its meaning on it. Values that do not fit together (ownCourtFaults) are held to the nearest that do.
 */
export function customPack(base: RulePack, own: OwnCourt | null): RulePack {
  if (!own || Object.values(own).every((value) => value === undefined)) return base
  const court = sidesOf(base, own)
  const scale = scaleOf(base, own)
  const basket = base.basket * scale
  const radius = Math.min(own.threePoint ?? base.threePoint.radius * scale, court.width / 2)
  // The corner line keeps its distance from the middle; an arc that is shorter than that meets it as a tangent.
  const across = Math.min((base.court.width / 2 - base.threePoint.cornerInset) * scale, radius)
  const freeThrowLine = held(
    own.freeThrowLine ?? base.freeThrowLine * scale,
    basket + 0.01,
    court.length / 2 - CLEAR,
  )
  return {
    ...base,
    name: own.name ?? `${base.name}, our court`,
    label: `${own.backcourtSeconds ?? base.backcourtSeconds}-second rules, our court`,
    court,
    freeThrowLine,
    laneWidth: held(own.laneWidth ?? base.laneWidth * scale, 0.5, court.width - 2 * CLEAR),
    centreCircle: base.centreCircle * scale,
    threePoint: { radius, cornerInset: court.width / 2 - across },
    basket,
    board: { face: base.board.face * scale, width: base.board.width * scale },
    ringRadius: base.ringRadius * scale,
    noCharge: base.noCharge === null ? null : base.noCharge * scale,
    throwInSeconds: own.throwInSeconds ?? base.throwInSeconds,
    backcourtSeconds: own.backcourtSeconds ?? base.backcourtSeconds,
    countStarts: own.countStarts ?? base.countStarts,
  }
}

const held = (value: number, least: number, most: number): number => Math.max(least, Math.min(value, most))

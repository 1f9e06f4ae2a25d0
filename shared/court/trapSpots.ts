import { z } from 'zod'

/** The named areas where two come to the ball (DOMAIN.md section 1); `other` is any place outside them. */
export const SPOT_NAMES = [
  'coffin-corner',
  'early-sideline',
  'short-of-half',
  'just-over-half',
  'front-wing',
  'front-corner',
  'middle-lane',
  'other',
] as const
export const SpotName = z.enum(SPOT_NAMES)
export type SpotName = z.infer<typeof SpotName>

/** Left is y 0, facing up court. The middle lane and `other` have no side. */
export const SpotSide = z.enum(['left', 'right', 'middle'])
export type SpotSide = z.infer<typeof SpotSide>

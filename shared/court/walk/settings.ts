import { z } from 'zod'
import { Role } from '../diagram'
import type { Role as OurRole } from '../../vocabulary'

/** One assumption of the walk: its default, what may be set, and how a coach reads it. */
export interface WalkSetting {
  readonly value: number
  readonly least: number
  readonly most: number
  readonly step: number
  /** Empty for a bare share. */
  readonly unit: 's' | 'm' | 'm/s' | '°' | ''
  readonly label: string
  /** Why this default. Every one is an assumption until the team puts its own in its place. */
  readonly note: string
}

/**
 * What the walk assumes. No readable source gives the speed of a pass in a game, so these are defaults to
 * be replaced; the reaction lies near the 231 ms of CHECKS.md 'Motion and people' (Woods 2015).
 */
export const WALK_SETTINGS = {
  reaction: {
    value: 0.25,
    least: 0.1,
    most: 0.8,
    step: 0.05,
    unit: 's',
    label: 'A defender sees the pass after',
    note: 'Assumption. Simple reaction in the laboratory is about .23 s.',
  },
  reach: {
    value: 0.9,
    least: 0,
    most: 2,
    step: 0.1,
    unit: 'm',
    label: 'A defender reaches to the side',
    note: 'Assumption: an arm and a lean.',
  },
  reachHeight: {
    value: 2.5,
    least: 1.8,
    most: 3.6,
    step: 0.1,
    unit: 'm',
    label: 'A defender reaches up to',
    note: 'Assumption: an arm up and a small jump. A lob above it cannot be touched.',
  },
  closingSpeed: {
    value: 4,
    least: 0,
    most: 9,
    step: 0.5,
    unit: 'm/s',
    label: 'A defender closes at',
    note: 'Assumption: the mean over the first steps.',
  },
  guardWithin: {
    value: 1.5,
    least: 0,
    most: 3,
    step: 0.1,
    unit: 'm',
    label: 'A guard on the passer stands within',
    note: 'Assumption: the passer fakes and steps round, so this guard is not counted for the lane.',
  },
  straightSpeed: {
    value: 13,
    least: 4,
    most: 30,
    step: 0.5,
    unit: 'm/s',
    label: 'A straight pass flies at',
    note: 'Assumption. No source at hand for passes in a game.',
  },
  bounceSpeed: {
    value: 9,
    least: 3,
    most: 25,
    step: 0.5,
    unit: 'm/s',
    label: 'A bounce pass comes at',
    note: 'Assumption: slower than a straight one, the floor takes some.',
  },
  lobAngle: {
    value: 40,
    least: 15,
    most: 75,
    step: 5,
    unit: '°',
    label: 'A lob leaves the hand at',
    note: 'Assumption. Its speed follows from how far it goes.',
  },
  releaseHeight: {
    value: 2,
    least: 0.5,
    most: 3,
    step: 0.1,
    unit: 'm',
    label: 'A lob is let go at',
    note: 'Assumption: hands over the head.',
  },
  catchHeight: {
    value: 2,
    least: 0.5,
    most: 3.2,
    step: 0.1,
    unit: 'm',
    label: 'A lob is caught at',
    note: 'Assumption: hands over the head.',
  },
  ourTopSpeed: {
    value: 7.5,
    least: 3,
    most: 11,
    step: 0.1,
    unit: 'm/s',
    label: 'Ours run at most',
    note: 'Assumption, until a player’s own sprint is known.',
  },
  ourRunUp: {
    value: 1,
    least: 0.3,
    most: 2,
    step: 0.05,
    unit: 's',
    label: 'Ours gather speed over',
    note: 'Assumption: after this long a sprint is at two thirds of its top speed.',
  },
  theirTopSpeed: {
    value: 7.5,
    least: 3,
    most: 11,
    step: 0.1,
    unit: 'm/s',
    label: 'Theirs run at most',
    note: 'Assumption.',
  },
  theirRunUp: {
    value: 1,
    least: 0.3,
    most: 2,
    step: 0.05,
    unit: 's',
    label: 'Theirs gather speed over',
    note: 'Assumption.',
  },
  dribbleShare: {
    value: 0.85,
    least: 0.3,
    most: 1,
    step: 0.05,
    unit: '',
    label: 'With the ball, a share of the top speed',
    note: 'Assumption.',
  },
  screenWait: {
    value: 0.4,
    least: 0,
    most: 2,
    step: 0.1,
    unit: 's',
    label: 'A screen stands before it is used',
    note: 'Assumption.',
  },
  beatGap: {
    value: 0.25,
    least: 0,
    most: 2,
    step: 0.05,
    unit: 's',
    label: 'From one thing to the next',
    note: 'Assumption: catch, look, go.',
  },
  controlAfterTouch: {
    value: 0.2,
    least: 0,
    most: 1,
    step: 0.05,
    unit: 's',
    label: 'From touch to control',
    note: 'Assumption. Counts only where the book starts the backcourt count at control.',
  },
  stride: {
    value: 1,
    least: 0.5,
    most: 2,
    step: 0.1,
    unit: 'm',
    label: 'A stride is',
    note: 'Assumption: for saying distances in strides.',
  },
} as const satisfies Record<string, WalkSetting>
export type WalkSettingKey = keyof typeof WALK_SETTINGS

/** A sprint from rest: v = topSpeed (1 - exp(-t / runUp)); m/s and s. */
export const Sprint = z.object({
  topSpeed: z.number().min(WALK_SETTINGS.ourTopSpeed.least).max(WALK_SETTINGS.ourTopSpeed.most),
  runUp: z.number().min(WALK_SETTINGS.ourRunUp.least).max(WALK_SETTINGS.ourRunUp.most),
})
export type Sprint = z.infer<typeof Sprint>

const setting = ({ value, least, most }: WalkSetting) => z.number().min(least).max(most).default(value)

/** Everything the walk is timed by. `WalkSettings.parse({})` gives the defaults. */
export const WalkSettings = z.object({
  ...(Object.fromEntries(Object.entries(WALK_SETTINGS).map(([key, one]) => [key, setting(one)])) as Record<
    WalkSettingKey,
    ReturnType<typeof setting>
  >),
  /** A squad player's own sprint for the role that is played; it replaces the default. */
  runners: z.partialRecord(Role, Sprint).default({}),
})
export type WalkSettings = z.infer<typeof WalkSettings>

/** The assumptions as they come. */
export const DEFAULT_WALK: WalkSettings = WalkSettings.parse({})

/** How one of ours sprints: the player's own where known. */
export const ourSprint = (settings: WalkSettings, role: OurRole): Sprint =>
  settings.runners[role] ?? { topSpeed: settings.ourTopSpeed, runUp: settings.ourRunUp }

/** How one of theirs sprints. */
export const theirSprint = (settings: WalkSettings): Sprint => ({
  topSpeed: settings.theirTopSpeed,
  runUp: settings.theirRunUp,
})

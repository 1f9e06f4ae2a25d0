import { spotAt } from '@shared/court/trapSpots'
import { spotLabel } from '@shared/tendencies/habits'
import type { Handler, OnBall, Shape, ShapeVariant, ThrowerGuard, Trigger } from '@shared/vocabulary'

/** How values stand inside the sentence of a possession, where their label alone would not read. */

export const TRIGGER_LEAD: Record<Trigger, string> = {
  'made-basket': 'After a ',
  'made-free-throw': 'After a ',
  'dead-ball': 'After a ',
  break: 'After a ',
  live: 'From a ',
}

/** Words before the shape, and the shape itself. */
export const SHAPE_WORDS: Record<Shape, { lead: string; word: string }> = {
  person: { lead: ', ', word: 'person to person' },
  '1-2-1-1': { lead: ' in a ', word: '1-2-1-1' },
  '2-2-1': { lead: ' in a ', word: '2-2-1' },
  '1-3-1': { lead: ' in a ', word: '1-3-1' },
  'other-zone': { lead: ' in ', word: 'another zone' },
  fake: { lead: '', word: 'showed it and left' },
  'dropped-back': { lead: '', word: 'dropped back' },
}

export const VARIANT_WORDS: Record<ShapeVariant, string> = {
  straight: 'straight',
  deny: 'denying',
  switch: 'switching',
  'jump-switch': 'jump-switch',
  'jump-trap': 'jump-trap',
  'fake-jump': 'fake jump',
  'face-guard': 'face-guarding',
  'centre-field': 'with a centre-fielder',
  'double-receiver': 'doubling the receiver',
  '2-1-2': 'a 2-1-2',
  '1-2-2': 'a 1-2-2',
  '1-1-3': 'a 1-1-3',
  'match-up': 'a match-up',
}

export const THROWER_WORDS: Record<ThrowerGuard, string> = {
  none: 'left the thrower free',
  mirror: 'mirrored the thrower',
  off: 'stood off the thrower',
}

export const ON_BALL_WORDS: Record<OnBall, string> = {
  pressured: 'pressured the ball',
  contained: 'contained the ball',
  sagged: 'sagged off the ball',
}

export const HANDLER_WORDS: Record<Handler, string> = {
  strong: 'A strong handler',
  weak: 'A weak handler',
  unknown: 'An unknown handler',
}

const IN_IT = ['coffin-corner', 'front-corner', 'middle-lane']

/** A trap's place with the words before it: "in the" "left deep corner". */
export function trapWords(place: { x: number; y: number }): { lead: string; word: string } {
  const { spot, side } = spotAt(place)
  if (spot === 'other') return { lead: ' ', word: 'elsewhere' }
  return { lead: IN_IT.includes(spot) ? ' in the ' : ' on the ', word: spotLabel(spot, side) }
}

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

/** "a", "a and b", "a, b and c" */
export function listWords(words: readonly string[]): string {
  const last = words.at(-1)
  if (last === undefined) return ''
  return words.length === 1 ? last : `${words.slice(0, -1).join(', ')} and ${last}`
}

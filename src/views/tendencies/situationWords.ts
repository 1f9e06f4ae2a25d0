import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import { shapeLabel } from '@shared/tendencies/habits'
import type { MARGINS, TendencyFilter, TendencyRead } from '@shared/tendencies/schemas'
import { labelOf, PICKUPS, type Pickup, type Shape, type Trigger } from '@shared/vocabulary'
import { capital, listed } from './segments'

type Margin = (typeof MARGINS)[number]
export type Situation = TendencyRead['situations'][number]

/** What stands on a trigger's button. */
const TRIGGER_NAMES: Record<Situation['trigger'], string> = {
  all: 'All',
  'made-basket': 'After made basket',
  'made-free-throw': 'After made free throw',
  'dead-ball': 'Dead ball',
  break: 'After a break',
  live: 'Live ball',
}

/** A trigger at the head of a sentence about many possessions. */
const TRIGGER_WHEN: Record<Trigger, string> = {
  'made-basket': 'made baskets',
  'made-free-throw': 'made free throws',
  'dead-ball': 'dead balls',
  break: 'breaks',
  live: 'live balls',
}

const MARGIN_WORDS: Record<Margin, string> = {
  behind: 'behind by 6 or more',
  level: 'within 5',
  ahead: 'ahead by 6 or more',
}

export const triggerName = (trigger: Situation['trigger']): string => TRIGGER_NAMES[trigger]
export const marginWords = (margin: Margin): string => MARGIN_WORDS[margin]
export const pickupName = (pickup: Pickup): string => labelOf(PICKUPS, pickup)
export const shapeName = (shape: Shape): string => shapeLabel(shape)

/** "Q3" or, with more of them, "Q3 and Q4". */
export const periodNames = (periods: readonly number[], pack: RulePack): string =>
  listed(periods.map((period) => periodLabel(pack, period)))

/** "a, b or c" */
export const orList = (words: readonly string[]): string => listed(words).replace(/ and ([^,]*)$/, ' or $1')

/**
 * The situation at the head of a sentence: "After made free throws, in Q4,"; empty when nothing narrows.
 * The games are not named: they say how much was counted, not when.
 */
export function situationLead(filter: TendencyFilter, pack: RulePack): string {
  const parts = [
    filter.trigger && `after ${listed(filter.trigger.map((trigger) => TRIGGER_WHEN[trigger]))}`,
    filter.period && `in ${periodNames(filter.period, pack)}`,
    filter.margin && orList(filter.margin.map(marginWords)),
    filter.pickup && `picked up at ${orList(filter.pickup.map(pickupName))}`,
    filter.shape && `in their ${orList(filter.shape.map(shapeName))}`,
  ].filter((part) => part !== undefined)
  return capital(parts.join(', ')) + (parts.length > 1 ? ',' : '')
}

/** What narrows the view besides trigger and games, for a quiet line: "Q4, behind by 6 or more". */
export function narrowWords(filter: TendencyFilter, pack: RulePack): string {
  const parts = [
    filter.period && periodNames(filter.period, pack),
    filter.margin && orList(filter.margin.map(marginWords)),
    filter.pickup && orList(filter.pickup.map(pickupName)),
    filter.shape && orList(filter.shape.map(shapeName)),
  ].filter((part) => part !== undefined)
  return parts.join(', ')
}

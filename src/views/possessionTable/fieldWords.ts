import { periodLabel } from '@shared/court/gameTime'
import type { RulePack } from '@shared/court/rulePacks'
import { spotAt } from '@shared/court/trapSpots'
import { FALLBACKS, FINISHES, FORCED_SIDES } from '@shared/filmWords'
import { spotLabel } from '@shared/tendencies/habits'
import {
  DENIED,
  GOALIES,
  HANDLERS,
  LANES,
  NOT_VISIBLE,
  ON_BALL,
  OUTCOME_PLACES,
  OUTCOMES,
  PICKUPS,
  SHAPE_VARIANTS,
  SHAPES,
  THROWER_GUARDS,
  TRAP_CUES,
  TRIGGERS,
  type Term,
} from '@shared/vocabulary'

/** The fields of a possession as a table says them: their name, and a value of one in a few words. */

const NAMES: Readonly<Record<string, string>> = {
  number: 'number',
  period: 'period',
  clock: 'clock',
  margin: 'score',
  trigger: 'what came before',
  shape: 'shape',
  shapeVariant: 'which kind',
  pickup: 'pick-up',
  traps: 'traps',
  outcome: 'how it ended',
  outcomePlace: 'where it ended',
  throwerGuard: 'on the thrower',
  denied: 'denied',
  tookAway: 'took away',
  leftOpen: 'left open',
  onBall: 'on the ball',
  handler: 'who had it',
  goalie: 'the safety',
  shownShape: 'showed first',
  forcedSide: 'steered to',
  entrySpot: 'caught where',
  receiver: 'who caught it',
  onFloor: 'their five',
  thief: 'who took it',
  passes: 'passes',
  reversals: 'changes of side',
  fallback: 'then they played',
  finish: 'the finish',
  points: 'points',
  pointsAgainst: 'scored off it',
  timeOutBurned: 'time-out',
  filmTime: 'time on film',
  crossedAt: 'over half at',
  track: 'the ball’s way',
  note: 'note',
  counterId: 'our call',
  rightCall: 'the right call',
  runWell: 'run well',
  tripId: 'trip',
  cue: 'cue of the trap',
}

/** "took away"; the field's own name where there is no other, so that an old row still reads. */
export const fieldName = (field: string): string => NAMES[field] ?? field

const short = (list: readonly Term[], words: Readonly<Record<string, string>> = {}): readonly Term[] =>
  list.map((term) => ({ ...term, label: words[term.value] ?? term.label.replace(/^the /, '') }))

/** The closed lists, in the table's short words. */
const LISTS: Readonly<Record<string, readonly Term[]>> = {
  trigger: short(TRIGGERS, {
    'made-basket': 'basket',
    'made-free-throw': 'free throw',
    'dead-ball': 'dead ball',
    break: 'break',
    live: 'live ball',
  }),
  shape: short(SHAPES),
  shapeVariant: short(SHAPE_VARIANTS),
  pickup: short(PICKUPS),
  outcome: short(OUTCOMES),
  outcomePlace: short(OUTCOME_PLACES),
  throwerGuard: short(THROWER_GUARDS, { none: 'nobody', mirror: 'mirrored', off: 'stood off' }),
  denied: short(DENIED),
  tookAway: short(LANES),
  leftOpen: short(LANES),
  onBall: short(ON_BALL),
  handler: short(HANDLERS),
  goalie: short(GOALIES),
  shownShape: short(SHAPES),
  forcedSide: short(FORCED_SIDES),
  fallback: short(FALLBACKS),
  finish: short(FINISHES),
  cue: short(TRAP_CUES),
}

/** The values of a field that has a closed list; null for one that is typed. */
export const termsOf = (field: string): readonly Term[] | null => LISTS[field] ?? null

/** Fields that hold several values at once. */
export const isSeveral = (field: string): boolean =>
  field === 'denied' || field === 'tookAway' || field === 'leftOpen'

/** Fields that are said with yes or no. */
export const isYesNo = (field: string): boolean =>
  field === 'timeOutBurned' || field === 'rightCall' || field === 'runWell'

/** "5:20", from tenths of a second left. */
export function timeLeft(tenths: number): string {
  const seconds = Math.floor(tenths / 10)
  return `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`
}

/** "Left deep corner 2.0"; the second is left away where it is not known. */
export function trapWords(trap: unknown): string {
  if (typeof trap !== 'object' || trap === null) return ''
  const { x, y, t } = trap as { x?: unknown; y?: unknown; t?: unknown }
  if (typeof x !== 'number' || typeof y !== 'number') return ''
  const { spot, side } = spotAt({ x, y } as Parameters<typeof spotAt>[0])
  const place = spot === 'other' ? 'elsewhere' : spotLabel(spot, side)
  return typeof t === 'number' ? `${place} ${t.toFixed(1)}` : place
}

/**
 * A value of a field in a few words: "pass back", "middle and sideline", "nothing" for none, "not seen". A value that
 * no list knows is said as it is.
 */
export function valueWords(field: string, value: unknown, pack?: RulePack): string {
  if (value === null || value === undefined || value === '') return 'not logged'
  if (value === NOT_VISIBLE) return 'not seen'
  if (Array.isArray(value)) return listWords(field, value)
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'number') return numberWords(field, value, pack)
  if (typeof value === 'object') return objectWords(field, value)
  const text = value as string
  return LISTS[field]?.find((term) => term.value === text)?.label ?? text
}

function listWords(field: string, values: readonly unknown[]): string {
  if (field === 'traps') return values.length === 0 ? 'no trap' : joined(values.map(trapWords))
  if (values.length === 0) return field === 'denied' || field === 'onFloor' ? 'nobody' : 'nothing'
  if (field === 'track') return `${values.length} points`
  return joined(values.map((value) => valueWords(field, value)))
}

function numberWords(field: string, value: number, pack?: RulePack): string {
  if (field === 'clock') return timeLeft(value)
  if (field === 'period') return pack === undefined ? `period ${value}` : periodLabel(pack, value)
  if (field === 'margin') return value === 0 ? 'level' : value > 0 ? `up ${value}` : `down ${-value}`
  if (field === 'crossedAt') return `${value.toFixed(1)} s`
  if (field === 'filmTime')
    return `${Math.floor(value / 60)}:${String(Math.floor(value % 60)).padStart(2, '0')}`
  if (field === 'receiver' || field === 'thief') return `no. ${value}`
  return String(value)
}

function objectWords(field: string, value: object): string {
  if (field === 'entrySpot') return trapWords(value)
  if ('long' in value && typeof value.long === 'number') return `${value.long} characters`
  return 'something else'
}

function joined(words: readonly string[]): string {
  const last = words.at(-1) ?? ''
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} and ${last}`
}

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

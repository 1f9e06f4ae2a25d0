import { RULE_PACKS } from '@shared/court/rulePacks'
import { SPOT_CELLS } from '@shared/court/trapSpots'
import { FORCED_SIDES } from '@shared/filmWords'
import { HABITS } from '@shared/tendencies/habits'
import { DENIED, GOT_OUT, LANES, NOT_PRESSED, SHAPES, SHAPE_VARIANTS, TRAP_CUES } from '@shared/vocabulary'
import {
  HAS_SHAPE,
  holds,
  inSpot,
  is,
  NOT_STOPPED,
  PRESSED,
  seen,
  THROUGH,
  THROWN_IN,
  JOINED,
  COVERED,
} from './expressions'

/** What a habit's n and k count, as SQL over one row `p` of `habitRows`. */
export interface HabitSql {
  n: string
  k: string
}

/** Columns of a possession's traps in one line; there is none for a possession without traps. */
export const TRAP_LINE = `trap_line AS (
  SELECT t.possessionId,
         max(CASE WHEN t.position = 1 THEN t.cue END) AS cue,
         max(t.position = 1 AND t.result IN (${GOT_OUT.map((result) => `'${result}'`).join(', ')})) AS gotOut,
         count(*) AS traps,
         ${SPOT_CELLS.map((cell) => `max${inSpot(cell.spot, cell.side)} AS ${column(cell.spot, cell.side)}`).join(',\n         ')}
    FROM ${JOINED} JOIN traps t ON t.possessionId = p.id
   GROUP BY t.possessionId)`

const FIELDS = [
  'shape',
  'shapeVariant',
  'pickup',
  'trapsLogged',
  'outcome',
  'throwerGuard',
  'denied',
  'leftOpen',
  'onBall',
  'handler',
  'goalie',
  'shownShape',
  'crossedAt',
  'forcedSide',
]

/**
 * The covered rows of a situation with everything that habits look at: possession, game and traps side by
 * side. Needs the tables of SOURCES and TRAP_LINE; `where` is over `p` and `s`.
 */
export const habitRows = (
  where: string,
) => `SELECT p.id, p.number, p.trigger, ${FIELDS.map((field) => `p.${field}`).join(', ')},
    s.id AS gameId, s.kind, s.day, s.label, s.rulePack, tr.*
  FROM ${JOINED} LEFT JOIN trap_line tr ON tr.possessionId = p.id
 WHERE ${where} AND ${COVERED}`

function column(spot: string, side: string): string {
  return `"${spot} ${side}"`
}

const yes = (expression: string) => `coalesce(${expression}, 0)`
const and = (...parts: string[]) => `(${parts.join(' AND ')})`

const TRAPS_LOGGED = is('p.trapsLogged', 'seen')
const TRAPPED = and(PRESSED, TRAPS_LOGGED, yes('p.traps > 0'))
const BALL_SEEN = and(PRESSED, seen('p.onBall'))
/** Light and all-out also need to know whom they denied. */
const BALL_AND_DENIED_SEEN = and(BALL_SEEN, seen('p.denied'))
const THROWER_SEEN = and(PRESSED, THROWN_IN, seen('p.throwerGuard'))
const DENIED_TWO = yes('json_array_length(p.denied) >= 2')
const DENIED_NONE = yes(`p.denied = '[]'`)
const SAFETY_SEEN = and(TRAPPED, seen('p.goalie'))

/** Three quarters of the backcourt count of the game's rule set, seconds. */
const LATE = `(CASE p.rulePack ${Object.values(RULE_PACKS)
  .map(({ key, backcourtSeconds }) => `WHEN '${key}' THEN ${backcourtSeconds * 0.75}`)
  .join(' ')} END)`

const SQL: Record<string, HabitSql> = {
  press: { n: HAS_SHAPE, k: PRESSED },
  fake: { n: HAS_SHAPE, k: is('p.shape', 'fake') },
  'pickup:full': { n: and(PRESSED, seen('p.pickup')), k: is('p.pickup', 'full') },
  mirror: { n: THROWER_SEEN, k: is('p.throwerGuard', 'mirror') },
  'thrower-free': { n: THROWER_SEEN, k: is('p.throwerGuard', 'none') },
  sag: { n: and(BALL_SEEN, is('p.handler', 'weak')), k: is('p.onBall', 'sagged') },
  light: { n: BALL_AND_DENIED_SEEN, k: and(is('p.onBall', 'contained'), DENIED_NONE) },
  'all-out': { n: BALL_AND_DENIED_SEEN, k: and(is('p.onBall', 'pressured'), DENIED_TWO) },
  disguise: { n: and(PRESSED, 'p.shownShape IS NOT NULL'), k: yes('p.shownShape <> p.shape') },
  trap: { n: and(PRESSED, TRAPS_LOGGED), k: yes('p.traps > 0') },
  'trap-again': { n: and(TRAPPED, yes('p.gotOut')), k: yes('p.traps > 1') },
  'safety-leaves-early': { n: SAFETY_SEEN, k: is('p.goalie', 'left-early') },
  'safety-home': { n: SAFETY_SEEN, k: is('p.goalie', 'home') },
  'slow-crossing': { n: and(PRESSED, 'p.crossedAt IS NOT NULL'), k: yes(`p.crossedAt > ${LATE}`) },
  'others-through': { n: and(PRESSED, `p.kind = 'scouted'`, NOT_STOPPED), k: THROUGH },
}
for (const { value } of SHAPES)
  if (!NOT_PRESSED.includes(value)) SQL[`shape:${value}`] = { n: PRESSED, k: is('p.shape', value) }
for (const { value, parent } of SHAPE_VARIANTS)
  SQL[`variant:${value}`] = {
    n: and(PRESSED, `(p.shapeVariant IS NOT NULL OR p.shape <> '${parent}')`),
    k: is('p.shapeVariant', value),
  }
for (const { value } of DENIED)
  SQL[`deny:${value}`] = { n: and(PRESSED, seen('p.denied')), k: holds('p.denied', value) }
for (const { value } of FORCED_SIDES)
  SQL[`forced:${value}`] = { n: and(PRESSED, seen('p.forcedSide')), k: is('p.forcedSide', value) }
for (const { value } of TRAP_CUES)
  SQL[`cue:${value}`] = { n: and(TRAPPED, seen('p.cue')), k: is('p.cue', value) }
for (const { value } of LANES)
  SQL[`leave-open:${value}`] = { n: and(TRAPPED, seen('p.leftOpen')), k: holds('p.leftOpen', value) }
for (const { spot, side } of SPOT_CELLS) {
  SQL[`trap-at:${spot}:${side}`] = { n: and(PRESSED, TRAPS_LOGGED), k: yes(`p.${column(spot, side)}`) }
  if (side === 'left')
    SQL[`trap-at:${spot}:any`] = {
      n: and(PRESSED, TRAPS_LOGGED),
      k: yes(`(p.${column(spot, 'left')} OR p.${column(spot, 'right')})`),
    }
}

/** The SQL of a habit, or undefined for a key that is not counted. */
export const habitSql = (key: string): HabitSql | undefined => SQL[key]

/** Every counted habit with its SQL, in the order of HABITS. */
export const COUNTED_HABITS: readonly ({ key: string } & HabitSql)[] = HABITS.map(({ key }) => {
  const sql = SQL[key]
  if (!sql) throw new Error(`habit ${key} has no SQL`)
  return { key, ...sql }
})

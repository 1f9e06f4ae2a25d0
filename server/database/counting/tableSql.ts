import { SPOT_CELLS } from '@shared/court/trapSpots'
import type { TableFilter, TableSort } from '@shared/possessions/table'
import { FALLBACKS, FINISHES, FORCED_SIDES } from '@shared/filmWords'
import {
  GOALIES,
  HANDLERS,
  ON_BALL,
  OUTCOMES,
  OUTCOME_PLACES,
  PICKUPS,
  SHAPES,
  THROWER_GUARDS,
  TRAP_CUES,
  TRIGGERS,
  type Term,
} from '@shared/vocabulary'
import { holds, inSpot, is, PRESSED } from './expressions'
import { oneOf, situation, type Where } from './filters'

const fixed = (sql: string): Where => ({ sql, parameters: [] })
const anyOf = (parts: Where[]): Where => ({
  sql: `(${parts.map(({ sql }) => sql).join(' OR ')})`,
  parameters: parts.flatMap(({ parameters }) => parameters),
})

const trapped = (condition: string) =>
  `EXISTS (SELECT 1 FROM traps t WHERE t.possessionId = p.id AND ${condition})`

const NAMED_SPOT = SPOT_CELLS.map(({ spot, side }) => inSpot(spot, side)).join(' OR ')

function trapAt(spot: NonNullable<TableFilter['trap']>[number]): Where {
  if (spot === 'none') return fixed(`(${is('p.trapsLogged', 'seen')} AND NOT ${trapped('1')})`)
  if (spot === 'other') return fixed(trapped(`NOT (${NAMED_SPOT})`))
  const cells = SPOT_CELLS.filter((cell) => cell.spot === spot)
  return fixed(trapped(`(${cells.map((cell) => inSpot(cell.spot, cell.side)).join(' OR ')})`))
}

/** A shirt number of theirs on the floor, at a trap or with the ball that was taken. */
const wears = (jersey: number): Where => ({
  sql: `(EXISTS (SELECT 1 FROM json_each(p.onFloor) j WHERE j.value = ?) OR coalesce(p.thief = ?, 0)
     OR EXISTS (SELECT 1 FROM traps t, json_each(t.trappers) j WHERE t.possessionId = p.id AND j.value = ?))`,
  parameters: [jersey, String(jersey), jersey],
})

const ONE_VALUE = [
  'outcome',
  'outcomePlace',
  'onBall',
  'handler',
  'throwerGuard',
  'goalie',
  'forcedSide',
  'fallback',
  'finish',
] as const
const LISTS = ['denied', 'tookAway', 'leftOpen'] as const

/** The table's filter over a possession `p` of a game `s`; true when nothing is filtered. */
export function tableWhere(filter: TableFilter): Where {
  const parts: (Where | null)[] = [
    situation(filter),
    filter.pressed ? fixed(filter.pressed === 'yes' ? PRESSED : `NOT ${PRESSED}`) : null,
    ...ONE_VALUE.map((field) => oneOf(`p.${field}`, filter[field])),
    ...LISTS.map((field) =>
      filter[field] ? anyOf(filter[field].map((value) => fixed(holds(`p.${field}`, value)))) : null,
    ),
    oneOf('p.counterId', filter.counter),
    filter.trap ? anyOf(filter.trap.map(trapAt)) : null,
    filter.cue
      ? anyOf(filter.cue.map((cue) => fixed(trapped(`t.position = 1 AND ${is('t.cue', cue)}`))))
      : null,
    filter.jersey ? anyOf(filter.jersey.map(wears)) : null,
    filter.text
      ? { sql: `p.note LIKE ? ESCAPE '\\'`, parameters: [`%${filter.text.replace(/[\\%_]/g, '\\$&')}%`] }
      : null,
  ]
  const given = parts.filter((part) => part !== null)
  return {
    sql: given.map(({ sql }) => `coalesce(${sql}, 0)`).join(' AND '),
    parameters: given.flatMap(({ parameters }) => parameters),
  }
}

/** In the order of the closed list, as it stands in a form; not logged and not visible come out null. */
const inOrderOf = <T extends string>(column: string, terms: readonly Term<T>[]) =>
  `(CASE ${column} ${terms.map(({ value }, index) => `WHEN '${value}' THEN ${index}`).join(' ')} END)`

const ofTrap = (position: number, column: string) =>
  `(SELECT t.${column} FROM traps t WHERE t.possessionId = p.id AND t.position = ${position})`

const number = (column: string) =>
  `(CASE WHEN json_type(${column}) = 'integer' THEN CAST(${column} AS INTEGER) END)`
const word = (column: string) => `(CASE WHEN ${column} NOT IN ('', '[]', '"not-visible"') THEN ${column} END)`

const SORTS: Record<TableSort, string> = {
  played: '0',
  number: 'p.number',
  // Played time: a clock runs down.
  clock: '(p.period * 100000 - coalesce(p.clock, 0))',
  margin: 'p.margin',
  trigger: inOrderOf('p.trigger', TRIGGERS),
  pickup: inOrderOf('p.pickup', PICKUPS),
  shape: inOrderOf('p.shape', SHAPES),
  firstTrap: ofTrap(1, 't'),
  secondTrap: ofTrap(2, 't'),
  cue: inOrderOf(ofTrap(1, 'cue'), TRAP_CUES),
  tookAway: word('p.tookAway'),
  leftOpen: word('p.leftOpen'),
  denied: word('p.denied'),
  onBall: inOrderOf('p.onBall', ON_BALL),
  handler: inOrderOf('p.handler', HANDLERS),
  throwerGuard: inOrderOf('p.throwerGuard', THROWER_GUARDS),
  goalie: inOrderOf('p.goalie', GOALIES),
  forcedSide: inOrderOf('p.forcedSide', FORCED_SIDES),
  outcome: inOrderOf('p.outcome', OUTCOMES),
  outcomePlace: inOrderOf('p.outcomePlace', OUTCOME_PLACES),
  crossedAt: 'p.crossedAt',
  passes: 'p.passes',
  reversals: 'p.reversals',
  fallback: inOrderOf('p.fallback', FALLBACKS),
  finish: inOrderOf('p.finish', FINISHES),
  points: 'p.points',
  pointsAgainst: 'p.pointsAgainst',
  filmTime: 'p.filmTime',
  receiver: number('p.receiver'),
  thief: number('p.thief'),
  note: `(CASE WHEN p.note <> '' THEN p.note END COLLATE NOCASE)`,
  updatedAt: 'p.updatedAt',
}

/** The order in which rows were played. */
export const AS_PLAYED = 's.day, s.id, p.number, p.createdAt, p.id'

/** ORDER BY of the table: by a column, empty cells last either way; ties as they were played. */
export function tableOrder(sort: TableSort, direction: 'asc' | 'desc'): string {
  const way = direction === 'asc' ? 'ASC' : 'DESC'
  if (sort === 'played')
    return AS_PLAYED.split(', ')
      .map((column) => `${column} ${way}`)
      .join(', ')
  return `${SORTS[sort]} IS NULL, ${SORTS[sort]} ${way}, ${AS_PLAYED}`
}

import { RULE_PACKS } from '@shared/court/rulePacks'
import { SPOT_CELLS, type SpotName, type SpotSide } from '@shared/court/trapSpots'
import { NOT_PRESSED, NOT_VISIBLE, SUCCESSES } from '@shared/vocabulary'

/**
 * SQL pieces that every count shares. `p` is a possession, `s` its game (scouted or ours) with its
 * coverage and rule set. Each is a condition that is 0 or 1, never null. Only closed lists of the
 * vocabulary are written into the text; what a caller sends is always a parameter.
 */
const quoted = (values: readonly string[]) => values.map((value) => `'${value}'`).join(', ')

export const HAS_SHAPE = 'p.shape IS NOT NULL'
export const PRESSED = `(p.shape IS NOT NULL AND p.shape NOT IN (${quoted(NOT_PRESSED)}))`
export const THROWN_IN = `(p.trigger <> 'live')`
export const THROUGH = `coalesce(p.outcome IN (${quoted(SUCCESSES)}), 0)`
export const NOT_STOPPED = `(p.outcome IS NOT NULL AND p.outcome <> 'stopped')`

/** Logged and visible; a list that is empty counts as seen. */
export const seen = (column: string) =>
  `(${column} IS NOT NULL AND ${column} NOT IN ('${NOT_VISIBLE}', '"${NOT_VISIBLE}"'))`

/** A JSON list column holds a value. */
export const holds = (column: string, value: string) => `coalesce(instr(${column}, '"${value}"') > 0, 0)`

export const is = (column: string, value: string) => `coalesce(${column} = '${value}', 0)`

/** Minutes of play since tip-off, as gameMinute() of shared/court has it. */
const MINUTE = `(CASE s.rulePack ${Object.values(RULE_PACKS)
  .map(({ key, periods: { count, minutes, overtimeMinutes } }) => {
    const full = `min(p.period - 1, ${count}) * ${minutes} + max(0, p.period - 1 - ${count}) * ${overtimeMinutes}`
    const long = `(CASE WHEN p.period <= ${count} THEN ${minutes} ELSE ${overtimeMinutes} END)`
    return `WHEN '${key}' THEN ${full} + ${long} - coalesce(min(${long}, p.clock / 600.0), ${long} / 2.0)`
  })
  .join(' ')} END)`

/** The scout set out to log this row; a rate uses nothing else (RECORD.md section 1). */
export const COVERED = `(CASE s.coverageKind
  WHEN 'all' THEN 1
  WHEN 'throw-ins' THEN p.trigger <> 'live'
  ELSE coalesce(${MINUTE} >= s.coverageFrom AND ${MINUTE} < s.coverageTo, 0) END)`

/**
 * Every row against an opponent with its game, watched (one parameter) and ours (one more), as the table
 * `s`; `day` is the calendar day of the one and the tip-off of the other (gameDays.ts). The plus keeps SQLite
 * off the index on deletedAt, which nearly every row shares.
 */
export const SOURCES = `source AS (
  SELECT g.id, 'scouted' AS kind, g.playedOn AS day, g.foe AS label, g.coverageKind, g.coverageFrom, g.coverageTo,
         g.rulePack, p.rowid AS possession
    FROM scouted_games g JOIN possessions p ON p.scoutedGameId = g.id
   WHERE g.opponentId = ? AND +p.deletedAt IS NULL
  UNION ALL
  SELECT g.id, 'ours', g.tipOff, '', 'all', NULL, NULL, g.rulePack, p.rowid
    FROM games g JOIN possessions p ON p.gameId = g.id
   WHERE g.opponentId = ? AND +p.deletedAt IS NULL)`

export const JOINED = `source s CROSS JOIN possessions p ON p.rowid = s.possession`

/** The trap `t` lies in a spot, as spotAt() of shared/court has it; a test holds the two together. */
export function inSpot(spot: SpotName, side: SpotSide): string {
  const cell = SPOT_CELLS.find((entry) => entry.spot === spot && entry.side === side)
  if (!cell) throw new Error(`no such trap spot: ${spot}, ${side}`)
  const along = cell.x1 === 1 ? `t.x >= ${cell.x0} AND t.x <= 1` : `t.x >= ${cell.x0} AND t.x < ${cell.x1}`
  const across =
    side === 'middle'
      ? `max(t.y, 1 - t.y) <= ${cell.y1}`
      : `max(t.y, 1 - t.y) > ${1 - FROM_SIDELINE} AND t.y ${side === 'left' ? '<' : '>'} 0.5`
  return `(${along} AND ${across})`
}

const FROM_SIDELINE = 0.22

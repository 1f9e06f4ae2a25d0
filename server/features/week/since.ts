import type { EntityManager } from 'typeorm'
import { SINCE_KINDS, type WeekEvent } from '@shared/week/schemas'
import { peopleOf } from '../games/around'

type Kind = WeekEvent['kind']

interface Line {
  personId: string | null
  kind: string
  action: WeekEvent['action']
  count: number
  of: number | null
  about: string | null
  toId: string | null
  at: string
}

const isKind = (kind: string): kind is Kind => SINCE_KINDS.some((known) => known === kind)

/**
 * Rows changed, counted by person, thing and what it is about; one line for a whole evening of logging. Of a row that
 * was deleted only that it was.
 */
const CHANGED = `
  SELECT c.personId, CASE WHEN c.kind = 'games' AND instr(c.fields, '"readAt"') THEN 'read' ELSE c.kind END AS kind,
         CASE WHEN c.kind = 'games' AND instr(c.fields, '"readAt"')
              THEN CASE WHEN instr(c.fields, '"to":null') THEN 'reopened' ELSE 'signed' END
              ELSE c.action END AS action,
         count(DISTINCT c.rowId) AS count, NULL AS "of",
         CASE c.kind
           WHEN 'possessions' THEN coalesce(so.shortName || ' against ' || sg.foe, 'our game with ' || po.shortName)
           WHEN 'scouted_games' THEN ho.shortName || ' against ' || hg.foe
           WHEN 'games' THEN go.name WHEN 'opponents' THEN o.name WHEN 'counters' THEN k.name
           WHEN 'opponent_players' THEN oo.name WHEN 'plans' THEN lo.name WHEN 'practices' THEN ro.name END AS about,
         NULL AS toId, max(c.at) AS at
    FROM changes c
    LEFT JOIN possessions p ON c.kind = 'possessions' AND p.id = c.rowId
    LEFT JOIN scouted_games sg ON sg.id = p.scoutedGameId LEFT JOIN opponents so ON so.id = sg.opponentId
    LEFT JOIN games pg ON pg.id = p.gameId LEFT JOIN opponents po ON po.id = pg.opponentId
    LEFT JOIN scouted_games hg ON c.kind = 'scouted_games' AND hg.id = c.rowId
    LEFT JOIN opponents ho ON ho.id = hg.opponentId
    LEFT JOIN games gg ON c.kind = 'games' AND gg.id = c.rowId LEFT JOIN opponents go ON go.id = gg.opponentId
    LEFT JOIN opponents o ON c.kind = 'opponents' AND o.id = c.rowId
    LEFT JOIN counters k ON c.kind = 'counters' AND k.id = c.rowId
    LEFT JOIN opponent_players op ON c.kind = 'opponent_players' AND op.id = c.rowId
    LEFT JOIN opponents oo ON oo.id = op.opponentId
    LEFT JOIN plans l ON c.kind = 'plans' AND l.id = c.rowId
    LEFT JOIN games lg ON lg.id = l.gameId LEFT JOIN opponents lo ON lo.id = lg.opponentId
    LEFT JOIN practices r ON c.kind = 'practices' AND r.id = c.rowId
    LEFT JOIN games rg ON rg.id = r.gameId LEFT JOIN opponents ro ON ro.id = rg.opponentId
   WHERE c.teamId = ? AND c.at >= ?
     AND (c.action = 'deleted' OR coalesce(p.deletedAt, hg.deletedAt, gg.deletedAt, o.deletedAt, k.deletedAt,
                                           op.deletedAt, l.deletedAt, r.deletedAt) IS NULL)
   GROUP BY 1, 2, 3, 6`

const SIGNED = `
  SELECT l.signedById AS personId, 'plans' AS kind, 'signed' AS action, count(*) AS count, NULL AS "of",
         o.name AS about, NULL AS toId, max(l.signedAt) AS at
    FROM plans l JOIN games g ON g.id = l.gameId JOIN opponents o ON o.id = g.opponentId
   WHERE l.teamId = ? AND l.signedAt >= ? AND l.deletedAt IS NULL GROUP BY l.signedById, g.id`

/** Players only: that a coach looked at her own sheet is no news. */
const OPENED = `
  SELECT NULL AS personId, 'sheets' AS kind, 'opened' AS action, count(DISTINCT n.personId) AS count,
         (SELECT count(*) FROM memberships m WHERE m.teamId = n.teamId AND m.role = 'player') AS "of",
         o.name AS about, NULL AS toId, max(n.firstAt) AS at
    FROM openings n JOIN memberships w ON w.personId = n.personId AND w.teamId = n.teamId AND w.role = 'player'
    JOIN sheets s ON s.id = n.sheetId JOIN plans l ON l.id = s.planId JOIN games g ON g.id = l.gameId
    JOIN opponents o ON o.id = g.opponentId
   WHERE n.teamId = ? AND n.firstAt >= ? AND l.deletedAt IS NULL GROUP BY n.sheetId`

const HANDED = `
  SELECT h.fromId AS personId, 'ball' AS kind, 'handed-on' AS action, 1 AS count, NULL AS "of",
         o.name AS about, h.toId, h.at
    FROM hand_ons h JOIN games g ON g.id = h.gameId JOIN opponents o ON o.id = g.opponentId
   WHERE h.teamId = ? AND h.at >= ? AND g.deletedAt IS NULL`

/** More lines than anybody reads of a day. */
const MOST = 24

/** What happened in a team since an instant, latest first: counts by person and thing. */
export async function sinceThen(manager: EntityManager, teamId: string, since: Date): Promise<WeekEvent[]> {
  const lines: Line[] = []
  for (const sql of [CHANGED, SIGNED, OPENED, HANDED])
    lines.push(...((await manager.query(sql, [teamId, since.toISOString()])) as Line[]))
  const people = await peopleOf(
    manager,
    lines.flatMap(({ personId, toId }) => [personId, toId]),
  )
  return lines
    .sort((a, b) => b.at.localeCompare(a.at))
    .flatMap(({ kind, personId, toId, action, count, of, about, at }) =>
      isKind(kind)
        ? [
            {
              who: (personId && people.get(personId)) || null,
              kind,
              action,
              count,
              of,
              about,
              to: (toId && people.get(toId)?.name) || null,
              at,
            },
          ]
        : [],
    )
    .slice(0, MOST)
}

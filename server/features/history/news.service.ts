import { In, type EntityManager } from 'typeorm'
import type { News, NewsRow } from '@shared/history/schemas'
import { Change } from '../../database/entities/Change'
import { presentChange } from './history.presenter'

const WEEK_MS = 7 * 86_400_000

interface Line {
  id: string
  rows: number
  total: number
}

/**
 * Lines of what happened, newest first: rows of one batch are one line, and so are the possessions that one person
 * logged in one game, and what one person did to a still. SQLite takes a bare column from the row that holds the maximum.
 */
const LINES = `
  SELECT id, at, rows, count(*) OVER () AS total FROM (
    SELECT c.id, max(c.at) AS at, count(*) AS rows
      FROM changes c LEFT JOIN possessions p ON c.kind = 'possessions' AND c.action = 'made' AND p.id = c.rowId
     WHERE c.teamId = ? AND c.at >= ?
     GROUP BY CASE WHEN c.batchId IS NOT NULL THEN c.batchId || c.action
                   WHEN p.id IS NOT NULL
                   THEN coalesce(c.personId, '') || coalesce(p.scoutedGameId, p.gameId)
                   WHEN c.kind = 'stills' THEN c.rowId || coalesce(c.personId, '')
                   ELSE c.id END)
   ORDER BY at DESC, id LIMIT ?`

type Place = Pick<NewsRow, 'label' | 'open' | 'opponentId' | 'scoutedGameId' | 'gameId'>

/** Where rows of a kind are, and what they are called; `r` is the row. A person's name stands in none but squad_players. */
const PLACES: Record<
  string,
  { label: string; from: string; open?: string; opponent?: string; scouted?: string; game?: string }
> = {
  opponents: { label: 'r.name', from: '', opponent: 'r.id' },
  scouted_games: {
    label: `o.shortName || ' v ' || r.foe`,
    from: 'JOIN opponents o ON o.id = r.opponentId',
    opponent: 'o.id',
    scouted: 'r.id',
  },
  games: {
    label: 'o.name',
    from: 'JOIN opponents o ON o.id = r.opponentId',
    opponent: 'o.id',
    game: 'r.id',
  },
  possessions: {
    label: `'No. ' || r.number || ', ' || o.shortName || CASE WHEN s.id IS NULL THEN ' against us' ELSE ' v ' || s.foe END`,
    from: `LEFT JOIN scouted_games s ON s.id = r.scoutedGameId LEFT JOIN games g ON g.id = r.gameId
           JOIN opponents o ON o.id = coalesce(s.opponentId, g.opponentId)`,
    opponent: 'o.id',
    scouted: 's.id',
    game: 'g.id',
  },
  stills: {
    label: `'Still of no. ' || p.number || ', ' || o.shortName`,
    from: `JOIN possessions p ON p.id = r.possessionId LEFT JOIN scouted_games s ON s.id = p.scoutedGameId
           LEFT JOIN games g ON g.id = p.gameId JOIN opponents o ON o.id = coalesce(s.opponentId, g.opponentId)`,
    open: 'p.deletedAt IS NULL',
    opponent: 'o.id',
    scouted: 's.id',
    game: 'g.id',
  },
  opponent_players: {
    label: `'No. ' || r.jersey || ' of ' || o.shortName`,
    from: 'JOIN opponents o ON o.id = r.opponentId',
    opponent: 'o.id',
  },
  plans: {
    label: `'Plan ' || r.number || ' against ' || o.shortName`,
    from: 'JOIN games g ON g.id = r.gameId JOIN opponents o ON o.id = g.opponentId',
    opponent: 'o.id',
    game: 'g.id',
  },
  practices: {
    label: `'Practice for ' || o.shortName`,
    from: 'JOIN games g ON g.id = r.gameId JOIN opponents o ON o.id = g.opponentId',
    opponent: 'o.id',
    game: 'g.id',
  },
  counters: { label: 'r.name', from: '' },
  rules: { label: `'Rule ' || r.number`, from: '' },
  // Only while the player is there: a name goes with whoever it belongs to.
  squad_players: { label: `CASE WHEN r.deletedAt IS NULL THEN r.firstName ELSE '' END`, from: '' },
}

const NOWHERE: Place = { label: '', open: false, opponentId: null, scoutedGameId: null, gameId: null }

/** Names and places of rows of one kind, by id. */
async function placesOf(
  manager: EntityManager,
  kind: string,
  teamId: string,
  ids: readonly string[],
): Promise<Map<string, Place>> {
  const sql = PLACES[kind]
  if (!sql) return new Map()
  const rows: (Omit<Place, 'open'> & { id: string; open: number })[] = await manager.query(
    `SELECT r.id, ${sql.label} AS label, ${sql.open ?? 'r.deletedAt IS NULL'} AS open, ${sql.opponent ?? 'NULL'} AS opponentId,
            ${sql.scouted ?? 'NULL'} AS scoutedGameId, ${sql.game ?? 'NULL'} AS gameId
       FROM "${kind}" r ${sql.from} WHERE r.teamId = ? AND r.id IN (${ids.map(() => '?').join(', ')})`,
    [teamId, ...ids],
  )
  return new Map(rows.map(({ id, open, ...place }) => [id, { ...place, open: open === 1 }]))
}

/** What happened in a team since an instant (without one, in the last seven days), newest first. */
export async function newsOf(
  manager: EntityManager,
  teamId: string,
  { since, limit }: { since?: string | undefined; limit: number },
  now: Date,
): Promise<News> {
  const from = since ?? new Date(now.getTime() - WEEK_MS).toISOString()
  const lines: Line[] = await manager.query(LINES, [teamId, from, limit])
  const changes = await manager.getRepository(Change).find({
    where: { id: In(lines.map(({ id }) => id)) },
    relations: { person: true },
  })
  const places = new Map<string, Place>()
  for (const kind of new Set(changes.map((change) => change.kind))) {
    const ids = new Set(changes.filter((change) => change.kind === kind).map((change) => change.rowId))
    for (const [id, place] of await placesOf(manager, kind, teamId, [...ids])) places.set(id, place)
  }
  const byId = new Map(changes.map((change) => [change.id, change]))
  return {
    total: lines[0]?.total ?? 0,
    rows: lines.flatMap(({ id, rows }) => {
      const change = byId.get(id)
      return change ? [{ ...presentChange(change), rows, ...(places.get(change.rowId) ?? NOWHERE) }] : []
    }),
  }
}

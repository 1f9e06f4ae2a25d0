import { LIMITS } from '@shared/limits'

/** Rows of `table` hang on a row of another one by `column`: they go and come back with it. */
interface Hanging {
  table: string
  column: string
}

/** Every table whose rows can be deleted with an undo, and what hangs on each. Children come before parents. */
const HANGING: Record<string, readonly Hanging[]> = {
  possessions: [],
  opponent_players: [],
  plans: [],
  practices: [],
  counters: [],
  scouted_games: [{ table: 'possessions', column: 'scoutedGameId' }],
  games: [
    { table: 'possessions', column: 'gameId' },
    { table: 'plans', column: 'gameId' },
    { table: 'practices', column: 'gameId' },
  ],
  opponents: [
    { table: 'scouted_games', column: 'opponentId' },
    { table: 'games', column: 'opponentId' },
    { table: 'opponent_players', column: 'opponentId' },
  ],
}

export const DELETABLE_TABLES: readonly string[] = Object.keys(HANGING)

/** What hangs on rows of a table, directly. */
export const hangingOn = (table: string): readonly Hanging[] => HANGING[table] ?? []

/** The tables that rows of a table hang on, and by which column. */
export const parentsOf = (table: string): Hanging[] =>
  Object.entries(HANGING).flatMap(([parent, children]) =>
    children.filter((child) => child.table === table).map(({ column }) => ({ table: parent, column })),
  )

/** Deletions made at this instant or before it can no longer be undone at `now`. */
export const undoUntil = (now: Date): string =>
  new Date(now.getTime() - LIMITS.undoMinutes * 60_000).toISOString()

/** Tables whose rows go with a parent by their foreign key and may have a history of their own. */
const GOES_ALONG = ['stills', 'copies', 'practice_reps']

/** A statement of the purge, and the columns that it reads: an older database has not all of them. */
interface PurgeStatement {
  sql: string
  needs: readonly (readonly [table: string, column: string])[]
}

/**
 * What has to be run, in this order, so that deletions past their undo are gone for good: letters about their
 * sheets, the rows themselves with all that hangs on them, and the history of every row that is gone. A
 * statement that holds a question mark takes the instant of `undoUntil`. The same for the live database and for
 * the copy in a backup.
 */
export const PURGE_STATEMENTS: readonly PurgeStatement[] = [
  {
    sql: `DELETE FROM "mails" WHERE "aboutId" IN (
            SELECT s."id" FROM "sheets" s JOIN "plans" p ON p."id" = s."planId" WHERE p."deletedAt" <= ?)`,
    needs: [
      ['mails', 'aboutId'],
      ['plans', 'deletedAt'],
    ],
  },
  ...DELETABLE_TABLES.map((table): PurgeStatement => ({
    sql: `DELETE FROM "${table}" WHERE "deletedAt" <= ?`,
    needs: [[table, 'deletedAt']],
  })),
  ...[...DELETABLE_TABLES, ...GOES_ALONG].map((table): PurgeStatement => ({
    sql: `DELETE FROM "changes" WHERE "kind" = '${table}'
               AND NOT EXISTS (SELECT 1 FROM "${table}" t WHERE t."id" = "changes"."rowId")`,
    needs: [
      ['changes', 'rowId'],
      [table, 'id'],
    ],
  })),
]

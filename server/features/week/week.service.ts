import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { GameRow } from '@shared/games/schemas'
import { STATIONS, type Station } from '@shared/vocabulary'
import type { Week, WeekMark } from '@shared/week/schemas'
import { Opponent } from '../../database/entities/Opponent'
import { Practice } from '../../database/entities/Practice'
import { Team } from '../../database/entities/Team'
import type { Caller } from '../../http/endpoint'
import { dayAfter, dayInZone, startOfDay } from '../../http/zone'
import { staffOf } from '../games/around'
import { listGames } from '../games/games.service'
import { weekOf } from './days'
import { lastTimeOut } from './lastTime'
import { sinceThen } from './since'

const ORDER = STATIONS.map(({ value }) => value)
const DUE_STATIONS: readonly Station[] = ['scout', 'read', 'choose', 'teach', 'review']

const markOf = (game: GameRow, more: Pick<WeekMark, 'kind' | 'at'> & Partial<WeekMark>): WeekMark => ({
  gameId: game.id,
  opponentName: game.opponentName,
  place: game.place,
  station: null,
  done: false,
  holder: null,
  ...more,
})

/** Tip-off and due dates of a game. */
function marksOf(game: GameRow): WeekMark[] {
  const due = { ...game.due, choose: game.chooseBy }
  const dates = DUE_STATIONS.flatMap((station) => {
    const at = due[station as keyof typeof due]
    if (!at) return []
    const done = ORDER.indexOf(game.station) > ORDER.indexOf(station)
    const holder = game.station === station ? game.holder : null
    return [markOf(game, { kind: 'due', at, station, done, holder })]
  })
  return [markOf(game, { kind: 'tip-off', at: game.tipOff }), ...dates]
}

async function practiceMarks(
  manager: EntityManager,
  teamId: string,
  games: readonly GameRow[],
): Promise<WeekMark[]> {
  const rows = await manager
    .getRepository(Practice)
    .createQueryBuilder('row')
    .where('row.teamId = :teamId AND row.deletedAt IS NULL', { teamId })
    .getMany()
  const byId = new Map(games.map((game) => [game.id, game]))
  return rows.flatMap(({ gameId, startsAt }) => {
    const game = byId.get(gameId)
    return game ? [markOf(game, { kind: 'practice', at: startsAt })] : []
  })
}

/**
 * A team's week for one of its staff.
 * @param on a calendar day of the week that is wanted, in the team's zone; today without it
 */
export async function weekFor(
  db: DataSource,
  { caller, on, now }: { caller: Caller; on: string | undefined; now: Date },
): Promise<Week> {
  const { manager } = db
  const { teamId } = caller
  const { timeZone } = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const today = dayInZone(now, timeZone)
  const days = weekOf(on ?? today)
  const games = await listGames(db, teamId, now, caller)
  const ahead = games.filter(({ tipOff }) => tipOff > now.toISOString())
  const last = games.filter(({ tipOff }) => tipOff <= now.toISOString()).at(-1) ?? null
  const marks = [...games.flatMap(marksOf), ...(await practiceMarks(manager, teamId, games))]
  return {
    now: now.toISOString(),
    today,
    days,
    marks: marks
      .filter(({ at }) => days.includes(dayInZone(new Date(at), timeZone)))
      .sort((a, b) => a.at.localeCompare(b.at)),
    games: ahead,
    last,
    lastTime: last && (await lastTimeOut(manager, teamId, last)),
    since: await sinceThen(manager, teamId, startOfDay(dayAfter(today, -1), timeZone)),
    coaches: (await staffOf(manager, teamId)).map(({ id, name, initials }) => ({ id, name, initials })),
    empty:
      games.length === 0 &&
      !(await manager.getRepository(Opponent).existsBy({ teamId, deletedAt: IsNull() })),
  }
}

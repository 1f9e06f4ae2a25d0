import type { Coach, GameBody, GameRow } from '@shared/games/schemas'
import { STATIONS, valuesOf, type Station, type TeamRole } from '@shared/vocabulary'
import type { Game } from '../../database/entities/Game'
import type { Listing } from '../../http/listing'
import { metaOf } from '../../http/present'
import { mayHandOn } from './games.policy'

/** What stands around a game; the station and whoever has the ball follow from it. */
export interface GameFacts {
  opponentName: string
  possessions: number
  scoutedGames: number
  /** Our own games against them in which something was logged. */
  ourGames: number
  plan: GameRow['plan']
  headCoach: Coach | null
  /** The staff of the team, by id. */
  staff: ReadonlyMap<string, Coach>
  /** Whoever watched the opponent's newest game; null when nobody has. */
  scoutId: string | null
  /** The newest hand-on of this game. */
  handedOn: (NonNullable<GameRow['handedOn']> & { station: Station }) | null
  readBy: Coach | null
  /** Whoever asks. */
  caller: { personId: string; role: TeamRole } | null
}

/** Fewer counted possessions than this and the game is still with the scout (setting). */
const ENOUGH_TO_READ = 10

/**
 * Where the work stands, from what is there: played, chosen and signed, picks begun, read signed off, counted.
 * A later step that was taken moves the work on whether or not an earlier one was written down: a plan that is
 * signed off or begun is past the read, also where nobody signed the read off.
 */
function stationOf(
  game: Pick<Game, 'tipOff' | 'readAt'>,
  facts: Pick<GameFacts, 'possessions' | 'plan'>,
  now: Date,
): Station {
  if (game.tipOff <= now.toISOString()) return 'review'
  if (facts.plan) return facts.plan.signedAt ? 'teach' : 'choose'
  if (game.readAt) return 'choose'
  return facts.possessions < ENOUGH_TO_READ ? 'scout' : 'read'
}

/**
 * Whoever has the ball. A hand-on holds while the work stands at the station it was made at; when the work moves
 * on the ball goes to whoever the next station is usually with: Scout and Read to the scout of the newest game
 * that was watched, Choose, Teach and Review to the head coach. Somebody who left the staff has no ball.
 */
export function holderOf(
  game: Pick<Game, 'holderId'>,
  station: Station,
  facts: Pick<GameFacts, 'staff' | 'scoutId' | 'headCoach' | 'handedOn'>,
): Coach | null {
  const holds = facts.handedOn === null || facts.handedOn.station === station
  const held = holds && game.holderId ? facts.staff.get(game.holderId) : undefined
  if (held) return held
  if (station !== 'scout' && station !== 'read') return facts.headCoach
  return (facts.scoutId && facts.staff.get(facts.scoutId)) || null
}

const NOT_DUE: GameBody['due'] = { scout: null, read: null, teach: null, review: null }

export const bodyOfGame = (row: Game): GameBody => ({
  opponentId: row.opponentId,
  tipOff: row.tipOff,
  place: row.place,
  rulePack: row.rulePack,
  chooseBy: row.chooseBy,
  due: row.due ?? NOT_DUE,
  notes: row.notes,
})

export function presentGame(row: Game, facts: GameFacts, now: Date): GameRow {
  const station = stationOf(row, facts, now)
  const holder = holderOf(row, station, facts)
  return {
    ...metaOf(row),
    ...bodyOfGame(row),
    opponentName: facts.opponentName,
    station,
    counts: { possessions: facts.possessions, scoutedGames: facts.scoutedGames, ourGames: facts.ourGames },
    plan: facts.plan,
    headCoach: facts.headCoach && { name: facts.headCoach.name, initials: facts.headCoach.initials },
    holder,
    read: row.readAt === null ? null : { at: row.readAt, by: facts.readBy },
    handedOn: facts.handedOn && {
      from: facts.handedOn.from,
      to: facts.handedOn.to,
      note: facts.handedOn.note,
      at: facts.handedOn.at,
    },
    mayHandOn: facts.caller !== null && mayHandOn(facts.caller, holder),
  }
}

/** How the list of games is searched and ordered. */
export const GAME_LISTING: Listing<GameRow, 'tipOff' | 'opponent' | 'station'> = {
  words: (row) => row.opponentName,
  by: {
    tipOff: (row) => row.tipOff,
    opponent: (row) => row.opponentName,
    station: (row) => valuesOf(STATIONS).indexOf(row.station),
  },
}

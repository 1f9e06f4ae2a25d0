import type { EntityManager } from 'typeorm'
import type { Choices } from '@shared/choices/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import { rulePack } from '@shared/court/rulePacks'
import type { Trigger } from '@shared/vocabulary'
import { countOwnSuccess, countOwnThrowInCounts } from '../../database/counting/records'
import { Game } from '../../database/entities/Game'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { chooseCounters } from '../../engine/choose'
import type { GivenFacts } from '../../engine/facts'
import { dayInZone } from '../../http/zone'
import { listCounters } from '../counters/counters.service'
import { listRules } from '../rules/rules.service'
import { presentSquadPlayer } from '../squad/squad.presenter'
import { readOpponent, type OpponentRead } from '../tendencies/readOpponent'

/** The calendar day of a game in the team's zone. */
async function dayOf(manager: EntityManager, teamId: string, tipOff: string): Promise<string> {
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  return dayInZone(new Date(tipOff), team.timeZone)
}

/** The squad as it will be on the day of a game. */
export async function squadOn(manager: EntityManager, teamId: string, tipOff: string) {
  const day = await dayOf(manager, teamId, tipOff)
  const rows = await manager.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  return rows.map((row) => presentSquadPlayer(row, day))
}

const DAY = 86_400_000

/** What rules ask of the read and the book. `day` is the day of our game in the team's zone. */
export function givenFacts(
  read: Pick<OpponentRead, 'games' | 'situations'>,
  counters: readonly Pick<CounterRow, 'diagram'>[],
  day: string,
): Partial<GivenFacts> {
  const pressedAfter = (trigger: Trigger) =>
    read.situations.find((situation) => situation.trigger === trigger)?.pressed ?? 0
  const newest = read.games
    .map((game) => game.day)
    .sort()
    .at(-1)
  const blind = ({ diagram }: Pick<CounterRow, 'diagram'>) =>
    diagram.steps.some((step) => step.moves.some((move) => move.kind === 'screen' && move.blind))
  return {
    pressedAfterScore: pressedAfter('made-basket') + pressedAfter('made-free-throw'),
    pressedAfterFreeThrow: pressedAfter('made-free-throw'),
    pressedAfterDeadBall: pressedAfter('dead-ball'),
    pressedAfterBreak: pressedAfter('break'),
    filmDays: newest === undefined ? null : Math.round((Date.parse(day) - Date.parse(newest)) / DAY),
    blindScreens: counters.filter(blind).length,
  }
}

/** Our counters in order against the opponent of a game, with reasons. @throws NotFound */
export async function chooseFor(manager: EntityManager, teamId: string, gameId: string): Promise<Choices> {
  const game = await findInTeam(manager, Game, teamId, gameId, 'game')
  const read = await readOpponent(manager, game.opponentId, {})
  const pack = rulePack(game.rulePack)
  const counters = await listCounters(manager, teamId)
  const day = await dayOf(manager, teamId, game.tipOff)
  const chosen = await chooseCounters({
    tendencies: read.tendencies,
    rules: await listRules(manager, teamId),
    counters,
    squad: await squadOn(manager, teamId, game.tipOff),
    pack: { key: pack.key, backcourtCount: pack.backcourtSeconds },
    own: await countOwnSuccess(manager, teamId),
    given: {
      ...givenFacts(read, counters, day),
      ownThrowInCounts: await countOwnThrowInCounts(manager, teamId),
    },
  })
  return { gameId, opponentId: game.opponentId, ...chosen }
}

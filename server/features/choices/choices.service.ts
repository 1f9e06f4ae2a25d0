import type { EntityManager } from 'typeorm'
import type { Choices, Turn } from '@shared/choices/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import { rulePack } from '@shared/court/rulePacks'
import type { Trigger } from '@shared/vocabulary'
import {
  countOurStealsInMiddle,
  countOwnSuccess,
  countOwnThrowInCounts,
  countTheirStealsInMiddle,
} from '../../database/counting/records'
import { Game } from '../../database/entities/Game'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { chooseCounters, type ChooseInput } from '../../engine/choose'
import type { GivenFacts } from '../../engine/facts'
import { whatWouldTurn } from '../../engine/turns'
import { dayInZone } from '../../http/zone'
import { listCounters } from '../counters/counters.service'
import { listRules } from '../rules/rules.service'
import { presentSquadPlayer } from '../squad/squad.presenter'
import { engineSettings } from '../team/team.service'
import { readOpponent, type OpponentRead } from '../tendencies/readOpponent'

/** The calendar day of a game in the team's zone. */
async function dayOf(manager: EntityManager, teamId: string, tipOff: string): Promise<string> {
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  return dayInZone(new Date(tipOff), team.timeZone)
}

/** The squad as it will be on the day of a game. */
async function squadOn(manager: EntityManager, teamId: string, tipOff: string) {
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

/** Everything that the order for a game is worked out from. @throws NotFound */
async function chooseInput(
  manager: EntityManager,
  teamId: string,
  gameId: string,
): Promise<{ input: ChooseInput; opponentId: string; cells: OpponentRead['cells'] }> {
  const game = await findInTeam(manager, Game, teamId, gameId, 'game')
  const settings = await engineSettings(manager, teamId)
  const read = await readOpponent(manager, game.opponentId, {}, settings)
  const pack = rulePack(game.rulePack)
  const counters = await listCounters(manager, teamId)
  const day = await dayOf(manager, teamId, game.tipOff)
  const input: ChooseInput = {
    tendencies: read.tendencies,
    settings,
    rules: await listRules(manager, teamId),
    counters,
    squad: await squadOn(manager, teamId, game.tipOff),
    pack: { key: pack.key, backcourtCount: pack.backcourtSeconds },
    own: await countOwnSuccess(manager, teamId),
    given: {
      ...givenFacts(read, counters, day),
      ownThrowInCounts: await countOwnThrowInCounts(manager, teamId),
      theirStealsInMiddle: await countTheirStealsInMiddle(manager, game.opponentId),
      ourStealsInMiddle: await countOurStealsInMiddle(manager, teamId),
    },
  }
  return { input, opponentId: game.opponentId, cells: read.cells }
}

/** Our counters in order against the opponent of a game, with reasons. @throws NotFound */
export async function chooseFor(manager: EntityManager, teamId: string, gameId: string): Promise<Choices> {
  const { input, opponentId } = await chooseInput(manager, teamId, gameId)
  return { gameId, opponentId, ...(await chooseCounters(input)) }
}

/**
 * The same order as it would be were a rule written like this; nothing is kept. A rule of the team's with this id
 * is replaced, another one joins them.
 * @throws NotFound
 */
export async function previewRule(
  manager: EntityManager,
  teamId: string,
  gameId: string,
  rule: ChooseInput['rules'][number],
): Promise<Choices> {
  const { input, opponentId } = await chooseInput(manager, teamId, gameId)
  const at = input.rules.findIndex(({ id }) => id === rule.id)
  const rules = at < 0 ? [...input.rules, rule] : input.rules.with(at, rule)
  return { gameId, opponentId, ...(await chooseCounters({ ...input, rules })) }
}

/** What their next rows would have to show for another counter to lead. @throws NotFound */
export async function turnsFor(manager: EntityManager, teamId: string, gameId: string): Promise<Turn[]> {
  const { input, cells } = await chooseInput(manager, teamId, gameId)
  return whatWouldTurn(input, cells)
}

import type { EntityManager } from 'typeorm'
import type { Choices } from '@shared/choices/schemas'
import { rulePack } from '@shared/court/rulePacks'
import { countOwnSuccess } from '../../database/counting/records'
import { Game } from '../../database/entities/Game'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { chooseCounters } from '../../engine/choose'
import { dayInZone } from '../../http/zone'
import { listCounters } from '../counters/counters.service'
import { listRules } from '../rules/rules.service'
import { presentSquadPlayer } from '../squad/squad.presenter'
import { readOpponent } from '../tendencies/readOpponent'

/** The squad as it will be on the day of a game. */
export async function squadOn(manager: EntityManager, teamId: string, tipOff: string) {
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const day = dayInZone(new Date(tipOff), team.timeZone)
  const rows = await manager.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  return rows.map((row) => presentSquadPlayer(row, day))
}

/** Our counters in order against the opponent of a game, with reasons. @throws NotFound */
export async function chooseFor(manager: EntityManager, teamId: string, gameId: string): Promise<Choices> {
  const game = await findInTeam(manager, Game, teamId, gameId, 'game')
  const read = await readOpponent(manager, game.opponentId, {})
  const pack = rulePack(game.rulePack)
  const chosen = await chooseCounters({
    tendencies: read.tendencies,
    rules: await listRules(manager, teamId),
    counters: await listCounters(manager, teamId),
    squad: await squadOn(manager, teamId, game.tipOff),
    pack: { key: pack.key, backcourtCount: pack.backcourtSeconds },
    own: await countOwnSuccess(manager, teamId),
  })
  return { gameId, opponentId: game.opponentId, ...chosen }
}

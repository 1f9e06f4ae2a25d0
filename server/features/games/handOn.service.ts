import { randomUUID } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { GameRow, HandOnBody } from '@shared/games/schemas'
import { Game } from '../../database/entities/Game'
import { HandOn } from '../../database/entities/HandOn'
import { Membership } from '../../database/entities/Membership'
import { findInTeam } from '../../database/findInTeam'
import { recordChange } from '../../database/history'
import type { Caller } from '../../http/endpoint'
import { BadInput, NotAllowed, NotFound } from '../../http/problem'
import { presentGames } from './games.service'

interface OnGame {
  gameId: string
  caller: Caller
  now: Date
}

/** The game as it stands for a caller who may move it on. @throws NotFound, NotAllowed */
async function movable(
  manager: EntityManager,
  { gameId, caller, now }: OnGame,
): Promise<{ row: Game; game: GameRow }> {
  const row = await findInTeam(manager, Game, caller.teamId, gameId, 'game')
  const [game] = await presentGames(manager, caller.teamId, [row], now, caller)
  if (!game?.mayHandOn) {
    const whose = game?.holder ? `It is with ${game.holder.name}.` : 'It is with nobody yet.'
    throw new NotAllowed(`${whose} Ask them, or the head coach.`)
  }
  return { row, game }
}

/**
 * Gives the ball to somebody of the staff, at the station where the work stands. To whoever has it already, with
 * nothing to say, it changes nothing.
 * @throws NotFound, NotAllowed, BadInput for a player
 */
export function handOn(db: DataSource, { body, ...options }: OnGame & { body: HandOnBody }): Promise<void> {
  const { gameId, caller, now } = options
  return db.transaction(async (manager) => {
    const { game } = await movable(manager, options)
    const to = await manager
      .getRepository(Membership)
      .findOneBy({ teamId: caller.teamId, personId: body.toId })
    if (!to) throw new NotFound('coach')
    if (to.role === 'player')
      throw new BadInput([{ field: 'toId', message: 'Players do not prepare games. Choose a coach.' }])
    if (game.holder?.id === body.toId && body.note === '') return
    await manager.getRepository(HandOn).insert({
      id: randomUUID(),
      teamId: caller.teamId,
      gameId,
      station: game.station,
      fromId: game.holder?.id ?? null,
      toId: body.toId,
      note: body.note,
      at: now.toISOString(),
    })
    // The ball is no part of what a PUT edits: whoever has the game open keeps the version they have.
    await manager.getRepository(Game).update({ id: gameId }, { holderId: body.toId })
  })
}

/**
 * Signs the read of a game off, or takes that back: then the ball is at Choose already, so that whoever signed it
 * may, too. The same again changes nothing.
 * @throws NotFound, NotAllowed
 */
export function signRead(
  db: DataSource,
  { signed, ...options }: OnGame & { signed: boolean },
): Promise<void> {
  const { gameId, caller, now } = options
  return db.transaction(async (manager) => {
    const found = await findInTeam(manager, Game, caller.teamId, gameId, 'game')
    const own = !signed && found.readById === caller.personId
    const row = own ? found : (await movable(manager, options)).row
    if ((row.readAt !== null) === signed) return
    const readAt = signed ? now.toISOString() : null
    await manager
      .getRepository(Game)
      .update({ id: gameId }, { readAt, readById: signed ? caller.personId : null })
    await recordChange(manager, Game, {
      teamId: caller.teamId,
      rowId: gameId,
      action: 'changed',
      by: caller.personId,
      now,
      fields: [{ field: 'readAt', from: row.readAt, to: readAt }],
    })
  })
}

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

/** The game as it stands. @throws NotFound */
async function standing(manager: EntityManager, { gameId, caller, now }: OnGame): Promise<GameRow> {
  const row = await findInTeam(manager, Game, caller.teamId, gameId, 'game')
  const [game] = await presentGames(manager, caller.teamId, [row], now, caller)
  return game as GameRow
}

/** @throws NotAllowed for a caller who may not move it on */
function checkMovable({ mayHandOn, holder }: GameRow): void {
  if (mayHandOn) return
  throw new NotAllowed(
    `${holder ? `It is with ${holder.name}.` : 'It is with nobody yet.'} Ask them, or the head coach.`,
  )
}

/**
 * Gives the ball to somebody of the staff, at the station where the work stands. To whoever has it already, with
 * nothing to say, it changes nothing; nor does the same again, when an answer got lost on its way.
 * @throws NotFound, NotAllowed, BadInput for a player
 */
export function handOn(db: DataSource, { body, ...options }: OnGame & { body: HandOnBody }): Promise<void> {
  const { gameId, caller, now } = options
  return db.transaction(async (manager) => {
    const game = await standing(manager, options)
    if (await isRepeat(manager, options, body, game)) return
    checkMovable(game)
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

/** Whether the last that happened to the ball, at this station, is that the caller handed it on with these words. */
async function isRepeat(
  manager: EntityManager,
  { gameId, caller }: OnGame,
  { toId, note }: HandOnBody,
  { station }: GameRow,
): Promise<boolean> {
  const [newest] = await manager
    .getRepository(HandOn)
    .find({ where: { gameId }, order: { at: 'DESC' }, take: 1 })
  return (
    newest?.fromId === caller.personId &&
    newest.toId === toId &&
    newest.note === note &&
    newest.station === station
  )
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
    const own = found.readById === caller.personId
    if (!own) checkMovable(await standing(manager, options))
    if ((found.readAt !== null) === signed) return
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
      fields: [{ field: 'readAt', from: found.readAt, to: readAt }],
    })
  })
}

import type { DataSource } from 'typeorm'
import { FrozenPlan, type SheetRow } from '@shared/sheets/schemas'
import { Game } from '../../database/entities/Game'
import { Plan } from '../../database/entities/Plan'
import { Sheet } from '../../database/entities/Sheet'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { NotFound } from '../../http/problem'
import { presentSheetRow, type WholeSheet } from './sheets.presenter'

/** Sheets of a team, or of one game, newest first. @throws NotFound for another team's game */
export async function listSheets(db: DataSource, teamId: string, gameId?: string): Promise<SheetRow[]> {
  if (gameId !== undefined) await findInTeam(db.manager, Game, teamId, gameId, 'game')
  const sheets = await db.getRepository(Sheet).find({
    where: { teamId, ...(gameId === undefined ? {} : { plan: { gameId } }) },
    relations: { plan: true },
    order: { createdAt: 'DESC' },
  })
  return sheets.flatMap((sheet) => {
    const content = FrozenPlan.safeParse(sheet.plan?.frozen)
    return sheet.plan && content.success
      ? [
          presentSheetRow({
            sheet,
            gameId: sheet.plan.gameId,
            planNumber: sheet.plan.number,
            content: content.data,
          }),
        ]
      : []
  })
}

/** A sheet with its players' names as they are now. @throws NotFound */
export async function getSheet(db: DataSource, teamId: string, id: string): Promise<WholeSheet> {
  const sheet = await findInTeam(db.manager, Sheet, teamId, id, 'sheet')
  const plan = await db.getRepository(Plan).findOneByOrFail({ id: sheet.planId })
  const content = FrozenPlan.safeParse(plan.frozen)
  if (!content.success) throw new NotFound('sheet')
  const team = await db.getRepository(Team).findOneByOrFail({ id: teamId })
  const named = new Set(
    [content.data.firstCall, content.data.changeUp].flatMap(
      (counter) => counter?.roles.map((role) => role.squadPlayerId) ?? [],
    ),
  )
  const squad = await db.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  return {
    sheet,
    gameId: plan.gameId,
    planNumber: plan.number,
    content: content.data,
    timeZone: team.timeZone,
    players: squad
      .filter((player) => named.has(player.id))
      .map((player) => ({ squadPlayerId: player.id, firstName: player.firstName, jersey: player.jersey })),
  }
}

/** @throws NotFound when the player is not of this team */
export const checkReader = (db: DataSource, teamId: string, squadPlayerId: string): Promise<SquadPlayer> =>
  findInTeam(db.manager, SquadPlayer, teamId, squadPlayerId, 'player')

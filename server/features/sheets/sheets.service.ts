import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import { fullerBudgetOf } from '@shared/sheets/fuller'
import { FrozenPlan, type SheetRow } from '@shared/sheets/schemas'
import { Game } from '../../database/entities/Game'
import type { Plan } from '../../database/entities/Plan'
import { Sheet } from '../../database/entities/Sheet'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { findInTeam } from '../../database/findInTeam'
import { Conflict, NotFound } from '../../http/problem'
import { findSheet } from './findSheet'
import { pageOfSheet, presentSheetRow, type WholeSheet } from './sheets.presenter'

/** Sheets of a team, or of one game, newest first. @throws NotFound for another team's game */
export async function listSheets(db: DataSource, teamId: string, gameId?: string): Promise<SheetRow[]> {
  if (gameId !== undefined) await findInTeam(db.manager, Game, teamId, gameId, 'game')
  const sheets = await db.getRepository(Sheet).find({
    where: { teamId, plan: { deletedAt: IsNull(), ...(gameId === undefined ? {} : { gameId }) } },
    relations: { plan: { signedBy: true } },
    order: { createdAt: 'DESC', plan: { number: 'DESC' } },
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
            signedBy: sheet.plan.signedBy?.name ?? null,
          }),
        ]
      : []
  })
}

/** A sheet with its players' names as they are now. @throws NotFound */
export async function getSheet(manager: EntityManager, teamId: string, id: string): Promise<WholeSheet> {
  const { sheet, plan } = await findSheet(manager, teamId, id)
  const content = FrozenPlan.safeParse(plan.frozen)
  if (!content.success) throw new NotFound('sheet')
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const named = new Set(
    [content.data.firstCall, content.data.changeUp].flatMap(
      (counter) => counter?.roles.map((role) => role.squadPlayerId) ?? [],
    ),
  )
  const squad = await manager.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  return {
    sheet,
    gameId: plan.gameId,
    planNumber: plan.number,
    content: content.data,
    timeZone: team.timeZone,
    players: squad
      .filter((player) => named.has(player.id))
      .map((player) => ({ squadPlayerId: player.id, firstName: player.firstName, jersey: player.jersey })),
    newest: await newerThan(manager, sheet, plan),
  }
}

/** The newest sheet of the same game, when there is a newer one. */
async function newerThan(manager: EntityManager, sheet: Sheet, plan: Plan): Promise<WholeSheet['newest']> {
  const [newest] = await manager.getRepository(Sheet).find({
    where: { teamId: sheet.teamId, plan: { gameId: plan.gameId, deletedAt: IsNull() } },
    relations: { plan: true },
    order: { plan: { number: 'DESC' } },
    take: 1,
  })
  return newest?.plan && newest.id !== sheet.id ? { id: newest.id, planNumber: newest.plan.number } : null
}

/**
 * Chooses the fuller page, or the light one again.
 * @throws NotFound, Conflict when the fuller page would hold too much
 */
export function chooseFuller(
  db: DataSource,
  { teamId, sheetId, fuller }: { teamId: string; sheetId: string; fuller: boolean },
): Promise<void> {
  return db.transaction(async (manager) => {
    const whole = await getSheet(manager, teamId, sheetId)
    const budget = fuller ? fullerBudgetOf(pageOfSheet(whole, null)) : null
    if (budget?.over)
      throw new Conflict(
        `The fuller page would hold ${budget.words} words, ${budget.limit} at most. Shorten the keys or the looks, then sign off again.`,
      )
    await manager.getRepository(Sheet).update({ id: sheetId }, { fuller })
  })
}

/** @throws NotFound when the player is not of this team */
export const checkReader = (db: DataSource, teamId: string, squadPlayerId: string): Promise<SquadPlayer> =>
  findInTeam(db.manager, SquadPlayer, teamId, squadPlayerId, 'player')

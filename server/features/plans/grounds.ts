import { z } from 'zod'
import type { EntityManager } from 'typeorm'
import type { Choices } from '@shared/choices/schemas'
import { LIMITS } from '@shared/limits'
import { Ground } from '@shared/plans/grounds'
import { evidenceIds } from '../../database/counting/evidenceIds'
import { habitSql } from '../../database/counting/habitSql'
import { Game } from '../../database/entities/Game'
import { Plan } from '../../database/entities/Plan'
import { findInTeam } from '../../database/findInTeam'
import { NotFound } from '../../http/problem'

type Habit = Ground['habits'][number]

/** The rows behind a habit at this moment: those of k, and the rest of n. */
async function rowsBehind(
  manager: EntityManager,
  opponentId: string,
  key: string,
): Promise<Pick<Habit, 'rowIds' | 'otherIds'>> {
  const sql = habitSql(key)
  if (!sql) return { rowIds: [], otherIds: [] }
  const { rows } = await evidenceIds(manager, opponentId, sql, {}, { limit: LIMITS.groundRows, offset: 0 })
  const idsOf = (counted: boolean) => rows.filter((row) => row.counted === counted).map(({ id }) => id)
  return { rowIds: idsOf(true), otherIds: idsOf(false) }
}

/** Every reason for or against the picked counters, with the possessions behind it (RECORD.md section 5). */
export async function groundsOf(
  manager: EntityManager,
  choices: Choices,
  picked: readonly string[],
): Promise<Ground[]> {
  const behind = new Map<string, Pick<Habit, 'rowIds' | 'otherIds'>>()
  const grounds: Ground[] = []
  for (const { counterId, reasons } of choices.choices.filter((choice) => picked.includes(choice.counterId)))
    for (const { ruleId, ruleNumber, title, because, asked, weight, facts } of reasons) {
      const habits: Habit[] = []
      for (const { habitKey: key, k, n, games } of facts) {
        const rows = behind.get(key) ?? (await rowsBehind(manager, choices.opponentId, key))
        behind.set(key, rows)
        habits.push({ key, k, n, games, ...rows })
      }
      grounds.push({ counterId, ruleId, ruleNumber, title, because, asked, weight, habits })
    }
  return grounds
}

const Kept = z.object({ grounds: z.array(Ground).default([]) })

/** What a signed version stood on; the newest signed one unless another is asked for. @throws NotFound */
export async function planGrounds(
  manager: EntityManager,
  teamId: string,
  gameId: string,
  planId?: string,
): Promise<Ground[]> {
  await findInTeam(manager, Game, teamId, gameId, 'game')
  const versions = await manager.getRepository(Plan).find({ where: { gameId }, order: { number: 'DESC' } })
  const plan = versions.find(({ id, signedAt }) => (planId === undefined ? signedAt !== null : id === planId))
  if (planId !== undefined && !plan) throw new NotFound('plan')
  const kept = Kept.safeParse(plan?.frozen ?? {})
  return kept.success ? kept.data.grounds : []
}

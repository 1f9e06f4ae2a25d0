import type { DataSource, EntityManager } from 'typeorm'
import { RuleBody, type RuleRow } from '@shared/rules/schemas'
import { Rule } from '../../database/entities/Rule'
import { putRow, type Put } from '../../database/putRow'
import { bodyOfRule, presentRule } from './rules.presenter'

/** The team's rules in the order of their numbers; a rule that can no longer be read is left out. */
export async function listRules(manager: EntityManager, teamId: string): Promise<RuleRow[]> {
  const rows = await manager
    .getRepository(Rule)
    .find({ where: { teamId }, order: { number: 'ASC', createdAt: 'ASC' } })
  return rows.flatMap((row) => {
    const body = bodyOfRule(row)
    return body ? [presentRule(row, body)] : []
  })
}

/** @throws NotFound, Conflict, StaleVersion */
export function putRule(
  db: DataSource,
  options: { id: string; teamId: string; body: RuleBody; ifMatch: number | null; now: Date; by: string },
): Promise<Put<Rule>> {
  return db.transaction((manager) =>
    putRow<Rule, RuleBody>({
      ...options,
      manager,
      entity: Rule,
      what: 'rule',
      bodyOf: (row) => RuleBody.parse({ ...(row.body as object), on: row.on }),
      columnsOf: (body) => ({ number: body.number, on: body.on, body }),
      present: (row) => presentRule(row, RuleBody.parse(row.body)),
    }),
  )
}

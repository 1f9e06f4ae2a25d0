import type { EntityManager } from 'typeorm'
import type { BookQuery } from '@shared/counters/book'
import { rulePack, type RulePackKey } from '@shared/court/rulePacks'
import { bookPdf, type BookPage } from '../../adapters/pdf/bookPdf'
import { Team } from '../../database/entities/Team'
import { Conflict, NotFound } from '../../http/problem'
import { listCounters } from '../counters/counters.service'

/**
 * The team's book as a file: every counter by name, or those asked for, which may be drafts or taken out of the
 * book. Each stands on the team's own book of rules where it is drawn for it, else on the first that it names.
 * @throws NotFound for a counter that the team does not have
 * @throws Conflict when there is none to print
 */
export async function printBook(
  manager: EntityManager,
  teamId: string,
  { paper, counters }: BookQuery,
): Promise<Buffer> {
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  const all = await listCounters(manager, teamId, counters === undefined ? 'book' : 'all')
  const known = new Set(all.map(({ id }) => id))
  if (counters?.some((id) => !known.has(id))) throw new NotFound('counter')
  const rows = counters === undefined ? all : all.filter(({ id }) => counters.includes(id))
  if (rows.length === 0) throw new Conflict('The book has no counter to print yet.')
  const pages = rows.map((counter): BookPage => ({ counter, pack: packOf(counter.rulePacks, team.rulePack) }))
  return bookPdf(pages, paper, `${team.name}, ${team.squadName}`)
}

const packOf = (drawnFor: readonly RulePackKey[], teams: RulePackKey) =>
  rulePack(drawnFor.includes(teams) ? teams : (drawnFor[0] ?? teams))

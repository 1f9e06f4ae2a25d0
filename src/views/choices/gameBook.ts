import type { Choices } from '@shared/choices/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import type { GameRow } from '@shared/games/schemas'
import type { PlanState } from '@shared/plans/schemas'
import type { RuleRow } from '@shared/rules/schemas'
import type { SheetList } from '@shared/sheets/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import type { TendencyRead } from '@shared/tendencies/schemas'
import { getChoices } from '@/api/choices'
import { listCounters } from '@/api/counters'
import { getPlan } from '@/api/plans'
import { listRules } from '@/api/rules'
import { listGameSheets } from '@/api/sheets'
import { listSquad } from '@/api/squad'
import { getTendencies } from '@/api/tendencies'

/** Everything that a pick for one game is made from. */
export interface GameBook {
  game: GameRow
  choices: Choices
  counters: CounterRow[]
  squad: SquadPlayerRow[]
  rules: RuleRow[]
  plan: PlanState
  sheets: SheetList['rows']
  /** Everything counted of the opponent. */
  read: TendencyRead
}

/** Loads them side by side. @throws as the api does; the first fault stops all */
export async function loadGameBook(team: string, game: GameRow, signal: AbortSignal): Promise<GameBook> {
  const [choices, counters, squad, rules, plan, sheets, read] = await Promise.all([
    getChoices(team, game.id, signal),
    listCounters(team, signal),
    listSquad(team, signal),
    listRules(team, signal),
    getPlan(team, game.id, signal),
    listGameSheets(team, game.id, signal),
    getTendencies(team, game.opponentId, {}, signal),
  ])
  return {
    game,
    choices,
    counters: counters.rows,
    squad: squad.rows,
    rules: rules.rows,
    plan,
    sheets: sheets.rows,
    read,
  }
}

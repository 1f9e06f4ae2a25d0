import type { FactName } from '@shared/rules/schemas'
import type { RulePackKey } from '@shared/court/rulePacks'
import type { SquadPlayerRow } from '@shared/squad/schemas'

/** What the engine needs of a squad player. */
export type EnginePlayer = Pick<SquadPlayerRow, 'id' | 'skills' | 'available'>

/** The level from which a skill counts as there: 2, under pressure. */
const UNDER_PRESSURE = 2

export type Facts = Record<FactName, number>

/** What rules may ask that is no habit (FACTS): counted from the squad, given by the rule set and the record. */
export function factsOf(input: {
  squad: readonly EnginePlayer[]
  pressedRows: number
  /** Seconds. */
  backcourtCount: number
}): Facts {
  const available = input.squad.filter((player) => player.available)
  const having = (skill: keyof EnginePlayer['skills']) =>
    available.filter((player) => player.skills[skill] >= UNDER_PRESSURE).length
  return {
    pressedRows: input.pressedRows,
    handlers: having('handle'),
    longArms: having('long-arm'),
    middlePlayers: having('decide'),
    backcourtCount: input.backcourtCount,
    available: available.length,
  }
}

/** The rule set of the game as the engine needs it. */
export interface EnginePack {
  key: RulePackKey
  /** Seconds. */
  backcourtCount: number
}

import type { FactName } from '@shared/rules/schemas'
import type { RulePackKey } from '@shared/court/rulePacks'
import type { SquadPlayerRow } from '@shared/squad/schemas'

/** What the engine needs of a squad player. */
export type EnginePlayer = Pick<SquadPlayerRow, 'id' | 'skills' | 'available'>

type SkillName = keyof EnginePlayer['skills']

/** Levels of a skill (shared/squad): when free, under pressure, our best. */
const WHEN_FREE = 1
const UNDER_PRESSURE = 2
const OUR_BEST = 3

type SquadFact =
  | 'handlers'
  | 'longArms'
  | 'middlePlayers'
  | 'available'
  | 'dribblingThrowers'
  | 'bestHandlers'
  | 'otherLongArms'
  | 'sprinters'

/** What only the record, the rule set and the book can say; null while they do not. */
export type GivenFacts = Record<
  Exclude<FactName, SquadFact | 'pressedRows' | 'backcourtCount'>,
  number | null
>

/** Null is no answer: no condition holds on it. */
export type Facts = Record<SquadFact | 'pressedRows' | 'backcourtCount', number> & GivenFacts

const NOTHING_GIVEN: GivenFacts = {
  timeOutWhileThrowing: null,
  pressedAfterScore: null,
  pressedAfterFreeThrow: null,
  pressedAfterDeadBall: null,
  pressedAfterBreak: null,
  disguised: null,
  ownThrowInCounts: null,
  filmDays: null,
  theirStealsInMiddle: null,
  ourStealsInMiddle: null,
  timeOutAdvance: null,
  blindScreens: null,
}

function squadFacts(squad: readonly EnginePlayer[]): Record<SquadFact, number> {
  const available = squad.filter((player) => player.available)
  const has = (player: EnginePlayer, skill: SkillName, level = UNDER_PRESSURE) =>
    player.skills[skill] >= level
  const count = (holds: (player: EnginePlayer) => boolean) => available.filter(holds).length
  const topHandle = Math.max(0, ...available.map((player) => player.skills.handle))
  return {
    handlers: count((player) => has(player, 'handle')),
    longArms: count((player) => has(player, 'long-arm')),
    middlePlayers: count((player) => has(player, 'decide')),
    available: available.length,
    dribblingThrowers: count((player) => has(player, 'throw-in') && has(player, 'handle', WHEN_FREE)),
    bestHandlers: count((player) => has(player, 'handle', OUR_BEST)),
    otherLongArms: count((player) => has(player, 'long-arm') && !has(player, 'handle', topHandle)),
    sprinters: count((player) => has(player, 'sprint')),
  }
}

/** What rules may ask that is no habit (FACTS): counted from the squad, given by the rule set and the record. */
export function factsOf(input: {
  squad: readonly EnginePlayer[]
  pressedRows: number
  /** Seconds. */
  backcourtCount: number
  given?: Partial<GivenFacts>
}): Facts {
  return {
    ...NOTHING_GIVEN,
    ...input.given,
    ...squadFacts(input.squad),
    pressedRows: input.pressedRows,
    backcourtCount: input.backcourtCount,
  }
}

/** The rule set of the game as the engine needs it. */
export interface EnginePack {
  key: RulePackKey
  /** Seconds. */
  backcourtCount: number
}

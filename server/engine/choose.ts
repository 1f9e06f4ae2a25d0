import type { Choice, Choices } from '@shared/choices/schemas'
import { rulePack } from '@shared/court/rulePacks'
import { habitOf } from '@shared/tendencies/habits'
import type { Count } from '@shared/stats/clusters'
import { reaches } from '@shared/stats/evidence'
import { factsOf, type EnginePack, type EnginePlayer, type GivenFacts } from './facts'
import { baseOf, estimate, rank, weightedRecord, type Contender, type EngineCounter } from './ranking'
import { banOn, reasonsFor, warningsFor, warningsForAll } from './reasons'
import { assignRoles } from '@shared/stats/roles'
import { runRules, type EngineRule, type FiredRule } from './rules'
import { ENGINE_DEFAULTS, type EngineSettings } from './settings'
import type { EngineTendency } from './tendencies'

export interface ChooseInput {
  /** The opponent's, as `tendencies()` returns them. */
  tendencies: readonly EngineTendency[]
  rules: readonly EngineRule[]
  counters: readonly EngineCounter[]
  squad: readonly EnginePlayer[]
  pack: EnginePack
  /** Our own trips against pressure in our games, and how many got through. */
  own: Count
  /** What else the record and the book say; a rule that asks what is left out stays silent. */
  given?: Partial<GivenFacts>
  settings?: Partial<EngineSettings>
}

export type ChosenCounters = Omit<Choices, 'gameId' | 'opponentId'>

const SHAPE = 'shape:'

const countOf = (tendencies: readonly EngineTendency[], key: string): Count => {
  const found = tendencies.find((tendency) => tendency.key === key)
  return { k: found?.k ?? 0, n: found?.n ?? 0 }
}

/** The shape they showed most, as counted; of two equals the one listed first. Null when none was. */
function mostlyOf(tendencies: readonly EngineTendency[]): Choices['mostly'] {
  const best = tendencies
    .filter((tendency) => tendency.key.startsWith(SHAPE) && tendency.k > 0)
    .reduce<EngineTendency | null>((held, next) => (held && held.k >= next.k ? held : next), null)
  return best && { shape: best.key.slice(SHAPE.length), k: best.k, n: best.n }
}

/** No pressed rows, or nothing above a sighting among the habits given pressed (RECORD.md section 5). */
export function isUnknown(tendencies: readonly EngineTendency[]): boolean {
  return !tendencies.some(
    (tendency) => habitOf(tendency.key)?.givenPressed && reaches(tendency.grade, 'hint'),
  )
}

interface Scene {
  fired: readonly FiredRule[]
  squad: readonly EnginePlayer[]
  pack: EnginePack
  unknown: boolean
  base: number
  mostly: string | null
  settings: EngineSettings
}

type LeftOut = Choices['leftOut'][number]

/** Why a counter is not offered, or null: the rule set, a ban, a role that nobody can fill. */
function leftOutOf(counter: EngineCounter, unfillable: string | null, scene: Scene): LeftOut | null {
  const out = (reason: string, ruleId: string | null = null) => ({ counterId: counter.id, reason, ruleId })
  if (!counter.rulePacks.includes(scene.pack.key)) return out('It is not drawn for this game’s rule set.')
  const ban = banOn(counter.traits, scene.fired)
  if (ban) return out(ban.rule.because, ban.rule.id)
  return unfillable === null ? null : out(unfillable)
}

function contend(counter: EngineCounter, scene: Scene): Contender | LeftOut {
  const { settings, fired, mostly } = scene
  const given = assignRoles(counter.roles, scene.squad, settings.leastFit)
  // A club that has not written its squad down yet is not one that nobody plays for: its places stay empty.
  const assignment = scene.squad.length === 0 ? { ...given, squadTerm: 0, unfillable: null } : given
  const left = leftOutOf(counter, assignment.unfillable, scene)
  if (left) return left
  const reasons = reasonsFor(counter.traits, fired, settings.strengths)
  const known = scene.unknown
    ? { expected: null, prior: null, recordShare: 0 }
    : estimate(
        {
          base: scene.base,
          weights: reasons.map((reason) => reason.weight),
          squadTerm: assignment.squadTerm,
          record: weightedRecord(counter, mostly, settings.recordWeights),
        },
        settings,
      )
  const choice: Omit<Choice, 'rank'> = {
    counterId: counter.id,
    ...known,
    record: sameShape(counter, mostly),
    reasons,
    warnings: warningsFor(counter.traits, fired),
    squadTerm: assignment.squadTerm,
    roles: assignment.roles,
    gameReady: counter.liveReps >= settings.leastLiveReps,
  }
  return {
    choice,
    newActions: counter.newActions,
    universal: counter.traits.includes('universal'),
    name: counter.name,
  }
}

const sameShape = (counter: EngineCounter, mostly: string | null): Count => {
  const rows = counter.record.filter((row) => row.shape === mostly)
  return {
    k: rows.reduce((sum, row) => sum + row.k, 0),
    n: rows.reduce((sum, row) => sum + row.n, 0),
  }
}

/**
 * The whole way from what an opponent does to our counters in order: rules fire, counters are left out or
 * estimated, roles are given, the rest is ranked (RECORD.md section 5). Pure: the same input gives the
 * same answer, and the caller adds whose game it is.
 */
export async function chooseCounters(input: ChooseInput): Promise<ChosenCounters> {
  const settings = { ...ENGINE_DEFAULTS, ...input.settings }
  const mostly = mostlyOf(input.tendencies)
  const facts = factsOf({
    squad: input.squad,
    pressedRows: countOf(input.tendencies, 'press').k,
    backcourtCount: input.pack.backcourtCount,
    given: {
      timeOutWhileThrowing: Number(rulePack(input.pack.key).timeOutWhileThrowing),
      timeOutAdvance: Number(rulePack(input.pack.key).timeOutAdvance),
      disguised: countOf(input.tendencies, 'disguise').k,
      ...input.given,
    },
  })
  const { fired, silenced } = await runRules(input.rules, input.tendencies, facts)
  const base = baseOf(input.own, settings)
  const unknown = isUnknown(input.tendencies)
  const scene: Scene = {
    fired,
    squad: input.squad,
    pack: input.pack,
    unknown,
    base: base.mean,
    mostly: mostly?.shape ?? null,
    settings,
  }
  const contenders: Contender[] = []
  const leftOut: LeftOut[] = []
  for (const counter of input.counters) {
    const outcome = contend(counter, scene)
    if ('choice' in outcome) contenders.push(outcome)
    else leftOut.push(outcome)
  }
  return {
    unknown,
    base,
    mostly,
    others: countOf(input.tendencies, 'others-through'),
    choices: rank(contenders, unknown, settings.tieWithin),
    leftOut,
    silenced: silenced.map(({ rule, because }) => ({ ruleId: rule.id, because })),
    warnings: warningsForAll(fired),
  }
}

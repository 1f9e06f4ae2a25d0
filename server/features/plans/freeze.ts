import type { EntityManager } from 'typeorm'
import type { Ground } from '@shared/plans/grounds'
import { FrozenPlan, type FrozenCounter } from '@shared/sheets/schemas'
import type { CounterRow } from '@shared/counters/schemas'
import { Game } from '../../database/entities/Game'
import { Opponent } from '../../database/entities/Opponent'
import type { Plan } from '../../database/entities/Plan'
import { findInTeam } from '../../database/findInTeam'
import { chooseFor } from '../choices/choices.service'
import { getCounter } from '../counters/counters.service'
import { readOpponent } from '../tendencies/readOpponent'
import { groundsOf } from './grounds'
import { describePress } from './pressLines'

type Seats = ReadonlyMap<string, string | null>

/** Who has which role of a counter: as given by the head coach, else as the engine fills it. */
function seatsOf(
  plan: Plan,
  counter: CounterRow,
  suggested: { role: string; squadPlayerId: string | null }[],
): Seats {
  const given = new Map(
    plan.roles
      .filter((role) => role.counterId === counter.id)
      .map((role) => [role.role as string, role.squadPlayerId]),
  )
  const taken = new Set(given.values())
  return new Map(
    counter.roles.map(({ role }) => {
      const own = given.get(role)
      if (own !== undefined) return [role, own]
      const filled = suggested.find((fit) => fit.role === role)?.squadPlayerId ?? null
      return [role, filled !== null && taken.has(filled) ? null : filled]
    }),
  )
}

const freezeCounter = (counter: CounterRow, seats: Seats): FrozenCounter => ({
  counterId: counter.id,
  name: counter.name,
  call: counter.call,
  diagram: counter.diagram,
  looks: counter.looks,
  roles: counter.roles.map(({ role, title, jobs, changeUpLine, keyStep }) => ({
    role,
    title,
    jobs,
    changeUpLine,
    keyStep,
    squadPlayerId: seats.get(role) ?? null,
  })),
})

/**
 * Everything a sheet needs, as it stands at this moment, and what the picks stood on, for staff: later changes to
 * counters, counts or roles do not reach either. Players are kept by id only.
 * @throws NotFound when a picked counter is gone
 */
export async function freezePlan(
  manager: EntityManager,
  plan: Plan & { firstCallId: string },
): Promise<FrozenPlan & { grounds: Ground[] }> {
  const { teamId } = plan
  const game = await findInTeam(manager, Game, teamId, plan.gameId, 'game')
  const opponent = await findInTeam(manager, Opponent, teamId, game.opponentId, 'opponent')
  const read = await readOpponent(manager, opponent.id, {})
  const choices = await chooseFor(manager, teamId, game.id)
  const frozen = async (id: string) => {
    const counter = await getCounter(manager, teamId, id)
    const suggested = choices.choices.find((choice) => choice.counterId === id)?.roles ?? []
    return freezeCounter(counter, seatsOf(plan, counter, suggested))
  }
  const content = FrozenPlan.parse({
    version: 1,
    opponentName: opponent.name,
    tipOff: game.tipOff,
    place: game.place,
    rulePack: game.rulePack,
    press: {
      pressed: read.tendencies.find((tendency) => tendency.key === 'press')?.k ?? 0,
      mostlyShape: choices.mostly?.shape ?? null,
      ...describePress(read),
    },
    firstCall: await frozen(plan.firstCallId),
    changeUp: plan.changeUpId === null ? null : await frozen(plan.changeUpId),
    keys: plan.keys,
  } satisfies FrozenPlan)
  const picked = [plan.firstCallId, plan.changeUpId].filter((id) => id !== null)
  return { ...content, grounds: await groundsOf(manager, choices, picked) }
}

import type { Choice } from '@shared/choices/schemas'
import type { PlanRow } from '@shared/plans/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import type { Role } from '@shared/vocabulary'

/** Who plays which role of a counter: as the plan for the next game has it, else who fits best. */
export function counterFive(
  counterId: string,
  next: { plan: PlanRow | null; choices: readonly Choice[] } | null,
  squad: readonly SquadPlayerRow[],
): [Role, SquadPlayerRow][] {
  if (next === null) return []
  const planned = (next.plan?.roles ?? []).filter((given) => given.counterId === counterId)
  const fits = next.choices.find((choice) => choice.counterId === counterId)?.roles ?? []
  const given = new Map<Role, string>()
  for (const { role, squadPlayerId } of fits) if (squadPlayerId !== null) given.set(role, squadPlayerId)
  for (const { role, squadPlayerId } of planned) given.set(role, squadPlayerId)
  const players = new Map(squad.map((player) => [player.id, player]))
  return [...given].flatMap(([role, id]): [Role, SquadPlayerRow][] => {
    const player = players.get(id)
    return player ? [[role, player]] : []
  })
}

/** "2 runs by Nell’s own sprint" for those that were timed; empty where nobody was. */
export function sprintWords(five: readonly [Role, SquadPlayerRow][]): string {
  const timed = five.filter(([, { sprint20 }]) => sprint20 !== null)
  if (timed.length === 0) return ''
  const names = timed.map(([role, { firstName }]) => `${firstName} as ${role}`).join(', ')
  return `By their own sprint: ${names}. The others by the settings.`
}

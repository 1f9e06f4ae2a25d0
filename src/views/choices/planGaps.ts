import type { Role } from '@shared/vocabulary'

interface Player {
  firstName: string
  /** Out through this day, YYYY-MM-DD; null is available. */
  outUntil: string | null
}

/**
 * What is amiss with the five of a picked counter on the day of the game: a role nobody has, or one whose
 * player is out. One sentence each.
 */
export function gapsOf(
  counterName: string,
  seats: ReadonlyMap<Role, string | null>,
  squad: ReadonlyMap<string, Player>,
  day: string,
): string[] {
  return [...seats].flatMap(([role, playerId]) => {
    const player = playerId === null ? undefined : squad.get(playerId)
    if (player === undefined) return [`${counterName}: nobody has role ${role}.`]
    return player.outUntil === null || player.outUntil < day
      ? []
      : [`${counterName}: ${player.firstName} is out and has role ${role}.`]
  })
}

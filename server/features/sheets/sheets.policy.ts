import type { Caller } from '../../http/endpoint'

/** Staff draw anybody's copy; a player draws her own or the general one. */
export const mayDrawFor = (
  caller: Pick<Caller, 'role' | 'squadPlayerId'>,
  squadPlayerId: string | null,
): boolean => caller.role !== 'player' || squadPlayerId === null || squadPlayerId === caller.squadPlayerId

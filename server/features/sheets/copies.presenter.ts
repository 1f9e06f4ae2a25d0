import type { CopyPlace, CopyRow } from '@shared/sheets/handOut'
import type { Copy } from '../../database/entities/Copy'
import type { Mail } from '../../database/entities/Mail'
import type { SquadPlayer } from '../../database/entities/SquadPlayer'
import { metaOf } from '../../http/present'

/** What is looked up beside a copy: whose it is and how its letter fares. */
export interface CopyFacts {
  player: Pick<SquadPlayer, 'firstName' | 'jersey'> | null
  /** A coach's name, for a letter to staff. */
  coach: string | null
  mail: Pick<Mail, 'state' | 'trouble' | 'sentAt'> | null
}

/** In the bag until it is given out; back once it was brought. */
export function placeOf({ outAt, backAt }: Pick<Copy, 'outAt' | 'backAt'>): CopyPlace {
  if (backAt !== null) return 'back'
  return outAt === null ? 'bag' : 'out'
}

export const presentCopy = (row: Copy, { player, coach, mail }: CopyFacts): CopyRow => ({
  ...metaOf(row),
  sheetId: row.sheetId,
  number: row.number,
  way: row.way,
  squadPlayerId: row.squadPlayerId,
  // A guardian's letter goes by the number alone.
  name: row.way === 'guardian' ? null : (player?.firstName ?? coach),
  jersey: player?.jersey ?? null,
  place: row.way === 'paper' ? placeOf(row) : null,
  outAt: row.outAt,
  backAt: row.backAt,
  letter: mail && { state: mail.state, trouble: mail.trouble, sentAt: mail.sentAt },
})

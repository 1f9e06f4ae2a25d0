import type { RulePack } from '@shared/court/rulePacks'
import type { ChangeRow } from '@shared/history/schemas'
import { fieldName, valueWords } from './fieldWords'

/** One line of everything that happened to a row. */
export interface HistoryLine {
  key: string
  at: string
  who: string
  /** What was done where there is no field to tell: "logged it". */
  did: string
  /** The field that was changed, with both its values in words. */
  change: { changeId: string; field: string; name: string; was: string; now: string } | null
  /** Several rows were changed in one go. */
  many: boolean
  /** The line can be put back. */
  canPutBack: boolean
}

const DID: Record<ChangeRow['action'], string> = {
  made: 'logged it',
  changed: 'changed it',
  deleted: 'threw it away',
  restored: 'put it back',
}
/** Kept by the machine, not said by anybody. */
const QUIET = new Set(['frame', 'tripId', 'scoutedGameId', 'gameId'])

const firstName = (name: string): string => name.split(' ')[0] ?? name

/** The lines of a row's history, oldest first; a change of three fields is three lines. */
export function historyLines(changes: readonly ChangeRow[], pack: RulePack): HistoryLine[] {
  return changes.flatMap((change): HistoryLine[] => {
    const base = {
      at: change.at,
      who: change.who === null ? 'Somebody who has left' : firstName(change.who.name),
      many: change.batchId !== null,
    }
    const fields = change.fields.filter(({ field }) => !QUIET.has(field))
    if (change.action !== 'changed' || fields.length === 0)
      return [{ ...base, key: change.id, did: DID[change.action], change: null, canPutBack: false }]
    return fields.map(({ field, from, to }) => ({
      ...base,
      key: `${change.id} ${field}`,
      did: '',
      change: {
        changeId: change.id,
        field,
        name: fieldName(field),
        was: valueWords(field, from, pack),
        now: valueWords(field, to, pack),
      },
      canPutBack: !isLong(from),
    }))
  })
}

/** A long text is told by its length only: the words themselves are not in the history. */
const isLong = (value: unknown): boolean => typeof value === 'object' && value !== null && 'long' in value

/** A line as it is read out: "took away: was nothing, now pass back, Tomas". */
export const lineWords = ({ who, did, change }: HistoryLine): string =>
  change === null ? `${who} ${did}` : `${change.name}: was ${change.was}, now ${change.now}, ${who}`

import { instantOf } from './stamp'

const DAY_MS = 86_400_000

/** The end of a name while its folder is being written. */
export const PART = '.part'
/** Before the stamp of a folder that a restore was put in place of. */
export const BEFORE_RESTORE = 'before-restore-'
/** Before the stamp of a folder that a restore is prepared in. */
export const RESTORING = 'restoring-'

/** What of a folder's names has to go, given the days that backups are kept. */
export interface Over {
  /** Whole backups and folders set aside by a restore, older than the retention. */
  kept: string[]
  /** Folders that a run left half-written, more than a day old. */
  unfinished: string[]
}

/** Names that are none of ours are never among them. A backup goes once its days are over, not before. */
export function namesOver(names: readonly string[], days: number, now: Date): Over {
  const olderThan = (stamp: string, age: number) => {
    const made = instantOf(stamp)
    return made !== null && made.getTime() < now.getTime() - age * DAY_MS
  }
  const half = (name: string) => name.endsWith(PART) || name.startsWith(RESTORING)
  const bare = (name: string) =>
    [BEFORE_RESTORE, RESTORING].reduce(
      (rest, start) => (rest.startsWith(start) ? rest.slice(start.length) : rest),
      name.endsWith(PART) ? name.slice(0, -PART.length) : name,
    )
  return {
    kept: names.filter((name) => !half(name) && olderThan(bare(name), days)).sort(),
    unfinished: names.filter((name) => half(name) && olderThan(bare(name), 1)).sort(),
  }
}

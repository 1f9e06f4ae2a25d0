import { randomUUID } from 'node:crypto'
import type { EntityManager } from 'typeorm'

/** Ids made for the keys of one kind of demo row. */
export class Ids {
  private readonly made = new Map<string, string>()

  /** The id of a key, made on first use. */
  of(key: string): string {
    const id = this.made.get(key) ?? randomUUID()
    this.made.set(key, id)
    return id
  }

  /** Null stays null. */
  ofNullable = (key: string | null): string | null => (key === null ? null : this.of(key))
}

/** What every part of the loading works with. */
export interface Load {
  manager: EntityManager
  now: Date
  ids: Ids
}

/** What every row of a team carries; `at` is when it was written, else now. */
export const meta = ({ now, ids }: Load, teamKey: string, key: string, at?: string) => {
  const stamp = at ?? now.toISOString()
  return { id: ids.of(key), teamId: ids.of(teamKey), version: 1, createdAt: stamp, updatedAt: stamp }
}

import type { EntityManager } from 'typeorm'
import { CounterBody } from '@shared/counters/schemas'
import { RuleBody } from '@shared/rules/schemas'
import { Counter } from './entities/Counter'
import { Rule } from './entities/Rule'

type Keyed<Body> = Body & { key: string }

/** Counters as a team has them that has never run one: no live reps, no practice. */
export const unused = <C extends CounterBody>(counters: readonly C[]): C[] =>
  counters.map((counter) => ({ ...counter, liveReps: 0, practice: { k: 0, n: 0 } }))

/** What a team starts with: counters and rules, as rows of its own that its head coach may change. */
export async function insertBook(
  manager: EntityManager,
  book: {
    teamId: string
    now: Date
    counters: readonly Keyed<CounterBody>[]
    rules: readonly Keyed<RuleBody>[]
    idOf: (kind: 'counter' | 'rule', key: string) => string
  },
): Promise<void> {
  const { teamId, now, idOf } = book
  const stamp = now.toISOString()
  const meta = { teamId, version: 1, createdAt: stamp, updatedAt: stamp }
  for (const { key, ...counter } of book.counters) {
    const body = CounterBody.parse(counter)
    await manager.insert(Counter, {
      ...meta,
      id: idOf('counter', key),
      name: body.name,
      family: body.family,
      body,
    })
  }
  for (const { key, ...rule } of book.rules) {
    const body = RuleBody.parse(rule)
    await manager.insert(Rule, { ...meta, id: idOf('rule', key), number: body.number, on: body.on, body })
  }
}

import type { CounterBody } from '@shared/counters/schemas'

/** A counter as the API takes it, with the key by which the scenario's own games name it. */
export type DemoCounter = CounterBody & { key: string }

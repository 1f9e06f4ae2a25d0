import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_RULES } from '@server/database/demo/rules'
import { badId, type Row } from './row'
import type { World } from './world'

const rowsOf = { counter: (rows: World) => ({ id: rows.counters[0] ?? '' }) }
const { key: _counter, ...counterBody } = DEMO_COUNTERS[0] ?? { key: '' }
const { key: _rule, ...ruleBody } = DEMO_RULES[0] ?? { key: '' }

/** The library of counters, the book that is printed of it, and the rules. */
export const BOOK_ROWS: Record<string, Row> = {
  'get /counters': { at: () => ({}), success: 200, bad: { query: 'show=mine', field: 'show' } },
  'get /book.pdf': {
    at: () => ({}),
    success: 200,
    query: (rows) => `counters=${rows.counters[0] ?? ''}`,
    bad: { query: 'paper=a3', field: 'paper' },
  },
  'get /counters/{id}': { at: rowsOf.counter, success: 200, bad: badId },
  'put /counters/{id}': {
    at: rowsOf.counter,
    success: 200,
    body: () => counterBody,
    bad: { body: { ...counterBody, name: '' }, field: 'name' },
  },
  'post /counters/preview': {
    at: () => ({}),
    success: 200,
    body: () => counterBody,
    bad: { body: { name: 'no drawing' }, field: 'diagram' },
  },
  'get /counters/{id}/export.json': { at: rowsOf.counter, success: 200, bad: badId },
  'post /counters/{id}/walked': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'post /counters/{id}/archive': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'post /counters/{id}/unarchive': { at: rowsOf.counter, success: 200, body: () => ({}), bad: badId },
  'get /rules': { at: () => ({}), success: 200, bad: { field: '' } },
  'put /rules/{id}': {
    at: (rows) => ({ id: rows.rule }),
    success: 200,
    body: () => ruleBody,
    bad: { body: { ...ruleBody, because: '' }, field: 'because' },
  },
  'delete /counters/{id}': { at: (rows) => ({ id: rows.counters[1] ?? '' }), success: 204, bad: badId },
  'post /counters/{id}/restore': {
    at: (rows) => ({ id: rows.counters[1] ?? '' }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
}

import { randomUUID } from 'node:crypto'
import { DEMO_RULES } from '@server/database/demo/rules'
import { gameBody, practiceBody } from '../fixture'
import { badId, type Row } from './row'
import type { World } from './world'

const rowsOf = { game: (rows: World) => ({ id: rows.game }) }
const { key: _rule, ...ruleBody } = DEMO_RULES[0] ?? { key: '' }

/** Our games from the week to the sheet: who has the ball, choices, plan, practice, copies. */
export const GAME_ROWS: Record<string, Row> = {
  'get /games': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /games/{id}': { at: rowsOf.game, success: 200, bad: badId },
  'put /games/{id}': {
    at: rowsOf.game,
    success: 200,
    body: (rows) => gameBody(rows.opponent),
    bad: { body: { tipOff: '20.3.2026' }, field: 'tipOff' },
  },
  'get /week': { at: () => ({}), success: 200, bad: { query: 'on=monday', field: 'on' } },
  'post /games/{id}/hand-on': {
    at: rowsOf.game,
    success: 200,
    body: (rows) => ({ toId: rows.headCoach }),
    bad: { body: { toId: 'maren' }, field: 'toId' },
  },
  'post /games/{id}/read-sign-off': { at: rowsOf.game, success: 200, bad: badId },
  'delete /games/{id}/read-sign-off': { at: rowsOf.game, success: 200, bad: badId },
  'get /games/{id}/choices': { at: rowsOf.game, success: 200, bad: badId },
  'get /games/{id}/turns': { at: rowsOf.game, success: 200, bad: badId },
  'post /games/{id}/choices/preview': {
    at: rowsOf.game,
    success: 200,
    body: (rows) => ({ id: rows.rule, rule: ruleBody }),
    bad: { body: { id: 'first', rule: ruleBody }, field: 'id' },
  },
  'get /games/{id}/plan': { at: rowsOf.game, success: 200, bad: badId },
  'put /games/{id}/plan': {
    at: rowsOf.game,
    success: 201,
    body: () => ({ id: randomUUID() }),
    bad: { body: { id: randomUUID(), keys: ['a', 'b', 'c', 'd'] }, field: 'keys' },
  },
  'get /games/{id}/plan/grounds': {
    at: rowsOf.game,
    success: 200,
    bad: { query: 'plan=first', field: 'plan' },
  },
  'post /games/{id}/plan/sign-off': {
    at: rowsOf.game,
    success: 200,
    body: (rows) => ({ planId: rows.plan, sheetId: rows.sheet }),
    bad: { body: { planId: 'one', sheetId: randomUUID() }, field: 'planId' },
  },
  'get /games/{id}/sheets': { at: rowsOf.game, success: 200, bad: badId },
  'get /sheets': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /sheets/{id}': { at: (rows) => ({ id: rows.sheet }), success: 200, bad: badId },
  'patch /sheets/{id}': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    body: () => ({ fuller: true, seenWarning: true }),
    bad: { body: { fuller: 'yes' }, field: 'fuller' },
  },
  'get /sheets/{id}/copies': { at: (rows) => ({ id: rows.sheet }), success: 200, bad: badId },
  'post /sheets/{id}/copies': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    body: (rows) => ({ copies: [{ id: rows.copy }] }),
    bad: { body: { copies: [] }, field: 'copies' },
  },
  'get /sheets/{id}/copies.pdf': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    bad: { query: 'paper=napkin', field: 'paper' },
  },
  'patch /copies/{id}': {
    at: (rows) => ({ id: rows.copy }),
    success: 200,
    ifMatch: '"1"',
    body: () => ({ place: 'out' }),
    bad: { body: { place: 'lost' }, field: 'place' },
  },
  'post /sheets/{id}/letters': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    body: () => ({ players: [] }),
    bad: { body: { players: ['nell'] }, field: 'players.0' },
  },
  'get /sheets/{id}/openings': { at: (rows) => ({ id: rows.sheet }), success: 200, bad: badId },
  'post /sheets/{id}/recall': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    bad: badId,
  },
  'get /practices': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /games/{id}/practices': { at: rowsOf.game, success: 200, bad: badId },
  'get /games/{id}/script': {
    at: rowsOf.game,
    success: 200,
    bad: { query: 'minutes=many', field: 'minutes' },
  },
  'get /practices/{id}': { at: (rows) => ({ id: rows.practice }), success: 200, bad: badId },
  'put /practices/{id}': {
    at: (rows) => ({ id: rows.practice }),
    success: 200,
    body: (rows) => practiceBody(rows.game),
    bad: { body: { startsAt: 'Thursday' }, field: 'startsAt' },
  },
  'delete /practices/{id}': { at: (rows) => ({ id: rows.practice }), success: 204, bad: badId },
  'post /practices/{id}/restore': { at: (rows) => ({ id: rows.practice }), success: 200, bad: badId },
  'get /sheets/{id}.pdf': {
    at: (rows) => ({ id: rows.sheet }),
    success: 200,
    bad: { query: 'paper=napkin', field: 'paper' },
  },
  'delete /games/{id}': { at: rowsOf.game, success: 204, bad: badId },
  'post /games/{id}/restore': { at: rowsOf.game, success: 200, body: () => ({}), bad: badId },
}

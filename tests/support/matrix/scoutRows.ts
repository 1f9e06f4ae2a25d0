import { randomUUID } from 'node:crypto'
import { opponentBody, possessionBody, scoutedGameBody } from '../fixture'
import { badId, type Row } from './row'
import type { World } from './world'

const rowsOf = {
  opponent: (rows: World) => ({ id: rows.opponent }),
  scoutedGame: (rows: World) => ({ id: rows.scoutedGame }),
  possession: (rows: World) => ({ id: rows.possession }),
  game: (rows: World) => ({ id: rows.game }),
  still: (rows: World) => ({ id: rows.possession, still: rows.still }),
}

/** A change of many rows that its undo finds: the same in both rows of the table. */
const BATCH = '55555555-5555-4555-8555-555555555555'
const batchBody = (id: string) => ({
  batchId: BATCH,
  rows: [{ id, version: 1 }],
  field: 'handler',
  from: null,
  to: 'weak',
})

/** What is recorded about opponents: games, possessions, stills, players, and their history. */
export const SCOUT_ROWS: Record<string, Row> = {
  'get /opponents': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /strips': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /opponents/{id}': { at: rowsOf.opponent, success: 200, bad: badId },
  'put /opponents/{id}': {
    at: rowsOf.opponent,
    success: 200,
    body: () => opponentBody(),
    bad: { body: { name: '', shortName: 'x' }, field: 'name' },
  },
  'get /opponents/{id}/scouted-games': { at: rowsOf.opponent, success: 200, bad: badId },
  'get /opponents/{id}/tendencies': {
    at: rowsOf.opponent,
    success: 200,
    bad: { query: 'trigger=sometimes', field: 'trigger.0' },
  },
  'get /opponents/{id}/evidence': {
    at: rowsOf.opponent,
    success: 200,
    query: 'habit=press',
    bad: { query: 'habit=whistling', field: 'habit' },
  },
  'get /scouted-games/{id}': { at: rowsOf.scoutedGame, success: 200, bad: badId },
  'put /scouted-games/{id}': {
    at: rowsOf.scoutedGame,
    success: 200,
    body: (rows) => scoutedGameBody(rows.opponent),
    bad: { body: { playedOn: 'yesterday' }, field: 'playedOn' },
  },
  'get /scouted-games/{id}/possessions': { at: rowsOf.scoutedGame, success: 200, bad: badId },
  'get /games/{id}/possessions': { at: rowsOf.game, success: 200, bad: badId },
  'get /possessions/{id}': { at: rowsOf.possession, success: 200, bad: badId },
  'put /possessions/{id}': {
    at: rowsOf.possession,
    success: 200,
    body: (rows) => possessionBody(rows.scoutedGame),
    bad: { body: { trigger: 'sometimes', number: 1 }, field: 'trigger' },
  },
  'patch /possessions/{id}': {
    at: rowsOf.possession,
    success: 200,
    body: () => ({ outcome: 'through' }),
    ifMatch: '"1"',
    bad: { body: { outcome: 'victory' }, field: 'outcome' },
  },
  'post /possessions/{id}/restore': { at: rowsOf.possession, success: 200, body: () => ({}), bad: badId },
  'put /possessions/{id}/stills/{still}': {
    at: rowsOf.still,
    success: 200,
    still: true,
    bad: { field: 'still' },
  },
  'get /stills/{id}': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    bad: { query: 'size=huge', field: 'size' },
  },
  'get /stills/{id}/row': { at: (rows) => ({ id: rows.still }), success: 200, bad: badId },
  'patch /stills/{id}': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    // Nothing new, so that the version stays what the blur below names.
    body: () => ({ caption: '' }),
    ifMatch: '"1"',
    bad: { body: { caption: 'one two three four five six seven eight nine' }, field: 'caption' },
  },
  'post /stills/{id}/blur': {
    at: (rows) => ({ id: rows.still }),
    success: 200,
    body: () => ({ regions: [{ x: 0.1, y: 0.1, w: 0.1, h: 0.1 }] }),
    ifMatch: '"1"',
    bad: { body: { regions: [] }, field: 'regions' },
  },
  'get /opponents/{id}/stills': {
    at: rowsOf.opponent,
    success: 200,
    query: 'report=1',
    bad: { query: 'limit=0', field: 'limit' },
  },
  'delete /possessions/{id}/stills/{still}': {
    at: rowsOf.still,
    success: 204,
    once: 'it is gone for good',
    bad: badId,
  },
  'get /history': {
    at: () => ({}),
    success: 200,
    query: (rows) => `row=${rows.possession}`,
    bad: { query: 'row=first', field: 'row' },
  },
  'get /changes': { at: () => ({}), success: 200, bad: { query: 'since=yesterday', field: 'since' } },
  'get /opponents/{id}/possessions': {
    at: rowsOf.opponent,
    success: 200,
    bad: { query: 'sort=luck', field: 'sort' },
  },
  'post /possessions/{id}/put-back': {
    at: rowsOf.possession,
    success: 200,
    body: (rows) => ({ changeId: rows.change, field: 'outcome' }),
    ifMatch: '"1"',
    bad: { body: { changeId: 'first', field: 'outcome' }, field: 'changeId' },
  },
  'post /possessions/batch': {
    at: () => ({}),
    success: 200,
    body: (rows) => batchBody(rows.possession),
    bad: { body: { ...batchBody(randomUUID()), field: 'id' }, field: 'field' },
  },
  'post /possessions/batch/{batch}/undo': {
    at: () => ({ batch: BATCH }),
    success: 200,
    body: () => ({}),
    bad: { field: '' },
  },
  'get /opponents/{id}/players': { at: rowsOf.opponent, success: 200, bad: badId },
  'put /opponent-players/{id}': {
    at: (rows) => ({ id: rows.opponentPlayer }),
    success: 200,
    body: (rows) => ({ opponentId: rows.opponent, jersey: 12, does: ['thief'] }),
    bad: { body: { jersey: 120 }, field: 'jersey' },
  },
  'delete /opponent-players/{id}': { at: (rows) => ({ id: rows.opponentPlayer }), success: 204, bad: badId },
  'post /opponent-players/{id}/restore': {
    at: (rows) => ({ id: rows.opponentPlayer }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
  'delete /scouted-games/{id}': { at: rowsOf.scoutedGame, success: 204, bad: badId },
  'post /scouted-games/{id}/restore': { at: rowsOf.scoutedGame, success: 200, body: () => ({}), bad: badId },
  'delete /opponents/{id}': { at: rowsOf.opponent, success: 204, bad: badId },
  'post /opponents/{id}/restore': { at: rowsOf.opponent, success: 200, body: () => ({}), bad: badId },
  'delete /possessions/{id}': { at: rowsOf.possession, success: 204, bad: badId },
}

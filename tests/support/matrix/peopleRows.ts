import { PLAYER } from '../testApp'
import { badId, type Row } from './row'
import { invitation } from './world'

const player = {
  jersey: 44,
  firstName: 'Wren',
  skills: { handle: 1, 'throw-in': 1, 'long-arm': 1, decide: 1, sprint: 1, screen: 1 },
}

const teamBody = {
  name: 'Herons',
  squadName: 'U17 girls',
  timeZone: 'Europe/London',
  season: '2026-27',
  rulePack: 'fiba',
  settings: {},
}

/** The team itself: settings, squad, people, invitations, letters, erasures. */
export const PEOPLE_ROWS: Record<string, Row> = {
  'get /settings': { at: () => ({}), success: 200, bad: { field: '' } },
  'put /settings': {
    at: () => ({}),
    success: 200,
    body: () => teamBody,
    ifMatch: '"1"',
    bad: { body: { ...teamBody, season: 'this one' }, field: 'season' },
  },
  'get /squad': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /squad/{id}': { at: () => ({ id: PLAYER }), success: 200, bad: badId },
  'put /squad/{id}': {
    at: () => ({ id: PLAYER }),
    success: 200,
    body: () => player,
    ifMatch: '"1"',
    bad: { body: { ...player, jersey: 140 }, field: 'jersey' },
  },
  'get /mails': { at: () => ({}), success: 200, bad: { query: 'state=lost', field: 'state' } },
  'post /mails/{id}/again': {
    at: (rows) => ({ id: rows.again }),
    success: 200,
    once: 'it has left',
    bad: badId,
  },
  'post /mails/{id}/withdraw': { at: (rows) => ({ id: rows.withdraw }), success: 200, bad: badId },
  'post /members/{id}/password-link': {
    at: (rows) => ({ id: rows.member }),
    success: 200,
    bad: badId,
  },
  'get /people': { at: () => ({}), success: 200, bad: { field: '' } },
  'get /people/export': {
    at: () => ({}),
    success: 200,
    // A head coach takes out anybody's; anybody else only what is kept on them.
    query: (rows, role) =>
      role === 'assistant-coach'
        ? `kind=member&id=${rows.people[role] ?? ''}`
        : `kind=squad-player&id=${PLAYER}`,
    bad: { query: `kind=nobody&id=${PLAYER}`, field: 'kind' },
  },
  'patch /members/{id}': {
    at: (rows) => ({ id: rows.member }),
    success: 200,
    ifMatch: '"1"',
    body: () => ({ role: 'assistant-coach' }),
    bad: { body: { role: 'owner' }, field: 'role' },
  },
  'delete /members/{id}': {
    at: (rows) => ({ id: rows.leaver }),
    success: 204,
    once: 'she is out',
    bad: badId,
  },
  'put /invitations/{id}': {
    at: (rows) => ({ id: rows.invitation }),
    success: 200,
    body: () => invitation,
    bad: { body: { ...invitation, role: 'owner' }, field: 'role' },
  },
  'post /invitations/{id}/resend': {
    at: (rows) => ({ id: rows.invitation }),
    success: 200,
    body: () => ({ days: 3 }),
    bad: { body: { days: 400 }, field: 'days' },
  },
  'delete /invitations/{id}': {
    at: (rows) => ({ id: rows.invitation }),
    success: 204,
    bad: badId,
  },
  'get /erasures/preview': {
    at: () => ({}),
    success: 200,
    query: `kind=squad-player&subjectId=${PLAYER}`,
    bad: { query: `kind=nobody&subjectId=${PLAYER}`, field: 'kind' },
  },
  'put /erasures/{id}': {
    at: (rows) => ({ id: rows.erasure }),
    success: 200,
    body: (rows) => ({ kind: 'squad-player', subjectId: rows.leaving }),
    bad: { body: { kind: 'squad-player', subjectId: 'she' }, field: 'subjectId' },
  },
  'post /erasures/{id}/stop': {
    at: (rows) => ({ id: rows.erasure }),
    success: 200,
    body: () => ({}),
    bad: badId,
  },
  'delete /membership': {
    at: () => ({}),
    success: 204,
    once: 'they have left',
    bad: { field: '' },
  },
}

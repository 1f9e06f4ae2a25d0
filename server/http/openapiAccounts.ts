import {
  Account,
  AskedPassword,
  AskPassword,
  ChangePassword,
  MailChoice,
  UsePasswordLink,
} from '@shared/session/account'
import { Session, SignIn } from '@shared/session/schemas'
import { json, problem, type Json, type Schemas } from './openapiSchemas'

/** What people do with their own accounts: no team in the address, so no entry in the endpoint table. */
export const accountPaths = (schemas: Schemas): Record<string, Json> => ({
  '/session': {
    get: {
      summary: 'Who is signed in and what they may do',
      responses: {
        '200': { description: 'Done', content: json(schemas.of(Session, 'output')) },
        '401': problem('Not signed in'),
      },
    },
    post: {
      summary: 'Sign in',
      requestBody: { required: true, content: json(schemas.of(SignIn, 'input')) },
      responses: {
        '201': { description: 'Signed in', content: json(schemas.of(Session, 'output')) },
        '400': problem('A field is at fault'),
        '401': problem('Address and password do not fit'),
        '429': problem('Too many tries'),
      },
    },
    delete: { summary: 'Sign out', responses: { '204': { description: 'Done' } } },
  },
  '/session/account': {
    get: {
      summary: 'One’s own account',
      responses: {
        '200': { description: 'Done', content: json(schemas.of(Account, 'output')) },
        '401': problem('Not signed in'),
      },
    },
  },
  '/session/password': {
    put: {
      summary: 'Change one’s own password and sign out everywhere else',
      requestBody: { required: true, content: json(schemas.of(ChangePassword, 'input')) },
      responses: {
        '204': { description: 'Changed' },
        '400': problem('A field is at fault, or the old password does not fit'),
        '401': problem('Not signed in'),
        '429': problem('Too many tries'),
      },
    },
  },
  '/session/teams/{team}/mail': {
    put: {
      summary: 'Choose whether sheets of a team come by mail',
      parameters: [{ name: 'team', in: 'path', required: true, schema: { type: 'string', format: 'uuid' } }],
      requestBody: { required: true, content: json(schemas.of(MailChoice, 'input')) },
      responses: {
        '200': { description: 'Done', content: json(schemas.of(Account, 'output')) },
        '400': problem('A field is at fault'),
        '401': problem('Not signed in'),
        '404': problem('Not a team of one’s own'),
      },
    },
  },
  '/session/everywhere': {
    delete: {
      summary: 'Sign out everywhere',
      responses: { '204': { description: 'Done' }, '401': problem('Not signed in') },
    },
  },
  '/password-resets': {
    post: {
      summary: 'Ask for a link to a new password; the answer is the same for every address',
      requestBody: { required: true, content: json(schemas.of(AskPassword, 'input')) },
      responses: {
        '202': { description: 'Asked', content: json(schemas.of(AskedPassword, 'output')) },
        '400': problem('A field is at fault'),
        '429': problem('Asked too often'),
      },
    },
  },
  '/password-resets/use': {
    post: {
      summary: 'Set a new password by a link, once',
      requestBody: { required: true, content: json(schemas.of(UsePasswordLink, 'input')) },
      responses: {
        '204': { description: 'Set; signed out everywhere' },
        '400': problem('A field is at fault'),
        '410': problem('The link no longer works'),
        '429': problem('Too many tries'),
      },
    },
  },
})

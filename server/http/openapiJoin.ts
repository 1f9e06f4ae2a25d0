import { InvitationLook, Joined, LookBody, NewAccount, NewTeam, TeamMade } from '@shared/people/schemas'
import { FirstCoachBySelf } from '@shared/session/firstCoach'
import { json, problem, type Json, type Schemas } from './openapiSchemas'

/** Ways into a team that stand outside any team, so no entry in the endpoint table. */
export const joinPaths = (schemas: Schemas): Record<string, Json> => ({
  '/invitations/look': {
    post: {
      summary: 'Who asks, and into which team, by the secret of a link',
      requestBody: { required: true, content: json(schemas.of(LookBody, 'input')) },
      responses: {
        '200': { description: 'Done', content: json(schemas.of(InvitationLook, 'output')) },
        '400': problem('A field is at fault'),
        '404': problem('The link opens nothing'),
        '410': problem('Used, taken back or past its day'),
        '429': problem('Too many tries'),
      },
    },
  },
  '/invitations/accept': {
    post: {
      summary: 'Join by the secret of a link: with a new account, or as whoever is signed in',
      requestBody: { required: true, content: json(schemas.of(NewAccount.or(LookBody), 'input')) },
      responses: {
        '201': { description: 'Joined and signed in', content: json(schemas.of(Joined, 'output')) },
        '400': problem('A field is at fault'),
        '404': problem('The link opens nothing'),
        '409': problem('The address has an account, or the person is in the team already'),
        '410': problem('Used, taken back or past its day'),
        '429': problem('Too many tries'),
      },
    },
  },
  '/teams': {
    post: {
      summary: 'Another team of a head coach, with counters and rules to start from',
      requestBody: { required: true, content: json(schemas.of(NewTeam, 'input')) },
      responses: {
        '201': { description: 'Made', content: json(schemas.of(TeamMade, 'output')) },
        '400': problem('A field is at fault'),
        '401': problem('Not signed in'),
        '403': problem('Not a head coach'),
        '409': problem('The same team is there already'),
      },
    },
  },
  '/first-coach': {
    post: {
      summary: 'The first team of an empty server, with the token that it printed when it started',
      requestBody: { required: true, content: json(schemas.of(FirstCoachBySelf, 'input')) },
      responses: {
        '201': { description: 'Made and signed in' },
        '400': problem('A field is at fault'),
        '403': problem('Not the token that was printed'),
        '409': problem('There is a team already'),
        '429': problem('Too many tries'),
      },
    },
  },
})

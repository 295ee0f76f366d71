// Teams, their people and invitations.
import { z } from 'zod';
import { ROLES } from '#shared/access';
import { defineEndpoint, may, nameField, personId, rowId, signedIn, when } from './endpoint';

const role = z.enum(ROLES);
const teamParams = z.object({ teamId: rowId });

export const team = z.object({ id: rowId, name: z.string(), role, createdAt: when });
export const person = z.object({ id: personId, name: z.string(), email: z.string(), role, since: when });
export const invitation = z.object({
  id: rowId,
  email: z.string(),
  role,
  projects: z.array(rowId),
  invitedBy: z.string(),
  createdAt: when,
  expiresAt: when,
});
export type Person = z.infer<typeof person>;
export type Invitation = z.infer<typeof invitation>;

export const createTeam = defineEndpoint({
  method: 'POST',
  path: '/teams',
  who: signedIn,
  body: z.object({ name: nameField }),
  response: team,
  status: 201,
});
export const readTeam = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId',
  who: may('team.read', 'team', 'teamId'),
  params: teamParams,
  response: team,
});
export const changeTeam = defineEndpoint({
  method: 'PATCH',
  path: '/teams/:teamId',
  who: may('team.change', 'team', 'teamId'),
  params: teamParams,
  body: z.object({ name: nameField }),
  response: team,
});
export const deleteTeam = defineEndpoint({
  method: 'DELETE',
  path: '/teams/:teamId',
  who: may('team.delete', 'team', 'teamId'),
  params: teamParams,
  /** The team's name, typed once more. */
  body: z.object({ name: z.string() }),
  errors: ['team/name-differs'],
});
export const leaveTeam = defineEndpoint({
  method: 'POST',
  path: '/teams/:teamId/leave',
  who: may('team.leave', 'team', 'teamId'),
  params: teamParams,
  errors: ['team/last-owner'],
});

const personParams = z.object({ teamId: rowId, personId });
export const listPeople = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/people',
  who: may('people.read', 'team', 'teamId'),
  params: teamParams,
  response: z.array(person),
});
export const changePerson = defineEndpoint({
  method: 'PATCH',
  path: '/teams/:teamId/people/:personId',
  who: may('people.change', 'team', 'teamId'),
  params: personParams,
  body: z.object({ role }),
  response: person,
  errors: ['team/last-owner'],
});
export const removePerson = defineEndpoint({
  method: 'DELETE',
  path: '/teams/:teamId/people/:personId',
  who: may('people.change', 'team', 'teamId'),
  params: personParams,
  errors: ['team/last-owner'],
});

const invitationParams = z.object({ teamId: rowId, invitationId: rowId });
export const listInvitations = defineEndpoint({
  method: 'GET',
  path: '/teams/:teamId/invitations',
  who: may('people.change', 'team', 'teamId'),
  params: teamParams,
  response: z.array(invitation),
});
export const invite = defineEndpoint({
  method: 'POST',
  path: '/teams/:teamId/invitations',
  who: may('people.change', 'team', 'teamId'),
  params: teamParams,
  body: z.object({ email: z.email().max(320), role, projects: z.array(rowId).max(50).default([]) }),
  response: invitation,
  status: 201,
  errors: ['person/already-member', 'invitation/pending'],
});
export const resendInvitation = defineEndpoint({
  method: 'POST',
  path: '/teams/:teamId/invitations/:invitationId/resend',
  who: may('people.change', 'team', 'teamId'),
  params: invitationParams,
  response: invitation,
  errors: ['invitation/ended'],
});
export const withdrawInvitation = defineEndpoint({
  method: 'DELETE',
  path: '/teams/:teamId/invitations/:invitationId',
  who: may('people.change', 'team', 'teamId'),
  params: invitationParams,
});

/** For the invited: the id in the mail is the secret, and the signed-in address must be the invited one. */
const invitedParams = z.object({ invitationId: rowId });
export const readInvitation = defineEndpoint({
  method: 'GET',
  path: '/invitations/:invitationId',
  who: signedIn,
  params: invitedParams,
  response: z.object({ id: rowId, team: z.string(), role, invitedBy: z.string() }),
  errors: ['invitation/ended', 'invitation/other-address'],
});
export const acceptInvitation = defineEndpoint({
  method: 'POST',
  path: '/invitations/:invitationId/accept',
  who: signedIn,
  params: invitedParams,
  response: z.object({ teamId: rowId }),
  errors: ['invitation/ended', 'invitation/other-address'],
});
export const declineInvitation = defineEndpoint({
  method: 'POST',
  path: '/invitations/:invitationId/decline',
  who: signedIn,
  params: invitedParams,
  errors: ['invitation/ended', 'invitation/other-address'],
});

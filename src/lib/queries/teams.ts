import { queryOptions } from '@tanstack/react-query';
import { listInvitations, listPeople, readInvitation, readTeam } from '#shared/api';
import { callApi } from '../api';

export const teamQuery = (teamId: string) =>
  queryOptions({
    queryKey: ['team', teamId],
    queryFn: ({ signal }) => callApi(readTeam, { params: { teamId }, signal }),
  });

export const peopleQuery = (teamId: string) =>
  queryOptions({
    queryKey: ['team', teamId, 'people'],
    queryFn: ({ signal }) => callApi(listPeople, { params: { teamId }, signal }),
  });

export const invitationsQuery = (teamId: string) =>
  queryOptions({
    queryKey: ['team', teamId, 'invitations'],
    queryFn: ({ signal }) => callApi(listInvitations, { params: { teamId }, signal }),
  });

export const invitationQuery = (invitationId: string) =>
  queryOptions({
    queryKey: ['invitation', invitationId],
    queryFn: ({ signal }) => callApi(readInvitation, { params: { invitationId }, signal }),
    retry: false,
  });

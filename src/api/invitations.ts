import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import {
  acceptedAnswer,
  type CreateInvitationBody,
  invitationAnswer,
  invitationLookUpAnswer,
  invitationsAnswer,
} from '#shared/api/invitations';
import { call, callForNothing } from './client';
import { keys } from './keys';

/** The team's open invitations; only owners may ask. */
export function useInvitations(teamId: string) {
  return useQuery({
    queryKey: keys.invitations(teamId),
    queryFn: async () => (await call('GET', `/api/teams/${teamId}/invitations`, invitationsAnswer)).invitations,
  });
}

export function useCreateInvitation(teamId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateInvitationBody) =>
      call('POST', `/api/teams/${teamId}/invitations`, invitationAnswer, body),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.invitations(teamId) }),
  });
}

export function useRevokeInvitation(teamId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => callForNothing('DELETE', `/api/invitations/${id}`),
    onSettled: () => client.invalidateQueries({ queryKey: keys.invitations(teamId) }),
  });
}

/** What the holder of a link is being asked. The token goes in a body, so that it is in no server's log of addresses. */
export function useInvitation(token: string) {
  return useQuery({
    queryKey: keys.invitation(token),
    queryFn: async () => (await call('POST', '/api/invitations/look-up', invitationLookUpAnswer, { token })).invitation,
    retry: false,
    staleTime: Number.POSITIVE_INFINITY,
  });
}

export function useAcceptInvitation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (token: string) =>
      (await call('POST', '/api/invitations/accept', acceptedAnswer, { token })).team,
    onSuccess: () => client.refetchQueries({ queryKey: keys.me }),
  });
}

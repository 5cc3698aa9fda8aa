import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type ChangeRoleBody, memberAnswer, membersAnswer } from '#shared/api/members';
import { call, callForNothing } from './client';
import { keys } from './keys';

export function useMembers(teamId: string) {
  return useQuery({
    queryKey: keys.members(teamId),
    queryFn: async () => (await call('GET', `/api/teams/${teamId}/members`, membersAnswer)).members,
  });
}

export function useChangeRole(teamId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ personId, ...body }: ChangeRoleBody & { personId: string }) =>
      call('PATCH', `/api/teams/${teamId}/members/${personId}`, memberAnswer, body),
    // One's own role is among those that may have changed.
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.members(teamId) }),
        client.invalidateQueries({ queryKey: keys.me }),
      ]),
  });
}

export function useRemoveMember(teamId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (personId: string) => callForNothing('DELETE', `/api/teams/${teamId}/members/${personId}`),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.members(teamId) }),
        client.invalidateQueries({ queryKey: keys.me }),
      ]),
  });
}

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type CreateTeamBody, teamAnswer } from '#shared/api/teams';
import { call } from './client';
import { keys } from './keys';

export function useCreateTeam() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (body: CreateTeamBody) => (await call('POST', '/api/teams', teamAnswer, body)).team,
    onSuccess: () => client.refetchQueries({ queryKey: keys.me }),
  });
}

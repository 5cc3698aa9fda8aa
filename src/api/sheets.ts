import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type ChangeSheetBody, type CreateSheetBody, sheetAnswer, sheetsAnswer } from '#shared/api/sheets';
import { call } from './client';
import { keys } from './keys';

/** The team's sheets, last changed first, archived ones too. */
export function useSheets(teamId: string) {
  return useQuery({
    queryKey: keys.sheets(teamId),
    queryFn: async () => (await call('GET', `/api/teams/${teamId}/sheets`, sheetsAnswer)).sheets,
  });
}

/** One sheet, and its team with one's own role in it. */
export function useSheet(sheetId: string) {
  return useQuery({
    queryKey: keys.sheet(sheetId),
    queryFn: () => call('GET', `/api/sheets/${sheetId}`, sheetAnswer),
  });
}

export function useCreateSheet(teamId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (body: CreateSheetBody) =>
      (await call('POST', `/api/teams/${teamId}/sheets`, sheetAnswer, body)).sheet,
    onSuccess: () => client.invalidateQueries({ queryKey: keys.sheets(teamId) }),
  });
}

/** Renames a sheet, archives it or brings it back. */
export function useChangeSheet() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ sheetId, ...body }: ChangeSheetBody & { sheetId: string }) =>
      call('PATCH', `/api/sheets/${sheetId}`, sheetAnswer, body),
    onSuccess: ({ sheet, team }) => {
      client.setQueryData(keys.sheet(sheet.id), { sheet, team });
      return client.invalidateQueries({ queryKey: keys.sheets(sheet.teamId) });
    },
  });
}

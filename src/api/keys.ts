/** The name under which each answer is kept; an event from the server says which of them to ask for again. */
export const keys = {
  me: ['me'] as const,
  members: (teamId: string) => ['teams', teamId, 'members'] as const,
  invitations: (teamId: string) => ['teams', teamId, 'invitations'] as const,
  sheets: (teamId: string) => ['teams', teamId, 'sheets'] as const,
  everySheet: ['sheets'] as const,
  sheet: (sheetId: string) => ['sheets', sheetId] as const,
  invitation: (token: string) => ['invitation', token] as const,
};

/** What a person may be in a team, from least to most; each role may all that the one before it may. */
export const ROLES = ['viewer', 'reviewer', 'designer', 'owner'] as const;
export type Role = (typeof ROLES)[number];

/** Every action with the least role that may do it. */
const LEAST_ROLE = {
  'open-sheet': 'viewer',
  'see-members': 'viewer',
  'write-thread': 'reviewer',
  'decide-review': 'reviewer',
  'edit-sheet': 'designer',
  'take-snapshot': 'designer',
  'ask-review': 'designer',
  'settle-any-thread': 'designer',
  'edit-process': 'designer',
  'manage-members': 'owner',
  'archive-sheet': 'owner',
  'delete-sheet': 'owner',
  'read-activity': 'owner',
} as const satisfies Record<string, Role>;

export type Action = keyof typeof LEAST_ROLE;

export const ACTIONS = Object.keys(LEAST_ROLE) as readonly Action[];

/** Whether someone of this role may do this; the one table that the server, the live connection and the pages ask. */
export function can(role: Role, action: Action): boolean {
  return ROLES.indexOf(role) >= ROLES.indexOf(LEAST_ROLE[action]);
}

import { describe, expect, test } from 'vitest';
import { ACTIONS, type Action, can, ROLES } from '#shared/access/roles';

/** The product's table of roles: for each action, from which role on it is allowed. */
const TABLE: Record<Action, string> = {
  'open-sheet': 'viewer reviewer designer owner',
  'see-members': 'viewer reviewer designer owner',
  'write-thread': 'reviewer designer owner',
  'decide-review': 'reviewer designer owner',
  'edit-sheet': 'designer owner',
  'take-snapshot': 'designer owner',
  'ask-review': 'designer owner',
  'settle-any-thread': 'designer owner',
  'edit-process': 'designer owner',
  'manage-members': 'owner',
  'archive-sheet': 'owner',
  'delete-sheet': 'owner',
  'read-activity': 'owner',
};

describe('roles', () => {
  test.each(ACTIONS)('%s is allowed to those that the table names', (action) => {
    expect(ROLES.filter((role) => can(role, action)).join(' ')).toBe(TABLE[action]);
  });
});

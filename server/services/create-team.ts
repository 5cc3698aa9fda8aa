import type { OwnTeam } from '#shared/api/accounts';
import { newId } from '../auth/tokens';
import { insertMembership, insertTeam } from '../db/queries/teams';
import type { Context } from './context';

/** Makes a team that this person owns. */
export function createTeam(ctx: Context, name: string, personId: string): OwnTeam {
  const team: OwnTeam = { id: newId(), name, role: 'owner' };
  const now = ctx.now();
  ctx.db.transaction((tx) => {
    insertTeam(tx, { id: team.id, name, createdAt: now });
    insertMembership(tx, { teamId: team.id, personId, role: 'owner', joinedAt: now });
  });
  return team;
}

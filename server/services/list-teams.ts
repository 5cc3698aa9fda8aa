import type { OwnTeam } from '#shared/api/accounts';
import { teamsOf } from '../db/queries/teams';
import type { Context } from './context';

/** The person's teams, with their role in each. */
export function listTeams(ctx: Context, personId: string): OwnTeam[] {
  return teamsOf(ctx.db, personId);
}

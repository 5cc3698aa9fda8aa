import type { Member } from '#shared/api/members';
import { membersOf } from '../db/queries/teams';
import type { Context } from './context';
import { memberAnswerOf } from './member-answer';
import { requireTeam } from './team-access';

export function listMembers(ctx: Context, teamId: string, askerId: string): Member[] {
  requireTeam(ctx.db, teamId, askerId, 'see-members');
  return membersOf(ctx.db, teamId).map(memberAnswerOf);
}

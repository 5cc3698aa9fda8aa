import type { Invitation } from '#shared/api/invitations';
import { openInvitationsOf } from '../db/queries/invitations';
import type { Context } from './context';
import { invitationAnswerOf } from './invitation-answer';
import { requireTeam } from './team-access';

/** Those that can still be taken. */
export function listInvitations(ctx: Context, teamId: string, askerId: string): Invitation[] {
  requireTeam(ctx.db, teamId, askerId, 'manage-members');
  return openInvitationsOf(ctx.db, teamId, ctx.now()).map(invitationAnswerOf);
}

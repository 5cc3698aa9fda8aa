import { Refusal } from '#shared/api/refusal';
import { deleteInvitation, findInvitation } from '../db/queries/invitations';
import { findOwnTeam } from '../db/queries/teams';
import type { Context } from './context';
import { requireRole } from './team-access';

/** Takes back an invitation that nobody has taken. */
export function revokeInvitation(ctx: Context, id: string, askerId: string): void {
  const invitation = findInvitation(ctx.db, id);
  const team = invitation && findOwnTeam(ctx.db, invitation.teamId, askerId);
  if (!team) throw new Refusal('not-found', 'There is no such invitation, or it was taken.');
  requireRole(team, 'manage-members');
  deleteInvitation(ctx.db, id);
}
